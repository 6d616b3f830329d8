import { z } from "zod";
import { DECIMAL_MARKS, LENGTH_UNITS } from "#app/lib/scan-reading/reading.ts";
import { optionalQuantity, quantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { optionalChoice } from "./record-fields.ts";
import type { FileFormat } from "./scan-result.ts";

/** Where a thickness comes from. */
export const THICKNESS_FROM = ["measured", "nominal"] as const;

export const scanSchema = z.object({
  program: z.uuid("Choose the program."),
  label: z
    .string("Name the wafer, for example M-0388.")
    .trim()
    .min(1, "Name the wafer, for example M-0388.")
    .max(80, "Keep the name under 80 characters.")
    .regex(/^\P{Cc}*$/u, "The name holds a character that cannot be shown. Type it anew."),
  film: z
    .union([z.uuid(), z.literal("")], "Choose a film from the list.")
    .optional()
    .transform((id) => id || null),
  orientation: z.enum(["100", "111"], "Choose the orientation."),
  filmThickness: quantity(RULES.filmThickness),
  filmThicknessTolerance: optionalQuantity({
    ...RULES.filmThickness,
    range: { least: 0, most: 1e-3, words: "0 to 1 mm" },
  }),
  siliconThickness: quantity(RULES.siliconThickness),
  siliconThicknessTolerance: optionalQuantity({
    ...RULES.siliconThickness,
    range: { least: 0, most: 2e-3, words: "0 to 2 mm" },
  }),
  /** whether the silicon was measured on this wafer or is as its box says; null where nobody has said */
  siliconThicknessFrom: optionalChoice(THICKNESS_FROM),
  /** from the end of the film's cure to the scan after it, s */
  sinceCure: optionalQuantity({
    label: "time since the cure",
    dimension: "time",
    range: { least: 0, most: 3.2e8, words: "0 to ten years" },
  }),
  diameter: quantity(RULES.diameter),
  edgeExclusion: quantity(RULES.rim),
  positionUnit: z.enum(LENGTH_UNITS, "Choose the unit of the position."),
  heightUnit: z.enum(LENGTH_UNITS, "Choose the unit of the height."),
  decimalMark: z.enum(DECIMAL_MARKS, "Choose the decimal mark."),
});
export type ScanValues = z.output<typeof scanSchema>;
/** A scan without how its files are written. */
export type ScanSubject = Omit<ScanValues, keyof FileFormat>;
