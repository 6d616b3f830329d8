import { firstGuess } from "./first-guess.ts";
import type { Plate } from "./plate.ts";
import { settleState, type CurvaturePair, type RestingState } from "./stable-state.ts";

/**
 * The shape that a plate reaches as its load grows from zero: the one of least energy. Both parts of `load` are zero or more,
 * and so are those of the shape. Where one part of the load is exactly zero the sign of that part of the shape is free.
 */
export function reachedState({ energy, criticalLoad, saddleLoad }: Plate, load: CurvaturePair): RestingState {
  const start = firstGuess(energy, load);
  // Past a bifurcation the search must not begin on the ridge.
  const rolling = load.mean / criticalLoad - 1;
  if (rolling > 0)
    start.halfDifference = Math.max(start.halfDifference, Math.min(0.7, Math.sqrt(rolling)) * start.mean);
  const snapping = load.halfDifference / saddleLoad - 1;
  if (snapping > 0) start.mean = Math.max(start.mean, Math.min(0.5, Math.sqrt(snapping)) * start.halfDifference);
  return settleState(energy, load, start);
}

/**
 * The shape that has snapped through: a saddle's load with the mean curvature opposite to the load's, which it keeps when it was
 * brought there by another load. Its `mean` counts against the load. The search starts from the mirror image of `reached`, the
 * state that the load leads to. Null when there is none.
 */
export function snappedState(plate: Plate, load: CurvaturePair, reached: CurvaturePair): RestingState | null {
  // A roll lets go at the latest when the load would bend it the other way: m_x = 0, in curvatures A_0 = τ B_0.
  if (load.halfDifference <= plate.saddleLoad || load.mean >= plate.energy.tau * load.halfDifference) return null;
  return held(settleState(plate.energy, { mean: -load.mean, halfDifference: load.halfDifference }, reached));
}

/** Half difference over mean of a load beyond which no roll of silicon stays about the other axis; the true limit is lower. */
const MOST_CROSSED = 0.45;

/** The roll about the other axis, which only a crystal can hold. Its `halfDifference` counts against the load. */
export function crossedState(plate: Plate, load: CurvaturePair): RestingState | null {
  if (load.mean <= plate.criticalLoad || load.halfDifference > MOST_CROSSED * load.mean) return null;
  const start = reachedState(plate, { mean: load.mean, halfDifference: 0 });
  return held(settleState(plate.energy, { mean: load.mean, halfDifference: -load.halfDifference }, start));
}

function held(state: RestingState): RestingState | null {
  return state.stable ? state : null;
}
