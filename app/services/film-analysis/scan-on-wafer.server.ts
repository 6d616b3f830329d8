import type { EntityManager } from "@mikro-orm/postgresql";
import type { ImportProfile } from "#app/db/entities/import-profile.ts";
import type { Scan } from "#app/db/entities/scan.ts";
import { ScanFile } from "#app/db/entities/scan-file.ts";
import { ScanReading } from "#app/db/entities/scan-reading.ts";
import { WaferScan } from "#app/db/entities/wafer-scan.ts";
import { faceUpScan, lineAzimuth } from "#app/engine/profile/orient-scan.ts";
import type { CalendarDay } from "#app/engine/profile/mistakes/scan-checks.ts";
import { centred, type KnownTool, type PlacedPair, type PlacedPoints } from "#app/lib/film-analysis/pair-points.ts";
import { twoTools } from "#app/lib/film-analysis/two-tools.ts";
import { profilePoints } from "#app/lib/scan-reading/profile-points.ts";
import { ScanFileError } from "#app/lib/scan-reading/refusal.ts";
import { readScanFile } from "#app/lib/scan-reading/scan-reader.ts";
import type { ImportProfile as Profile } from "#app/schemas/import-profile.ts";
import type { FileReading, ScanParameters } from "#app/schemas/scan-result.ts";
import { toolOf } from "./tool-of.server.ts";

/** A larger file is not read again for a page, bytes: this much takes some 100 ms. */
const LARGEST_READ_AGAIN = 2 * 1024 * 1024;

/** Instruments that were asked for already, by id. */
export type KnownTools = Map<string, KnownTool>;

/** A scan placed on its wafer, and how to get at its points. */
export interface ScanOnWafer {
  pair: Omit<PlacedPair, "points">;
  points: () => Promise<PlacedPair["points"]>;
}

/** A scan with what is known of its place and its instruments; its points come when they are asked for. */
export async function scanOnWafer(em: EntityManager, scan: Scan, tools: KnownTools): Promise<ScanOnWafer> {
  const result = scan.result.unwrap() as PlacedPair["result"];
  const [before, after] = [await placed(em, scan.beforeScan), await placed(em, scan.afterScan)];
  const first = before?.instrument ?? scan.instrument ?? null;
  const second = after?.instrument ?? scan.instrument ?? first;
  const sameTool = !first || !second || first.id === second.id;
  const [one, other] = [await toolIf(em, first, tools), await toolIf(em, second, tools)];
  return {
    pair: {
      id: scan.id,
      label: scan.label,
      azimuth: typeof scan.azimuth === "number" ? lineAzimuth(scan.azimuth) : null,
      result,
      sameTool,
      tool: one && other && !sameTool ? twoTools(one, other) : one,
    },
    points: async () => {
      const { parameters } = scan;
      const pre = before
        ? await kept(em, before, parameters)
        : await readAgain(em, scan.before, result.before, parameters);
      const post = after
        ? await kept(em, after, parameters)
        : await readAgain(em, scan.after, result.after, parameters);
      return pre && post ? { pre, post } : null;
    },
  };
}

async function toolIf(
  em: EntityManager,
  instrument: ImportProfile | null,
  tools: KnownTools,
): Promise<KnownTool | null> {
  if (!instrument) return null;
  const found = tools.get(instrument.id) ?? (await toolOf(em, instrument));
  tools.set(instrument.id, found);
  return found;
}

async function placed(em: EntityManager, scan: { id: string } | null | undefined) {
  if (!scan) return null;
  return em.findOne(WaferScan, { id: scan.id }, { populate: ["instrument"] });
}

/** The points of a placed scan as they were kept, its line run the one way. */
async function kept(
  em: EntityManager,
  { reading, profile: number, azimuth }: NonNullable<Awaited<ReturnType<typeof placed>>>,
  { diameter }: ScanParameters,
): Promise<PlacedPoints | null> {
  const { result } = await em.findOneOrFail(ScanReading, { id: reading.id }, { populate: ["result"] });
  const { reading: how, content } = result.get();
  const profile = content.kind === "profiles" ? content.profiles[number] : undefined;
  if (!profile) return null;
  const { x, z } = faceUpScan({ ...centred(profile, diameter), azimuth }, { up: "device side" });
  return { x, z, day: dayOf(how.date?.day ?? null) };
}

/** The only profile of a file, read again as it was read when it came; null for a file that is too large for that. */
async function readAgain(
  em: EntityManager,
  { id, size }: Pick<ScanFile, "id" | "size">,
  reading: FileReading,
  parameters: ScanParameters,
): Promise<PlacedPoints | null> {
  if (size > LARGEST_READ_AGAIN) return null;
  const file = await em.findOneOrFail(ScanFile, { id }, { populate: ["bytes"] });
  try {
    const read = readScanFile(new Uint8Array(file.bytes.get()), file.name, readAs(reading, parameters));
    if (read.outcome !== "read" || read.content.kind !== "profiles") return null;
    const [profile] = read.content.profiles;
    if (!profile) return null;
    const points = profilePoints(profile);
    const columns = { x: points.map(({ x }) => x), z: points.map(({ z }) => z) };
    return { ...centred(columns, parameters.diameter), day: dayOf(read.reading.date?.day ?? null) };
  } catch (error) {
    // The reader may have learned to ask since.
    if (error instanceof ScanFileError) return null;
    throw error;
  }
}

/** What is kept of how a file was read, as an import profile. */
function readAs({ format, readColumns = [0, 1], delimiter }: FileReading, parameters: ScanParameters): Profile {
  const { decimalMark, positionUnit, heightUnit } = format ?? parameters;
  const [position, height] = readColumns;
  return {
    delimiter,
    decimalMark,
    columns: [
      { index: position, role: "position", unit: positionUnit },
      { index: height, role: "height", unit: heightUnit },
    ],
  };
}

function dayOf(iso: string | null): CalendarDay | null {
  const [year, month, day] = (iso ?? "").split("-").map(Number);
  return year && month && day ? { year, month, day } : null;
}
