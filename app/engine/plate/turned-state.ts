import { reachedState } from "./load-path.ts";
import { blendedEnergy, blendedPlate, siliconPlates, type Plate } from "./plate.ts";
import { settleState, type CurvaturePair, type RestingState } from "./stable-state.ts";
import { turningCost } from "./turning-cost.ts";

/** A shape of silicon (001) with the plate that stands for its direction. */
export interface TurnedState {
  state: RestingState;
  plate: Plate;
  /** Angle from the <110> axis of the load to the axis of the shape, rad, 0 to π/4; its mirror image is the same shape. */
  turn: number;
}

/** How near to a direction the search for it ends. */
const CLOSE = 1e-9;
/** Slope of the energy at which it ends too, over the cost of the whole turn. */
const SETTLED = 1e-11;
const MOST_STEPS = 40;
/** Half difference over mean of curvatures that are the same but for what a search leaves over. */
const ALIKE = 1e-6;

/**
 * Shape of silicon (001) whose load has its axes along <110>, both parts zero or more. The load pulls the roll towards <110> and
 * the crystal towards <100>. With σ the sine of twice the angle from <100> the energy of given mean curvatures is
 *
 *   (1 − σ²) u_100 + σ² u_110 − 2 A_0 A − 2 τ_110 B_0 B σ,
 *
 * so σ = τ_110 B_0 B/(u_110 − u_100) unless that is more than 1, when the shape lies along <110>.
 */
export function turnedState(load: CurvaturePair): TurnedState {
  const { soft, hard } = siliconPlates();
  const straight = reachedState(hard, load);
  const pullAt = (shape: CurvaturePair) => hard.energy.tau * load.halfDifference * shape.halfDifference;
  // Equal loads leave the direction to the crystal.
  if (load.halfDifference === 0) return { state: reachedState(soft, load), plate: soft, turn: Math.PI / 4 };
  const rolls = load.mean > soft.criticalLoad;
  const roll = rolls ? reachedState(soft, { mean: load.mean, halfDifference: 0 }) : straight;
  // Past the onset a bowl gives way, but curvatures that hardly differ are too little for their energies to tell.
  const givesWay = (shape: CurvaturePair) => rolls && shape.halfDifference < ALIKE * shape.mean;
  if (!givesWay(straight) && turningCost(straight) <= pullAt(straight))
    return { state: straight, plate: hard, turn: 0 };
  const scale = turningCost(roll);
  let state = roll;
  /** Slope of the energy by σ, over 2; from below zero at σ = 0 to above it at σ = 1. */
  const slopeAt = (sigma: number): number => {
    const energy = blendedEnergy(sigma * sigma);
    const along = { mean: load.mean, halfDifference: (hard.energy.tau * load.halfDifference * sigma) / energy.tau };
    state = settleState(energy, along, givesWay(state) ? roll : state);
    if (givesWay(state)) return scale;
    return sigma * turningCost(state) - pullAt(state);
  };
  let [low, high] = [0, 1];
  let [atLow, atHigh] = [-pullAt(straight), givesWay(straight) ? scale : turningCost(straight) - pullAt(straight)];
  let sigma = 1;
  for (let step = 0; step < MOST_STEPS && high - low > CLOSE; step += 1) {
    // The secant, and the middle whenever it hugs one end.
    const secant = (low * atHigh - high * atLow) / (atHigh - atLow);
    sigma = step % 3 === 2 ? (low + high) / 2 : secant;
    const slope = slopeAt(sigma);
    if (Math.abs(slope) < SETTLED * scale) break;
    if (slope < 0) [low, atLow] = [sigma, slope];
    else [high, atHigh] = [sigma, slope];
  }
  if (givesWay(state)) return { state: roll, plate: soft, turn: Math.PI / 4 };
  return { state, plate: blendedPlate(sigma * sigma), turn: Math.PI / 4 - Math.asin(Math.min(1, sigma)) / 2 };
}

/**
 * Whether a shape along an axis of silicon (001) stays there: turning it costs more bending than the load gives back. `pull`
 * is the half difference of the load along the shape's own.
 */
export function keepsDirection(direction: "soft" | "hard", shape: CurvaturePair, pull: number): boolean {
  const { soft, hard } = siliconPlates();
  const cost = turningCost(shape);
  const { tau } = direction === "soft" ? soft.energy : hard.energy;
  const held = tau * pull * shape.halfDifference;
  return direction === "soft" ? cost + held > 0 : held - cost > 0;
}
