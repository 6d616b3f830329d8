import { normalShareBelow } from "./random/inverse-normal.ts";
import type { Chance } from "./summary.ts";

/** The straight line through the best estimate: what first order says of a figure, whose distribution is known. */
export interface Line {
  /** figure at the best estimates, which is the line's mean */
  atBest: number;
  slopes: Float64Array;
  best: Float64Array;
  /** its standard uncertainty when the line is normal, null otherwise */
  normalUncertainty: number | null;
}

/** The line's figure for each row of inputs. */
export function evaluateLine(
  { atBest, slopes, best }: Line,
  inputs: Float64Array,
  rows: number,
  out: Float64Array,
): void {
  const width = best.length;
  for (let row = 0; row < rows; row += 1) {
    let sum = atBest;
    for (let n = 0; n < width; n += 1) sum += (slopes[n] ?? 0) * ((inputs[row * width + n] ?? 0) - (best[n] ?? 0));
    out[row] = sum;
  }
}

/**
 * Probability of exceeding a limit with the line as control: the count of figures beyond it, corrected by how far the count of
 * the same draws' lines lies off its known value. The factor of the correction comes from the other half of the draws, which
 * keeps it unbiased. Null when the line's distribution is not known.
 */
export function controlledChance(
  figures: Float64Array,
  lines: Float64Array,
  { atBest, normalUncertainty }: Line,
  limit: number,
): Chance | null {
  if (normalUncertainty === null || normalUncertainty === 0) return null;
  const expected = normalShareBelow((atBest - limit) / normalUncertainty);
  const middle = figures.length >> 1;
  const halves = [tally(figures, lines, limit, 0, middle), tally(figures, lines, limit, middle, figures.length)];
  const [first, second] = halves;
  if (!first || !second) return null;
  const parts = [corrected(first, slopeOf(second), expected), corrected(second, slopeOf(first), expected)];
  const weigh = (pick: (part: { probability: number; variance: number; share: number }) => number) =>
    parts.reduce((sum, part) => sum + pick(part), 0);
  return {
    probability: Math.min(
      1,
      Math.max(
        0,
        weigh(({ probability, share }) => (probability * share) / figures.length),
      ),
    ),
    standardError: Math.sqrt(weigh(({ variance, share }) => variance * (share / figures.length) ** 2)),
  };
}

interface Tally {
  draws: number;
  figures: number;
  lines: number;
  both: number;
}

function tally(figures: Float64Array, lines: Float64Array, limit: number, from: number, to: number): Tally {
  const counts = { draws: to - from, figures: 0, lines: 0, both: 0 };
  for (let n = from; n < to; n += 1) {
    const beyond = (figures[n] ?? 0) > limit;
    const lineBeyond = (lines[n] ?? 0) > limit;
    if (beyond) counts.figures += 1;
    if (lineBeyond) counts.lines += 1;
    if (beyond && lineBeyond) counts.both += 1;
  }
  return counts;
}

/** Least-squares factor of the correction; none when no line is beyond the limit or all are. */
function slopeOf({ draws, figures, lines, both }: Tally): number {
  const spread = lines * (draws - lines);
  return spread === 0 ? 0 : (both * draws - figures * lines) / spread;
}

function corrected({ draws, figures, lines, both }: Tally, slope: number, expected: number) {
  const probability = figures / draws - slope * (lines / draws - expected);
  const [a, b] = [(figures + 1) / (draws + 2), lines / draws];
  const variance =
    (a * (1 - a) + slope ** 2 * b * (1 - b) - 2 * slope * (both / draws - (figures / draws) * b)) / draws;
  return { probability, variance: Math.max(0, variance), share: draws };
}
