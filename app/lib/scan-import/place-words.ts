import type { BatchFile } from "./batch.ts";
import type { ScanOf } from "./name-guess.ts";

/** An azimuth in degrees; zero when nothing is typed, null when it is no angle. */
export function azimuthOf({ azimuth }: Pick<ScanOf, "azimuth">): number | null {
  const text = azimuth.trim().replace(",", ".").replace(/\s*°$/, "");
  if (text === "") return 0;
  const degrees = /^\d+(?:\.\d+)?$/.test(text) ? Number(text) : NaN;
  return degrees <= 360 ? degrees : null;
}

/** A wafer as it was named: 'M-1, lot L12, slot 7'. */
export function waferWords(of: ScanOf): string {
  const named = (word: string, text: string) => (text.trim() === "" ? [] : [`${word} ${text.trim()}`]);
  const own = of.wafer.trim() === "" ? [] : [of.wafer.trim()];
  return [...own, ...named("lot", of.lot), ...named("slot", of.slot)].join(", ");
}

/** A line of it: the wafer, then the azimuth, 0° where none is typed. */
export const lineWords = (of: ScanOf): string => `${waferWords(of)}, ${azimuthOf(of) ?? of.azimuth}°`;

/** What kind of file it is, as far as that is told. */
export const kindOf = ({ told }: Pick<BatchFile, "told">) => told?.layout?.reading.kind ?? "profiles";

/** A profile of a file with the azimuth that stands for it. */
export interface BatchLine {
  /** place in the file, from 0 */
  profile: number;
  name: string;
  azimuth: string;
}

/**
 * The profiles of a file with their azimuths. Of several each has its own, proposed by its head; one that is left blank is not taken.
 */
export function linesOf({ told, of, azimuths }: BatchFile): BatchLine[] {
  const profiles = told?.profiles ?? [];
  return profiles.map(({ name, azimuth }, profile) => ({
    profile,
    name,
    azimuth: profiles.length === 1 ? of.azimuth : (azimuths[profile] ?? azimuth),
  }));
}

/** The lines that are taken, in degrees; null when one of them is no angle. */
export function takenLines(file: BatchFile): { profile: number; degrees: number }[] | null {
  const lines = linesOf(file);
  const taken = lines.length === 1 ? lines : lines.filter(({ azimuth }) => azimuth.trim() !== "");
  const read = taken.flatMap((line) => {
    const degrees = azimuthOf(line);
    return degrees === null ? [] : [{ profile: line.profile, degrees }];
  });
  return read.length === taken.length ? read : null;
}
