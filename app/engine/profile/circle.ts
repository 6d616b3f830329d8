import { EngineInputError } from "../errors.ts";
import { plainParabola, takeOut, type PolynomialBasis } from "./orthogonal-polynomials.ts";

export interface CurveFit {
  /** 1/m */
  curvature: number;
  /** at the middle */
  slope: number;
  /** height at the middle, m */
  offset: number;
}

/**
 * Circle through the scan: the sine of its slope grows by the curvature times the distance. The part of the circle that a
 * parabola misses is taken from the heights and the parabola fitted again, until the two agree.
 */
export function fitCircle(t: Float64Array, z: Float64Array, basis: PolynomialBasis, halfWidth: number): CurveFit {
  let [curvature, slope] = [0, 0];
  const rest = new Float64Array(z.length);
  for (let round = 0; round < 100; round += 1) {
    for (let n = 0; n < z.length; n += 1)
      rest[n] = (z[n] ?? 0) - beyondParabola((t[n] ?? 0) * halfWidth, curvature, slope);
    const [offset, c1, c2] = plainParabola(basis, takeOut(basis, t, rest, 0, 2));
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
