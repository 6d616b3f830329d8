import type { FileContent } from "#app/lib/scan-reading/scan-reader.ts";
import type { ColumnPair, Fault, Reading } from "#app/lib/scan-reading/reading.ts";
import type { ImportProfile } from "./import-profile.ts";

/** How a file is read and fitted. */
export interface ReadingSettings {
  profile: ImportProfile;
  /** left out at either end of a profile, m */
  edgeExclusion: number;
}

/** A parabola through one profile, SI. */
export interface ProfileFigures {
  curvature: number;
  standardUncertainty: number;
  /** half of the interval that holds the curvature in 95 of 100 cases */
  expandedUncertainty: number;
  rms: number;
  used: number;
  rejected: number;
  notSpherical: boolean;
}

/** One profile of a file. All its points were fitted; what is kept of more than ten thousand are the means of equal stretches. */
export interface ReadProfileFigures extends ColumnPair {
  /** points in the file */
  points: number;
  /** kept: every point, or the means */
  x: number[];
  z: number[];
  /** null for half a profile, from the centre outwards, which holds no tilt to take out */
  fit: ProfileFigures | null;
}

export type ReadContent =
  | { kind: "profiles"; profiles: ReadProfileFigures[]; rows: number; faulty: number; faults: Fault[] }
  | Exclude<FileContent, { kind: "profiles" }>;

export interface ScanReadingResult {
  reading: Reading;
  content: ReadContent;
}

/** A stored reading. */
export interface ScanReadingDetail extends ScanReadingResult {
  id: string;
  program: { id: string; name: string; slug: string };
  file: { id: string; name: string; size: number; hash: string };
  settings: ReadingSettings;
  engineVersion: string;
  createdAt: string;
  createdBy: string;
}
