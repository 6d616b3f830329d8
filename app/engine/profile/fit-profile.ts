import { EngineInputError } from "../errors.ts";
import { requireWithin } from "../inputs.ts";
import { fitPolynomial } from "./least-squares.ts";
import { requireEnough, requirePoints, type ProfilePoint } from "./points.ts";

export interface ProfileFit {
  /** Position of the middle of the fit, m. */
  centre: number;
  /** Height of the fitted curve there, m. */
  offset: number;
  /** 1/m, positive for a bowl (device side up). */
  curvature: number;
  /** Standard uncertainty of the curvature from the scatter about the parabola, 1/m. */
  standardUncertainty: number;
  /** Angle of the fitted curve at the middle of the scan, rad. It is taken out of the curvature. */
  tilt: number;
  /** Root mean square of measured less fitted, m. */
  rms: number;
  /**
   * Fourth-order term at the end of the fit against the sum of it and the parabola, −1 to 1: beyond 0.05 either way the shape is
   * not spherical, by a film that varies over the wafer or by large deflection.
   */
  quartic: number;
  /** Whether the scan was so steep that a circle was fitted. */
  steep: boolean;
  /** Number of points in the fit. */
  used: number;
  /** Positions in the given list of the points that the robust fit left out. */
  rejected: number[];
}

export interface FitOptions {
  /** Length left out at either end of the scan, m. */
  edgeExclusion: number;
  /** Leave out points off the parabola by more than 4 times the scatter (median of deviations, scaled). Default false. */
  robust?: boolean;
}

/** Slope at the end of the fit beyond which a parabola is no longer a circle, rad. */
const STEEP = 0.03;

const REJECT_BEYOND = 4;

/** Standard deviation of a normal distribution over its median absolute deviation. */
const NORMAL_OVER_MEDIAN = 1.4826;

/**
 * Curvature of a scan across the wafer: a parabola by least squares, tilt and offset taken out, from points at least
 * `edgeExclusion` from either end. A scan steeper than 0.03 is fitted by a circle instead. The uncertainty holds for scatter
 * that is independent from point to point; it does not know drift, the bow of the reference or a wafer that is not spherical.
 *
 * Refuses, with `EngineInputError`: values that are not finite, fewer than 7 positions left, no spread in position.
 * Source: least squares, as in JCGM 100:2008, annex H.3.
 */
export function fitProfile(points: readonly ProfilePoint[], o: FitOptions): ProfileFit {
  requirePoints("points", points);
  const inside = insideEdges(points, o.edgeExclusion);
  const kept = o.robust ? withoutOutliers(inside) : inside;
  const frame = scanFrame(kept);
  const scaled = kept.map(({ x, z }) => ({ t: (x - frame.centre) / frame.halfWidth, z }));
  const parabola = fitPolynomial(scaled, 2);
  const [c0 = 0, c1 = 0, c2 = 0] = parabola.coefficients;
  const [, , spread2 = 0] = parabola.spread;
  const slope = c1 / frame.halfWidth;
  const perCoefficient = 2 / frame.halfWidth ** 2 / (1 + slope * slope) ** 1.5;
  const squares = parabola.residuals.reduce((total, r) => total + r * r, 0);
  const scatter = Math.sqrt(squares / (kept.length - 3));
  const steepest = Math.abs(slope) + (2 * Math.abs(c2)) / frame.halfWidth;
  const steep = steepest > STEEP;
  const curved = steep ? circle(scaled, frame.halfWidth) : { curvature: c2 * perCoefficient, slope, offset: c0 };
  const fit: ProfileFit = {
    centre: frame.centre,
    offset: curved.offset,
    curvature: curved.curvature,
    standardUncertainty: scatter * spread2 * perCoefficient,
    tilt: Math.atan(curved.slope),
    rms: Math.sqrt(squares / kept.length),
    quartic: quarticShare(scaled, c2),
    steep,
    used: kept.length,
    rejected: leftOut(inside, kept),
  };
  if (![fit.offset, fit.curvature, fit.standardUncertainty, fit.tilt, fit.quartic].every(Number.isFinite)) {
    throw new EngineInputError("points", "are too unevenly placed for a curvature");
  }
  return fit;
}

interface IndexedPoint extends ProfilePoint {
  index: number;
}

function insideEdges(points: readonly ProfilePoint[], edgeExclusion: number): IndexedPoint[] {
  const exclusion = requireWithin("edgeExclusion", edgeExclusion, 0, 1, "m");
  requireEnough("points", points.length);
  const [first, last] = span(points);
  if (first === last) throw new EngineInputError("points", "all lie at the same position");
  const inside = points
    .map(({ x, z }, index) => ({ x, z, index }))
    .filter(({ x }) => x >= first + exclusion && x <= last - exclusion);
  requireEnough("points", new Set(inside.map(({ x }) => x)).size);
  return inside;
}

