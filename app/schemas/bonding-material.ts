import { z } from "zod";
import { RELEASE_METHODS } from "#app/engine/flow/model.ts";
import { measured, optionalMeasured, quantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { recordFields } from "./record-fields.ts";

const point = { ...RULES.temperature, toleranceDimension: "temperatureDifference" } as const;
const words = z
  .string()
  .trim()
  .max(200, "Keep it under 200 characters.")
  .optional()
  .transform((text) => text || "not known");

export const bondingMaterialSchema = z
  .object({
    ...recordFields,
    effectiveModulus: measured({ ...RULES.modulus, label: "locked-in modulus" }),
    dataSheetModulus: optionalMeasured(RULES.modulus),
    poissonsRatio: measured(RULES.poissonsRatio),
    expansionBelow: measured(RULES.expansion),
    expansionAbove: measured(RULES.expansion),
    softening: optionalMeasured({ ...point, label: "softening point" }),
    flows: z
      .boolean()
      .optional()
      .transform((checked) => checked ?? false),
    bondTemperature: measured({ ...point, label: "bond temperature" }),
    temperatureLimit: measured({ ...point, label: "temperature limit" }),
    leastThickness: quantity({ ...RULES.bondThickness, label: "least thickness" }),
    mostThickness: quantity({ ...RULES.bondThickness, label: "most thickness" }),
    thicknessVariationShare: measured({ ...RULES.share, label: "thickness variation" }),
    release: z.enum(RELEASE_METHODS, "Choose how it lets go."),
    releaseTemperature: measured({ ...point, label: "release temperature" }),
    thermalCycles: z
      .number("Type a whole number or leave it blank.")
      .int("Type a whole number or leave it blank.")
      .min(1)
      .max(1000)
      .optional()
      .transform((count) => count ?? null),
    vacuum: words,
    solvent: words,
    acid: words,
    base: words,
  })
  .superRefine(({ leastThickness, mostThickness, flows, softening }, context) => {
    if (mostThickness < leastThickness)
      context.addIssue({
        code: "custom",
        path: ["mostThickness"],
        message: "The most is less than the least thickness.",
      });
    if (flows && softening === null)
      context.addIssue({
        code: "custom",
        path: ["softening", "value"],
        message: "A thermoplastic flows above its softening point: type that point.",
      });
  });
export type BondingMaterialValues = z.output<typeof bondingMaterialSchema>;
