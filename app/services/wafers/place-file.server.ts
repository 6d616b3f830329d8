import { UniqueConstraintViolationException, type EntityManager } from "@mikro-orm/postgresql";
import { ImportProfile } from "#app/db/entities/import-profile.ts";
import { ScanReading } from "#app/db/entities/scan-reading.ts";
import { excerpt } from "#app/lib/excerpt.ts";
import type { FileAnswer, FileValues, KeptFile } from "#app/schemas/scan-import.ts";
import type { ScanReadingResult } from "#app/schemas/scan-reading.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { pairRefusal } from "../scan-pair.ts";
import { keepReading, knownReading } from "../scan-readings/keep-reading.server.ts";
import { ImportRefused } from "./import-refused.ts";
import { keepTable } from "./keep-table.server.ts";
import { placeProfiles } from "./place-profiles.server.ts";

/**
 * Keeps what a stored file says, and places it where that belongs, within a transaction that is open already.
 * @throws ImportRefused, and what `makeScan` throws, when it cannot be placed: then nothing is kept
 */
export async function placeFile(
  em: EntityManager,
  scope: ActorScope,
  values: FileValues,
  { file, result }: { file: { id: string; name: string }; result: ScanReadingResult },
): Promise<KeptFile> {
  const { program, profile, edgeExclusion } = values;
  const settings = { profile, edgeExclusion };
  const id =
    (await knownReading(em, file.id, settings)) ??
    (await keepReading(em, scope, { program, file: file.id, settings, result }));
  const reading = await em.findOneOrFail(ScanReading, { id }, { populate: ["file"] });
  if (result.content.kind !== "profiles") return keepTable(em, scope, values, reading, result);
  if (!("lines" in values)) throw new ImportRefused(`${excerpt(file.name, 80)} holds profiles. Say of which wafer.`);
  const instrument = values.instrument === null ? null : await em.findOne(ImportProfile, { id: values.instrument });
  const placed = await placeProfiles(em, scope, values, { reading, result, instrument });
  return { outcome: "placed", placed };
}

/** What placing a file comes to, tried once more when somebody did the same at the same moment. */
export async function placed(place: () => Promise<KeptFile>): Promise<Exclude<FileAnswer, { outcome: "job" }>> {
  try {
    return await place().catch((error: unknown) => {
      // Somebody brought the same file, lot or wafer in at the same moment: it is there now, and the second time finds it.
      if (error instanceof UniqueConstraintViolationException) return place();
      throw error;
    });
  } catch (error) {
    const reason = error instanceof ImportRefused ? error.message : pairRefusal(error);
    if (reason === null) throw error;
    const field = error instanceof ImportRefused ? error.field : null;
    return field === null ? { outcome: "refused", reason } : { outcome: "fields", errors: { [field]: [reason] } };
  }
}
