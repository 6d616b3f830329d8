import { formatQuantity, formatWithUncertainty } from "#app/engine/units/format.ts";
import type { Predicted, PredictionGroup } from "#app/schemas/prediction.ts";
import { withoutUnit } from "./format-measured.ts";
import { COVERAGE } from "./scan-answer.ts";

const UNITS = { bow: { dimension: "length", unit: "µm" }, stress: { dimension: "stress", unit: "MPa" } } as const;

/** A figure with its sign and expanded uncertainty, '−102 ± 12 µm'. */
export function withExpanded(of: Predicted, value: number, standardUncertainty: number): string {
  const { dimension, unit } = UNITS[of];
  return standardUncertainty > 0
    ? formatWithUncertainty(value, COVERAGE * standardUncertainty, dimension, { unit, sign: true })
    : formatQuantity(value, dimension, { unit, sign: true });
}

/** The same without its unit, which stands in the head of the column. */
export const bareWithExpanded = (of: Predicted, value: number, standardUncertainty: number): string =>
  withoutUnit(withExpanded(of, value, standardUncertainty));

export const bowWithUncertainty = (value: number, standardUncertainty: number): string =>
  bareWithExpanded("bow", value, standardUncertainty);

/** A size without a sign. */
export function sizeOf(of: Predicted, value: number): string {
  const { dimension, unit } = UNITS[of];
  return formatQuantity(Math.abs(value), dimension, { unit, significant: 2 });
}

const THINGS: Record<Predicted, string> = { bow: "bows", stress: "stresses" };

/** The answer over all points: how far off, with what uncertainty, and where. */
export function predictionSentences(of: Predicted, all: PredictionGroup, groups: readonly PredictionGroup[]): string[] {
  const points = all.count === 1 ? "One point" : `${all.count} points`;
  const bias = `${points}: measured ${THINGS[of]} lie ${withExpanded(of, all.bias, all.biasUncertainty)} from the predicted ones on the mean, k = 2.`;
  const off = groups.filter(({ isOff }) => isOff);
  if (off.length === 0) return [bias, "Nowhere is the model off by more than what is stated of both."];
  const places = off.slice(0, NAMED).map(({ step }) => step);
  const more = off.length > NAMED ? ` and ${off.length - NAMED} more` : "";
  return [bias, `It is off by more than chance at ${places.join("; ")}${more}.`];
}

const NAMED = 3;

/** How much a group's slope is, or why it has none. */
export function slopeText({ slope, count }: PredictionGroup): string {
  if (!slope) return count < 3 ? "too few points" : "all predicted alike";
  return `${slope.value.toFixed(2)} ± ${(COVERAGE * slope.standardUncertainty).toFixed(2)}`;
}
