import { EngineInputError } from "../errors.ts";
import { siliconDirectionalConstants } from "../silicon/plane-constants.ts";

/**
 * Three components in the plane of the wafer. For stress and strain `xy` is the shear: τ_xy, and the engineering shear
 * strain γ_xy = u_y + v_x.
 */
export interface PlaneTensor {
  x: number;
  y: number;
  xy: number;
}

/**
 * Symmetric 3×3 stiffness between strain and stress in the plane, faces free (plane stress), Pa; or, summed over a thickness,
 * N/m, N or N·m. Rows and columns x, y and shear, with engineering shear strain.
 */
export interface PlaneStiffness {
  xx: number;
  xy: number;
  yy: number;
  /** Row x, column shear. */
  xs: number;
  ys: number;
  ss: number;
}

/** Crystal direction of the (001) face of silicon that lies along the axis. */
export type SiliconDirection = "100" | "110";

/** Stiffness of an isotropic layer, Pa, from Young's modulus (Pa) and Poisson's ratio, both already checked. */
export function isotropicStiffness(youngsModulus: number, poissonsRatio: number): PlaneStiffness {
  const xx = youngsModulus / (1 - poissonsRatio * poissonsRatio);
  return { xx, xy: poissonsRatio * xx, yy: xx, xs: 0, ys: 0, ss: youngsModulus / (2 * (1 + poissonsRatio)) };
}

/**
 * Stiffness of silicon (001), Pa, in axes along `direction` and across it, at 25 °C: 141.0, 39.3 and 79.5 GPa along <100>,
 * 169.6, 10.6 and 50.8 GPa along <110>. The elastic constants fall by about 0.9 % per 100 K, left out here as in
 * `solveLaminate`.
 */
export function siliconPlaneStiffness(direction: SiliconDirection): PlaneStiffness {
  if (direction !== "100" && direction !== "110") {
    throw new EngineInputError("direction", `'${String(direction)}' is not a direction known here`, "100 or 110");
  }
  const along = siliconDirectionalConstants(direction);
  const diagonal = siliconDirectionalConstants(direction === "100" ? "110" : "100");
  const xx = along.youngsModulus / (1 - along.poissonsRatio * along.poissonsRatio);
  // Shear in these axes is stretching along the diagonals.
  const ss = diagonal.youngsModulus / (2 * (1 + diagonal.poissonsRatio));
  return { xx, xy: along.poissonsRatio * xx, yy: xx, xs: 0, ys: 0, ss };
}

/** Cosine and sine of an angle (rad), exact for multiples of a right angle. */
export function directionCosines(angle: number): { c: number; s: number } {
  const [c, s] = [Math.cos(angle), Math.sin(angle)];
  // Zero in exact arithmetic: what is left is the rounding of π.
  if (Math.abs(c) < 1e-14) return { c: 0, s: Math.sign(s) };
  if (Math.abs(s) < 1e-14) return { c: Math.sign(c), s: 0 };
  return { c, s };
}

/** Stiffness in the axes x, y of a material whose own axes are turned by `angle` (rad, counter-clockwise seen from above). */
export function turnStiffness(q: PlaneStiffness, angle: number): PlaneStiffness {
  const { c, s } = directionCosines(angle);
  // Strain along the material's axes is t times that along x, y; the stiffness is t transposed times q times t.
  const t = [
    [c * c, s * s, c * s],
    [s * s, c * c, -c * s],
    [-2 * c * s, 2 * c * s, c * c - s * s],
  ] as const;
  const rows = [
    [q.xx, q.xy, q.xs],
    [q.xy, q.yy, q.ys],
    [q.xs, q.ys, q.ss],
  ] as const;
  const product = (i: 0 | 1 | 2, j: 0 | 1 | 2) =>
    rows.reduce(
      (total, row, m) => total + row.reduce((sum, value, n) => sum + (t[m]?.[i] ?? 0) * value * (t[n]?.[j] ?? 0), 0),
      0,
    );
  return {
    xx: product(0, 0),
    xy: product(0, 1),
    yy: product(1, 1),
    xs: product(0, 2),
    ys: product(1, 2),
    ss: product(2, 2),
  };
}

export function scaleStiffness(q: PlaneStiffness, by: number): PlaneStiffness {
  return { xx: q.xx * by, xy: q.xy * by, yy: q.yy * by, xs: q.xs * by, ys: q.ys * by, ss: q.ss * by };
}

export function addStiffness(p: PlaneStiffness, q: PlaneStiffness): PlaneStiffness {
  return { xx: p.xx + q.xx, xy: p.xy + q.xy, yy: p.yy + q.yy, xs: p.xs + q.xs, ys: p.ys + q.ys, ss: p.ss + q.ss };
}

/** Stiffness times strain. */
export function applyStiffness(q: PlaneStiffness, e: PlaneTensor): PlaneTensor {
  return {
    x: q.xx * e.x + q.xy * e.y + q.xs * e.xy,
    y: q.xy * e.x + q.yy * e.y + q.ys * e.xy,
    xy: q.xs * e.x + q.ys * e.y + q.ss * e.xy,
  };
}

export function addTensor(a: PlaneTensor, b: PlaneTensor, times = 1): PlaneTensor {
  return { x: a.x + times * b.x, y: a.y + times * b.y, xy: a.xy + times * b.xy };
}

/**
 * Isotropic Young's modulus and Poisson's ratio of a stiffness averaged over all directions of the plane. It keeps the mean
 * biaxial modulus (xx + 2 xy + yy)/2 exactly.
 */
export function directionalAverage(q: PlaneStiffness): { youngsModulus: number; poissonsRatio: number } {
  const along = (3 * q.xx + 2 * q.xy + 3 * q.yy + 4 * q.ss) / 8;
  const across = (q.xx + 6 * q.xy + q.yy - 4 * q.ss) / 8;
  const poissonsRatio = across / along;
  return { youngsModulus: along * (1 - poissonsRatio * poissonsRatio), poissonsRatio };
}
