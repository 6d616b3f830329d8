import { isotropicPlate, siliconPlates, type Plate } from "../plate.ts";
import { plateShape, type PlateShape } from "../shape-model.ts";
import { isotropicRatios, siliconRatios, type ShearRatios } from "../shear-ratios.ts";
import type { CurvaturePair } from "../stable-state.ts";
import { criticalByBisection } from "./convergence.ts";
import type { OffGridPoint, PointClass } from "./off-grid.ts";

/**
 * Largest errors of the tables over a set of points solved in full. Along the axis that bends most they are shares of the value
 * itself. Across it values pass through zero, so they are shares of the larger of the value itself and a tenth of the one along.
 */
export interface Errors {
  points: number;
  bowMajor: number;
  bowMinor: number;
  centreMajor: number;
  centreMinor: number;
  parabolaMajor: number;
  parabolaMinor: number;
  threePoint: number;
  warp: number;
  /** Angle of a roll between the axes of the load and of the crystal, rad. */
  turn: number;
  /** How far the azimuth of three points moves what they read, over the bow along the axis that bends most. */
  azimuth: number;
}

export type ErrorsByClass = Partial<Record<PointClass, Errors>>;

const NONE: Errors = {
  points: 0,
  bowMajor: 0,
  bowMinor: 0,
  centreMajor: 0,
  centreMinor: 0,
  parabolaMajor: 0,
  parabolaMinor: 0,
  threePoint: 0,
  warp: 0,
  turn: 0,
  azimuth: 0,
};

/** Errors of `plateShape` at the points, the largest of each class. */
export function largestErrors(points: readonly OffGridPoint[]): ErrorsByClass {
  const largest: ErrorsByClass = {};
  for (const point of points) {
    const errors = errorsAt(point);
    const known = largest[point.class] ?? NONE;
    const merged = { ...known, points: known.points + 1 };
    for (const key of ERROR_KEYS) merged[key] = Math.max(known[key], errors[key]);
    largest[point.class] = merged;
  }
  return largest;
}

const ERROR_KEYS = [
  "bowMajor",
  "bowMinor",
  "centreMajor",
  "centreMinor",
  "parabolaMajor",
  "parabolaMinor",
  "threePoint",
  "warp",
  "turn",
  "azimuth",
] as const;

/** The same by material; silicon apart by the direction of the load's axes. */
export function errorsByMaterial(points: readonly OffGridPoint[]): Record<string, ErrorsByClass> {
  return {
    isotropic: largestErrors(points.filter(({ kind }) => kind.crystal === undefined)),
    silicon100: largestErrors(points.filter(({ kind }) => kind.crystal !== undefined && kind.axes !== "110")),
    silicon110: largestErrors(points.filter(({ kind }) => kind.axes === "110")),
  };
}

/** Largest error of the loads at which a bowl starts to roll and a saddle snaps, as a share, away from the tables' own points. */
export interface OnsetErrors {
  bowl: number;
  saddle: number;
}

export function onsetErrors(degree: number): OnsetErrors {
  const plates: { plate: Plate; ratios: ShearRatios }[] = [0, 0.07, 0.16, 0.22, 0.28, 0.35, 0.4, 0.45].map(
    (poissonsRatio) => ({
      plate: isotropicPlate(poissonsRatio),
      ratios: isotropicRatios(poissonsRatio),
    }),
  );
  plates.push({ plate: siliconPlates().soft, ratios: siliconRatios() });
  const off = (sort: "bowl" | "saddle") =>
    Math.max(
      ...plates.map(({ plate, ratios }) => {
        const load = sort === "bowl" ? plate.criticalLoad : plate.saddleLoad;
        return Math.abs(load / criticalByBisection(degree, ratios, sort) - 1);
      }),
    );
  return { bowl: off("bowl"), saddle: off("saddle") };
}

/** Errors at one point. */
export function errorsAt(point: OffGridPoint): Errors {
  const { load, kind } = point;
  const shape = plateShape({ mean: (load.x + load.y) / 2, halfDifference: (load.x - load.y) / 2 }, kind);
  if (point.class === "held") return { ...NONE, ...heldErrors(point, shape) };
  const swapped = Math.abs(point.bow.x) < Math.abs(point.bow.y);
  const order = ({ x, y }: { x: number; y: number }): Along =>
    swapped ? { major: y, minor: x } : { major: x, minor: y };
  const bow = apart(order(along(shape.bow)), order(point.bow));
  const centre = apart(order(along(shape.centre)), order(point.centre));
  const parabola = apart(order(along(shape.parabola)), order(point.parabola));
  const { major } = order(point.bow);
  return {
    ...NONE,
    bowMajor: bow.major,
    bowMinor: bow.minor,
    centreMajor: centre.major,
    centreMinor: centre.minor,
    parabolaMajor: parabola.major,
    parabolaMinor: parabola.minor,
    threePoint: Math.abs((shape.rim - point.rim) / major),
    warp: Math.abs((shape.top + shape.dip) / point.warp - 1),
    turn: point.kind.axes === "110" && load.x !== load.y ? Math.abs(Math.abs(shape.turn) - Math.abs(point.turn)) : 0,
    azimuth: Math.abs(point.sixfold / major),
  };
}

/** Two values along the axis that bends most and across it. */
interface Along {
  major: number;
  minor: number;
}

function along({ mean, halfDifference }: CurvaturePair): { x: number; y: number } {
  return { x: mean + halfDifference, y: mean - halfDifference };
}

function apart(got: Along, truth: Along): Along {
  const floor = Math.max(Math.abs(truth.minor), Math.abs(truth.major) / 10);
  return { major: Math.abs(got.major / truth.major - 1), minor: Math.abs(got.minor - truth.minor) / floor };
}

/** A second shape is judged by the listed one nearest to it; one that is not listed is wholly wrong. */
function heldErrors(point: OffGridPoint, shape: PlateShape): Pick<Errors, "bowMajor" | "bowMinor"> {
  const swapped = Math.abs(point.bow.x) < Math.abs(point.bow.y);
  const truth = swapped ? { major: point.bow.y, minor: point.bow.x } : { major: point.bow.x, minor: point.bow.y };
  let best = { major: 1, minor: 1 };
  for (const other of shape.others) {
    const { x, y } = along(other);
    const error = apart(swapped ? { major: y, minor: x } : { major: x, minor: y }, truth);
    if (error.major < best.major) best = error;
  }
  return { bowMajor: best.major, bowMinor: best.minor };
}
