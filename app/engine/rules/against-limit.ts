import type { Outcome } from "../vocabulary.ts";

/** Rounding error of a decimal quantity turned into SI and back, relative: 'at' a limit must not depend on it. */
const SAME = 1e-9;

/** Whether a figure is at or above a limit, rounding error aside. */
export function reaches(value: number, limit: number): boolean {
  return value >= limit - SAME * Math.max(Math.abs(value), Math.abs(limit));
}

/** Whether a figure is beyond a limit, rounding error aside: at it is not beyond it. */
export function exceeds(value: number, limit: number): boolean {
  return !reaches(limit, value);
}

/**
 * The one meaning of 'at' for every limit: below limit minus margin is clear; from limit minus margin on, up to and at the
 * limit, is a caution; beyond the limit fails with `fail`.
 * @param value the figure, larger is worse
 * @param margin width of the caution band below the limit, same unit, 0 for none (then only 'at' is a caution)
 */
export function againstUpperLimit(value: number, limit: number, margin: number, fail: Outcome): Outcome {
  if (exceeds(value, limit)) return fail;
  return reaches(value, limit - margin) ? "caution" : "clear";
}

/** The same for a figure that must not fall below its limit: at the limit is a caution, below it fails. */
export function againstLowerLimit(value: number, limit: number, margin: number, fail: Outcome): Outcome {
  return againstUpperLimit(-value, -limit, margin, fail);
}
