import { z } from "zod";
import { RELEASE_METHODS } from "#app/engine/flow/model.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { bondingMaterialHandling } from "./library-handling.ts";
import { measured, optionalMeasured, quantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { checkbox, line, recordFields, wholeNumber } from "./record-fields.ts";

const point = { ...RULES.temperature, toleranceDimension: "temperatureDifference" } as const;
const celsius = (kelvin: number) => formatQuantity(kelvin, "temperature", { unit: "°C" });
const resistance = line(200).transform((text) => text || "not known");

export const bondingMaterialSchema = z
  .object({
    ...recordFields,
    flows: checkbox,
    softening: optionalMeasured({ ...point, label: "softening point" }),
    glassTransition: optionalMeasured({ ...point, label: "glass transition" }),
    flowPoint: optionalMeasured({ ...point, label: "flow point" }),
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
    const { flows, softening, glassTransition, flowPoint, release, releaseTemperature } = material;
    if (material.mostThickness < material.leastThickness)
      fail(["mostThickness"], "The most is less than the least thickness.");
    if (flows && softening === null)
      fail(["softening", "value"], "A thermoplastic flows above its softening point: type that point.");
    const rubber = glassTransition ?? softening;
    if (flowPoint && !flows)
      fail(["flowPoint", "value"], "Only a thermoplastic flows: leave it blank, or tick that it does.");
    else if (flowPoint && rubber && flowPoint.value < rubber.value)
      fail(["flowPoint", "value"], `It cannot flow below ${celsius(rubber.value)}, where it begins to soften.`);
    if (release !== "thermal slide") return;
    if (!flows) fail(["release"], "A cross-linked material does not flow, so it cannot slide off.");
    else if (flowPoint && releaseTemperature.value < flowPoint.value)
      fail(
        ["releaseTemperature", "value"],
        `It slides only where it flows: at its flow point, ${celsius(flowPoint.value)}, or above.`,
      );
    else if (softening !== null && releaseTemperature.value < softening.value)
      fail(
        ["releaseTemperature", "value"],
        `It slides only where it flows: at its softening point, ${celsius(softening.value)}, or above.`,
      );
  });
export type BondingMaterialValues = z.output<typeof bondingMaterialSchema>;
