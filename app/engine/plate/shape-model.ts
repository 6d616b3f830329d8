import { siliconStiffness } from "../silicon/elastic-constants.ts";
import { siliconBiaxialModulus } from "../silicon/biaxial-modulus.ts";
import type { Orientation } from "../silicon/orientation.ts";
import { siliconPlateConstants } from "../silicon/plane-constants.ts";
import { shapeFactors } from "./shape-table.ts";
import {
  equalCurvature,
  onsetLoad,
  saddleOnsetLoad,
  snappedState,
  stableState,
  type CurvaturePair,
  type PlateCoefficients,
} from "./uniform-curvature.ts";

/**
 * Shape of a free plate beyond small deflections, without dimensions: curvatures times R²/(4h). Everything that the rest of
 * the engine knows about large deflections is behind this file, so a denser solution can replace it without touching callers.
 *
 * The equations are those of uniform curvature. Their two coefficients are set so that the bow before the onset of rolling
 * follows the exact third-order theory, K [1 + (1 − ν)(17 + 5ν)/12 K²] = S, and so that rolling begins at the true
 * load; past the onset they move to the values of uniform curvature as a full numerical solution says.
 */
export interface PlateKind {
  /** 0 to 0.5 */
  poissonsRatio: number;
  /** Silicon (100) replaces the isotropic coefficients by those of the crystal; (111) is isotropic. */
  crystal?: Orientation;
}

/** What is measured differs because the curvature is not uniform: the centre flattens and the rim bends more. */
export interface PlateShape {
  bow: CurvaturePair;
  centre: CurvaturePair;
  /** Least-squares parabola along a diameter over 0.97 R. */
  parabola: CurvaturePair;
  /** Bow of the other stable shape, when there is one. */
  snapped: CurvaturePair | null;
}

/** Share of the radius over which a parabola is fitted. */
const FITTED = 0.97;

/** Coefficients of uniform curvature. */
export function uniformCoefficients({ poissonsRatio, crystal }: PlateKind): PlateCoefficients {
  if (crystal !== "100") return { alpha: 1 - poissonsRatio, beta: 1 + poissonsRatio };
  // Rolling about <100>, the soft axes: E* is the mean of the membrane compliance over all directions.
  const { c11, c12, c44 } = siliconStiffness();
  const determinant = (c11 - c12) * (c11 + 2 * c12);
  const [s11, s12] = [(c11 + c12) / determinant, -c12 / determinant];
  const membrane = 4 / (3 * s11 + s12 + 1 / (2 * c44));
  return { alpha: membrane / siliconBiaxialModulus("100"), beta: membrane / (c11 - c12) };
}

/** Poisson's ratio that the isotropic corrections use. */
function effectivePoisson({ poissonsRatio, crystal }: PlateKind): number {
  return crystal === "100" ? siliconPlateConstants("100").poissonsRatio : poissonsRatio;
}

/**
 * True load at the onset of rolling over that of uniform curvature. A parabola through the computed values 0.987, 1.030, 1.039,
 * 1.041 and 1.051 at ν = 0, 0.22, 0.28, 0.30 and 0.40, within 0.0005 of each; silicon (100) computed by itself.
 */
export function trueOnsetFactor({ poissonsRatio, crystal }: PlateKind): number {
  if (crystal === "100") return 1.0326;
  return 0.9871 + 0.2389 * poissonsRatio - 0.196 * poissonsRatio * poissonsRatio;
}

/** Equal small-deflection curvature at which rolling begins, times R²/(4h). */
export function criticalLoad(kind: PlateKind): number {
  return onsetLoad(uniformCoefficients(kind)) * trueOnsetFactor(kind);
}

/** Coefficients of the bow up to the onset. */
function onsetCoefficients(kind: PlateKind): PlateCoefficients {
  const alpha = (uniformCoefficients(kind).alpha * (17 + 5 * effectivePoisson(kind))) / 12;
  const curvature = equalCurvature(criticalLoad(kind), alpha);
  return { alpha, beta: 1 / (curvature * curvature) };
}

/**
 * Load over the load at which the shape becomes unstable, whichever part of it is nearer: the mean part against rolling, the
 * part of opposite sign against snapping out of a saddle. Unequal moments go over into a roll gradually; 1 marks where equal
 * ones would start. The saddle's limit is up to 10 % low.
 */
export function loadRatio(load: CurvaturePair, kind: PlateKind): number {
  return Math.max(
    Math.abs(load.mean) / criticalLoad(kind),
    Math.abs(load.halfDifference) / saddleOnsetLoad(onsetCoefficients(kind)),
  );
}

/** The shape under a load given as the two curvatures of small deflections. */
export function plateShape(load: CurvaturePair, kind: PlateKind): PlateShape {
  const factors = shapeFactors(loadRatio(load, kind));
  const onset = onsetCoefficients(kind);
  const uniform = uniformCoefficients(kind);
  const coefficients = {
    alpha: onset.alpha + (uniform.alpha - onset.alpha) * factors.uniformity,
    beta: onset.beta + (uniform.beta - onset.beta) * factors.uniformity,
  };
  const bow = stableState(load, coefficients);
  const first = firstOrder(effectivePoisson(kind));
  return {
    bow,
    centre: departed(bow, first.centreMean * factors.centreMean, first.centreDifference * factors.centreDifference),
    parabola: departed(
      bow,
      first.parabolaMean * factors.parabolaMean,
      first.parabolaDifference * factors.parabolaDifference,
    ),
    snapped: snappedState(load, coefficients),
  };
}

/** First correction of von Karman's theory: how centre and fitted parabola depart from the bow, per product of curvatures. */
function firstOrder(nu: number) {
  const free = 1 - nu * nu;
  const square = FITTED ** 2;
  const rim = (14 + 2 * nu) / (3 + nu);
  return {
    centreMean: (7 / 12) * free,
    centreDifference: (free / 8) * (rim - 1),
    parabolaMean: (free / 2) * (7 / 6 - (9 / 7) * square + (5 / 21) * square ** 2),
    parabolaDifference: (free / 8) * ((5 / 7) * square ** 2 - 1 + rim * (1 - (6 / 7) * square)),
  };
}

function departed(bow: CurvaturePair, mean: number, difference: number): CurvaturePair {
  const product = bow.mean * bow.mean - bow.halfDifference * bow.halfDifference;
  return {
    mean: bow.mean / (1 + mean * product),
    halfDifference: bow.halfDifference * (1 + difference * product),
  };
}
