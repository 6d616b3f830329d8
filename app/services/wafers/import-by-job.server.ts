import { ScanFile } from "#app/db/entities/scan-file.ts";
import { ScanReading } from "#app/db/entities/scan-reading.ts";
import { excerpt } from "#app/lib/excerpt.ts";
import { keptFileSentence } from "#app/lib/kept-file.ts";
import { readingFigures } from "#app/lib/reading-figures.ts";
import type { JobKinds } from "#app/schemas/job.ts";
import type { FileAnswer, FileValues } from "#app/schemas/scan-import.ts";
import type { ScanReadingResult } from "#app/schemas/scan-reading.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import type { UploadedFile } from "#app/server/upload.server.ts";
import { enqueueOnce } from "../jobs/enqueue.server.ts";
import { JobRefused, type Tell } from "../jobs/progress.server.ts";
import type { Worked } from "../jobs/run-job.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { keepScanFileAlone, piecesOf } from "../scan-files.server.ts";
import { readInPieces } from "../scan-readings/read-in-pieces.server.ts";
import { refusedAtBeginning } from "../scan-readings/refused-at-beginning.ts";
import { fileRefusal } from "../scan-readings/refusal-sentence.ts";
import { settingsHash } from "../scan-readings/settings-hash.ts";
import { placed, placeFile } from "./place-file.server.ts";

/** Stores a file of an import that is too large to be read on a request, and has a job read and place it. */
export async function importByJob(scope: ActorScope, values: FileValues, file: UploadedFile): Promise<FileAnswer> {
  const refused = refusedAtBeginning(file, values);
  if (refused) return { outcome: "refused", reason: refused.reason };
  const stored = await keepScanFileAlone(scope, values.program, file);
  const job = await inScope(scope, (em) =>
    enqueueOnce(em, scope, {
      program: values.program,
      kind: "file import",
      title: excerpt(file.name, 80),
      total: stored.size,
      unit: "bytes",
      input: { values, file: stored },
    }),
  );
  return { outcome: "job", job };
}

/**
 * Reads a stored file and places what it says; one that is done again finds it there.
 * @throws JobRefused when it cannot be read or placed, with the reason
 */
export async function importStoredFile(
  scope: ActorScope,
  { values, file }: JobKinds["file import"]["input"],
  tell: Tell,
): Promise<Worked> {
  requireInProgram(scope, "upload scans", values.program, "program");
  const result = await readResult(scope, values, file.id, tell);
  const answer = await placed(() => inScope(scope, (em) => placeFile(em, scope, values, { file, result })));
  if (answer.outcome === "refused") throw new JobRefused(answer.reason);
  if (answer.outcome === "fields") throw new JobRefused(Object.values(answer.errors).flat().join(" "));
  return { outcome: { kept: answer }, sentence: keptFileSentence(answer) };
}

async function readResult(
  scope: ActorScope,
  { program, profile, edgeExclusion }: FileValues,
  id: string,
  tell: Tell,
): Promise<ScanReadingResult> {
  const { file, known } = await inScope(scope, async (em) => {
    const file = await em.findOne(ScanFile, { id, program });
    if (!file) throw notFound("scan file");
    const hash = settingsHash({ profile, edgeExclusion });
    const known = await em.findOne(ScanReading, { file: id, settingsHash: hash }, { populate: ["result"] });
    return { file, known: known?.result.get() ?? null };
  });
  if (known) return known;
  try {
    const read = await readInPieces(piecesOf(scope, id), file, profile, tell);
    return readingFigures(excerpt(file.name, 80), read, edgeExclusion);
  } catch (error) {
    const reason = fileRefusal(error);
    throw reason === null ? error : new JobRefused(reason);
  }
}
