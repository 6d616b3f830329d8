import { randomUUID } from "node:crypto";
import { UniqueConstraintViolationException } from "@mikro-orm/postgresql";
import { Film } from "#app/db/entities/film.ts";
import { Scan } from "#app/db/entities/scan.ts";
import { EngineInputError } from "#app/engine/errors.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { excerpt } from "#app/lib/excerpt.ts";
import { checkOnWafer, checkTogether } from "#app/lib/profile-on-wafer.ts";
import { readOneProfile, type ReadProfile } from "#app/lib/scan-reading/one-profile.ts";
import { ScanFileError } from "#app/lib/scan-reading/refusal.ts";
import type { FileFormat, ScanResult } from "#app/schemas/scan-result.ts";
import type { ScanSubject, ScanValues } from "#app/schemas/scan.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import type { UploadedFile } from "#app/server/upload.server.ts";
import { requireInProgram } from "./permission.server.ts";
import { keepScanFile, sha256 } from "./scan-files.server.ts";
import { scanResult } from "./scan-result-of.ts";

export type Refused = { outcome: "refused"; field: "before" | "after" | "film" | ""; reason: string };
export type Uploaded = { outcome: "stored"; id: string } | Refused;

export interface ScanFiles {
  before: UploadedFile;
  after: UploadedFile;
}

/** How each file is read. */
type ReadAs = (which: "before" | "after", file: UploadedFile) => ReadProfile;

/**
 * Reads two profiles, computes the film's stress and stores raw files, inputs and result in one transaction. A pair that cannot be
 * read or computed leaves nothing behind and comes back with the reason.
 */
export async function uploadScan(scope: ActorScope, values: ScanValues, files: ScanFiles): Promise<Uploaded> {
  return uploadReadAs(scope, values, files, (_, file) => readOneProfile(file.bytes, file.name, values));
}

/** The same where each file says by itself, or by a profile of its own, how it is written. */
export async function uploadReadAs(
  scope: ActorScope,
  values: ScanSubject,
  files: ScanFiles,
  readAs: ReadAs,
): Promise<Uploaded> {
  requireInProgram(scope, "upload scans", values.program, "program");
  const computed = computeScan(values, files, readAs);
  if ("outcome" in computed) return computed;
  try {
    return await keepScan(scope, values, files, computed.result);
  } catch (error) {
    // Somebody stored the same file at the same moment: it is there now, and the second time finds it.
    if (error instanceof UniqueConstraintViolationException) return keepScan(scope, values, files, computed.result);
    throw error;
  }
}

function computeScan(values: ScanSubject, files: ScanFiles, readAs: ReadAs): { result: ScanResult } | Refused {
  const read = (which: "before" | "after"): ReadProfile => {
    const profile = readAs(which, files[which]);
    checkOnWafer(profile, excerpt(files[which].name, 80), values);
    return profile;
  };
  let reading: "before" | "after" = "before";
  try {
    const before = read("before");
    reading = "after";
    if (sha256(files.before.bytes) === sha256(files.after.bytes))
      throw new ScanFileError(
        `${excerpt(files.after.name, 80)} holds the same bytes as the file before the film. Choose the scan after it.`,
      );
    const after = read("after");
    checkTogether({ name: files.before.name, profile: before }, { name: files.after.name, profile: after }, values);
    return { result: scanResult(values, before, after) };
  } catch (error) {
    if (error instanceof ScanFileError) return { outcome: "refused", field: reading, reason: error.message };
    if (error instanceof EngineInputError)
      return {
        outcome: "refused",
        field: "",
        reason: `The two scans give no curvature: the ${error.field === "points" ? "points" : error.field} ${error.reason}.`,
      };
    throw error;
  }
}

function keepScan(scope: ActorScope, values: ScanSubject, files: ScanFiles, result: ScanResult): Promise<Uploaded> {
  return inScope(scope, async (em): Promise<Uploaded> => {
    const film = values.film ? await em.findOne(Film, { id: values.film }) : null;
    if (values.film && !film)
      return { outcome: "refused", field: "film", reason: "That film is no longer in the library. Choose another." };
    const { program: _program, label: _label, film: _film, ...parameters } = values;
    const scan = em.create(Scan, {
      id: randomUUID(),
      program: values.program,
      label: values.label,
      film,
      before: await keepScanFile(em, scope, values.program, files.before),
      after: await keepScanFile(em, scope, values.program, files.after),
      parameters: { ...parameters, ...formatOf(result) },
      result,
      engineVersion: ENGINE_VERSION,
      createdAt: new Date(),
      createdBy: scope.actor.id,
    });
    await em.flush();
    return { outcome: "stored", id: scan.id };
  });
}

function formatOf({ before }: ScanResult): FileFormat {
  if (!before.format) throw new Error("a file that was read has a format");
  return before.format;
}
