import { EngineInputError } from "../errors.ts";
import { requireWithin } from "../inputs.ts";
import { incompleteBeta } from "./incomplete-beta.ts";

/** Share of a normal distribution within two standard deviations: what an expanded uncertainty with k = 2 promises. */
export const TWO_SIGMA = 0.954499736103642;

const DEGREES = { low: 0.1, high: 1e9 } as const;
/** From here on the distribution is normal to seven digits. */
const ENDLESS = 1e7;

/**
 * Factor by which a standard uncertainty from `degreesOfFreedom` is multiplied so that the interval holds the share `share` of
 * outcomes: the two-sided quantile of Student's distribution. 2.000 for many degrees, 2.231 for 12, 2.649 for 5, 13.97 for 1.
 * Within 1e-9 of its size (measured against tables and by inversion). Source: JCGM 100:2008, annex G.3 and table G.2.
 * @throws EngineInputError for a share or degrees of freedom out of range
 */
export function studentFactor(degreesOfFreedom: number, share = TWO_SIGMA): number {
  requireWithin("share", share, 1e-6, 1 - 1e-9, "1");
  const degrees = Math.min(checkDegrees("degreesOfFreedom", degreesOfFreedom), ENDLESS);
  let [low, high] = [0, 2];
  while (studentShareWithin(high, degrees) < share && high < 1e12) high *= 2;
  for (let n = 0; n < 100 && high - low > 1e-13 * high; n += 1) {
    const middle = (low + high) / 2;
    if (studentShareWithin(middle, degrees) < share) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}

/** Share of Student's distribution between −t and t. */
function studentShareWithin(t: number, degrees: number): number {
  const square = t * t;
  return incompleteBeta(0.5, degrees / 2, square / (degrees + square));
}

/**
 * Probability that a ratio of two independent estimates of one variance, with these degrees of freedom, is at least `ratio`
 * (Fisher's F). Source: Abramowitz and Stegun 1964, 26.6.2, from memory.
 */
export function varianceRatioBeyond(ratio: number, above: number, below: number): number {
  requireWithin("ratio", ratio, 0, Number.MAX_VALUE, "1");
  const [a, b] = [checkDegrees("above", above), checkDegrees("below", below)].map((n) => Math.min(n, ENDLESS) / 2);
  if (a === undefined || b === undefined) throw new EngineInputError("above", "is missing");
  return incompleteBeta(b, a, b / (b + a * ratio));
}

function checkDegrees(field: string, value: number): number {
  if (value === Number.POSITIVE_INFINITY) return DEGREES.high;
  return requireWithin(field, value, DEGREES.low, DEGREES.high, "1");
}
