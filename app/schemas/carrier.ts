import { z } from "zod";
import { CARRIER_MATERIALS } from "#app/engine/flow/model.ts";
import { measured, optionalMeasured, quantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { recordFields } from "./record-fields.ts";

const limit = {
  ...RULES.temperature,
  label: "temperature limit",
  toleranceDimension: "temperatureDifference",
} as const;

export const carrierSchema = z
  .object({
    ...recordFields,
    material: z.enum(CARRIER_MATERIALS, "Choose the material."),
    diameter: quantity(RULES.diameter),
    thickness: measured(RULES.carrierThickness),
    youngsModulus: measured(RULES.modulus),
    poissonsRatio: measured(RULES.poissonsRatio),
    expansion: optionalMeasured(RULES.expansion),
    expansionRange: z
      .string()
      .trim()
      .max(100)
      .optional()
      .transform((text) => text ?? ""),
    density: measured(RULES.density),
    thicknessVariation: measured(RULES.thicknessVariation),
    temperatureLimit: measured(limit),
    passesUltraviolet: z
      .boolean()
      .optional()
      .transform((checked) => checked ?? false),
    passesInfrared: z
      .boolean()
      .optional()
      .transform((checked) => checked ?? false),
    perforated: z
      .boolean()
      .optional()
      .transform((checked) => checked ?? false),
    reuseLimit: z.number("Type how often it may be used.").int("Type a whole number.").min(1).max(10_000),
  })
  .superRefine(({ material, expansion }, context) => {
    if (material === "glass" && expansion === null)
      context.addIssue({
        code: "custom",
        path: ["expansion", "value"],
        message: "Type the expansion of the glass. Only silicon has its own curve here.",
      });
  });
export type CarrierValues = z.output<typeof carrierSchema>;
