import { gaussLegendre } from "./gauss-legendre.ts";

/**
 * Functions on the disc of radius 1 that have an n-fold axis and a mirror line through θ = 0, sampled on one sector with their
 * derivatives: what a Ritz solution of the large deflection of a plate needs.
 */
export interface SectorPoint {
  r: number;
  angle: number;
  /** Share of the disc's area π. */
  weight: number;
}

/** Deflection sampled at the points of a sector: slopes and curvatures in polar directions. */
export interface Deflection {
  value: Float64Array;
  /** w_r and w_θ/r */
  slopeR: Float64Array;
  slopeT: Float64Array;
  /** w_rr, w_r/r + w_θθ/r² and (w_θ/r)_r */
  bendR: Float64Array;
  bendT: Float64Array;
  twist: Float64Array;
  /** Height at any place. */
  at: (r: number, angle: number) => number;
}

/** Displacement in the plane sampled likewise: ε_r, ε_θ, γ. */
export interface InPlane {
  stretchR: Float64Array;
  stretchT: Float64Array;
  shear: Float64Array;
}

/** Points of the sector 0 to π/fold: Gauss along the radius, even steps around. */
export function sectorPoints(fold: number, radial: number, around: number): SectorPoint[] {
  return gaussLegendre(radial).flatMap(({ node, weight }) =>
    Array.from({ length: around }, (_, n) => ({
      r: node,
      angle: ((n + 0.5) * Math.PI) / (fold * around),
      weight: (2 * node * weight) / around,
    })),
  );
}

/** r^power P_j(2r² − 1) with first and second derivative. */
function radial(r: number, power: number, j: number): [number, number, number] {
  const x = 2 * r * r - 1;
  let [p, dp, ddp] = [1, 0, 0];
  let [q, dq, ddq] = [0, 0, 0];
  for (let k = 1; k <= j; k += 1) {
    const a = (2 * k - 1) / k;
    const b = (k - 1) / k;
    const next = [a * x * p - b * q, a * (p + x * dp) - b * dq, a * (2 * dp + x * ddp) - b * ddq] as const;
    [q, dq, ddq] = [p, dp, ddp];
    [p, dp, ddp] = next;
  }
  const [slope, bend] = [4 * r * dp, 16 * r * r * ddp + 4 * dp];
  const s = power;
  const [r0, r1, r2] = [r ** s, s === 0 ? 0 : s * r ** (s - 1), s < 2 ? 0 : s * (s - 1) * r ** (s - 2)];
  return [r0 * p, r1 * p + r0 * slope, r2 * p + 2 * r1 * slope + r0 * bend];
}

/** Deflections r^m P_j cos mθ of degree m + 2j up to `degree`, m a multiple of `fold`, the constant left out. */
export function deflections(points: readonly SectorPoint[], fold: number, degree: number): Deflection[] {
  const found: Deflection[] = [];
  for (let m = 0; m <= degree; m += fold) {
    for (let j = m === 0 ? 1 : 0; m + 2 * j <= degree; j += 1) {
      found.push(
        sampled(
          points,
          (r, angle) => polar(radial(r, m, j), m, r, angle),
          (r, angle) => radial(r, m, j)[0] * Math.cos(m * angle),
        ),
      );
    }
  }
  return found;
}

type PolarParts = [number, number, number, number, number, number];

/** Value, slopes and curvatures of f(r) cos mθ from f and its derivatives. */
export function polar(
  [f, df, ddf]: readonly [number, number, number],
  m: number,
  r: number,
  angle: number,
): PolarParts {
  const [c, s] = [Math.cos(m * angle), Math.sin(m * angle)];
  return [
    f * c,
    df * c,
    (-m * f * s) / r,
    ddf * c,
    (df / r - (m * m * f) / (r * r)) * c,
    -m * (df / r - f / (r * r)) * s,
  ];
}

export function sampled(
  points: readonly SectorPoint[],
  parts: (r: number, angle: number) => readonly number[],
  at: Deflection["at"],
): Deflection {
  const [value, slopeR, slopeT, bendR, bendT, twist] = Array.from({ length: 6 }, () => new Float64Array(points.length));
  if (!value || !slopeR || !slopeT || !bendR || !bendT || !twist) throw new Error("unreachable");
  points.forEach(({ r, angle }, n) => {
    [value[n], slopeR[n], slopeT[n], bendR[n], bendT[n], twist[n]] = parts(r, angle) as PolarParts;
  });
  return { value, slopeR, slopeT, bendR, bendT, twist, at };
}

/**
 * Displacements (u_r, u_θ) = r^p P_j (cos μθ, sin μθ), μ a multiple of `fold` of either sign and p = |μ + 1|: the fields that
 * are smooth at the centre. Degree p + 2j up to `degree`.
 */
export function displacements(points: readonly SectorPoint[], fold: number, degree: number): InPlane[] {
  const found: InPlane[] = [];
  const most = Math.ceil((degree + 1) / fold) * fold;
  for (let mu = -most; mu <= most; mu += fold) {
    const power = Math.abs(mu + 1);
    for (let j = 0; power + 2 * j <= degree; j += 1) {
      const field: InPlane = {
        stretchR: new Float64Array(points.length),
        stretchT: new Float64Array(points.length),
        shear: new Float64Array(points.length),
      };
      points.forEach(({ r, angle }, n) => {
        const [f, df] = radial(r, power, j);
        const [c, s] = [Math.cos(mu * angle), Math.sin(mu * angle)];
        field.stretchR[n] = df * c;
        field.stretchT[n] = ((f + mu * f) / r) * c;
        field.shear[n] = (df - f / r - (mu * f) / r) * s;
      });
      found.push(field);
    }
  }
  return found;
}
