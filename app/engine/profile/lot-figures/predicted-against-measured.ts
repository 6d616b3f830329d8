import { EngineInputError } from "../../errors.ts";
import { requireFinite, requireWithin } from "../../inputs.ts";
import { studentFactor } from "../../uncertainty/student.ts";
import { formatNumber } from "../../units/format-number.ts";
import { straightLine } from "../tool/straight-line.ts";

export interface ParityPoint {
  /** step of the flow, or whatever the points are grouped by */
  step: string;
  predicted: number;
  predictedUncertainty: number;
  measured: number;
  measuredUncertainty: number;
  /** points of one key share their prediction's error, which does not shrink with their number; left out, each has its own */
  shared?: string;
}

export interface Parity {
  step: string;
  count: number;
  /** mean of measured less predicted */
  bias: number;
  biasUncertainty: number;
  /** standard deviation of measured less predicted */
  spread: number;
  /** measured = intercept + slope predicted; null for fewer than three points or equal predictions */
  slope: { value: number; standardUncertainty: number } | null;
  /** mean square of the differences over their stated uncertainties: about 1 when the stated ones are right */
  agreement: number;
  /** where the model is off by more than chance */
  off: ("bias" | "slope" | "spread")[];
  sentence: string;
}

/** Rounds of the effective variance, which depends on the slope. */
const ROUNDS = 20;
/** Mean square ratio from which the spread is more than stated. */
const MORE_THAN_STATED = 2;

/**
 * Predicted against measured, for all points and for each step: bias, spread, and the slope of measured over predicted, with
 * uncertainties. The line weights each point by its effective variance u_m² + slope² u_p² and is widened where the points scatter more
 * than stated. Figures that do not depend on the unit; bows with one convention of sign. What points share of their prediction counts
 * once in the bias, as fully correlated.
 * @throws EngineInputError for no points or one out of range
 * Source: Orear 1982 for uncertainties in both; JCGM 100:2008, 5.2.2 for what is shared, annex G.3 for few points.
 */
export function predictedAgainstMeasured(points: readonly ParityPoint[]): { all: Parity; steps: Parity[] } {
  if (points.length === 0) throw new EngineInputError("points", "are none", "at least one");
  points.forEach((point, n) => {
    requireFinite(`points[${n}].predicted`, point.predicted);
    requireFinite(`points[${n}].measured`, point.measured);
    requireWithin(`points[${n}].predictedUncertainty`, point.predictedUncertainty, 0, Number.MAX_VALUE, "1");
    requireWithin(
      `points[${n}].measuredUncertainty`,
      point.measuredUncertainty,
      Number.MIN_VALUE,
      Number.MAX_VALUE,
      "1",
    );
  });
  const steps = [...new Set(points.map(({ step }) => step))];
  return {
    all: parityOf("all steps", points),
    steps: steps.map((step) =>
      parityOf(
        step,
        points.filter((point) => point.step === step),
      ),
    ),
  };
}

function parityOf(step: string, points: readonly ParityPoint[]): Parity {
  const count = points.length;
  const off = points.map(({ predicted, measured }) => measured - predicted);
  const stated = points.map((p) => Math.hypot(p.predictedUncertainty, p.measuredUncertainty));
  const bias = off.reduce((sum, value) => sum + value, 0) / count;
  const spread = count > 1 ? Math.sqrt(off.reduce((sum, value) => sum + (value - bias) ** 2, 0) / (count - 1)) : 0;
  const own = points.map((p, n) => (p.shared === undefined ? (stated[n] ?? 0) : p.measuredUncertainty));
  const byStated = Math.hypot(...own) / count;
  const bySpread = count > 1 ? ((studentFactor(count - 1) / 2) * spread) / Math.sqrt(count) : byStated;
  const biasUncertainty = Math.hypot(Math.max(byStated, bySpread), sharedPart(points));
  const agreement = off.reduce((sum, value, n) => sum + (value / (stated[n] ?? 1)) ** 2, 0) / count;
  const slope = slopeOf(points);
  const found: Parity["off"] = [];
  if (Math.abs(bias) > 2 * biasUncertainty) found.push("bias");
  if (slope && Math.abs(slope.value - 1) > 2 * slope.standardUncertainty) found.push("slope");
  if (agreement > MORE_THAN_STATED) found.push("spread");
  return { step, count, bias, biasUncertainty, spread, slope, agreement, off: found, sentence: inWords(found, slope) };
}

/** Standard uncertainty of the mean by what points share: a sum within each key, independent between keys. */
function sharedPart(points: readonly ParityPoint[]): number {
  const sums = new Map<string, number>();
  for (const { shared, predictedUncertainty } of points)
    if (shared !== undefined) sums.set(shared, (sums.get(shared) ?? 0) + predictedUncertainty);
  return Math.hypot(...sums.values()) / points.length;
}

function slopeOf(points: readonly ParityPoint[]): Parity["slope"] {
  if (points.length < 3) return null;
  let slope = 1;
  for (let round = 0; round < ROUNDS; round += 1) {
    const by = slope;
    const line = straightLine(
      points.map((p) => ({
        x: p.predicted,
        y: p.measured,
        u: Math.hypot(p.measuredUncertainty, by * p.predictedUncertainty),
      })),
    );
    if (!line) return null;
    const widened = Math.sqrt(Math.max(1, line.chiSquare / line.degreesOfFreedom));
    const few = widened > 1 ? studentFactor(line.degreesOfFreedom) / 2 : 1;
    if (Math.abs(line.slope - slope) <= 1e-9 * Math.abs(line.slope) || round === ROUNDS - 1)
      return { value: line.slope, standardUncertainty: line.slopeUncertainty * widened * few };
    slope = line.slope;
  }
  return null;
}

function inWords(off: Parity["off"], slope: Parity["slope"]): string {
  if (off.length === 0) return "Predicted and measured agree within what is stated.";
  const parts = [
    ...(off.includes("bias") ? ["there is a bias"] : []),
    ...(off.includes("slope") && slope
      ? [`the measured figures are ${formatNumber(slope.value, { decimals: 2 })} times the predicted ones`]
      : []),
    ...(off.includes("spread") ? ["they scatter more than stated"] : []),
  ];
  const text = parts.join(", and ");
  return `${text.charAt(0).toUpperCase()}${text.slice(1)}.`;
}
