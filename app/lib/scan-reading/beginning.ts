import type { ImportProfile } from "#app/schemas/import-profile.ts";
import { scanReader, type ScanRead } from "./scan-reader.ts";

/** Bytes that are looked at: more than the longest line has. */
const LOOKED_AT = 1.25 * 1024 * 1024;

/**
 * Looks at the beginning of a file that is too large to be read here and now: what is no table, or leaves a question open, shows there.
 * @returns what a person has to answer first; null when reading may go on
 * @throws ScanFileError with a sentence that says what is wrong, where, and what to do
 */
export function questionAtBeginning(bytes: Uint8Array, fileName: string, profile: ImportProfile): ScanRead | null {
  const reader = scanReader(fileName, profile);
  return reader.push(bytes.subarray(0, LOOKED_AT)) ? null : reader.end();
}
