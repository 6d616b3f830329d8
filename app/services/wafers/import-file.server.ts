import { excerpt } from "#app/lib/excerpt.ts";
import { readingFigures } from "#app/lib/reading-figures.ts";
import { LARGEST_ON_REQUEST } from "#app/lib/scan-file.ts";
import { readScanFile } from "#app/lib/scan-reading/scan-reader.ts";
import type { FileAnswer, FileValues } from "#app/schemas/scan-import.ts";
import type { ScanReadingResult } from "#app/schemas/scan-reading.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import type { UploadedFile } from "#app/server/upload.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { keepScanFile } from "../scan-files.server.ts";
import { fileRefusal } from "../scan-readings/refusal-sentence.ts";
import { importByJob } from "./import-by-job.server.ts";
import { placed, placeFile } from "./place-file.server.ts";

/**
 * Takes one file of an import in, whole or not at all: the file, what it says, and where that belongs. A profile is placed on its wafer
 * and makes a scan with its partner if that waits there; a table is kept wafer by wafer. What was brought in before is recognised.
 * A large file that begins well is stored, and a job does the rest.
 * @throws 403 for a role that may not upload scans, 404 for a program that is not the person's own
 */
export async function importFile(scope: ActorScope, values: FileValues, file: UploadedFile): Promise<FileAnswer> {
  requireInProgram(scope, "upload scans", values.program, "program");
  if (file.bytes.length > LARGEST_ON_REQUEST) return importByJob(scope, values, file);
  const { program, profile, edgeExclusion } = values;
  let result: ScanReadingResult;
  try {
    result = readingFigures(excerpt(file.name, 80), readScanFile(file.bytes, file.name, profile), edgeExclusion);
  } catch (error) {
    const reason = fileRefusal(error);
    if (reason === null) throw error;
    return { outcome: "refused", reason };
  }
  return placed(() =>
    inScope(scope, async (em) =>
      placeFile(em, scope, values, { file: await keepScanFile(em, scope, program, file), result }),
    ),
  );
}
