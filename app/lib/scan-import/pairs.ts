import { pairScans } from "#app/engine/profile/orient-scan.ts";
import type { BatchFile } from "./batch.ts";
import type { ScanOf } from "./name-guess.ts";

export interface FilePair {
  before: BatchFile;
  after: BatchFile;
  /** name of the scan that they make */
  label: string;
}

export interface BatchPairs {
  pairs: FilePair[];
  /** files that stay, each with the sentence why */
  staying: { file: BatchFile; why: string }[];
}

/** The pairs that a batch makes as it stands, by wafer and line, and why each other file stays. */
export function batchPairs(files: readonly BatchFile[]): BatchPairs {
  const staying: BatchPairs["staying"] = [];
  const placed = (side: "before" | "after") =>
    files.flatMap((file) => {
      const why = whyNotReady(file);
      if (why !== null || file.of.side !== side) return [];
      return { file, wafer: waferKey(file.of), azimuth: (azimuthOf(file.of) ?? 0) * (Math.PI / 180) };
    });
  for (const file of files) {
    const why = whyNotReady(file);
    if (why !== null) staying.push({ file, why });
  }
  const { pairs, waiting } = pairScans(placed("before"), placed("after"));
  for (const { file } of waiting.pre) staying.push({ file, why: waits(file.of, "after") });
  for (const { file } of waiting.post) staying.push({ file, why: waits(file.of, "before") });
  const order = (file: BatchFile) => files.indexOf(file);
  return {
    pairs: pairs.map(({ pre, post }) => ({ before: pre.file, after: post.file, label: labelOf(pre.file.of) })),
    staying: staying.sort((one, other) => order(one.file) - order(other.file)),
  };
}

/** Why a file cannot be one of a pair yet; null when it can. */
function whyNotReady({ told, done, of }: BatchFile): string | null {
  if (done !== null || told === null) return "is being read.";
  if (told.outcome === "refused") return "cannot be read.";
  if (told.outcome === "question") return "has an open question.";
  const kind = told.layout?.reading.kind;
  if (kind !== "profiles") return `is a ${kind ?? "table"}, not a profile; the library has no place for it yet.`;
  if (told.profiles.length > 1)
    return `holds ${told.profiles.length} profiles. Leave out the other heights in its table of columns.`;
  if (of.wafer.trim() === "") return "has no wafer yet.";
  if (azimuthOf(of) === null) return "has an azimuth that is no angle of 0 to 360°.";
  if (of.side === "") return "is not said to be before or after the film.";
  return null;
}

const waits = (of: ScanOf, side: "before" | "after") =>
  `waits for its scan ${side} the film: same wafer, lot and slot (${labelOf(of)}), a file that reads.`;

const waferKey = ({ wafer, lot, slot }: ScanOf) =>
  JSON.stringify([wafer, lot, slot].map((text) => text.trim().toLowerCase()));

/** The azimuth in degrees; zero when nothing is typed, null when it is no angle. */
export function azimuthOf({ azimuth }: Pick<ScanOf, "azimuth">): number | null {
  const text = azimuth.trim().replace(",", ".").replace(/\s*°$/, "");
  if (text === "") return 0;
  const degrees = /^\d+(?:\.\d+)?$/.test(text) ? Number(text) : NaN;
  return degrees <= 360 ? degrees : null;
}

/** Name of a scan: its wafer, then what else was said of it. */
export function labelOf(of: ScanOf): string {
  const named = (word: string, text: string) => (text.trim() === "" ? [] : [`${word} ${text.trim()}`]);
  const azimuth = of.azimuth.trim() === "" ? [] : [`${azimuthOf(of) ?? of.azimuth}°`];
  return [of.wafer.trim(), ...named("lot", of.lot), ...named("slot", of.slot), ...azimuth].join(", ");
}
