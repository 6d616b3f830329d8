import { fileSize } from "./file-size.ts";

/** Units in which a profile's positions and heights are read. */
export const LENGTH_UNITS = ["m", "mm", "µm", "nm"] as const;
export type LengthUnit = (typeof LENGTH_UNITS)[number];

/** Mark that sets off the decimals in a file; stated by the person, never guessed. */
export const DECIMAL_MARKS = ["point", "comma"] as const;
export type DecimalMark = (typeof DECIMAL_MARKS)[number];

/** Largest profile that is taken, bytes and in words. */
export const LARGEST_FILE = 8 * 1024 * 1024;
export const LARGEST_FILE_WORDS = "8\u00A0MB";

/** What is said of a file beyond that. */
export function tooLargeSentence(name: string, size: number): string {
  return `${name} has ${fileSize(size)}; a file may have up to ${LARGEST_FILE_WORDS}. Export fewer points.`;
}
