import { z } from "zod";
import { importProfileSchema } from "./import-profile.ts";
import type { JobState } from "./job.ts";
import { optionalQuantity, quantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { scanSchema } from "./scan.ts";
import { WAFER_SCAN_SIDES } from "./wafer.ts";
import { placeShape } from "./wafer-place.ts";

const UNREADABLE = "How the file is read did not arrive. Open the page again.";

const jsonText = z
  .string(UNREADABLE)
  .max(100_000, UNREADABLE)
  .transform((text, context) => {
    try {
      return JSON.parse(text) as unknown;
    } catch {
      context.addIssue({ code: "custom", message: UNREADABLE });
      return z.NEVER;
    }
  });

/** An import profile as text, since a form has nothing else. */
export const profileText = jsonText.pipe(importProfileSchema);

/** The profiles of a file that are taken, each with the azimuth of its line, as pairs in JSON: place from 0, degrees. */
const linesText = jsonText
  .pipe(
    z
      .array(z.tuple([z.int().min(0).max(511), z.number().min(0).max(360)]), UNREADABLE)
      .min(1, "Give the azimuth of at least one profile.")
      .max(512, UNREADABLE),
  )
  .transform((lines) => lines.map(([profile, degrees]) => ({ profile, azimuth: degrees * (Math.PI / 180) })));

const fileShape = z.object({
  program: scanSchema.shape.program,
  edgeExclusion: quantity(RULES.rim),
  profile: profileText,
  /** id of the import profile that was chosen or kept for the instrument */
  instrument: z
    .union([z.uuid(), z.literal("")], UNREADABLE)
    .optional()
    .transform((id) => id || null),
  ...placeShape,
});

/** A table of an import: where no row names a wafer, it is of the one that is named here. */
export const tableFileSchema = fileShape;

/** A file of profiles: on which wafer and side, and what is known of the wafer. Thicknesses count once its partner is there. */
export const profileFileSchema = fileShape.extend({
  lines: linesText,
  side: z.enum(WAFER_SCAN_SIDES, "Say whether the file is before or after the film."),
  film: scanSchema.shape.film,
  orientation: scanSchema.shape.orientation,
  diameter: quantity(RULES.diameter),
  filmThickness: optionalQuantity(RULES.filmThickness),
  filmThicknessTolerance: scanSchema.shape.filmThicknessTolerance,
  siliconThickness: optionalQuantity(RULES.siliconThickness),
  siliconThicknessTolerance: scanSchema.shape.siliconThicknessTolerance,
  siliconThicknessFrom: scanSchema.shape.siliconThicknessFrom,
  sinceCure: scanSchema.shape.sinceCure,
});

export type TableFileValues = z.output<typeof tableFileSchema>;
export type ProfileFileValues = z.output<typeof profileFileSchema>;

/** What is said of a file of an import. */
export type FileValues = TableFileValues | ProfileFileValues;

/** Who brought the same in before, and when (ISO). */
export interface BroughtInBefore {
  by: string;
  at: string;
}

/** What came of one profile of a file: a scan with its partner, or a place in the queue. */
export type PlacedProfile = { label: string } &
  /** `partner` is the placed scan that has waited */
  (
    | { outcome: "scan"; scan: string; partner: string }
    | { outcome: "waits"; waferScan: string }
    | { outcome: "already"; before: BroughtInBefore; scan: string | null; waferScan: string }
  );

/** What came of a file of an import that is in. */
export type KeptFile =
  | { outcome: "placed"; placed: PlacedProfile[] }
  | {
      outcome: "measured";
      reading: string;
      kind: string;
      /** wafers of which the table says something new */
      wafers: number;
      /** id of the wafer where there is no other */
      only: string | null;
      lots: { id: string; name: string }[];
    }
  | { outcome: "known table"; reading: string; before: BroughtInBefore };

/** What the server answers to a file of an import. */
export type FileAnswer =
  | KeptFile
  /** it is large: the id of the job that reads it */
  | { outcome: "job"; job: string }
  | { outcome: "refused"; reason: string }
  /** by field: what is wrong with what all files of the batch share */
  | { outcome: "fields"; errors: Record<string, string[]> };

/** How a job stands that reads a large file of an import, for the screen that waits for it. */
export interface FileUnderWay {
  state: JobState;
  /** bytes read, of those that there are */
  done: number;
  total: number;
  sentence: string;
  /** what came of it; null until it is done */
  kept: KeptFile | null;
}

/** What came of keeping an import profile: its name, or what stands in the way. */
export interface KeptAnswer {
  kept?: { id: string; name: string };
  fault?: string;
}
