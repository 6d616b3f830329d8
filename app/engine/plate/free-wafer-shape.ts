import { EngineInputError } from "../errors.ts";
import { requireCurvature, requireModulus, requireRadius, requireThickness, requireWithin } from "../inputs.ts";
import { requireOrientation, type Orientation } from "../silicon/orientation.ts";
import { arcSagitta } from "../stoney/bow.ts";
import type { ShapeRegime } from "../vocabulary.ts";
import { loadRatio, plateShape, type PlateKind } from "./shape-model.ts";
import type { CurvaturePair } from "./uniform-curvature.ts";

/** A free circular wafer of uniform thickness, or a stack by its effective thickness. */
export interface PlateInput {
  /** m */
  radius: number;
  /** m; for a pair or a thick film the `effectiveThickness` of its laminate. */
  thickness: number;
  /** Pa */
  youngsModulus: number;
  /** 0 to 0.4999 */
  poissonsRatio: number;
  /** '100' takes the anisotropy of silicon into account, the axes being <100>; '111' is isotropic. */
  crystal?: Orientation;
}

export interface FreeWaferShapeInput extends PlateInput {
  /** Curvature by small-deflection theory (a laminate's), 1/m, positive for a bowl; x and y apart when they differ. */
  linearCurvature: number | { x: number; y: number };
}

/** All bows are centre to rim along an axis, m, with the sign of the curvature: outside the engine use `standardBow`. */
export interface FreeWaferShape {
  regime: ShapeRegime;
  /** Along the axis that bends most. */
  bowMajor: number;
  bowMinor: number;
  /** Which axis that is; `any` for equal loads. */
  majorAxis: "x" | "y" | "any";
  /** 1/m */
  centreCurvatureMajor: number;
  centreCurvatureMinor: number;
  /** Least-squares parabola along the diameter over 0.97 R, what a profilometer reports, 1/m. */
  parabolaCurvatureMajor: number;
  parabolaCurvatureMinor: number;
  /** Centre against the plane of three points at the rim, equally spaced: the mean of the two bows. */
  threePointBow: number;
  /** Peak to valley of the shape, m, never negative. */
  warp: number;
  /** Radius of the roll, m, when curled: of the least-squares parabola along the rolled diameter. */
  rollRadius: number | null;
  /** Load over the load at which the wafer starts to roll; from 1 on it is curled. */
  stabilityRatio: number;
  /** Genuinely different stable shapes under the same load. A roll about the other axis of the same size is not one. */
  alternatives: { bowMajor: number; bowMinor: number }[];
}

/** The bow of small-deflection theory counts as right while it is within this share of the nonlinear one. */
const LINEAR_WITHIN = 0.01;

/**
 * Shape that a free wafer takes, gravity left out, under the stress that would give it `linearCurvature` by small-deflection
 * theory.
 *
 * `linear` while the small-deflection bow is within 1 % along both axes (of the larger one), `nonlinear` up to the onset of
 * rolling, `curled` beyond it. Against a full von Karman solution the bow along the axis that bends most is
 * - before the onset within 0.5 %,
 * - past it within 2 % for ν from 0.16 to 0.45, 3.5 % down to ν = 0,
 * - for unequal curvatures of one sign within 3 %, of opposite signs 7 %, 20 % where a saddle has just snapped into a roll,
 * - with `crystal` '100' within 2.5 %, along <100>.
 * The curvatures are within 5 %, but for opposite signs the centre's is not to be relied on. Across a roll the bow is within
 * 0.35 thicknesses; the three-point bow of a roll is up to 5 % and its warp up to 1.5 % low.
 *
 * Bows are those of an arc of the wafer's own length. A roll that closes, more than half a turn from centre to rim, keeps the
 * height of half a turn, twice the roll radius, as bow and warp.
 * A real wafer never starts to roll sharply: an uneven film, a notch or a wedge picks the axis early.
 *
 * Bad input throws `EngineInputError`. Source: Freund 2000; own derivation and computation ('plate-perturbation',
 * 'plate-von-karman').
 */
