import { z } from "zod";
import type { ReferenceSummary } from "#app/lib/reference-summary.ts";
import type { ShownWorking } from "#app/lib/shown-working.ts";
import type { ImportProfile } from "./import-profile.ts";
import { optionalQuantity, quantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";

/** One repeat: its curvature, 1/m, bowl positive, and the file that it was read from; null when it was typed. */
export interface StudyReading {
  curvature: number;
  file: string | null;
}

/** What the repeats of one wafer say, 1/m. */
export interface StudyResult {
  mean: number;
  /** standard deviation of the repeats */
  standardUncertainty: number;
  degreesOfFreedom: number;
  /** standard uncertainty to put into a budget that is expanded with k = 2: widened where the repeats are few */
  forTwo: number;
  remark: string | null;
}

const name = (what: string) =>
  z
    .string(`Name the ${what}.`)
    .trim()
    .min(1, `Name the ${what}.`)
    .max(80, "Keep the name under 80 characters.")
    .regex(/^\P{Cc}*$/u, "The name holds a character that cannot be shown. Type it anew.");
const note = z
  .string()
  .trim()
  .max(300, "Keep the note under 300 characters.")
  .optional()
  .transform((text) => text ?? "");

export const newInstrumentSchema = z.object({ name: name("instrument") });

/** What typed repeats are. */
export const REPEATS_OF = ["bow", "curvature"] as const;
export type RepeatsOf = (typeof REPEATS_OF)[number];

export const studySchema = z.object({
  wafer: name("wafer"),
  diameter: quantity(RULES.diameter),
  edgeExclusion: quantity(RULES.rim),
  typedAs: z.enum(REPEATS_OF, "Say what is typed."),
  typed: z.string().max(10_000, "That is too much text for a list of readings.").optional(),
  note,
});
export type StudyValues = z.output<typeof studySchema>;

/** A reading of a wafer that is known, or of a new one with its certificate. */
export const referenceReadingSchema = z
  .object({
    wafer: z
      .union([z.uuid(), z.literal("")], "Choose a wafer from the list.")
      .optional()
      .transform((id) => id || null),
    newName: z.string().trim().max(80, "Keep the name under 80 characters.").optional(),
    knownBow: optionalQuantity(RULES.bow),
    /** as a certificate has it: k = 2 */
    knownUncertainty: optionalQuantity({ ...RULES.bowUncertainty, label: "uncertainty of the known bow" }),
    diameter: optionalQuantity(RULES.diameter),
    certificate: note,
    measuredOn: z.iso.date("Type the date as 2026-12-01."),
    bow: quantity(RULES.bow),
    note,
  })
  .superRefine((values, context) => {
    const { wafer, newName, knownBow, knownUncertainty, diameter } = values;
    const miss = (path: string, message: string) => context.addIssue({ code: "custom", path: [path], message });
    if (wafer !== null) {
      if (newName) miss("newName", "Choose a known wafer or name a new one, not both.");
      return;
    }
    if (!newName) miss("newName", "Choose a wafer above, or name a new one.");
    if (knownBow === null) miss("knownBow", "Type the known bow. Blank is missing, not zero.");
    if (knownUncertainty === null) miss("knownUncertainty", "Type its uncertainty, k = 2, as the certificate has it.");
    if (diameter === null) miss("diameter", "Type the diameter of the wafer.");
  });
export type ReferenceReadingValues = z.output<typeof referenceReadingSchema>;

export const setAsideSchema = z.object({
  what: z.enum(["study", "reading"]),
  id: z.uuid(),
  reason: z
    .string("Say why it does not count.")
    .trim()
    .min(1, "Say why it does not count.")
    .max(200, "Keep the reason under 200 characters."),
});
export type SetAsideValues = z.output<typeof setAsideSchema>;

/** An instrument as the list shows it. */
export interface InstrumentRow {
  id: string;
  name: string;
  /** of the newest study that counts; null without one */
  study: { forTwo: number; repeats: number; createdAt: string } | null;
  /** newest reading of a reference wafer, ISO date */
  checkedOn: string | null;
}

export interface StudyView {
  id: string;
  wafer: string;
  diameter: number;
  readings: StudyReading[];
  result: StudyResult;
  note: string;
  setAside: string | null;
  createdAt: string;
  createdBy: string;
  working: ShownWorking;
}

export interface ReferenceReadingView {
  id: string;
  measuredOn: string;
  /** standard bow, m */
  bow: number;
  note: string;
  setAside: string | null;
  createdBy: string;
}

export interface ReferenceWaferView {
  id: string;
  name: string;
  /** standard bow, m, and its standard uncertainty */
  bow: number;
  bowUncertainty: number;
  diameter: number;
  note: string;
}

/** A reference wafer with its readings on an instrument, oldest first, and what they say. */
export interface ReferenceView {
  wafer: ReferenceWaferView;
  readings: ReferenceReadingView[];
  summary: ReferenceSummary;
  workings: ShownWorking[];
}

export interface InstrumentDetail {
  id: string;
  name: string;
  mayCheck: boolean;
  /** what is kept of how it writes its files */
  profile: ImportProfile;
  /** newest first */
  studies: StudyView[];
  /** the study whose uncertainty budgets use */
  inUse: string | null;
  references: ReferenceView[];
}
