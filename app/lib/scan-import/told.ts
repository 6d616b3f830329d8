import type { Layout } from "#app/lib/scan-reading/layout.ts";
import type { Fault } from "#app/lib/scan-reading/reading.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";

/** A file to read, by the profile that stands for it now; `revision` tells a reading from one of an earlier profile. */
export interface FileAsked {
  key: string;
  revision: number;
  file: File;
  profile: ImportProfile;
}

/** A profile of a file, thinned for drawing, m. */
export interface ToldProfile {
  name: string;
  /** what its head proposes, degrees; nothing where it says none */
  azimuth: string;
  points: number;
  trace: { x: number; z: number }[];
}

/** What a file says under its profile, as the page shows it. */
export interface Told {
  outcome: "read" | "question" | "refused";
  /** why it is refused */
  sentence: string | null;
  /** null while not even its form is told */
  layout: Layout | null;
  profiles: ToldProfile[];
  /** rows of data */
  rows: number;
  faults: Fault[];
  /** lines of words below the data */
  footerLines: number;
}

export type FileSaid = { key: string; revision: number } & (
  { kind: "progress"; done: number; of: number } | { kind: "told"; told: Told }
);

/** What is told of a file of which nothing is known. */
export const UNTOLD: Omit<Told, "outcome"> = {
  sentence: null,
  layout: null,
  profiles: [],
  rows: 0,
  faults: [],
  footerLines: 0,
};

/** A file of which nothing but a sentence can be told. */
export const unreadable = (sentence: string): Told => ({ ...UNTOLD, outcome: "refused", sentence });
