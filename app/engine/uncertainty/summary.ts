import { EngineInputError } from "../errors.ts";
import { requireFinite } from "../inputs.ts";

/** Ways to draw. */
export const SAMPLING_METHODS = ["plain", "control variate", "lattice"] as const;
export type SamplingMethod = (typeof SAMPLING_METHODS)[number];

/** A probability with the standard error that the finite number of draws leaves it. */
export interface Chance {
  probability: number;
  standardError: number;
}

/** What sampling says about a figure, in the figure's unit. */
export interface SampledUncertainty {
  method: SamplingMethod;
  /** evaluations of the model that the result rests on */
  draws: number;
  mean: number;
  /** of the mean, from the finite number of draws */
  standardErrorOfMean: number;
  standardUncertainty: number;
  /** 95 % coverage interval with 2.5 % on either side */
  interval: [number, number];
  /** standard errors of its two ends */
  standardErrorOfInterval(): [number, number];
  /** shortest interval that holds 95 % of the draws */
  shortestInterval(): [number, number];
  /** figure below which the share `p` lies, 0 < p < 1 */
  quantile(p: number): number;
  standardErrorOfQuantile(p: number): number;
  probabilityAbove(limit: number): number;
  /** the same with its own standard error */
  chanceAbove(limit: number): Chance;
}

/** Share that a coverage interval holds. */
const COVERAGE = 0.95;

/** Everything drawn: figures in the order drawn, and where each replicate ends. */
export interface Drawn {
  method: SamplingMethod;
  figures: Float64Array;
  ends: number[];
  mean: number;
  standardErrorOfMean: number;
  /** replaces the plain count where the method knows better */
  chanceAbove?: (limit: number) => Chance | null;
}

/**
 * Summary of the draws of a figure: JCGM 101:2008, 7.6 (mean and standard uncertainty) and 7.7 (coverage intervals).
 * Quantiles are interpolated between draws. Their standard errors come from the scatter of the replicates, with a control variate
 * from the standard error of the share below and the density there.
 */
export function summarise(drawn: Drawn): SampledUncertainty {
  const { method, figures, ends, mean, standardErrorOfMean } = drawn;
  const sorted = figures.slice().sort();
  const quantile = (p: number) => quantileOf(sorted, requireShare(p), drawn);
  let replicates: Float64Array[] | null = null;
  const quantileError = (p: number) => {
    const chance = drawn.chanceAbove?.(quantile(p));
    if (chance) return chance.standardError / densityAt(sorted, p);
    replicates ??= replicatesOf(figures, ends).map((part) => part.slice().sort());
    return errorOfMean(replicates.map((part) => interpolated(part, p)));
  };
  const chanceAbove = (limit: number): Chance => {
    requireFinite("limit", limit);
    return drawn.chanceAbove?.(limit) ?? counted(drawn, sorted, limit);
  };
  const [low, high] = [(1 - COVERAGE) / 2, (1 + COVERAGE) / 2];
  return {
    method,
    draws: figures.length,
    mean,
    standardErrorOfMean,
    standardUncertainty: standardDeviation(figures),
    interval: [quantile(low), quantile(high)],
    standardErrorOfInterval: () => [quantileError(low), quantileError(high)],
    shortestInterval: () => shortest(sorted),
    quantile,
    standardErrorOfQuantile: (p) => quantileError(requireShare(p)),
    probabilityAbove: (limit) => chanceAbove(limit).probability,
    chanceAbove,
  };
}

function requireShare(p: number): number {
  if (!(p > 0 && p < 1)) throw new EngineInputError("p", "is not a share of a distribution", "above 0 and below 1");
  return p;
}

