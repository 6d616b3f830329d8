import { z } from "zod";
import { optionalQuantity, quantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";

export const LENGTH_UNITS = ["m", "mm", "µm", "nm"] as const;
export type LengthUnit = (typeof LENGTH_UNITS)[number];

export const scanSchema = z.object({
  program: z.uuid("Choose a program."),
  label: z.string("Name the wafer.").trim().min(1, "Name the wafer, for example M-0388.").max(80),
  film: z
    .union([z.uuid(), z.literal("")])
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
  diameter: quantity(RULES.diameter),
  edgeExclusion: quantity(RULES.rim),
  positionUnit: z.enum(LENGTH_UNITS, "Choose the unit of the position."),
  heightUnit: z.enum(LENGTH_UNITS, "Choose the unit of the height."),
  decimalMark: z.enum(["point", "comma"], "Choose the decimal mark."),
});
export type ScanValues = z.output<typeof scanSchema>;
