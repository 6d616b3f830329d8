import { checkTogether } from "#app/lib/profile-on-wafer.ts";
import { excerpt } from "#app/lib/excerpt.ts";
import { EngineInputError } from "#app/engine/errors.ts";
import { runBackwards } from "#app/lib/run-backwards.ts";
import type { ReadProfile } from "#app/lib/scan-reading/one-profile.ts";
import { ScanFileError } from "#app/lib/scan-reading/refusal.ts";
import type { FileFormat, ScanResult } from "#app/schemas/scan-result.ts";
import type { ScanSubject } from "#app/schemas/scan.ts";
import { scanResult } from "./scan-result-of.ts";

/** One of the two profiles that make a scan. */
export interface PairedProfile {
  /** of its file, for sentences */
  name: string;
  /** SHA-256 of its file, hex */
  hash: string;
  profile: ReadProfile;
}

/**
 * What two profiles of one line, each held against the wafer already, say of the film between them. `opposed` says that the second
 * was run the other way.
 * @throws ScanFileError when they cannot be of one line, EngineInputError when they give no curvature
 */
export function pairResult(
  values: ScanSubject,
  before: PairedProfile,
  after: PairedProfile,
  { opposed = false } = {},
): ScanResult {
  if (before.hash === after.hash)
    throw new ScanFileError(
      `${excerpt(after.name, 80)} holds the same bytes as the file before the film. Choose the scan after it.`,
    );
  const turned = opposed ? runBackwards(after.profile) : after.profile;
  checkTogether(before, { name: after.name, profile: turned }, values);
  return scanResult(values, before.profile, { points: turned.points, reading: after.profile.reading });
}

/** Why two profiles make no scan, for a person; null when the fault is not theirs. */
export function pairRefusal(error: unknown): string | null {
  if (error instanceof ScanFileError) return error.message;
  if (error instanceof EngineInputError)
    return `The two scans give no curvature: the ${error.field === "points" ? "points" : error.field} ${error.reason}.`;
  return null;
}

/** How the file before the film was written; that of a scan as a whole. */
export function formatOf({ before }: ScanResult): FileFormat {
  if (!before.format) throw new Error("a file that was read has a format");
  return before.format;
}
