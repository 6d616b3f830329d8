import type { Plate } from "./plate.ts";
import type { CurvaturePair } from "./stable-state.ts";
import { locate, type TablePlace } from "./table/coordinates.ts";
import { at } from "./table/elements.ts";
import { evaluateAll } from "./table/plane-sum.ts";

/**
 * What is measured on a shape, as curvatures times R²/(4h); a height of K is 2 K thicknesses. They differ because the curvature
 * is not uniform: the centre flattens and the rim bends more.
 */
export interface Readings {
  /** Height of the rim over the centre. */
  bow: CurvaturePair;
  centre: CurvaturePair;
  /** Least-squares parabola along a diameter over 0.97 R. */
  parabola: CurvaturePair;
  /** Height of the rim over the centre, averaged around the rim: what three points at the rim read. */
  rim: number;
}

/** Share of the radius over which a parabola is fitted. */
export const FITTED = 0.97;

const place: TablePlace = { s: 1, x: 1, y: 0, yq: 0, ys: 0, yss: 0, ysq: 0 };
const factors = new Float64Array(7);

/** Readings of a shape given by its mean curvatures over the area, both parts zero or more. */
export function readingsOf(plate: Plate, { mean, halfDifference }: CurvaturePair): Readings {
  const squares = mean * mean + halfDifference * halfDifference;
  const product = (mean - halfDifference) * (mean + halfDifference);
  locate(squares, squares > 0 ? product / squares : 0, plate.energy.rate, place);
  evaluateAll(plate.measures, place.x, place.y, factors);
  const share = product / (1 + squares / 3);
  const pair = (n: number): CurvaturePair => ({
    mean: mean * (1 + share * at(factors, n)),
    halfDifference: halfDifference * (1 + share * at(factors, n + 1)),
  });
  return { bow: pair(0), centre: pair(2), parabola: pair(4), rim: mean * (1 + share * at(factors, 6)) };
}

/**
 * How far the lowest point of a roll lies below its centre, as a height over 2 h. It lies on the axis across the roll, at the
 * rim or inside it where the bent rim begins; the profile there is the polynomial of sixth degree that has the centre's
 * curvature, the fitted parabola's and the rim's height. Own computation: within 0.2 % of the warp.
 */
export function dipAcross(bow: number, centre: number, parabola: number): number {
  const square = FITTED * FITTED;
  const [fourth, sixth] = [(6 / 7) * square, (5 / 7) * square * square];
  const c6 = (parabola - centre - (bow - centre) * fourth) / (sixth - fourth);
  const c4 = bow - centre - c6;
  let lowest = Math.min(0, bow);
  // Heights t (centre + c4 t + c6 t²) at t = (y/R)²: stationary where centre + 2 c4 t + 3 c6 t² = 0.
  const root = c4 * c4 - 3 * c6 * centre;
  if (root > 0) {
    const shift = Math.sqrt(root);
    for (const sign of [-1, 1]) {
      const t = -centre / (c4 + sign * shift);
      if (t > 0 && t < 1) lowest = Math.min(lowest, t * (centre + t * (c4 + t * c6)));
    }
  }
  return -lowest;
}

/**
 * Height over 2 h of the highest point of the rim, with its height taken as three waves, rim + c_2 cos 2θ + c_4 cos 4θ: on the
 * axis that bends most, or beside it on a crystal that would rather bend elsewhere.
 */
export function rimTop({ bow, rim }: Readings): number {
  const onAxis = bow.mean + bow.halfDifference;
  const fourfold = bow.mean - rim;
  if (fourfold >= 0 || bow.halfDifference >= -4 * fourfold) return onAxis;
  return rim - fourfold - (bow.halfDifference * bow.halfDifference) / (8 * fourfold);
}
