import { UniqueConstraintViolationException, type EntityManager } from "@mikro-orm/postgresql";
import { ImportProfile } from "#app/db/entities/import-profile.ts";
import { ScanReading } from "#app/db/entities/scan-reading.ts";
import { excerpt } from "#app/lib/excerpt.ts";
import { readingFigures } from "#app/lib/reading-figures.ts";
import { readScanFile } from "#app/lib/scan-reading/scan-reader.ts";
import type { FileAnswer, ProfileFileValues, TableFileValues } from "#app/schemas/scan-import.ts";
import type { ScanReadingResult } from "#app/schemas/scan-reading.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import type { UploadedFile } from "#app/server/upload.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { keepScanFile } from "../scan-files.server.ts";
import { pairRefusal } from "../scan-pair.ts";
import { keepReading, knownReading } from "../scan-readings/keep-reading.server.ts";
import { fileRefusal } from "../scan-readings/refusal-sentence.ts";
import { ImportRefused } from "./import-refused.ts";
import { keepTable } from "./keep-table.server.ts";
import { placeProfiles } from "./place-profiles.server.ts";

export type FileValues = TableFileValues | ProfileFileValues;

/**
 * Takes one file of an import in, whole or not at all: the file, what it says, and where that belongs. A profile is placed on its wafer
 * and makes a scan with its partner if that waits there; a table is kept wafer by wafer. What was brought in before is recognised.
 * @throws 403 for a role that may not upload scans, 404 for a program that is not the person's own
 */
export async function importFile(scope: ActorScope, values: FileValues, file: UploadedFile): Promise<FileAnswer> {
  requireInProgram(scope, "upload scans", values.program, "program");
  const { profile, edgeExclusion } = values;
  let result: ScanReadingResult;
  try {
    result = readingFigures(excerpt(file.name, 80), readScanFile(file.bytes, file.name, profile), edgeExclusion);
  } catch (error) {
    const reason = fileRefusal(error);
    if (reason === null) throw error;
    return { outcome: "refused", reason };
  }
  const keep = () => inScope(scope, (em) => keepFile(em, scope, values, file, result));
  try {
    return await keep().catch((error: unknown) => {
      // Somebody brought the same file, lot or wafer in at the same moment: it is there now, and the second time finds it.
      if (error instanceof UniqueConstraintViolationException) return keep();
      throw error;
    });
  } catch (error) {
    const reason = error instanceof ImportRefused ? error.message : pairRefusal(error);
    if (reason === null) throw error;
    const field = error instanceof ImportRefused ? error.field : null;
    return field === null ? { outcome: "refused", reason } : { outcome: "fields", errors: { [field]: [reason] } };
  }
}

async function keepFile(
  em: EntityManager,
  scope: ActorScope,
  values: FileValues,
  file: UploadedFile,
  result: ScanReadingResult,
): Promise<FileAnswer> {
  const { program, profile, edgeExclusion } = values;
  const settings = { profile, edgeExclusion };
  const kept = await keepScanFile(em, scope, program, file);
  const id =
    (await knownReading(em, kept.id, settings)) ??
    (await keepReading(em, scope, { program, file: kept.id, settings, result }));
  const reading = await em.findOneOrFail(ScanReading, { id }, { populate: ["file"] });
  if (result.content.kind !== "profiles") return keepTable(em, scope, values, reading, result);
  if (!("lines" in values)) throw new ImportRefused(`${excerpt(file.name, 80)} holds profiles. Say of which wafer.`);
  const instrument = values.instrument === null ? null : await em.findOne(ImportProfile, { id: values.instrument });
  const placed = await placeProfiles(em, scope, values, { reading, result, instrument });
  return { outcome: "placed", placed };
}
