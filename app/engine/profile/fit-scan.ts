import { EngineInputError } from "../errors.ts";
import { requireWithin } from "../inputs.ts";
import { studentFactor } from "../uncertainty/student.ts";
import { fitCircle } from "./circle.ts";
import { ascendingColumns, distinctUpTo, firstFrom, kept, type ScanColumns } from "./columns.ts";
import { plainParabola, polynomialBasis, takeOut, type PolynomialBasis } from "./orthogonal-polynomials.ts";
import { FEWEST_POINTS, requireEnough } from "./points.ts";
import { pointsOnParabola } from "./robust-points.ts";
import { scatterOf, SHAPE, type Scatter } from "./scatter.ts";
import { gapsIn, rejectedRuns, type RejectedRun, type ScanGap } from "./scan-features.ts";

export interface ProfileFit {
  /** Position of the middle of the fit, m. */
  centre: number;
  /** Half of the stretch that the fit covers, m. */
  halfWidth: number;
  /** Height of the fitted curve at the middle, m. */
  offset: number;
  /** 1/m, positive for a bowl (device side up). */
  curvature: number;
  /** Standard uncertainty of the curvature from the scatter about the parabola, 1/m, with `scatter.degreesOfFreedom`. */
  standardUncertainty: number;
  /**
   * Interval about the curvature that holds the true one in 95 of 100 cases, 1/m: twice the standard uncertainty, more where it
   * rests on few degrees of freedom. Half of it is the standard uncertainty to put into a budget that is expanded with k = 2.
   */
  expandedUncertainty: number;
  /** Angle of the fitted curve at the middle of the scan, rad. It is taken out of the curvature. */
  tilt: number;
  /** Root mean square of measured less fitted, m. */
  rms: number;
  scatter: Scatter;
  /**
   * Fourth-order term at the end of the fit against the sum of it and the parabola, −1 to 1: beyond 0.05 either way the shape is
   * not spherical, by a film that varies over the wafer or by large deflection.
   */
  quartic: number;
  shape: ShapeTest;
  /** Whether the scan was so steep that a circle was fitted. */
  steep: boolean;
  /** Number of points in the fit. */
  used: number;
  /** Positions in the given list of the points that the robust fit left out. */
  rejected: number[];
  /** The same side by side: spikes and steps. */
  runs: RejectedRun[];
  /** Stretches inside the fit without points: a notch, lost rows. */
  gaps: ScanGap[];
}

/** Whether terms beyond the parabola are more than scatter. */
export interface ShapeTest {
  /** third-order term at the end of the fit, m: a film that varies from one side to the other */
  cubicHeight: number;
  /** fourth-order term at the end of the fit, m */
  quarticHeight: number;
  /** size of the fourth-order term in standard uncertainties of it */
  quarticRatio: number;
  /** from this ratio on it is no chance, at 1 % */
  quarticLimit: number;
  /** the term is no chance and more than 5 % of the shape */
  notSpherical: boolean;
}

export interface FitOptions {
  /** Length left out at either end of the scan, m. */
  edgeExclusion: number;
  /** Leave out spikes and steps: what lies off the parabola by more than 4.685 times the scatter. Default false. */
  robust?: boolean;
}

/** Slope at the end of the fit beyond which a parabola is no longer a circle, rad. */
const STEEP = 0.03;
/** Share of the fourth order from which on a shape is not spherical (common practice, no source). */
export const NOT_SPHERICAL = 0.05;
const CHANCE = 0.99;

/**
 * Curvature of a scan across the wafer: a parabola by least squares, tilt and offset taken out, from points at least
 * `edgeExclusion` from either end. A scan steeper than 0.03 is fitted by a circle instead. With `robust`, `pointsOnParabola` says
 * which points count; least squares over those alone gives the answer (reweighted least squares). Linear in the number of points.
 *
 * The uncertainty is that of the scatter, also of one that goes together over short distances (`scatterOf`). It does not know
 * slow drift, the bow of the tool's reference or a wafer that is not spherical; `shape` and `gaps` say what was seen of those.
 * Measured over 1,000 scans each: the true curvature lies within `expandedUncertainty` for independent scatter in 95 %, for one
 * with a memory of 1 % of the scan in 94 % (taken as independent it would be 33 %).
 *
 * @throws EngineInputError for values that are not finite, fewer than 7 positions left, no spread in position
 * Source: least squares, as in JCGM 100:2008, annex H.3; Rousseeuw and Leroy 1987.
 */
export function fitScan(scan: ScanColumns, o: FitOptions): ProfileFit {
  const all = ascendingColumns("points", scan);
  const [low, high] = insideEdges(all.x, o.edgeExclusion);
  const [x, z] = [all.x.subarray(low, high), all.z.subarray(low, high)];
  const whole = scaled(x);
  const keep = o.robust ? pointsOnParabola(whole.t, z) : null;
  const [keptX, keptZ] = keep ? [kept(x, keep), kept(z, keep)] : [x, z];
  requireEnough("points", distinctUpTo(keptX, FEWEST_POINTS));
  const fit = fitColumns(keptX === x ? whole : scaled(keptX), keptZ);
  if (!keep || keptX.length === x.length) return { ...fit, gaps: gapsIn(x) };
  const rejected: number[] = [];
  for (let n = 0; n < keep.length; n += 1) if (keep[n] === 0) rejected.push(all.order?.[low + n] ?? low + n);
  const over = (n: number) => (z[n] ?? 0) - heightOf(fit, x[n] ?? 0);
  return {
    ...fit,
    rejected: rejected.sort((a, b) => a - b),
    runs: rejectedRuns(x, keep, over),
    gaps: gapsIn(x),
  };
}