export function freeWaferShape(i: FreeWaferShapeInput): FreeWaferShape {
  const { radius, thickness, kind } = checkPlate(i);
  const linear = checkCurvature(i.linearCurvature);
  // Dimensionless curvature K = κ R²/(4h): the bow of a parabola is 2 h K.
  const scale = (4 * thickness) / (radius * radius);
  const load = { mean: (linear.x + linear.y) / 2 / scale, halfDifference: (linear.x - linear.y) / 2 / scale };
  const shape = plateShape(load, kind);
  const swapped = Math.abs(alongX(shape.bow)) < Math.abs(alongY(shape.bow));
  const major = swapped ? alongY : alongX;
  const minor = swapped ? alongX : alongY;
  const sagitta = (curvature: number) => arcSagitta(curvature * scale, radius);
  const bowMajor = sagitta(major(shape.bow));
  const bowMinor = sagitta(minor(shape.bow));
  const stabilityRatio = loadRatio(load, kind);
  const regime = regimeOf(load, shape.bow, stabilityRatio);
  const rolled = Math.abs(major(shape.parabola)) * scale;
  return {
    regime,
    bowMajor,
    bowMinor,
    majorAxis: linear.x === linear.y ? "any" : swapped ? "y" : "x",
    centreCurvatureMajor: major(shape.centre) * scale,
    centreCurvatureMinor: minor(shape.centre) * scale,
    parabolaCurvatureMajor: major(shape.parabola) * scale,
    parabolaCurvatureMinor: minor(shape.parabola) * scale,
    threePointBow: (bowMajor + bowMinor) / 2,
    warp: Math.max(bowMajor, bowMinor, 0) - Math.min(bowMajor, bowMinor, 0),
    rollRadius: regime === "curled" && rolled > 0 ? 1 / rolled : null,
    stabilityRatio,
    alternatives: shape.snapped === null ? [] : [otherShape(shape.snapped, sagitta)],
  };
}

/** Checks the plate and names what its shape depends on. */
export function checkPlate(i: PlateInput): {
  radius: number;
  thickness: number;
  biaxialModulus: number;
  kind: PlateKind;
} {
  const radius = requireRadius("radius", i.radius);
  const thickness = requireThickness("thickness", i.thickness);
  if (thickness > radius / 5) {
    throw new EngineInputError("thickness", "is no plate: more than a fifth of the radius", `up to ${radius / 5} m`);
  }
  const youngsModulus = requireModulus("youngsModulus", i.youngsModulus);
  const poissonsRatio = requireWithin("poissonsRatio", i.poissonsRatio, 0, 0.4999, "1");
  const crystal = i.crystal === undefined ? undefined : requireOrientation("crystal", i.crystal);
  return { radius, thickness, biaxialModulus: youngsModulus / (1 - poissonsRatio), kind: { poissonsRatio, crystal } };
}

function checkCurvature(linear: FreeWaferShapeInput["linearCurvature"]): { x: number; y: number } {
  if (typeof linear === "number") {
    const both = requireCurvature("linearCurvature", linear);
    return { x: both, y: both };
  }
  return {
    x: requireCurvature("linearCurvature.x", linear.x),
    y: requireCurvature("linearCurvature.y", linear.y),
  };
}

function regimeOf(load: CurvaturePair, bow: CurvaturePair, stabilityRatio: number): ShapeRegime {
  if (stabilityRatio > 1) return "curled";
  const largest = Math.max(Math.abs(alongX(bow)), Math.abs(alongY(bow)));
  const off = Math.max(Math.abs(alongX(load) - alongX(bow)), Math.abs(alongY(load) - alongY(bow)));
  return off <= LINEAR_WITHIN * largest ? "linear" : "nonlinear";
}

function otherShape(state: CurvaturePair, sagitta: (curvature: number) => number) {
  const [x, y] = [sagitta(alongX(state)), sagitta(alongY(state))];
  return Math.abs(x) >= Math.abs(y) ? { bowMajor: x, bowMinor: y } : { bowMajor: y, bowMinor: x };
}

function alongX({ mean, halfDifference }: CurvaturePair): number {
  return mean + halfDifference;
}

function alongY({ mean, halfDifference }: CurvaturePair): number {
  return mean - halfDifference;
}
