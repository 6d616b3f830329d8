import { z } from "zod";
import { CARRIER_MATERIALS } from "#app/engine/flow/model.ts";
import { carrierHandling } from "./library-handling.ts";
import { measured, optionalMeasured, quantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { checkbox, line, recordFields, wholeNumber } from "./record-fields.ts";

/** What stands in place of a temperature range when the carrier follows silicon's own curve. */
const OWN_CURVE = "silicon's own curve";

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
    expansionRange: line(100),
    density: measured(RULES.density),
    thicknessVariation: measured(RULES.thicknessVariation),
    temperatureLimit: measured(limit),
    passesUltraviolet: checkbox,
    passesInfrared: checkbox,
    perforated: checkbox,
    reuseLimit: wholeNumber("Type how often it may be used, as a whole number.", { least: 1, most: 10_000 }),
    handling: carrierHandling,
  })
  .superRefine(({ material, expansion, expansionRange, passesUltraviolet }, context) => {
    const fail = (path: string[], message: string) => context.addIssue({ code: "custom", path, message });
    if (material === "glass") {
      if (expansion === null)
        fail(["expansion", "value"], "Type the expansion of the glass. Only silicon has its own curve here.");
      else if (expansionRange === "")
        fail(["expansionRange"], "Say over which temperatures the expansion is a mean, such as 25 to 150 °C.");
      return;
    }
    if (expansion !== null)
      fail(["expansion", "value"], "Leave it blank: a silicon carrier follows the curve of silicon itself.");
    if (passesUltraviolet) fail(["passesUltraviolet"], "Silicon does not pass ultraviolet light.");
  })
  .transform((carrier) => (carrier.expansion === null ? { ...carrier, expansionRange: OWN_CURVE } : carrier));
export type CarrierValues = z.output<typeof carrierSchema>;
