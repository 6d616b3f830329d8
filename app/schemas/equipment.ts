import { z } from "zod";
import { PEAK_HOLDINGS } from "#app/engine/flow/model.ts";
import { equipmentHandling } from "./library-handling.ts";
import { measured, optionalMeasured } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { recordFields } from "./record-fields.ts";

export const equipmentSchema = z.object({
  ...recordFields,
  holding: z
    .string("Say how it holds the wafer.")
    .trim()
    .min(1, "Say how it holds the wafer.")
    .max(100, "Keep it under 100 characters."),
  atPeak: z.enum(PEAK_HOLDINGS, "Choose whether the wafer is free when hot."),
  warpLimitEdgesUp: optionalMeasured(RULES.warpLimit),
  warpLimitEdgesDown: optionalMeasured(RULES.warpLimit),
  leastUnsupportedThickness: optionalMeasured({
    ...RULES.siliconThickness,
    label: "least unsupported thickness",
    range: { least: 0, most: 2e-3, words: "0 to 2 mm" },
  }),
  largestDiameter: measured({ ...RULES.diameter, label: "largest diameter" }),
  handling: equipmentHandling,
});
export type EquipmentValues = z.output<typeof equipmentSchema>;
