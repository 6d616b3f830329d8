import { randomUUID } from "node:crypto";
import { UniqueConstraintViolationException } from "@mikro-orm/postgresql";
import { Film } from "#app/db/entities/film.ts";
import { Scan } from "#app/db/entities/scan.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { excerpt } from "#app/lib/excerpt.ts";
import { checkOnWafer } from "#app/lib/profile-on-wafer.ts";
import { readOneProfile } from "#app/lib/scan-reading/one-profile.ts";
import { ScanFileError } from "#app/lib/scan-reading/refusal.ts";
import type { ScanResult } from "#app/schemas/scan-result.ts";
import type { ScanSubject, ScanValues } from "#app/schemas/scan.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import type { UploadedFile } from "#app/server/upload.server.ts";
import { requireInProgram } from "./permission.server.ts";
import { keepScanFile, sha256 } from "./scan-files.server.ts";
import { formatOf, pairRefusal, pairResult, type PairedProfile } from "./scan-pair.ts";

type Refused = { outcome: "refused"; field: "before" | "after" | "film" | ""; reason: string };
type Uploaded = { outcome: "stored"; id: string } | Refused;

interface ScanFiles {
  before: UploadedFile;
  after: UploadedFile;
}

/**
 * Reads two profiles, computes the film's stress and stores raw files, inputs and result in one transaction. A pair that cannot be
 * read or computed leaves nothing behind and comes back with the reason.
 */
export async function uploadScan(scope: ActorScope, values: ScanValues, files: ScanFiles): Promise<Uploaded> {
  requireInProgram(scope, "upload scans", values.program, "program");
  const computed = computeScan(values, files);
  if ("outcome" in computed) return computed;
  try {
    return await keepScan(scope, values, files, computed.result);
  } catch (error) {
    // Somebody stored the same file at the same moment: it is there now, and the second time finds it.
    if (error instanceof UniqueConstraintViolationException) return keepScan(scope, values, files, computed.result);
    throw error;
  }
}

function computeScan(values: ScanValues, files: ScanFiles): { result: ScanResult } | Refused {
  let reading: "before" | "after" = "before";
  const read = (which: "before" | "after"): PairedProfile => {
    reading = which;
    const { name, bytes } = files[which];
    const profile = readOneProfile(bytes, name, values);
    checkOnWafer(profile, excerpt(name, 80), values);
    return { name, hash: sha256(bytes), profile };
  };
  try {
    return { result: pairResult(values, read("before"), read("after")) };
  } catch (error) {
    const reason = pairRefusal(error);
    if (reason === null) throw error;
    return { outcome: "refused", field: error instanceof ScanFileError ? reading : "", reason };
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
