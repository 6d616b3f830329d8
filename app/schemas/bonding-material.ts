import { z } from "zod";
import { RELEASE_METHODS } from "#app/engine/flow/model.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { bondingMaterialHandling } from "./library-handling.ts";
import { measured, optionalMeasured, quantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { checkbox, line, recordFields, wholeNumber } from "./record-fields.ts";

const point = { ...RULES.temperature, toleranceDimension: "temperatureDifference" } as const;
const resistance = line(200).transform((text) => text || "not known");

export const bondingMaterialSchema = z
  .object({
    ...recordFields,
    flows: checkbox,
    softening: optionalMeasured({ ...point, label: "softening point" }),
    bondTemperature: measured({ ...point, label: "bond temperature" }),
    temperatureLimit: measured({ ...point, label: "temperature limit" }),
    effectiveModulus: measured({ ...RULES.modulus, label: "locked-in modulus" }),
    dataSheetModulus: optionalMeasured({ ...RULES.modulus, label: "data sheet’s modulus" }),
    poissonsRatio: measured(RULES.poissonsRatio),
    expansionBelow: measured({ ...RULES.expansion, label: "expansion below the softening point" }),
    expansionAbove: measured({ ...RULES.expansion, label: "expansion above the softening point" }),
    leastThickness: quantity({ ...RULES.bondThickness, label: "least thickness" }),
    mostThickness: quantity({ ...RULES.bondThickness, label: "most thickness" }),
    thicknessVariationShare: measured({ ...RULES.share, label: "thickness variation" }),
    release: z.enum(RELEASE_METHODS, "Choose how it lets go."),
    releaseTemperature: measured({ ...point, label: "release temperature" }),
    thermalCycles: wholeNumber("Type a whole number, or leave it blank.", { least: 1, most: 1000 })
      .optional()
      .transform((count) => count ?? null),
    vacuum: resistance,
    solvent: resistance,
    acid: resistance,
    base: resistance,
    handling: bondingMaterialHandling,
  })
  .superRefine((material, context) => {
    const fail = (path: string[], message: string) => context.addIssue({ code: "custom", path, message });
    const { flows, softening, release, releaseTemperature } = material;
    if (material.mostThickness < material.leastThickness)
      fail(["mostThickness"], "The most is less than the least thickness.");
    if (flows && softening === null)
      fail(["softening", "value"], "A thermoplastic flows above its softening point: type that point.");
    if (release !== "thermal slide") return;
    if (!flows) fail(["release"], "A cross-linked material does not flow, so it cannot slide off.");
    else if (softening !== null && releaseTemperature.value < softening.value) {
      const from = formatQuantity(softening.value, "temperature", { unit: "°C" });
      fail(
        ["releaseTemperature", "value"],
        `It slides only where it flows: at its softening point, ${from}, or above.`,
      );
    }
  });
export type BondingMaterialValues = z.output<typeof bondingMaterialSchema>;