/** The draws' quantile, moved to where the method's own probability has the share asked for. */
function quantileOf(sorted: Float64Array, p: number, { chanceAbove }: Drawn): number {
  const first = interpolated(sorted, p);
  if (!chanceAbove) return first;
  let value = first;
  for (let round = 0; round < 3; round += 1) {
    const better = chanceAbove(value);
    if (better === null) return first;
    // What the count says too much or too little at this place, taken off the share asked for.
    const excess = better.probability - shareAbove(sorted, value);
    value = interpolated(sorted, Math.min(1, Math.max(0, p + excess)));
  }
  return value;
}

/** The draw at the share `p` of sorted ones, each draw standing for the middle of its own share. */
function interpolated(sorted: Float64Array, p: number): number {
  const place = Math.min(sorted.length - 1, Math.max(0, p * sorted.length - 0.5));
  const low = Math.floor(place);
  const [below = 0, above = below] = [sorted[low], sorted[low + 1]];
  return below + (place - low) * (above - below);
}

/** Probability per unit of the figure at the quantile `p`, from the draws a quarter of the nearer tail to either side. */
function densityAt(sorted: Float64Array, p: number): number {
  const step = Math.min(p, 1 - p) / 4;
  return (2 * step) / (interpolated(sorted, p + step) - interpolated(sorted, p - step));
}

function shortest(sorted: Float64Array): [number, number] {
  const span = Math.min(sorted.length - 1, Math.round(COVERAGE * sorted.length));
  let best: [number, number] = [sorted[0] ?? 0, sorted[span] ?? 0];
  for (let low = 1; low + span < sorted.length; low += 1) {
    const [from, to] = [sorted[low] ?? 0, sorted[low + span] ?? 0];
    if (to - from < best[1] - best[0]) best = [from, to];
  }
  return best;
}

/** Share of sorted figures beyond a limit; at it is not beyond. */
function shareAbove(sorted: Float64Array, limit: number): number {
  let [low, high] = [0, sorted.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((sorted[middle] ?? 0) > limit) high = middle;
    else low = middle + 1;
  }
  return 1 - low / sorted.length;
}

function counted({ method, figures, ends }: Drawn, sorted: Float64Array, limit: number): Chance {
  const probability = shareAbove(sorted, limit);
  if (method === "lattice") {
    const standardError = errorOfMean(replicatesOf(figures, ends).map((part) => countAbove(part, limit) / part.length));
    if (standardError > 0) return { probability, standardError };
  }
  return { probability, standardError: binomialError(probability, figures.length) };
}

/** Standard error of a share of independent draws; one draw either way is allowed for, so that none of many is not certainty. */
export function binomialError(share: number, draws: number): number {
  const widened = (share * draws + 1) / (draws + 2);
  return Math.sqrt((widened * (1 - widened)) / draws);
}

/** How many figures lie beyond a limit. */
export function countAbove(figures: Float64Array, limit: number): number {
  let count = 0;
  for (const figure of figures) if (figure > limit) count += 1;
  return count;
}

function replicatesOf(figures: Float64Array, ends: readonly number[]): Float64Array[] {
  return ends.map((end, n) => figures.subarray(ends[n - 1] ?? 0, end));
}

/** Mean taken from the first figure on, so that a small spread about a large figure keeps its digits. */
export function meanOf(figures: Float64Array | readonly number[]): number {
  const first = figures[0] ?? 0;
  let sum = 0;
  for (let n = 0; n < figures.length; n += 1) sum += (figures[n] ?? 0) - first;
  return first + sum / figures.length;
}

/** Standard deviation of a sample; zero for fewer than two. */
export function standardDeviation(figures: Float64Array | readonly number[]): number {
  if (figures.length < 2) return 0;
  const mean = meanOf(figures);
  let squares = 0;
  for (let n = 0; n < figures.length; n += 1) {
    const off = (figures[n] ?? 0) - mean;
    squares += off * off;
  }
  return Math.sqrt(squares / (figures.length - 1));
}

/** Standard error of the mean of independent figures. */
export function errorOfMean(figures: readonly number[]): number {
  return standardDeviation(figures) / Math.sqrt(figures.length);
}