function heightOf({ offset, tilt, curvature, centre }: ProfileFit, x: number): number {
  const slope = Math.tan(tilt);
  return offset + (slope + ((curvature * (1 + slope * slope) ** 1.5) / 2) * (x - centre)) * (x - centre);
}

function insideEdges(x: Float64Array, edgeExclusion: number): [number, number] {
  const exclusion = requireWithin("edgeExclusion", edgeExclusion, 0, 1, "m");
  requireEnough("points", x.length);
  const [first, last] = [x[0] ?? 0, x[x.length - 1] ?? 0];
  if (first === last) throw new EngineInputError("points", "all lie at the same position");
  const low = firstFrom(x, first + exclusion);
  let high = firstFrom(x, last - exclusion);
  while (high < x.length && (x[high] ?? 0) <= last - exclusion) high += 1;
  requireEnough("points", high > low ? distinctUpTo(x.subarray(low, high), FEWEST_POINTS) : 0);
  return [low, high];
}

/** Positions from −1 to 1 over a scan, and how they came from those on the wafer, m. */
interface Scaled {
  t: Float64Array;
  centre: number;
  halfWidth: number;
}

function scaled(x: Float64Array): Scaled {
  const [first, last] = [x[0] ?? 0, x[x.length - 1] ?? 0];
  const [centre, halfWidth] = [(first + last) / 2, (last - first) / 2];
  const t = new Float64Array(x.length);
  for (let n = 0; n < x.length; n += 1) t[n] = ((x[n] ?? 0) - centre) / halfWidth;
  return { t, centre, halfWidth };
}

function fitColumns({ t, centre, halfWidth }: Scaled, z: Float64Array): ProfileFit {
  const basis = polynomialBasis(t, SHAPE);
  const residuals = z.slice();
  const shares = takeOut(basis, t, residuals, 0, 2);
  const [c0, c1, c2] = plainParabola(basis, shares);
  const rest = residuals.slice();
  const [cubicHeight = 0, quarticHeight = 0] = takeOut(basis, t, rest, 3, SHAPE);
  const scatter = scatterOf(t, residuals, rest);
  const slope = c1 / halfWidth;
  const perCoefficient = 2 / halfWidth ** 2 / (1 + slope * slope) ** 1.5;
  const steep = Math.abs(slope) + (2 * Math.abs(c2)) / halfWidth > STEEP;
  const curved = steep ? fitCircle(t, z, basis, halfWidth) : { curvature: c2 * perCoefficient, slope, offset: c0 };
  const standardUncertainty =
    (scatter.standardDeviation * scatter.inflation * perCoefficient) / Math.sqrt(basis.squares[2] ?? 1);
  const shape = shapeTest({ cubicHeight, quarticHeight }, rest, basis, scatter, c2);
  const fit: ProfileFit = {
    centre,
    halfWidth,
    offset: curved.offset,
    curvature: curved.curvature,
    standardUncertainty,
    expandedUncertainty: scatter.coverageFactor * standardUncertainty,
    tilt: Math.atan(curved.slope),
    rms: scatter.standardDeviation * Math.sqrt((t.length - 3) / t.length),
    scatter,
    quartic: share(shape.quarticHeight, c2),
    shape,
    steep,
    used: t.length,
    rejected: [],
    runs: [],
    gaps: [],
  };
  if (![fit.offset, fit.curvature, fit.standardUncertainty, fit.tilt, fit.quartic].every(Number.isFinite)) {
    throw new EngineInputError("points", "are too unevenly placed for a curvature");
  }
  return fit;
}

const share = (c4: number, c2: number) => (c4 === 0 ? 0 : c4 / (Math.abs(c4) + Math.abs(c2)));

/** The third and fourth order in what the parabola left, against the scatter; `rest` is what all of them left. */
function shapeTest(
  { cubicHeight, quarticHeight }: Pick<ShapeTest, "cubicHeight" | "quarticHeight">,
  rest: Float64Array,
  basis: PolynomialBasis,
  scatter: Scatter,
  c2: number,
): ShapeTest {
  const free = Math.max(rest.length - 5, 1);
  let squares = 0;
  for (let n = 0; n < rest.length; n += 1) squares += (rest[n] ?? 0) ** 2;
  // The shape itself must not count as scatter here, unless the scatter goes together and was told without it.
  const slow = scatter.inflation > 1;
  const deviation = slow ? scatter.standardDeviation * scatter.inflation : Math.sqrt(squares / free);
  const uncertainty = deviation / Math.sqrt(basis.squares[4] ?? 1);
  const quarticRatio = uncertainty > 0 ? Math.min(Math.abs(quarticHeight) / uncertainty, 1e9) : 0;
  const quarticLimit = studentFactor(slow ? scatter.degreesOfFreedom : free, CHANCE);
  return {
    cubicHeight,
    quarticHeight,
    quarticRatio,
    quarticLimit,
    notSpherical: quarticRatio > quarticLimit && Math.abs(share(quarticHeight, c2)) > NOT_SPHERICAL,
  };
}
