import { EngineInputError } from "../errors.ts";
import { requireCurvature, requireModulus, requireRadius, requireThickness, requireWithin } from "../inputs.ts";
import { requireOrientation, type Orientation } from "../silicon/orientation.ts";
import { arcSagitta } from "../stoney/bow.ts";
import type { ShapeRegime } from "../vocabulary.ts";
import { plateShape, reachedShape, type PlateKind, type PlateShape, type ReachedShape } from "./shape-model.ts";
import type { CurvaturePair } from "./stable-state.ts";

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
  /** '100' takes the anisotropy of silicon into account, whatever ν is; '111' is isotropic. */
  crystal?: Orientation;
  /** With `crystal` '100' the direction of the x axis on the wafer's face, <100> unless said otherwise. */
  axes?: "100" | "110";
}

export interface FreeWaferShapeInput extends PlateInput {
  /** Curvature by small-deflection theory (a laminate's), 1/m, positive for a bowl; x and y apart when they differ. */
  linearCurvature: number | { x: number; y: number };
}

/** All bows are centre to rim along an axis, m, with the sign of the curvature: outside the engine use `standardBow`. */
export interface ReachedWaferShape {
  regime: ShapeRegime;
  /** Along the axis that bends most. */
  bowMajor: number;
  bowMinor: number;
  /** Which axis that is or is nearest to; `any` for equal loads. */
  majorAxis: "x" | "y" | "any";
  /**
   * Angle from the x axis to it, rad, above −π/2 and up to π/2. Other than 0 and π/2 only on silicon (100) with its x axis along
   * <110>, where a roll may lie between the two: its mirror image about the x axis is then just as good.
   */
  majorAngle: number;
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
}

export interface FreeWaferShape extends ReachedWaferShape {
  /** Genuinely different stable shapes under the same load. A roll about the other axis of the same size is not one. */
  alternatives: { bowMajor: number; bowMinor: number }[];
}

/** The bow of small-deflection theory counts as right while it is within this share of the nonlinear one. */
const LINEAR_WITHIN = 0.01;

/**
 * How a free wafer bends: by its load over the one at which it rolls, its largest bow, and how far the bow of small-deflection
 * theory lies off, in the same unit.
 */
export function shapeRegime(stabilityRatio: number, bow: number, off: number): ShapeRegime {
  if (stabilityRatio > 1) return "curled";
  return off <= LINEAR_WITHIN * bow ? "linear" : "nonlinear";
}

/**
 * Shape that a free wafer takes, gravity left out, under the stress that would give it `linearCurvature` by small-deflection
 * theory.
 *
 * `linear` while the small-deflection bow is within 1 % along both axes (of the larger one), `nonlinear` up to the onset of
 * rolling, `curled` beyond it. The shape is the one that the load leads to as it grows; `alternatives` are those that another
 * load could have led to and that stay under this one: a saddle's load past its snap has the roll about the other axis, bent the
 * other way, until the load's own mean pushes it over; silicon (100) can hold a roll about its other <100> axis.
 *
 * From von Karman's plate solved in full and tabulated. Errors against several hundred solutions with a finer basis at random
 * loads (`table/errors.ts`), up to 20 times the critical load and 20 times beyond that, ν from 0 to 0.45 and silicon (100):
 * - bow along the axis that bends most 0.1 %, 0.2 % on silicon (100) under unequal loads along <110>, where the angle of a roll
 *   between the axes is within 0.02 rad; of a second shape 0.15 %; critical load 0.05 %, that of a saddle's snap 0.3 %,
 * - bow across it 0.5 % of its own value or of a tenth of the one along it, whichever is more,
 * - centre curvature 0.3 % along and, as across is measured, 1.3 % across; parabola 0.15 % and 0.5 %,
 * - three-point bow 0.1 % of the bow along the axis, averaged over where the points lie; where they do adds up to 0.25 % for a roll,
 * - warp of the whole surface 0.2 %.
 * Beyond 400 times the critical load the tables go over into the exact limit of a long roll, and the error shrinks. A Poisson's
 * ratio from 0.45 to 0.4999 is covered but was not measured.
 *
 * Bows are those of an arc of the wafer's own length. A roll that closes, more than half a turn from centre to rim, keeps the
 * height of half a turn, twice the roll radius, as bow and warp. The film is uniform: a real wafer never starts to roll sharply,
 * an uneven film, a notch or a wedge picks the axis early.
 *
 * Bad input throws `EngineInputError`. Source: own computation ('plate-von-karman', 'plate-endless-roll'); the uniform curvature
 * of Freund 2000 is its approximation.
 */
