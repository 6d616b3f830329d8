import { EngineInputError } from "../../errors.ts";
import { requireFinite } from "../../inputs.ts";
import { formatNumber } from "../../units/format-number.ts";

/** One value on a chart, in the order in which they were measured. Excluded ones stay in the data with their reason. */
export interface ChartValue {
  value: number;
  /** why it does not count; absent or null when it does */
  excluded?: string | null;
}

/** What the chart says of drift, by the tests that are in use. */
export type ChartRule =
  "beyond the limits" | "nine on one side" | "six rising or falling" | "two of three far out" | "moving range";

export interface ChartSignal {
  rule: ChartRule;
  /** places in the list of the values that make it, ascending */
  at: number[];
  sentence: string;
}

export interface ControlLimits {
  centre: number;
  lower: number;
  upper: number;
  /** mean moving range, and the limit of a single one */
  meanRange: number;
  rangeLimit: number;
  /** mean moving range / 1.128 */
  standardDeviation: number;
  /** values that they were computed from */
  from: number;
}

export interface ControlChart {
  limits: ControlLimits;
  /** of each value against the value before it that counts; null for the first and for excluded ones */
  ranges: (number | null)[];
  signals: ChartSignal[];
}

/** 3/d2 and D4 for ranges of two values, and d2 (Montgomery, appendix VI, from memory). */
export const INDIVIDUALS_FACTOR = 2.66;
export const RANGE_FACTOR = 3.267;
const D2 = 1.128;
/** Fewest values that limits are computed from; under 20 they are still loose. */
const FEWEST = 5;
const NINE = 9;
const SIX = 6;

/**
 * Chart of individual values and moving ranges: centre ± 2.66 mean moving ranges, ranges up to 3.267 of them. Ranges run from each
 * value that counts to the last one that does. With `limits` given (of an earlier, accepted stretch) the values are held against those.
 *
 * Signals, a small set on purpose: a value beyond the limits; nine in a row on one side of the centre; six in a row rising or falling;
 * two of three in a row beyond two thirds of the way to one limit; a moving range beyond its limit. On steady normal values the
 * five together signal falsely about once in 55 values (measured).
 * @throws EngineInputError for fewer than five values that count, or one that is not finite
 * Source: Montgomery, chapter 6; ISO 7870-2; Nelson 1984, tests 1, 2, 3 and 5; all from memory.
 */
export function controlChart(values: readonly ChartValue[], given?: ControlLimits): ControlChart {
  values.forEach(({ value }, n) => requireFinite(`values[${n}].value`, value));
  const ranges = movingRanges(values);
  const limits = given ?? limitsOf(values, ranges);
  return { limits, ranges, signals: signalsOf(values, ranges, limits) };
}

function movingRanges(values: readonly ChartValue[]): (number | null)[] {
  let last: number | null = null;
  return values.map(({ value, excluded }) => {
    if (excluded) return null;
    const range = last === null ? null : Math.abs(value - last);
    last = value;
    return range;
  });
}

function limitsOf(values: readonly ChartValue[], ranges: readonly (number | null)[]): ControlLimits {
  const counted = values.filter(({ excluded }) => !excluded);
  if (counted.length < FEWEST)
    throw new EngineInputError("values", `${counted.length} that count are too few for limits`, `at least ${FEWEST}`);
  const known = ranges.filter((range) => range !== null);
  const centre = counted.reduce((sum, { value }) => sum + value, 0) / counted.length;
  const meanRange = known.reduce((sum, range) => sum + range, 0) / known.length;
  return {
    centre,
    lower: centre - INDIVIDUALS_FACTOR * meanRange,
    upper: centre + INDIVIDUALS_FACTOR * meanRange,
    meanRange,
    rangeLimit: RANGE_FACTOR * meanRange,
    standardDeviation: meanRange / D2,
    from: counted.length,
  };
}

function signalsOf(
  values: readonly ChartValue[],
  ranges: readonly (number | null)[],
  limits: ControlLimits,
): ChartSignal[] {
  const places = values.flatMap(({ excluded }, n) => (excluded ? [] : [n]));
  const at = (k: number) => values[places[k] ?? 0]?.value ?? 0;
  const side = (k: number) => Math.sign(at(k) - limits.centre);
  const far = (2 / 3) * (limits.upper - limits.centre);
  const signals: ChartSignal[] = [];
  const add = (rule: ChartRule, from: number, to: number, sentence: string, only?: (k: number) => boolean) => {
    const run = Array.from({ length: to - from + 1 }, (_, n) => from + n).filter((k) => only?.(k) ?? true);
    signals.push({ rule, at: run.map((k) => places[k] ?? 0), sentence });
  };
  let [sameSide, rising, falling] = [0, 0, 0];
  for (let k = 0; k < places.length; k += 1) {
    const number = formatNumber((places[k] ?? 0) + 1);
    if (at(k) > limits.upper || at(k) < limits.lower)
      add("beyond the limits", k, k, `Value ${number} lies ${at(k) > limits.upper ? "above" : "below"} the limits.`);
    sameSide = side(k) === 0 ? 0 : k > 0 && side(k) === side(k - 1) ? sameSide + 1 : 1;
    if (sameSide === NINE)
      add("nine on one side", k - NINE + 1, k, `The nine values up to ${number} lie on one side of the centre.`);
    rising = k > 0 && at(k) > at(k - 1) ? rising + 1 : 0;
    falling = k > 0 && at(k) < at(k - 1) ? falling + 1 : 0;
    // Six values make five steps.
    if (rising === SIX - 1 || falling === SIX - 1)
      add(
        "six rising or falling",
        k - SIX + 1,
        k,
        `The six values up to ${number} ${rising > falling ? "rise" : "fall"}.`,
      );
    for (const up of [1, -1]) {
      const beyond = (j: number) => j >= 0 && up * (at(j) - limits.centre) > far;
      if (beyond(k) && (beyond(k - 1) || beyond(k - 2)))
        add(
          "two of three far out",
          Math.max(0, k - 2),
          k,
          `Two of the three values up to ${number} lie far out on one side.`,
          beyond,
        );
    }
    const range = ranges[places[k] ?? 0];
    if (typeof range === "number" && range > limits.rangeLimit)
      add(
        "moving range",
        Math.max(0, k - 1),
        k,
        `The step to value ${number} is larger than the limit of the moving range.`,
      );
  }
  return signals;
}
