import { pointSag } from "../point-sag.ts";
import { ringProfile } from "../axisymmetric-sag.ts";
import { harmonic, type Harmonic } from "../point-series.ts";
import {
  deflections,
  displacements,
  polar,
  sampled,
  sectorPoints,
  type Deflection,
  type SectorPoint,
} from "./disc-basis.ts";
import { VonKarmanPlate } from "./von-karman.ts";

/** How fine the Ritz solution is. */
export interface RitzFineness {
  degree: number;
  radial: number;
  around: number;
}

/**
 * A plate on `count` points on the circle of radius `at`, kept `count`-fold symmetric. The basis holds the exact solution of
 * small deflections, whose singular bending at the points no polynomial follows, and polynomials made zero at the points.
 */
export function plateOnPoints(count: number, at: number, nu: number, f: RitzFineness): VonKarmanPlate {
  const points = sectorPoints(count, f.radial, f.around);
  const linear = linearDeflection(points, count, at, nu);
  const smooth = deflections(points, count, f.degree).map((d) => zeroAt(d, at));
  return new VonKarmanPlate({
    points,
    deflections: [linear, ...smooth],
    inPlane: displacements(points, count, f.degree),
    nu,
  });
}

function zeroAt(d: Deflection, at: number): Deflection {
  const level = d.at(at, 0);
  return { ...d, value: d.value.map((value) => value - level), at: (r, angle) => d.at(r, angle) - level };
}

function linearDeflection(points: readonly SectorPoint[], count: number, at: number, nu: number): Deflection {
  const sag = pointSag(count, at, nu);
  const orders = Math.floor(1200 / count);
  const harmonics = Array.from({ length: orders }, (_, k) => harmonic(count * (k + 1), at, nu));
  const ring = ringProfile(at, nu);
  return sampled(
    points,
    (r, angle) => {
      const step = 1e-3 * Math.min(r, 1 - r);
      const total = polar(
        [
          ring(r),
          (ring(r + step) - ring(r - step)) / (2 * step),
          (ring(r + step) - 2 * ring(r) + ring(r - step)) / step ** 2,
        ],
        0,
        r,
        angle,
      );
      for (const h of harmonics) {
        const parts = polar(harmonicDerivatives(h, r), h.m, r, angle);
        parts.forEach((value, n) => (total[n] = (total[n] ?? 0) + value));
      }
      total[0] = sag.at(r, angle);
      return total;
    },
    sag.at,
  );
}

/** w_m and its first two derivatives. */
function harmonicDerivatives(h: Harmonic, r: number): [number, number, number] {
  const { at, m, scale } = h;
  const power = (p: number, factor: number): [number, number, number] => [
    factor,
    (factor * p) / r,
    (factor * p * (p - 1)) / (r * r),
  ];
  const ratio = (Math.min(r, at) / Math.max(r, at)) ** m;
  const product = (at * r) ** m;
  const square = (r / at) ** 2;
  const terms =
    r <= at
      ? [power(m, ratio / (m - 1)), power(m + 2, (-ratio * square) / (m + 1))]
      : [power(2 - m, (ratio * square) / (m - 1)), power(-m, -ratio / (m + 1))];
  terms.push(power(m, product * h.constant), power(m + 2, product * h.square * r * r));
  const sum: [number, number, number] = [0, 0, 0];
  for (const [a, b, c] of terms) {
    sum[0] += scale * a;
    sum[1] += scale * b;
    sum[2] += scale * c;
  }
  return sum;
}

/** Fineness of the shipped table; one step finer, degree 21, moves the ratio by 0.004 at most. */
export const POINTS_FINENESS: RitzFineness = { degree: 18, radial: 36, around: 24 };

/**
 * Peak to valley on three points at the rim over that of small deflections, at each load Q = q a⁴/(D h), rising. The shape
 * keeps its threefold symmetry, which is stable against folds with a mirror line up to Q = 450 in polynomials of degree 13.
 */
export function threePointRatios(nu: number, loads: readonly number[], f = POINTS_FINENESS): number[] {
  const plate = plateOnPoints(3, 1, nu, f);
  const rise = (unknowns: readonly number[]) => {
    const heights = Array.from({ length: 41 * 21 }, (_, n) =>
      plate.height(unknowns, (n % 41) / 40, (Math.floor(n / 41) / 20) * (Math.PI / 3)),
    );
    return Math.max(...heights) - Math.min(...heights);
  };
  let unknowns = plate.solve(0.01, plate.start());
  const perLoad = rise(unknowns) / 0.01;
  let reached = 1;
  return loads.map((load) => {
    const steps = Math.max(1, Math.ceil(Math.log(load / reached) / Math.log(1.6)));
    for (let n = 1; n <= steps; n += 1) unknowns = plate.solve(reached * (load / reached) ** (n / steps), unknowns);
    reached = load;
    return rise(unknowns) / (perLoad * load);
  });
}
