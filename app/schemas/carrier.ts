import { z } from "zod";
import { CARRIER_MATERIALS } from "#app/engine/flow/model.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { curveRangeWords } from "#app/lib/expansion-rows.ts";
import { optionalExpansionCurve } from "./expansion-curve.ts";
import { carrierHandling } from "./library-handling.ts";
import { measured, optionalMeasured, optionalQuantity, quantity } from "./quantity.ts";
import { RULES } from "./ranges.ts";
import { checkbox, line, recordFields, wholeNumber } from "./record-fields.ts";

/** What stands in place of a temperature range when the carrier follows silicon's own curve. */
const OWN_CURVE = "silicon's own curve";

/** Words that `meanRange` could have written, which follow the temperatures when those are changed. */
const WRITTEN_RANGE = /^[−\d.]+ to [−\d.]+ °C mean$/;

/** The range of a mean expansion in words; K. */
function meanRange(from: number, to: number): string {
  const celsius = (kelvin: number) => formatQuantity(kelvin, "temperature", { unit: "°C" }).replace("\u00A0", " ");
  return `${celsius(from).replace(" °C", "")} to ${celsius(to)} mean`;
}

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
    meanExpansionFrom: optionalQuantity({ ...RULES.temperature, label: "lower end of the range" }),
    meanExpansionTo: optionalQuantity({ ...RULES.temperature, label: "upper end of the range" }),
    expansionCurve: optionalExpansionCurve,
    density: measured(RULES.density),
    thicknessVariation: measured(RULES.thicknessVariation),
    temperatureLimit: measured(limit),
    passesUltraviolet: checkbox,
    passesInfrared: checkbox,
    perforated: checkbox,
    reuseLimit: wholeNumber("Type how often it may be used, as a whole number.", { least: 1, most: 10_000 }),
    handling: carrierHandling,
  })
  .superRefine((carrier, context) => {
    const {
      material,
      expansion,
      expansionCurve,
      expansionRange,
      meanExpansionFrom: from,
      meanExpansionTo: to,
    } = carrier;
    const fail = (path: string[], message: string) => context.addIssue({ code: "custom", path, message });
    if (from !== null && to === null) fail(["meanExpansionTo"], "Type where the range ends too, or leave both blank.");
    if (to !== null && from === null)
      fail(["meanExpansionFrom"], "Type where the range begins too, or leave both blank.");
    if (from !== null && to !== null && to <= from) fail(["meanExpansionTo"], "The range ends before it begins.");
    if (expansion !== null && expansionCurve && expansionCurve.tolerance !== null)
      fail(["expansionCurve", "tolerance"], "With a stated mean, its tolerance counts: clear one of the two.");
    if (material === "glass") {
      if (expansion === null && expansionCurve === null)
        fail(["expansion", "value"], "Type the expansion of the glass, or its curve. Only silicon has its own here.");
      else if (expansion === null && (from !== null || to !== null))
        fail(
          ["meanExpansionFrom"],
          "Type the mean that holds over this range, or leave it blank: the curve has its own.",
        );
      else if (expansionCurve !== null) return;
      else if (expansionRange === "" && from === null && to === null)
        fail(["expansionRange"], "Say over which temperatures the expansion is a mean, such as 25 to 150 °C.");
      return;
    }
    if (expansionCurve !== null)
      fail(["expansionCurve", "rows"], "Leave it blank: a silicon carrier follows the curve of silicon itself.");
    if (expansion !== null)
      fail(["expansion", "value"], "Leave it blank: a silicon carrier follows the curve of silicon itself.");
    if (from !== null || to !== null)
      fail([from === null ? "meanExpansionTo" : "meanExpansionFrom"], "Leave it blank: silicon has its own curve.");
    if (carrier.passesUltraviolet) fail(["passesUltraviolet"], "Silicon does not pass ultraviolet light.");
  })
  .transform((carrier) => {
    const { expansion, expansionCurve, expansionRange, meanExpansionFrom: from, meanExpansionTo: to } = carrier;
    if (expansion === null && expansionCurve)
      return { ...carrier, expansionRange: `curve, ${curveRangeWords(expansionCurve).replaceAll("\u00A0", " ")}` };
    if (expansion === null) return { ...carrier, expansionRange: OWN_CURVE };
    if (from === null || to === null || !(expansionRange === "" || WRITTEN_RANGE.test(expansionRange))) return carrier;
    return { ...carrier, expansionRange: meanRange(from, to) };
  });
export type CarrierValues = z.output<typeof carrierSchema>;
