import type { Outcome } from "../vocabulary.ts";

/** Rounding error of a decimal quantity turned into SI and back, relative: 'at' a limit must not depend on it. */
const SAME = 1e-9;

/**
 * The one meaning of 'at' for every limit: below limit minus margin is clear; from limit minus margin on, up to and at the
 * limit, is a caution; beyond the limit fails with `fail`.
 * @param value the figure, larger is worse
 * @param margin width of the caution band below the limit, same unit, 0 for none (then only 'at' is a caution)
 */
export function againstUpperLimit(value: number, limit: number, margin: number, fail: Outcome): Outcome {
  const slack = SAME * Math.max(Math.abs(value), Math.abs(limit));
  if (value > limit + slack) return fail;
  return value >= limit - margin - slack ? "caution" : "clear";
}

/** The same for a figure that must not fall below its limit: at the limit is a caution, below it fails. */
export function againstLowerLimit(value: number, limit: number, margin: number, fail: Outcome): Outcome {
  return againstUpperLimit(-value, -limit, margin, fail);
}
