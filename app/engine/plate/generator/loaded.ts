import { at } from "../table/elements.ts";
import { loadVector, settle, type Equilibrium, type MeanCurvature } from "./equilibrium.ts";
import { heightOf, measurer, type Measurer, type Measures } from "./measures.ts";
import { ritzPlate, type RitzPlate, type RitzSpace } from "./ritz-plate.ts";
import { sideSpace, stableAside, type SideSpace } from "./side-stability.ts";
import type { ShearRatios } from "../shear-ratios.ts";

/** Solves shapes under given loads, the way a wafer gets there: the load grows from zero on a plate with a small flaw. */
export interface LoadSolver {
  plate: RitzPlate;
  measure: Measurer;
  sides: SideSpace[];
}

/** A shape under a load. */
export interface LoadedShape {
  shape: Float64Array;
  /** Along the axis on which the rim is highest, and across it. */
  measures: Measures;
  /** Angle from the load's x axis to it, rad. */
  turn: number;
  /** Area means of the curvatures, times R²/(4h). */
  average: Required<MeanCurvature>;
  /** Whether the energy has a minimum there against every small change, of any symmetry. */
  stable: boolean;
}

export function loadSolver(space: RitzSpace, ratios: ShearRatios): LoadSolver {
  const twisting = space.uniform > 2;
  const { degree } = space;
  return {
    plate: ritzPlate(space, ratios),
    measure: measurer(space),
    sides: [
      ...(twisting ? [] : [sideSpace(space, ["twist"], degree)]),
      ...(twisting
        ? [sideSpace(space, ["odd-x", "odd-y"], degree - 1)]
        : [sideSpace(space, ["odd-x"], degree - 1), sideSpace(space, ["odd-y"], degree - 1)]),
    ],
  };
}

/** Shares of the load at which the path stops over; closest where a bowl goes over into a roll at loads of a few times that. */
const STOPS = [0.05, 0.1, 0.2, 0.35, 0.5, 0.7, 0.85, 1] as const;
/** The flaw, over the size of the load; taken away at the end. */
const FLAW = 1e-3;

/** The shape that the load leads to. The flaw bends towards x, and on a plate that can twist a little to one side of it. */
export function reach(solver: LoadSolver, load: MeanCurvature): LoadedShape {
  const { plate } = solver;
  const flaw = FLAW * (Math.abs(load.mean) + Math.abs(load.halfDifference));
  let shape = new Float64Array(plate.size);
  for (const stop of STOPS) {
    const stopped = scaled(load, stop);
    const flawed = {
      mean: stopped.mean + (load.mean === 0 ? flaw * stop : 0),
      halfDifference: stopped.halfDifference + (load.halfDifference < 0 ? -flaw : flaw) * stop,
      twist: stopped.twist + flaw * stop,
    };
    shape = Float64Array.from(settle(plate, shape, loadVector(plate, flawed)).shape);
  }
  return described(solver, settle(plate, shape, loadVector(plate, load)));
}

/**
 * The shape that stays when one part of a load that leads to it is turned round step by step; null when it lets go on the way.
 * With the mean turned round it is a roll that has not snapped back; with the half difference, one about the other axis.
 */
export function heldShape(
  solver: LoadSolver,
  load: MeanCurvature,
  turned: "mean" | "halfDifference",
  steps: number,
): LoadedShape | null {
  let shape = reach(solver, { ...load, [turned]: -load[turned] }).shape;
  let last: Equilibrium | null = null;
  for (let n = 1; n <= steps; n += 1) {
    const part = load[turned] * ((2 * n) / steps - 1);
    last = settle(solver.plate, shape, loadVector(solver.plate, { ...load, [turned]: part }));
    shape = Float64Array.from(last.shape);
    if (at(shape, turned === "mean" ? 0 : 1) * load[turned] > 0) return null;
  }
  return last === null ? null : described(solver, last);
}

function described(solver: LoadSolver, { shape, stable }: Equilibrium): LoadedShape {
  const { plate, measure, sides } = solver;
  const [half, twist] = [at(shape, 1) / 2, plate.space.uniform > 2 ? at(shape, 2) / 2 : 0];
  const turn = plate.space.uniform > 2 ? highestAt(plate.space, shape) : 0;
  return {
    shape,
    measures: measure(shape, turn),
    turn,
    average: { mean: at(shape, 0) / 2, halfDifference: half, twist },
    stable: stable && sides.every((side) => stableAside(plate, side, shape)),
  };
}

/** Angle of the highest point of the rim within a quarter turn about the load's x axis, by thirds from the best of a few. */
function highestAt({ functions }: RitzSpace, shape: Float64Array): number {
  const height = (angle: number) => functions.reduce((sum, one, n) => sum + at(shape, n) * heightOf(one, 1, angle), 0);
  const step = Math.PI / 64;
  let best = 0;
  for (let n = -16; n <= 16; n += 1) if (height(n * step) > height(best)) best = n * step;
  let [low, high] = [best - step, best + step];
  while (high - low > 1e-9) {
    const third = (high - low) / 3;
    if (height(low + third) < height(high - third)) low += third;
    else high -= third;
  }
  return (low + high) / 2;
}

function scaled({ mean, halfDifference, twist = 0 }: MeanCurvature, by: number): Required<MeanCurvature> {
  return { mean: mean * by, halfDifference: halfDifference * by, twist: twist * by };
}
