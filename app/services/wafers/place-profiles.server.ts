import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import type { ImportProfile } from "#app/db/entities/import-profile.ts";
import { Scan } from "#app/db/entities/scan.ts";
import type { ScanFile } from "#app/db/entities/scan-file.ts";
import type { ScanReading } from "#app/db/entities/scan-reading.ts";
import type { Wafer } from "#app/db/entities/wafer.ts";
import { WaferScan } from "#app/db/entities/wafer-scan.ts";
import { angleBetween } from "#app/engine/profile/orient-scan.ts";
import { excerpt } from "#app/lib/excerpt.ts";
import { checkOnWafer } from "#app/lib/profile-on-wafer.ts";
import { storedProfile } from "#app/lib/scan-reading/one-profile.ts";
import { lineLabel } from "#app/lib/wafer-label.ts";
import type { PlacedProfile, ProfileFileValues } from "#app/schemas/scan-import.ts";
import type { ScanReadingResult } from "#app/schemas/scan-reading.ts";
import type { WaferScanSubject } from "#app/schemas/wafer.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { findOrMakeWafer } from "./find-wafer.server.ts";
import { ImportRefused } from "./import-refused.ts";
import { makeScan } from "./make-scan.server.ts";
import { waitingPartner } from "./waiting-partner.server.ts";
import { labelled } from "./wafer-of.ts";

interface Read {
  reading: ScanReading & { file: ScanFile };
  result: ScanReadingResult;
  instrument: ImportProfile | null;
}

/**
 * Places the profiles of a file on their wafer, within a transaction that is open already. Where the partner waits, the scan is made.
 * @throws ImportRefused, and what `makeScan` throws, when one of them cannot be placed: then none is
 */
export async function placeProfiles(
  em: EntityManager,
  scope: ActorScope,
  values: ProfileFileValues,
  read: Read,
): Promise<PlacedProfile[]> {
  const wafer = await findOrMakeWafer(em, scope, values.program, values);
  const placed: PlacedProfile[] = [];
  for (const line of values.lines) placed.push(await placeProfile(em, scope, values, { ...read, wafer, ...line }));
  return placed;
}

interface Placing extends Read {
  wafer: Wafer;
  profile: number;
  azimuth: number;
}

async function placeProfile(
  em: EntityManager,
  scope: ActorScope,
  values: ProfileFileValues,
  { reading, result, instrument, wafer, profile, azimuth }: Placing,
): Promise<PlacedProfile> {
  const name = excerpt(reading.file.name, 80);
  const read = storedProfile(result, profile);
  if (!read) throw new ImportRefused(`${name} has no profile number ${profile + 1}.`);
  const subject = subjectOf(values);
  checkOnWafer(read, name, subject);
  const label = lineLabel(labelled(wafer), azimuth);
  const known = await knownPlace(em, reading.file, { wafer, profile, azimuth, side: values.side });
  if (known) return { label, ...known };
  const waferScan = em.create(WaferScan, {
    id: randomUUID(),
    program: values.program,
    reading,
    profile,
    wafer,
    azimuth,
    side: values.side,
    instrument,
    instrumentName: instrument?.name ?? "",
    measuredAt: measuredAt(result),
    subject,
    createdAt: new Date(),
    createdBy: scope.actor.id,
  });
  await em.flush();
  const partner = await waitingPartner(em, waferScan);
  if (!partner) return { outcome: "waits", label, waferScan: waferScan.id };
  const [before, after] = values.side === "before" ? [waferScan, partner] : [partner, waferScan];
  const scan = await makeScan(em, scope, { before, after, newest: waferScan });
  return { outcome: "scan", label: scan.label, scan: scan.id, partner: partner.id };
}

/** The day that a file gives, from its beginning in UTC, since files name no zone. */
export function measuredAt({ reading }: ScanReadingResult): Date | null {
  return reading.date?.day ? new Date(`${reading.date.day}T00:00:00Z`) : null;
}

function subjectOf(values: ProfileFileValues): WaferScanSubject {
  const { film, filmThickness, filmThicknessTolerance, siliconThickness, siliconThicknessTolerance } = values;
  const { siliconThicknessFrom, sinceCure, diameter, edgeExclusion, orientation } = values;
  return {
    film,
    filmThickness,
    filmThicknessTolerance,
    siliconThickness,
    siliconThicknessTolerance,
    siliconThicknessFrom,
    sinceCure,
    diameter,
    edgeExclusion,
    orientation,
  };
}

/** Where the same profile of the same file was placed before. After one film it may lie before the next, on the same line. */
async function knownPlace(
  em: EntityManager,
  file: ScanFile,
  place: Pick<WaferScan, "wafer" | "profile" | "azimuth" | "side">,
) {
  const placed = await em.find(
    WaferScan,
    { reading: { file: file.id }, profile: place.profile },
    { populate: ["createdBy", "wafer.lot"], orderBy: { createdAt: "asc" } },
  );
  for (const known of placed) {
    const sameLine = known.wafer.id === place.wafer.id && angleBetween(known.azimuth, place.azimuth) < 1e-6;
    if (!sameLine)
      throw new ImportRefused(
        `${excerpt(file.name, 80)} was imported on ${day(known.createdAt)} by ${known.createdBy.name} as ${lineLabel(labelled(known.wafer), known.azimuth)}. A file is of one line of one wafer: move it there, or undo that import first.`,
      );
    if (known.side !== place.side) continue;
    const scan = await em.findOne(Scan, { $or: [{ beforeScan: known.id }, { afterScan: known.id }] });
    const before = { by: known.createdBy.name, at: known.createdAt.toISOString() };
    return { outcome: "already", before, scan: scan?.id ?? null, waferScan: known.id } as const;
  }
  return null;
}

const day = (at: Date) => at.toISOString().slice(0, 10);
