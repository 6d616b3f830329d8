import { excerpt } from "#app/lib/excerpt.ts";
import { readingFigures } from "#app/lib/reading-figures.ts";
import { questionAtBeginning } from "#app/lib/scan-reading/beginning.ts";
import type { Fault } from "#app/lib/scan-reading/reading.ts";
import { ScanFileError } from "#app/lib/scan-reading/refusal.ts";
import type { ReadingSettings } from "#app/schemas/scan-reading.ts";
import { fileRefusal } from "./refusal-sentence.ts";

export interface RefusedFile {
  reason: string;
  faults: Fault[];
}

/** Why a file is not taken, as far as its beginning shows it; null when it begins well. A large one is stored only then. */
export function refusedAtBeginning(
  { bytes, name }: { bytes: Uint8Array; name: string },
  { profile, edgeExclusion }: ReadingSettings,
): RefusedFile | null {
  try {
    const question = questionAtBeginning(bytes, name, profile);
    if (question) readingFigures(excerpt(name, 80), question, edgeExclusion);
    return null;
  } catch (error) {
    return refusedFile(error);
  }
}

/** @throws what is no fault of the file */
export function refusedFile(error: unknown): RefusedFile {
  const reason = fileRefusal(error);
  if (reason === null) throw error;
  return { reason, faults: error instanceof ScanFileError ? error.faults : [] };
}
