import { EngineInputError } from "../errors.ts";
import { requireFinite, requireWithin } from "../inputs.ts";
import type { Measured } from "../measured.ts";

/**
 * How a value may lie about its best estimate. `standard` is a standard deviation, `halfWidth` half the interval that holds every
 * value; both in the unit of the value.
 */
export type Spread =
  | { distribution: "exact" }
  | { distribution: "normal"; standard: number }
  | { distribution: "rectangular" | "triangular"; halfWidth: number };

/**
 * An input of a model: best estimate, and what is known of its error. The spread beside the value is common to all wafers: a
 * property believed from a data sheet, the error of a gauge. `betweenWafers` is what differs from one wafer of a lot to the next,
 * independent of it; default none.
 */
export type UncertainQuantity = { name: string; value: number; betweenWafers?: Spread } & Spread;

/**
 * A stated property as an input: its tolerance is the half-width of the interval believed to hold it, so rectangular; without a
 * tolerance it counts as exact, which rules report on their own. Source: JCGM 100:2008, 4.3.7.
 */
export function uncertainQuantity(name: string, { value, tolerance }: Measured): UncertainQuantity {
  return tolerance === null
    ? { name, value, distribution: "exact" }
    : { name, value, distribution: "rectangular", halfWidth: tolerance };
}

/**
 * Standard uncertainty of a spread: halfWidth/√3 for a rectangular one, halfWidth/√6 for a triangular one.
 * Source: JCGM 100:2008, 4.3.7 and 4.3.9.
 */
export function spreadUncertainty(spread: Spread): number {
  switch (spread.distribution) {
    case "exact":
      return 0;
    case "normal":
      return spread.standard;
    case "rectangular":
      return spread.halfWidth / Math.sqrt(3);
    case "triangular":
      return spread.halfWidth / Math.sqrt(6);
  }
}

/** Farthest that a value is moved to see how a model bends: two standard uncertainties, or to the end of the interval. */
export function reach(spread: Spread): number {
  const twice = 2 * spreadUncertainty(spread);
  return spread.distribution === "rectangular" || spread.distribution === "triangular"
    ? Math.min(twice, spread.halfWidth)
    : twice;
}

/** Checks the inputs of a model; names must differ, since correlations and budgets go by them. */
export function checkQuantities(quantities: readonly UncertainQuantity[]): void {
  const seen = new Set<string>();
  for (const quantity of quantities) {
    const { name, value, betweenWafers } = quantity;
    if (seen.has(name)) throw new EngineInputError(name, "stands twice among the inputs", "one input per name");
    seen.add(name);
    requireFinite(`${name}.value`, value);
    checkSpread(name, quantity);
    if (betweenWafers) checkSpread(`${name}.betweenWafers`, betweenWafers);
  }
}

function checkSpread(field: string, spread: Spread): void {
  switch (spread.distribution) {
    case "exact":
      return;
    case "normal":
      requireWithin(`${field}.standard`, spread.standard, 0, Number.MAX_VALUE, "1");
      return;
    case "rectangular":
    case "triangular":
      requireWithin(`${field}.halfWidth`, spread.halfWidth, 0, Number.MAX_VALUE, "1");
      return;
    default:
      throw new EngineInputError(
        `${field}.distribution`,
        "is not a distribution",
        "exact, normal, rectangular or triangular",
      );
  }
}
