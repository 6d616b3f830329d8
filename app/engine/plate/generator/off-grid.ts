import { isotropicRatios, membraneStiffness, siliconRatios, type ShearRatios } from "../shear-ratios.ts";
import type { PlateKind } from "../shape-model.ts";
import type { Keep } from "./keep.ts";
import { heldShape, loadSolver, reach, type LoadedShape } from "./loaded.ts";
import { seededRandom } from "./random.ts";
import { ritzSpace, type RitzSpace } from "./ritz-plate.ts";

/** What kind of point of the check it is; `held` is a second shape, reached by another load. */
export type PointClass = "equal" | "one sign" | "opposite" | "held" | "beyond";

/** A shape solved in full away from the table's own points: curvatures times R²/(4h), heights over 2 h. */
export interface OffGridPoint {
  class: PointClass;
  kind: PlateKind;
  /** Small-deflection curvatures along x and y. */
  load: { x: number; y: number };
  bow: { x: number; y: number };
  centre: { x: number; y: number };
  parabola: { x: number; y: number };
  rim: number;
  sixfold: number;
  warp: number;
  turn: number;
}

/** How many points of each sort, and the degrees that they are solved with: finer than the table's own. */
export interface OffGridPlan {
  isotropic: number;
  silicon: number;
  turned: number;
  beyond: number;
  degree: number;
  turnedDegree: number;
  beyondDegree: number;
}

/** What `npm run plate-table` solves. */
export const OFF_GRID_PLAN: OffGridPlan = {
  isotropic: 300,
  silicon: 100,
  turned: 60,
  beyond: 24,
  degree: 28,
  turnedDegree: 20,
  beyondDegree: 40,
};

const HIGHEST_POISSON = 0.45;
const HIGHEST_LOAD = 20;
const HELD_STEPS = 16;

/**
 * Loads by moments: m_x in units of the equal moments at which uniform curvature would go over into a roll, and m_y over m_x.
 * That load is in closed form, so that the points do not depend on the tables.
 */
function loadOf(kind: PlateKind, times: number, ratio: number): { x: number; y: number } {
  const ratios = ratiosOf(kind);
  const tau = ratiosOf({ ...kind, axes: "100" }).along;
  const critical = Math.sqrt(tau / membraneStiffness(ratios)) * (1 + tau);
  const mean = (times * critical * (1 + ratio)) / 2;
  // Moments of opposite size act on the curvatures' difference by the resistance to it.
  const half = (times * critical * (1 - ratio)) / (2 * ratios.along);
  return { x: mean + half, y: mean - half };
}

export function ratiosOf({ crystal, axes, poissonsRatio }: PlateKind): ShearRatios {
  if (crystal !== "100") return isotropicRatios(poissonsRatio);
  const { along, between } = siliconRatios();
  return axes === "110" ? { along: between, between: along } : { along, between };
}

/** Solves the points of a plan, the same ones every time. `progress` is told of each. */
export function offGridPoints(
  plan: OffGridPlan,
  keep: Keep,
  progress: (done: number, total: number) => void,
): OffGridPoint[] {
  const random = seededRandom(20);
  const even = ritzSpace("even", plan.degree);
  const wide = plan.beyond > 0 ? ritzSpace("even", plan.beyondDegree) : even;
  const turning = plan.turned > 0 ? ritzSpace("half-turn", plan.turnedDegree) : even;
  const total = plan.isotropic + plan.silicon + plan.turned + plan.beyond;
  const found: OffGridPoint[] = [];
  const solve = (space: RitzSpace, kind: PlateKind, sort: PointClass | null, times: number, ratio: number) => {
    const load = loadOf(kind, times, ratio);
    const name = `point ${JSON.stringify([space.degree, kind, load])}`;
    found.push(...keep(name, () => solvedPoints(space, kind, sort, load)));
  };
  for (let n = 0; n < total; n += 1) {
    const [a, b, c] = [random(), random(), random()];
    const poissonsRatio = HIGHEST_POISSON * c;
    // Dense at small loads and round the onset; every fourth point has equal moments, every sixth a saddle's.
    const times = n % 3 === 0 ? 0.6 + 1.4 * a : HIGHEST_LOAD * a * a;
    const ratio = n % 4 === 0 ? 1 : n % 6 === 1 ? 0.5 * b * b - 1 : 2 * b - 1;
    if (n < plan.isotropic) solve(even, { poissonsRatio }, null, times, ratio);
    else if (n < plan.isotropic + plan.silicon)
      solve(even, { poissonsRatio: 0.28, crystal: "100" }, null, times, ratio);
    else if (n < total - plan.beyond) {
      // Nearly equal moments too, where the roll lies between the axes.
      const near = n % 2 === 0 ? 1 - 0.3 * b : 2 * b - 1;
      solve(turning, { poissonsRatio: 0.28, crystal: "100", axes: "110" }, null, times, near);
    } else solve(wide, { poissonsRatio }, "beyond", HIGHEST_LOAD * 20 ** a, ratio);
    progress(n + 1, total);
  }
  return found;
}

export function solvedPoints(
  space: RitzSpace,
  kind: PlateKind,
  sort: PointClass | null,
  load: { x: number; y: number },
): OffGridPoint[] {
  const solver = loadSolver(space, ratiosOf(kind));
  const pair = { mean: (load.x + load.y) / 2, halfDifference: (load.x - load.y) / 2 };
  const shape = reach(solver, pair);
  if (!shape.stable) throw new RangeError(`no stable shape at ${JSON.stringify({ kind, load })}`);
  const own = load.x === load.y ? "equal" : load.x * load.y > 0 ? "one sign" : "opposite";
  const found = [pointOf(sort ?? own, kind, load, shape)];
  const held =
    sort !== null || own === "equal"
      ? null
      : own === "opposite"
        ? heldShape(solver, pair, "mean", HELD_STEPS)
        : kind.crystal === "100" && kind.axes !== "110"
          ? heldShape(solver, pair, "halfDifference", HELD_STEPS)
          : null;
  if (held?.stable) found.push(pointOf("held", kind, load, held));
  return found;
}

function pointOf(sort: PointClass, kind: PlateKind, load: { x: number; y: number }, shape: LoadedShape): OffGridPoint {
  const { measures, turn } = shape;
  return { class: sort, kind, load, ...measures, turn };
}
