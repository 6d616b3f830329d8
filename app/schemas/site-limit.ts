import { z } from "zod";
import { LIMIT_DEFINITIONS, type LimitDefinition, type LimitKey } from "#app/engine/rules/limits.ts";
import { limitQuantity } from "#app/lib/limit-quantity.ts";
import type { PhysicalRange, QuantityRule } from "#app/lib/read-quantity.ts";
import { quantity } from "./quantity.ts";

const definitions: Record<LimitKey, LimitDefinition> = LIMIT_DEFINITIONS;

/** Limits of every kind with the widest range that makes sense of them. */
function rangeOf({ unit, rule, temperaturePoint, count }: LimitDefinition): PhysicalRange {
  switch (unit) {
    case "m":
      // Gaps and clearances are larger than anything of a wafer itself.
      return rule !== 4 && rule !== 5
        ? { least: 0, most: 2e-3, words: "0 to 2 mm" }
        : { least: 0, most: 10e-3, words: "0 to 10 mm" };
    case "K":
      return temperaturePoint
        ? { least: 273.15, most: 673.15, words: "0 °C to 400 °C" }
        : { least: 0, most: 200, words: "0 to 200 K" };
    case "1":
      return count ? { least: 0, most: 100, words: "0 to 100" } : { least: 0, most: 1, words: "0 to 100 %" };
    case "Pa":
      return { least: 0, most: 5e9, words: "0 to 5 GPa" };
    case "s":
      return { least: 0, most: 94608000, words: "0 to 3 years" };
  }
}

/** A limit as the person saw it when the form was filled: what differs from it was changed by them. */
const opened = z.object({ version: z.number().int(), value: z.number(), source: z.string() });

/** The rule that a limit is read by. */
export const limitRule = (definition: LimitDefinition): QuantityRule => ({
  label: "limit",
  dimension: limitQuantity(definition).dimension,
  range: rangeOf(definition),
});

const limitFields = (definition: LimitDefinition) =>
  z.object({
    value: quantity(limitRule(definition)),
    source: z
      .string("Say where the limit comes from.")
      .trim()
      .min(1, "Say where the limit comes from.")
      .max(200, "Keep it under 200 characters."),
    opened,
  });
export type LimitChange = z.output<ReturnType<typeof limitFields>>;

/** The form of the limits that one rule judges by. */
export function limitsSchema(keys: readonly LimitKey[]): z.ZodType<Partial<Record<LimitKey, LimitChange>>> {
  return z.object(Object.fromEntries(keys.map((key) => [key, limitFields(definitions[key])])));
}

/** Pairs of which the first must be at least the second, or the rules would contradict each other. */
const AT_LEAST: readonly (readonly [LimitKey, LimitKey])[] = [
  ["bareFrom150", "gripperFrom150"],
  ["bareFrom200", "gripperFrom200"],
  ["bareFrom300", "gripperFrom300"],
  ["gripperFrom150", "carrierBelow"],
  ["gripperFrom200", "carrierBelow"],
  ["gripperFrom300", "carrierBelow"],
  ["processCarrierBelow", "edgeRingFrom"],
  ["edgeRingFrom", "edgeRingLeast"],
  ["edgeRingLeast", "carrierBelow"],
  ["carrierBelow", "tapeInLineFrom"],
  ["sealGapPlain", "sealGapPlainClear"],
  ["sealGapCompliant", "sealGapCompliantClear"],
  ["stressGround", "stressGroundClear"],
  ["slot200", "slotClear200"],
  ["slot300", "slotClear300"],
  ["weightLoss", "weightLossClear"],
  ["coverLeftClear", "coverLeft"],
  ["trimAdvisedBelow", "trimBelow"],
  ["reliefAdvisedBelow", "reliefBelow"],
];

/** Pairs of limits that contradict each other. */
export function contradictions(values: Readonly<Record<LimitKey, number>>): { more: LimitKey; less: LimitKey }[] {
  return AT_LEAST.filter(([more, less]) => values[more] < values[less]).map(([more, less]) => ({ more, less }));
}
