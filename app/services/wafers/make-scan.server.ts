import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Film } from "#app/db/entities/film.ts";
import { Scan } from "#app/db/entities/scan.ts";
import type { ScanFile } from "#app/db/entities/scan-file.ts";
import { ScanReading } from "#app/db/entities/scan-reading.ts";
import { Wafer } from "#app/db/entities/wafer.ts";
import type { WaferScan } from "#app/db/entities/wafer-scan.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { excerpt } from "#app/lib/excerpt.ts";
import { checkOnWafer } from "#app/lib/profile-on-wafer.ts";
import { readProfile, storedProfile, type ReadProfile } from "#app/lib/scan-reading/one-profile.ts";
import { ScanFileError } from "#app/lib/scan-reading/refusal.ts";
import { lineLabel } from "#app/lib/wafer-label.ts";
import type { WaferScanSubject } from "#app/schemas/wafer.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { piecesWithin } from "../scan-files.server.ts";
import { formatOf, pairResult, type PairedProfile } from "../scan-pair.ts";
import { readInPieces } from "../scan-readings/read-in-pieces.server.ts";
import { ImportRefused } from "./import-refused.ts";
import { labelled } from "./wafer-of.ts";

interface Meeting {
  before: WaferScan;
  after: WaferScan;
  /** the one that came last: what was said of it goes before what was said of its partner */
  newest: WaferScan;
}

/** What a scan is computed with. */
type Complete = Required<WaferScanSubject> & { filmThickness: number; siliconThickness: number };

/** Diameters that differ by more are of two kinds of wafer. */
const SAME_DIAMETER = 0.01;

/**
 * Makes a scan of two placed ones, within a transaction that is open already.
 * @throws ImportRefused while a thickness is missing or the two contradict each other; ScanFileError and EngineInputError when the
 *   profiles do not go together
 */
export async function makeScan(
  em: EntityManager,
  scope: ActorScope,
  { before, after, newest }: Meeting,
): Promise<Scan> {
  const wafer = await em.findOneOrFail(Wafer, { id: before.wafer.id }, { populate: ["lot"] });
  const label = lineLabel(labelled(wafer), before.azimuth);
  const subject = complete(label, newest.subject, (newest === before ? after : before).subject);
  const film = subject.film === null ? null : await em.findOne(Film, { id: subject.film });
  if (subject.film !== null && !film)
    throw new ImportRefused("That film is no longer in the library. Choose another.", "film");
  const [first, second] = [await profileOf(em, before, subject), await profileOf(em, after, subject)];
  const opposed = Math.cos(after.azimuth - before.azimuth) < 0;
  const { film: _film, ...parameters } = subject;
  const values = { program: before.program.id, label, film: subject.film, ...parameters };
  const result = pairResult(values, first.paired, second.paired, { opposed });
  const scan = em.create(Scan, {
    id: randomUUID(),
    program: before.program,
    label,
    film,
    before: first.file,
    after: second.file,
    wafer,
    azimuth: before.azimuth,
    instrument: after.instrument ?? before.instrument ?? null,
    instrumentName: after.instrumentName || before.instrumentName,
    beforeScan: before,
    afterScan: after,
    parameters: { ...parameters, ...formatOf(result) },
    result,
    engineVersion: ENGINE_VERSION,
    createdAt: new Date(),
    createdBy: scope.actor.id,
  });
  await em.flush();
  return scan;
}

async function profileOf(em: EntityManager, placed: WaferScan, subject: Complete) {
  const reading = await em.findOneOrFail(ScanReading, { id: placed.reading.id }, { populate: ["file", "result"] });
  const { file } = reading;
  const kept = storedProfile(reading.result.get(), placed.profile);
  // What is kept of a long profile are means; the scan is made of all its points.
  const profile = kept?.reading.averagedTo === undefined ? kept : await profileFromFile(em, reading, placed.profile);
  if (!profile) throw new Error("a placed scan has a profile");
  const name = excerpt(file.name, 80);
  checkOnWafer(profile, name, subject);
  const paired: PairedProfile = { name, hash: file.hash, profile };
  return { file, paired };
}

async function profileFromFile(
  em: EntityManager,
  { file, settings }: Pick<ScanReading, "settings"> & { file: Pick<ScanFile, "id" | "name" | "size"> },
  which: number,
): Promise<ReadProfile | null> {
  return readProfile(await readInPieces(piecesWithin(em, file.id), file, settings.profile), which);
}

/** What was said of two scans, taken together. */
function complete(label: string, own: WaferScanSubject, other: WaferScanSubject): Complete {
  if (Math.abs(own.diameter / other.diameter - 1) > SAME_DIAMETER)
    throw new ScanFileError(
      `${label}: one of the two scans was said to be of another diameter. Put the diameter right, or name another wafer.`,
    );
  const filmThickness = own.filmThickness ?? other.filmThickness;
  const siliconThickness = own.siliconThickness ?? other.siliconThickness;
  if (filmThickness === null)
    throw new ImportRefused(`Type the film thickness: ${label} has both of its scans now.`, "filmThickness");
  if (siliconThickness === null)
    throw new ImportRefused(`Type the silicon thickness: ${label} has both of its scans now.`, "siliconThickness");
  const from = (given: number | null) => (given === null ? other : own);
  return {
    ...own,
    film: own.film ?? other.film,
    filmThickness,
    // A tolerance belongs to the value beside it.
    filmThicknessTolerance: from(own.filmThickness).filmThicknessTolerance,
    siliconThickness,
    siliconThicknessTolerance: from(own.siliconThickness).siliconThicknessTolerance,
    siliconThicknessFrom: from(own.siliconThickness).siliconThicknessFrom ?? null,
    sinceCure: own.sinceCure ?? other.sinceCure ?? null,
  };
}
