import { z } from "zod";
import { SOURCE_KINDS } from "#app/engine/vocabulary.ts";
import { TAPE_KINDS } from "#app/lib/tape-kinds.ts";
import { tapeHandling } from "./library-handling.ts";
import { optionalMeasured } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { recordFields } from "./record-fields.ts";

/** A tape; all but its name and kind may be left blank, which is missing. */
export const tapeSchema = z.object({
  ...recordFields,
  kind: z.enum(TAPE_KINDS, "Choose what it is for."),
  thickness: optionalMeasured(RULES.tapeThickness).refine(
    (thickness) => thickness === null || (thickness.tolerance ?? 0) < thickness.value,
    { path: ["tolerance"], error: "The tolerance is as large as the tape itself." },
  ),
  temperatureLimit: optionalMeasured({
    ...RULES.temperature,
    label: "temperature limit",
    toleranceDimension: "temperatureDifference",
  }),
  embeddingDepth: optionalMeasured(RULES.embeddingDepth),
  thicknessVariation: optionalMeasured(RULES.thicknessVariation),
  longestTime: optionalMeasured(RULES.timeOnTape),
  handling: tapeHandling,
  handlingSource: z
    .union([z.enum(SOURCE_KINDS), z.literal("")], "Say where it comes from.")
    .optional()
    .transform((source) => source || "assumed"),
});
export type TapeValues = z.output<typeof tapeSchema>;
