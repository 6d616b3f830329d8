import { Scan } from "#app/db/entities/scan.ts";
import { ScanFile } from "#app/db/entities/scan-file.ts";
import { excerpt } from "#app/lib/excerpt.ts";
import { checkOnWafer } from "#app/lib/profile-on-wafer.ts";
import { questionAtBeginning } from "#app/lib/scan-reading/beginning.ts";
import { onlyProfile, statedProfile, unheadedProfile, type ReadProfile } from "#app/lib/scan-reading/one-profile.ts";
import type { JobKinds, StoredFile } from "#app/schemas/job.ts";
import type { ScanValues } from "#app/schemas/scan.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { enqueueOnce } from "./jobs/enqueue.server.ts";
import { JobRefused, type Tell } from "./jobs/progress.server.ts";
import type { Worked } from "./jobs/run-job.server.ts";
import { requireInProgram } from "./permission.server.ts";
import { keepScanFileAlone, piecesOf } from "./scan-files.server.ts";
import { pairRefusal, pairResult, type PairedProfile } from "./scan-pair.ts";
import { readInPieces } from "./scan-readings/read-in-pieces.server.ts";
import { storeScan, type Refused, type ScanFiles } from "./scan-upload.server.ts";

const WHICH = ["before", "after"] as const;

/**
 * Keeps a pair that is too large to be read on a request, and has a job read it. What shows at the beginning of a file is refused
 * here, and then nothing is stored.
 */
export async function uploadByJob(
  scope: ActorScope,
  values: ScanValues,
  files: ScanFiles,
): Promise<{ outcome: "job"; id: string } | Refused> {
  requireInProgram(scope, "upload scans", values.program, "program");
  for (const which of WHICH) {
    const reason = refusedAtBeginning(files[which], values);
    if (reason !== null) return { outcome: "refused", field: which, reason };
  }
  const kept = {
    before: await keepScanFileAlone(scope, values.program, files.before),
    after: await keepScanFileAlone(scope, values.program, files.after),
  };
  const id = await inScope(scope, (em) =>
    enqueueOnce(em, scope, {
      program: values.program,
      kind: "scan pair",
      title: `${values.label}: ${excerpt(files.before.name, 80)} and ${excerpt(files.after.name, 80)}`,
      total: kept.before.size + kept.after.size,
      unit: "bytes",
      input: { values, files: kept },
    }),
  );
  return { outcome: "job", id };
}

function refusedAtBeginning({ bytes, name }: ScanFiles["before"], values: ScanValues): string | null {
  try {
    const profile = statedProfile(values);
    const question = questionAtBeginning(bytes, name, profile);
    if (question && !unheadedProfile(question, profile)) onlyProfile(question, name);
    return null;
  } catch (error) {
    const reason = pairRefusal(error);
    if (reason === null) throw error;
    return reason;
  }
}

/**
 * Reads a pair of stored files and stores the scan that they make; one that is done again finds the scan that it made.
 * @throws JobRefused when the pair makes no scan, with the reason
 */
export async function readStoredPair(
  scope: ActorScope,
  { values, files }: JobKinds["scan pair"]["input"],
  tell: Tell,
  job: string,
): Promise<Worked> {
  requireInProgram(scope, "upload scans", values.program, "program");
  const known = await inScope(scope, (em) => em.findOne(Scan, { id: job }, { fields: ["id"] }));
  if (known) return done(job);
  try {
    const before = await pairedProfile(scope, files.before, values, tell);
    const after = await pairedProfile(scope, files.after, values, (read) => tell(files.before.size + read));
    const result = pairResult(values, before, after);
    const stored = await inScope(scope, async (em) => {
      const [one, other] = [files.before.id, files.after.id].map((id) => em.getReference(ScanFile, id));
      if (!one || !other) throw new Error("a pair has two files");
      return storeScan(em, scope, values, { before: one, after: other }, result, job);
    });
    if (stored.outcome === "refused") throw new JobRefused(stored.reason);
  } catch (error) {
    const reason = pairRefusal(error);
    throw reason === null ? error : new JobRefused(reason);
  }
  return done(job);
}

const done = (scan: string): Worked => ({ outcome: { scan }, sentence: "The pair is in." });

async function pairedProfile(
  scope: ActorScope,
  { id }: StoredFile,
  values: ScanValues,
  tell: Tell,
): Promise<PairedProfile> {
  const file = await inScope(scope, (em) => em.findOne(ScanFile, { id, program: values.program }));
  if (!file) throw notFound("scan file");
  const profile = await readProfile(scope, file, values, tell);
  checkOnWafer(profile, excerpt(file.name, 80), values);
  return { name: file.name, hash: file.hash, profile };
}

async function readProfile(scope: ActorScope, file: ScanFile, values: ScanValues, tell: Tell): Promise<ReadProfile> {
  const profile = statedProfile(values);
  const pieces = piecesOf(scope, file.id);
  const read = await readInPieces(pieces, file, profile, tell);
  const unheaded = unheadedProfile(read, profile);
  return onlyProfile(unheaded ? await readInPieces(pieces, file, unheaded, tell) : read, file.name);
}
