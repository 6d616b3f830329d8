import { UniqueConstraintViolationException, type EntityManager } from "@mikro-orm/postgresql";
import { ScanFile } from "#app/db/entities/scan-file.ts";
import { excerpt } from "#app/lib/excerpt.ts";
import { LARGEST_ON_REQUEST } from "#app/lib/scan-file.ts";
import { readingFigures } from "#app/lib/reading-figures.ts";
import { readScanFile } from "#app/lib/scan-reading/scan-reader.ts";
import type { StoredFile } from "#app/schemas/job.ts";
import type { ReadingSettings, ScanReadingResult } from "#app/schemas/scan-reading.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import type { UploadedFile } from "#app/server/upload.server.ts";
import { enqueueOnce } from "../jobs/enqueue.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { fileHash, keepScanFile, keepScanFileAlone } from "../scan-files.server.ts";
import { keepReading, knownReading } from "./keep-reading.server.ts";
import { refusedAtBeginning, refusedFile, type RefusedFile } from "./refused-at-beginning.ts";

export type Imported =
  | { outcome: "read" | "already read"; reading: string }
  | { outcome: "job"; job: string }
  | ({ outcome: "refused" } & RefusedFile);

interface Import {
  program: string;
  files: UploadedFile[];
  settings: ReadingSettings;
}

/**
 * Takes files of an instrument in. One small file is read here and now, and one that cannot be read leaves nothing behind; a large file
 * that begins well and a batch are stored, each file in its own transaction, and read by a job. What has been read in the same way before is found.
 * @throws 403 for a role that may not, 404 for a program that is not the person's own
 */
export async function importScanFiles(scope: ActorScope, { program, files, settings }: Import): Promise<Imported> {
  requireInProgram(scope, "upload scans", program, "program");
  const [only, ...others] = files;
  if (!only) throw new Error("an import has a file");
  if (others.length > 0) return importInJob(scope, { program, files, settings });
  const isLarge = only.bytes.length > LARGEST_ON_REQUEST;
  const refused = isLarge ? refusedAtBeginning(only, settings) : null;
  if (refused) return { outcome: "refused", ...refused };
  const known = await inScope(scope, (em) => readingOfBytes(em, program, only, settings));
  if (known !== null) return { outcome: "already read", reading: known };
  return isLarge ? importInJob(scope, { program, files, settings }) : importNow(scope, program, only, settings);
}

async function readingOfBytes(
  em: EntityManager,
  program: string,
  { bytes }: UploadedFile,
  settings: ReadingSettings,
): Promise<string | null> {
  const file = await em.findOne(ScanFile, { program, hash: await fileHash(bytes) }, { fields: ["id"] });
  return file && knownReading(em, file.id, settings);
}

async function importNow(
  scope: ActorScope,
  program: string,
  file: UploadedFile,
  settings: ReadingSettings,
): Promise<Imported> {
  let result: ScanReadingResult;
  try {
    const name = excerpt(file.name, 80);
    result = readingFigures(name, readScanFile(file.bytes, file.name, settings.profile), settings.edgeExclusion);
  } catch (error) {
    return { outcome: "refused", ...refusedFile(error) };
  }
  try {
    const reading = await inScope(scope, async (em) => {
      const { id } = await keepScanFile(em, scope, program, file);
      return keepReading(em, scope, { program, file: id, settings, result });
    });
    return { outcome: "read", reading };
  } catch (error) {
    if (!(error instanceof UniqueConstraintViolationException)) throw error;
    // Somebody sent the same file at the same moment: it is there now.
    const known = await inScope(scope, (em) => readingOfBytes(em, program, file, settings));
    return known === null ? importNow(scope, program, file, settings) : { outcome: "already read", reading: known };
  }
}

async function importInJob(scope: ActorScope, { program, files, settings }: Import): Promise<Imported> {
  const kept = new Map<string, StoredFile>();
  for (const file of files) {
    const stored = await keepScanFileAlone(scope, program, file);
    kept.set(stored.id, stored);
  }
  const list = [...kept.values()];
  const job = await inScope(scope, (em) =>
    enqueueOnce(em, scope, {
      program,
      kind: "scan files",
      title: titleOf(list.map(({ name }) => name)),
      total: list.reduce((sum, { size }) => sum + size, 0),
      unit: "bytes",
      input: { files: list, settings },
    }),
  );
  return { outcome: "job", job };
}

function titleOf([first = "", ...others]: string[]): string {
  const name = excerpt(first, 80);
  return others.length === 0 ? name : `${name} and ${others.length} more`;
}
