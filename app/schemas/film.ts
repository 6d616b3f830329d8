import { z } from "zod";
import { FILM_KINDS } from "#app/engine/flow/model.ts";
import { filmHandling } from "./library-handling.ts";
import { measured, optionalMeasured } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { recordFields } from "./record-fields.ts";

export const filmSchema = z.object({
  ...recordFields,
  kind: z.enum(FILM_KINDS, "Choose the kind of film."),
  stressState: z
    .string()
    .trim()
    .max(200, "Keep it under 200 characters.")
    .optional()
    .transform((text) => text ?? ""),
  stress: measured(RULES.stress),
  youngsModulus: measured(RULES.modulus),
  poissonsRatio: measured(RULES.poissonsRatio),
  expansion: measured(RULES.expansion),
  yieldStress: optionalMeasured(RULES.yieldStress),
  temperatureLimit: optionalMeasured({ ...RULES.temperature, toleranceDimension: "temperatureDifference" }),
  handling: filmHandling,
});
export type FilmValues = z.output<typeof filmSchema>;
