import { randomUUID } from "node:crypto";
import { RepeatabilityStudy } from "#app/db/entities/repeatability-study.ts";
import { EngineInputError } from "#app/engine/errors.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { excerpt } from "#app/lib/excerpt.ts";
import { checkOnWafer } from "#app/lib/profile-on-wafer.ts";
import { readingFigures } from "#app/lib/reading-figures.ts";
import { ScanFileError } from "#app/lib/scan-reading/refusal.ts";
import { readScanFile } from "#app/lib/scan-reading/scan-reader.ts";
import { readTypedRepeats } from "#app/lib/study-readings.ts";
import { studyFault, studyResult } from "#app/lib/study-result.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import type { StudyReading, StudyValues } from "#app/schemas/instrument.ts";
import { RULES } from "#app/schemas/ranges.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import type { UploadedFile } from "#app/server/upload.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { fileHash } from "../scan-files.server.ts";
import { instrumentOf } from "./instrument-of.server.ts";

export type StudyAdded =
  { outcome: "stored"; id: string } | { outcome: "refused"; field: "files" | "typed"; reason: string };

const refused = (field: "files" | "typed", reason: string): StudyAdded => ({ outcome: "refused", field, reason });

/**
 * Keeps a repeatability study: repeats as files, which are read as the instrument writes them and not kept, or typed. A repeat that
 * cannot be read leaves nothing behind.
 * @throws 403 for a role that may not, 404 when the id names nothing
 */
export async function addStudy(
  scope: ActorScope,
  instrument: string | undefined,
  values: StudyValues,
  files: readonly UploadedFile[],
): Promise<StudyAdded> {
  requireOnSite(scope, "check instruments");
  const record = await inScope(scope, (em) => instrumentOf(em, instrument));
  const typed = values.typed?.trim() ?? "";
  if (files.length > 0 && typed !== "")
    return refused("typed", "Give the repeats as files or as a list, not both: the list would be lost.");
  const field = typed === "" ? "files" : "typed";
  const read = typed === "" ? await readFiles(files, values, record.profile) : readTyped(typed, values);
  if (!read.ok) return refused(field, read.fault);
  const fault = studyFault(read.readings);
  if (fault !== null) return refused(field, fault);
  return inScope(scope, async (em): Promise<StudyAdded> => {
    const study = em.create(RepeatabilityStudy, {
      id: randomUUID(),
      profile: record.id,
      instrument: record.name,
      wafer: values.wafer,
      diameter: values.diameter,
      readings: read.readings,
      result: studyResult(read.readings),
      note: values.note,
      setAside: null,
      engineVersion: ENGINE_VERSION,
      createdAt: new Date(),
      createdBy: scope.actor.id,
    });
    await em.flush();
    return { outcome: "stored", id: study.id };
  });
}

type Repeats = { ok: true; readings: StudyReading[] } | { ok: false; fault: string };

function readTyped(typed: string, { typedAs, diameter }: StudyValues): Repeats {
  const read = readTypedRepeats(typed, { typedAs, diameter, rule: RULES[typedAs] });
  if (!read.ok) return read;
  return { ok: true, readings: read.curvatures.map((curvature) => ({ curvature, file: null })) };
}

async function readFiles(
  files: readonly UploadedFile[],
  values: StudyValues,
  profile: ImportProfile,
): Promise<Repeats> {
  const readings: StudyReading[] = [];
  const seen = new Map<string, string>();
  for (const file of files) {
    const name = excerpt(file.name, 80);
    const hash = await fileHash(file.bytes);
    const same = seen.get(hash);
    if (same !== undefined)
      return {
        ok: false,
        fault: `${name} holds the same bytes as ${same}. A repeat is a scan of its own: take one out.`,
      };
    seen.set(hash, name);
    try {
      readings.push({ curvature: curvatureOf(file, values, profile), file: name });
    } catch (error) {
      if (error instanceof ScanFileError) return { ok: false, fault: error.message };
      if (error instanceof EngineInputError)
        return { ok: false, fault: `${name} gives no curvature: ${error.field} ${error.reason}.` };
      throw error;
    }
    // Others are served between two files.
    await new Promise(setImmediate);
  }
  return { ok: true, readings };
}

function curvatureOf({ bytes, name }: UploadedFile, values: StudyValues, profile: ImportProfile): number {
  const short = excerpt(name, 80);
  const { content } = readingFigures(short, readScanFile(bytes, name, profile), values.edgeExclusion);
  const profiles = content.kind === "profiles" ? content.profiles : [];
  const [only, ...others] = profiles;
  if (!only || others.length > 0)
    throw new ScanFileError(
      content.kind === "profiles"
        ? `${short} holds ${profiles.length} profiles. Export each repeat to a file of its own.`
        : `${short} is a ${content.kind}, not a profile. Choose the scans, position and height in a row.`,
    );
  if (!only.fit)
    throw new ScanFileError(`${short} runs from the centre to one side. A repeat is a scan across the wafer.`);
  const points = { x: Float64Array.from(only.x), z: Float64Array.from(only.z) };
  checkOnWafer({ points, reading: { from: Math.min(...only.x), to: Math.max(...only.x) } }, short, values);
  return only.fit.curvature;
}
