import type { PlateEnergy, StretchEnergy } from "./plate-energy.ts";
import { stretchEnergy } from "./plate-energy.ts";
import { isotropicRatios, membraneStiffness, SILICON_RANGE, siliconRatios, type ShearRatios } from "./shear-ratios.ts";
import { atThird } from "./table/chebyshev.ts";
import { borderRate } from "./table/coordinates.ts";
import { at } from "./table/elements.ts";
import { ISOTROPIC } from "./table/isotropic.ts";
import { sideBySide, type PlaneSums } from "./table/plane-sum.ts";
import type { ShapeTable } from "./table/shape-table.ts";
import { SILICON_100 } from "./table/silicon-100.ts";

/** A plate of one material, rolled about one direction of it, as the tables know it. */
export interface Plate {
  energy: PlateEnergy;
  /** In the order of `ShapeTable`. */
  measures: PlaneSums;
  /** Equal small-deflection curvature, times R²/(4h), at which a bowl goes over into a roll. */
  criticalLoad: number;
  /** Equal and opposite small-deflection curvature, times R²/(4h), at which a saddle snaps into a roll. */
  saddleLoad: number;
}

/** A plate from a table at one place of its third coordinate. */
export function plateFrom(table: ShapeTable, z: number, ratios: ShearRatios, poissonsRatio: number): Plate {
  const { energy, measures } = table;
  const plate: PlateEnergy = {
    tau: ratios.along,
    lambda: membraneStiffness(ratios),
    rate: borderRate(poissonsRatio),
    sum: atThird(energy.extent, energy.values, energy.quantum, z),
  };
  return {
    energy: plate,
    measures: sideBySide(measures.values.map((values) => atThird(measures.extent, values, measures.quantum, z))),
    criticalLoad: criticalLoad(plate),
    saddleLoad: saddleLoad(plate),
  };
}

let latest: { poissonsRatio: number; plate: Plate } | null = null;

/** Isotropic plate; the one asked for last is kept, because callers ask for the same many times over. */
export function isotropicPlate(poissonsRatio: number): Plate {
  if (latest?.poissonsRatio !== poissonsRatio) {
    const plate = plateFrom(ISOTROPIC, 4 * poissonsRatio - 1, isotropicRatios(poissonsRatio), poissonsRatio);
    latest = { poissonsRatio, plate };
  }
  return latest.plate;
}

let silicon: { soft: Plate; hard: Plate } | null = null;

/** Silicon (001) rolled about its soft axes, <100>, and about its hard ones, <110>. */
export function siliconPlates(): { soft: Plate; hard: Plate } {
  if (silicon === null) {
    const { along, between } = siliconRatios();
    silicon = {
      soft: plateFrom(SILICON_100.soft, 0, { along, between }, SILICON_RANGE),
      hard: plateFrom(SILICON_100.hard, 0, { along: between, between: along }, SILICON_RANGE),
    };
  }
  return silicon;
}

/**
 * Silicon (001) rolled about an axis between the two: `share` of the hard one, sin² of twice the angle from <100>. The energy
 * of a cubic plate depends on the direction through cos of four times the angle, which makes the blend linear.
 */
export function blendedPlate(share: number): Plate {
  const { soft, hard } = siliconPlates();
  return {
    energy: blendedEnergy(share),
    measures: {
      ...soft.measures,
      coefficients: blended(soft.measures.coefficients, hard.measures.coefficients, share),
    },
    criticalLoad: soft.criticalLoad,
    saddleLoad: (1 - share) * soft.saddleLoad + share * hard.saddleLoad,
  };
}

/** The energy of that plate alone. */
export function blendedEnergy(share: number): PlateEnergy {
  const [soft, hard] = [siliconPlates().soft.energy, siliconPlates().hard.energy];
  const coefficients = blended(soft.sum.coefficients, hard.sum.coefficients, share);
  return { ...soft, tau: (1 - share) * soft.tau + share * hard.tau, sum: { starts: soft.sum.starts, coefficients } };
}

function blended(soft: Float64Array, hard: Float64Array, share: number): Float64Array {
  const coefficients = new Float64Array(soft.length);
  for (let n = 0; n < soft.length; n += 1) coefficients[n] = (1 - share) * at(soft, n) + share * at(hard, n);
  return coefficients;
}

const stretch: StretchEnergy = { value: 0, x: 0, y: 0, xx: 0, xy: 0, yy: 0 };

/** Where a bowl no longer resists a difference of its curvatures: τ + e_Y = 0 at B = 0. */
function criticalLoad(plate: PlateEnergy): number {
  // Uniform curvature would have A² = τ/λ.
  const square = fallingRoot((0.85 * plate.tau) / plate.lambda, (X) => {
    stretchEnergy(plate, X, 0, stretch);
    return [plate.tau + stretch.y, stretch.xy];
  });
  stretchEnergy(plate, square, 0, stretch);
  return Math.sqrt(square) * (1 + stretch.x);
}

/** Where a saddle no longer resists a mean curvature: 1 + e_X = 0 at A = 0. */
function saddleLoad(plate: PlateEnergy): number {
  // Uniform curvature would have B² = 1/λ.
  const square = fallingRoot(1.2 / plate.lambda, (Y) => {
    stretchEnergy(plate, 0, Y, stretch);
    return [1 + stretch.x, stretch.xy];
  });
  stretchEnergy(plate, 0, square, stretch);
  return Math.sqrt(square) * (1 + stretch.y / plate.tau);
}

/** Root of a function that falls where it matters, from its value and slope, by Newton's method. */
function fallingRoot(start: number, f: (x: number) => readonly [value: number, slope: number]): number {
  let x = start;
  for (let step = 0; step < 40; step += 1) {
    const [value, slope] = f(x);
    const next = Math.min(2 * x, Math.max(x / 2, x - value / slope));
    if (Math.abs(next - x) <= 1e-14 * x) return next;
    x = next;
  }
  return x;
}