function span(points: readonly ProfilePoint[]): [number, number] {
  return points.reduce<[number, number]>(
    ([low, high], { x }) => [Math.min(low, x), Math.max(high, x)],
    [Number.POSITIVE_INFINITY, Number.NEGATIVE_INFINITY],
  );
}

function scanFrame(points: readonly ProfilePoint[]): { centre: number; halfWidth: number } {
  const [first, last] = span(points);
  return { centre: (first + last) / 2, halfWidth: (last - first) / 2 };
}

/**
 * Leaves out the points that lie off the parabola of those still in, until the choice stays. Every round judges all points
 * again, because a gross outlier at the edge bends the first fit away from its neighbours too.
 */
function withoutOutliers(inside: IndexedPoint[]): IndexedPoint[] {
  // A perfect parabola leaves rounding only, which is no scatter to judge points by.
  const rounding = 1e-12 * inside.reduce((largest, { z }) => Math.max(largest, Math.abs(z)), 0);
  let kept = inside;
  for (let round = 0; round < 20; round += 1) {
    const off = distancesFromParabola(inside, kept);
    const limit = Math.max(REJECT_BEYOND * NORMAL_OVER_MEDIAN * median(off), rounding);
    const next = inside.filter((_, n) => (off[n] ?? 0) <= limit);
    requireEnough("points", new Set(next.map(({ x }) => x)).size);
    if (next.length === kept.length && next.every((point, n) => point === kept[n])) return kept;
    kept = next;
  }
  return kept;
}

function distancesFromParabola(all: readonly ProfilePoint[], kept: readonly ProfilePoint[]): number[] {
  const { centre, halfWidth } = scanFrame(kept);
  const place = (x: number) => (x - centre) / halfWidth;
  const fit = fitPolynomial(
    kept.map(({ x, z }) => ({ t: place(x), z })),
    2,
  );
  const [c0 = 0, c1 = 0, c2 = 0] = fit.coefficients;
  return all.map(({ x, z }) => Math.abs(z - (c0 + (c1 + c2 * place(x)) * place(x))));
}

function leftOut(all: readonly IndexedPoint[], kept: readonly IndexedPoint[]): number[] {
  const stays = new Set(kept);
  return all.filter((point) => !stays.has(point)).map(({ index }) => index);
}

function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  const upper = sorted[Math.floor(sorted.length / 2)] ?? 0;
  const lower = sorted[Math.floor((sorted.length - 1) / 2)] ?? upper;
  return (lower + upper) / 2;
}

function quarticShare(scaled: readonly { t: number; z: number }[], c2: number): number {
  const c4 = fitPolynomial(scaled, 4).coefficients[4] ?? 0;
  const both = Math.abs(c4) + Math.abs(c2);
  return both === 0 ? 0 : c4 / both;
}

/**
 * Circle through the scan: the sine of its slope grows by the curvature times the distance. The part of the circle that a
 * parabola misses is taken from the heights and the parabola fitted again, until the two agree.
 */
function circle(
  scaled: readonly { t: number; z: number }[],
  halfWidth: number,
): { curvature: number; slope: number; offset: number } {
  let [curvature, slope] = [0, 0];
  for (let round = 0; round < 100; round += 1) {
    const rest = scaled.map(({ t, z }) => ({ t, z: z - beyondParabola(t * halfWidth, curvature, slope) }));
    const [offset = 0, c1 = 0, c2 = 0] = fitPolynomial(rest, 2).coefficients;
    const nextSlope = c1 / halfWidth;
    const next = (2 * c2) / halfWidth ** 2 / (1 + nextSlope * nextSlope) ** 1.5;
    if (Math.abs(next - curvature) <= 1e-13 * Math.abs(next)) return { curvature: next, slope: nextSlope, offset };
    [curvature, slope] = [next, nextSlope];
  }
  throw new EngineInputError("points", "bend too far for a curvature: the scan is close to a quarter turn");
}

/** Height of a circle over the parabola that touches it at the middle, m, at the distance `x` from there. */
export function beyondParabola(x: number, curvature: number, slope: number): number {
  const cosine = 1 / Math.sqrt(1 + slope * slope);
  const sine = slope * cosine;
  const sineAt = sine + curvature * x;
  if (Math.abs(sineAt) >= 1) {
    throw new EngineInputError("points", "bend too far for a curvature: the scan passes a quarter turn");
  }
  const height = (x * (2 * sine + curvature * x)) / (cosine + Math.sqrt(1 - sineAt * sineAt));
  return height - slope * x - (curvature * x * x) / (2 * cosine ** 3);
}
