import { z } from "zod";
import { FILM_KINDS } from "#app/engine/flow/model.ts";
import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import { filmHandling } from "./library-handling.ts";
import { measured, optionalMeasured } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { recordFields } from "./record-fields.ts";

const point = { ...RULES.temperature, toleranceDimension: "temperatureDifference" } as const;

export const filmSchema = z
  .object({
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
    zeroStressTemperature: optionalMeasured({ ...point, label: "zero-stress temperature" }),
    temperatureLimit: optionalMeasured(point),
    handling: filmHandling,
  })
  .superRefine(({ kind, zeroStressTemperature }, context) => {
    const fail = (message: string) =>
      context.addIssue({ code: "custom", path: ["zeroStressTemperature", "value"], message });
    if (zeroStressTemperature === null) return;
    if (kind !== "polymer") fail("Only a polymer has one: leave it blank, or choose the kind ‘polymer’.");
    else if (zeroStressTemperature.value <= ROOM_TEMPERATURE)
      fail("It must lie above 25 °C, where the stress is stated.");
  });
export type FilmValues = z.output<typeof filmSchema>;
