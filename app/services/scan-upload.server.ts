import { randomUUID } from "node:crypto";
import { UniqueConstraintViolationException, type EntityManager } from "@mikro-orm/postgresql";
import { Film } from "#app/db/entities/film.ts";
import type { ScanFile } from "#app/db/entities/scan-file.ts";
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
import { fileHash, keepScanFile } from "./scan-files.server.ts";
import { formatOf, pairRefusal, pairResult, type PairedProfile } from "./scan-pair.ts";

export type Refused = { outcome: "refused"; field: "before" | "after" | "film" | ""; reason: string };
export type Uploaded = { outcome: "stored"; id: string } | Refused;

export interface ScanFiles {
  before: UploadedFile;
  after: UploadedFile;
}

/**
 * Reads two profiles, computes the film's stress and stores raw files, inputs and result in one transaction. A pair that cannot be
 * read or computed leaves nothing behind and comes back with the reason.
 */
export async function uploadScan(scope: ActorScope, values: ScanValues, files: ScanFiles): Promise<Uploaded> {
  requireInProgram(scope, "upload scans", values.program, "program");
  const computed = await computeScan(values, files);
  if ("outcome" in computed) return computed;
  try {
    return await keepScan(scope, values, files, computed.result);
  } catch (error) {
    // Somebody stored the same file at the same moment: it is there now, and the second time finds it.
    if (error instanceof UniqueConstraintViolationException) return keepScan(scope, values, files, computed.result);
    throw error;
  }
}

async function computeScan(values: ScanValues, files: ScanFiles): Promise<{ result: ScanResult } | Refused> {
  let reading: "before" | "after" = "before";
  const read = async (which: "before" | "after"): Promise<PairedProfile> => {
    reading = which;
    const { name, bytes } = files[which];
    const profile = readOneProfile(bytes, name, values);
    checkOnWafer(profile, excerpt(name, 80), values);
    return { name, hash: await fileHash(bytes), profile };
  };
  try {
    return { result: pairResult(values, await read("before"), await read("after")) };
  } catch (error) {
    const reason = pairRefusal(error);
    if (reason === null) throw error;
    return { outcome: "refused", field: error instanceof ScanFileError ? reading : "", reason };
  }
}

function keepScan(scope: ActorScope, values: ScanSubject, files: ScanFiles, result: ScanResult): Promise<Uploaded> {
  return inScope(scope, async (em) => {
    // The film first: a pair that is refused leaves no file behind.
    if (!(await filmOf(em, values))) return FILM_GONE;
    const before = await keepScanFile(em, scope, values.program, files.before);
    const after = await keepScanFile(em, scope, values.program, files.after);
    return storeScan(em, scope, values, { before, after }, result);
  });
}

const FILM_GONE: Refused = {
  outcome: "refused",
  field: "film",
  reason: "That film is no longer in the library. Choose another.",
};

/** The film, or that none was named; null when it is gone. */
async function filmOf(em: EntityManager, { film }: ScanSubject): Promise<{ film: Film | null } | null> {
  if (film === null) return { film };
  const found = await em.findOne(Film, { id: film });
  return found && { film: found };
}

/** Stores a scan of two files that are kept, within a transaction that is open. */
export async function storeScan(
  em: EntityManager,
  scope: ActorScope,
  values: ScanSubject,
  files: { before: ScanFile; after: ScanFile },
  result: ScanResult,
  id: string = randomUUID(),
): Promise<Uploaded> {
  const named = await filmOf(em, values);
  if (!named) return FILM_GONE;
  const { program, label, film: _film, ...parameters } = values;
  const scan = em.create(Scan, {
    id,
    program,
    label,
    ...named,
    ...files,
    parameters: { ...parameters, ...formatOf(result) },
    result,
    engineVersion: ENGINE_VERSION,
    createdAt: new Date(),
    createdBy: scope.actor.id,
  });
  await em.flush();
  return { outcome: "stored", id: scan.id };
}