export function freeWaferShape(i: FreeWaferShapeInput): FreeWaferShape {
  const wafer = dimensionless(i);
  const shape = plateShape(wafer.load, wafer.kind);
  const sagitta = (curvature: number) => arcSagitta(curvature * wafer.scale, wafer.radius);
  return { ...waferShape(wafer, shape), alternatives: shape.others.map((other) => bowsOf(other, sagitta)) };
}

/** The shape that the load leads to, as by `freeWaferShape`, without looking for others. */
export function reachedWaferShape(i: FreeWaferShapeInput): ReachedWaferShape {
  const wafer = dimensionless(i);
  return waferShape(wafer, reachedShape(wafer.load, wafer.kind));
}

function waferShape(
  { radius, thickness, scale, linear, load }: ReturnType<typeof dimensionless>,
  shape: ReachedShape,
): ReachedWaferShape {
  const swapped = Math.abs(alongX(shape.bow)) < Math.abs(alongY(shape.bow));
  const major = swapped ? alongY : alongX;
  const minor = swapped ? alongX : alongY;
  const sagitta = (curvature: number) => arcSagitta(curvature * scale, radius);
  const bowMajor = sagitta(major(shape.bow));
  const bowMinor = sagitta(minor(shape.bow));
  // An arc is lower than the parabola of its curvature; what lies beside the arc shrinks with it.
  const flat = 2 * thickness * Math.abs(major(shape.bow));
  const bent = flat > 0 ? (2 * thickness * Math.abs(bowMajor)) / flat : 2 * thickness;
  const angle = shape.turn + (swapped ? Math.PI / 2 : 0);
  const regime = regimeOf(load, shape.bow, shape.loadRatio);
  const rolled = Math.abs(major(shape.parabola)) * scale;
  return {
    regime,
    bowMajor,
    bowMinor,
    majorAxis: linear.x === linear.y ? "any" : Math.abs(Math.cos(angle)) >= Math.SQRT1_2 ? "x" : "y",
    majorAngle: angle > Math.PI / 2 ? angle - Math.PI : angle,
    centreCurvatureMajor: major(shape.centre) * scale,
    centreCurvatureMinor: minor(shape.centre) * scale,
    parabolaCurvatureMajor: major(shape.parabola) * scale,
    parabolaCurvatureMinor: minor(shape.parabola) * scale,
    threePointBow: (bowMajor + bowMinor) / 2 + bent * (shape.rim - shape.bow.mean),
    warp: bent * (shape.top + shape.dip),
    rollRadius: regime === "curled" && rolled > 0 ? 1 / rolled : null,
    stabilityRatio: shape.loadRatio,
  };
}

/** The same without dimensions, for a working that shows what the table was asked for. */
export function plateShapeOf(i: FreeWaferShapeInput): PlateShape {
  const { load, kind } = dimensionless(i);
  return plateShape(load, kind);
}

function dimensionless(i: FreeWaferShapeInput) {
  const { radius, thickness, kind } = checkPlate(i);
  const linear = checkCurvature(i.linearCurvature);
  // K = κ R²/(4h): the bow of a parabola is 2 h K.
  const scale = (4 * thickness) / (radius * radius);
  const load = { mean: (linear.x + linear.y) / 2 / scale, halfDifference: (linear.x - linear.y) / 2 / scale };
  return { radius, thickness, scale, linear, load, kind };
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
  return {
    radius,
    thickness,
    biaxialModulus: youngsModulus / (1 - poissonsRatio),
    kind: { poissonsRatio, crystal, axes: requireAxes(i.axes) },
  };
}

function requireAxes(axes: string | undefined): "100" | "110" | undefined {
  if (axes === undefined || axes === "100" || axes === "110") return axes;
  throw new EngineInputError("axes", `'${axes}' is not a direction known here`, "100 or 110");
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
  const largest = Math.max(Math.abs(alongX(bow)), Math.abs(alongY(bow)));
  const off = Math.max(Math.abs(alongX(load) - alongX(bow)), Math.abs(alongY(load) - alongY(bow)));
  return shapeRegime(stabilityRatio, largest, off);
}

function bowsOf(bow: CurvaturePair, sagitta: (curvature: number) => number) {
  const [x, y] = [sagitta(alongX(bow)), sagitta(alongY(bow))];
  return Math.abs(x) >= Math.abs(y) ? { bowMajor: x, bowMinor: y } : { bowMajor: y, bowMinor: x };
}

function alongX({ mean, halfDifference }: CurvaturePair): number {
  return mean + halfDifference;
}

function alongY({ mean, halfDifference }: CurvaturePair): number {
  return mean - halfDifference;
}
