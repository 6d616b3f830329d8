import { UniqueConstraintViolationException } from "@mikro-orm/postgresql";
import { ScanFile } from "#app/db/entities/scan-file.ts";
import { count } from "#app/lib/count-words.ts";
import { readingFigures } from "#app/lib/reading-figures.ts";
import type { FileOutcome, JobKinds } from "#app/schemas/job.ts";
import type { ReadingSettings, ScanReadingResult } from "#app/schemas/scan-reading.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { JobRefused, type Tell } from "../jobs/progress.server.ts";
import type { Worked } from "../jobs/run-job.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { piecesOf } from "../scan-files.server.ts";
import { keepReading, knownReading } from "./keep-reading.server.ts";
import { readInPieces } from "./read-in-pieces.server.ts";
import { fileRefusal } from "./refusal-sentence.ts";

/**
 * Reads and fits files that are stored, each in a transaction of its own. A file that cannot be read stays as it is, with its reason;
 * one that has been read in the same way before is not read again.
 * @throws JobRefused when none could be read, with the reasons
 */
export async function readStoredFiles(
  scope: ActorScope,
  { files, settings }: JobKinds["scan files"]["input"],
  tell: Tell,
): Promise<Worked> {
  const outcomes: FileOutcome[] = [];
  let before = 0;
  for (const { id, name, size } of files) {
    const begun = before;
    await tell(begun);
    outcomes.push({ file: id, name, ...(await readStored(scope, id, settings, (done) => tell(begun + done))) });
    before += size;
  }
  const refused = outcomes.flatMap((each) => (each.outcome === "refused" ? each.reason : []));
  if (refused.length === files.length) throw new JobRefused(refused.join(" "));
  return { outcome: { files: outcomes }, sentence: sentenceOf(outcomes, refused.length) };
}

function sentenceOf(outcomes: FileOutcome[], refused: number): string {
  const known = outcomes.filter(({ outcome }) => outcome === "already read").length;
  const read = outcomes.length - refused - known;
  const parts = [
    read > 0 && `${count(read)} read`,
    known > 0 && `${count(known)} had been read before`,
    refused > 0 && `${count(refused)} refused`,
  ].filter((part) => part !== false);
  const text = parts.join(", ");
  return `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
}

async function readStored(
  scope: ActorScope,
  id: string,
  settings: ReadingSettings,
  tell: Tell,
): Promise<{ outcome: "read" | "already read"; reading: string } | { outcome: "refused"; reason: string }> {
  const stored = await inScope(scope, async (em) => {
    const file = await em.findOne(ScanFile, { id });
    if (!file) throw notFound("scan file");
    requireInProgram(scope, "upload scans", file.program.id, "scan file");
    const known = await knownReading(em, id, settings);
    return { program: file.program.id, name: file.name, size: file.size, known };
  });
  const { program, known } = stored;
  if (known !== null) return { outcome: "already read", reading: known };
  let result: ScanReadingResult;
  try {
    const read = await readInPieces(piecesOf(scope, id), stored, settings.profile, tell);
    result = readingFigures(stored.name, read, settings.edgeExclusion);
  } catch (error) {
    const reason = fileRefusal(error);
    if (reason === null) throw error;
    return { outcome: "refused", reason };
  }
  try {
    const reading = await inScope(scope, (em) => keepReading(em, scope, { program, file: id, settings, result }));
    return { outcome: "read", reading };
  } catch (error) {
    // Another worker has just read the same file in the same way.
    const reading =
      error instanceof UniqueConstraintViolationException
        ? await inScope(scope, (em) => knownReading(em, id, settings))
        : null;
    if (reading === null) throw error;
    return { outcome: "already read", reading };
  }
}
