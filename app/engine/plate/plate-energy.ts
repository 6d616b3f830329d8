import { locate, type TablePlace } from "./table/coordinates.ts";
import type { PlaneSum } from "./table/chebyshev.ts";
import { evaluateJet, type Jet } from "./table/plane-sum.ts";

/**
 * Internal energy of a free plate as a function of the area means of its curvatures, the least over all shapes that have them.
 *
 * With A the mean and B half the difference of the two mean curvatures, both times R²/(4h), and P = A² − B² (their product),
 * the energy in units of 16π (M h³/12) (h/R)² is
 *
 *   u = A² + τ B² + e,   e = (λ/2) P² m(A², B²),
 *
 * τ = (1 − ν)/(1 + ν) the resistance to a difference of curvatures and λ = 1 − ν that of the membrane. m is 1 for a flat wafer
 * and falls, as R^(−3/4) in a long roll (R = A² + B²), because a plate bends more at the rim and less in the middle than uniform
 * curvature would have it. The table holds m/s³ with s of `coordinates.ts`. A cylinder (P = 0) is free of stretching, so there u is exact.
 */
export interface PlateEnergy {
  tau: number;
  lambda: number;
  rate: number;
  sum: PlaneSum;
}

/** e and its derivatives by X = A² and Y = B². */
export interface StretchEnergy {
  value: number;
  x: number;
  y: number;
  xx: number;
  xy: number;
  yy: number;
}

/** Squares of curvatures below which a plate counts as flat: the inverse of their own square still fits a number. */
const FLAT = 1e-120;

const place: TablePlace = { s: 1, x: 1, y: 0, yq: 0, ys: 0, yss: 0, ysq: 0 };
const jet: Jet = { value: 0, x: 0, y: 0, xx: 0, xy: 0, yy: 0 };

/** m at a shape: 1 for curvatures that could stay uniform. */
export function softening(plate: PlateEnergy, shape: { mean: number; halfDifference: number }): number {
  const squares = shape.mean * shape.mean + shape.halfDifference * shape.halfDifference;
  const product = (shape.mean - shape.halfDifference) * (shape.mean + shape.halfDifference);
  locate(squares, squares > 0 ? product / squares : 0, plate.rate, place);
  evaluateJet(plate.sum, place.x, place.y, jet);
  return place.s ** 3 * jet.value;
}

/** Fills `result` at a shape with the squares `X` and `Y`. */
export function stretchEnergy({ lambda, rate, sum }: PlateEnergy, X: number, Y: number, result: StretchEnergy): void {
  const squares = X + Y;
  const product = X - Y;
  const inverse = squares > FLAT ? 1 / squares : 0;
  const q = product * inverse;
  locate(squares, q, rate, place);
  evaluateJet(sum, place.x, place.y, jet);
  const { s, yq, ys, yss, ysq } = place;
  const s2 = s * s;
  const s3 = s2 * s;
  // m = s³ F(x, y) with x = 2 s − 1, y = y(s, q).
  const along = 2 * jet.x + jet.y * ys;
  const m = s3 * jet.value;
  const mS = 3 * s2 * jet.value + s3 * along;
  const mQ = s3 * jet.y * yq;
  const alongS = 4 * jet.xx + 4 * jet.xy * ys + jet.yy * ys * ys + jet.y * yss;
  const mSS = 6 * s * jet.value + 6 * s2 * along + s3 * alongS;
  const mSQ = 3 * s2 * jet.y * yq + s3 * (2 * jet.xy * yq + jet.yy * ys * yq + jet.y * ysq);
  const mQQ = s3 * jet.yy * yq * yq;
  // By R at one P, and by P at one R: q = P/R, ds/dR = −s⁵/12.
  const sR = (-s2 * s3) / 12;
  const sRR = (5 / 144) * s3 * s3 * s3;
  const qR = -q * inverse;
  const mR = mS * sR + mQ * qR;
  const mP = mQ * inverse;
  const mRR = mSS * sR * sR + mS * sRR + 2 * mSQ * sR * qR + mQQ * qR * qR + 2 * mQ * q * inverse * inverse;
  const mRP = (mSQ * sR + mQQ * qR - mQ * inverse) * inverse;
  const mPP = mQQ * inverse * inverse;
  const half = lambda / 2;
  const eR = half * product * product * mR;
  const eP = half * (2 * product * m + product * product * mP);
  const eRR = half * product * product * mRR;
  const eRP = half * (2 * product * mR + product * product * mRP);
  const ePP = half * (2 * m + 4 * product * mP + product * product * mPP);
  result.value = half * product * product * m;
  result.x = eR + eP;
  result.y = eR - eP;
  result.xx = eRR + 2 * eRP + ePP;
  result.xy = eRR - ePP;
  result.yy = eRR - 2 * eRP + ePP;
}
