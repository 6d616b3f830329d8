import type { PlateEnergy } from "./plate-energy.ts";
import type { CurvaturePair } from "./stable-state.ts";
import { slenderness } from "./table/coordinates.ts";

/**
 * Where to start the search for a shape: the equations of uniform curvature, A (1 + λ p) = A_0 and B (1 − λ/τ p) = B_0, with the
 * membrane's force p = m P softened by a rough m = 0.85 s³. `load` has both parts zero or more; the shape is the one that the
 * plate reaches as its load grows.
 */
export function firstGuess({ tau, lambda }: PlateEnergy, load: CurvaturePair): CurvaturePair {
  const [a0, b0] = [load.mean, load.halfDifference];
  const beta = lambda / tau;
  // The force falls from its least, −1/λ, where a saddle snaps, to its most, τ/λ, where a roll is free to choose its axis.
  let [low, high] = [-1 / lambda, 1 / beta];
  for (let step = 0; step < 16; step += 1) {
    const force = (low + high) / 2;
    const mean = a0 / (1 + lambda * force);
    const half = b0 / (1 - beta * force);
    const soft = 0.85 * slenderness(mean * mean + half * half) ** 3;
    if (soft * (mean - half) * (mean + half) > force) low = force;
    else high = force;
  }
  // At the ends a part of the load is small against the force that holds the shape: the product of curvatures tells that part.
  const force = (low + high) / 2;
  const mean = a0 / (1 + lambda * force);
  const half = b0 / (1 - beta * force);
  const product = force / (0.85 * slenderness(mean * mean + half * half) ** 3);
  if (force > 0.9 / beta) return { mean, halfDifference: Math.sqrt(Math.max(half * half, mean * mean - product)) };
  if (force < -0.9 / lambda)
    return { mean: Math.sqrt(Math.max(mean * mean, half * half + product)), halfDifference: half };
  return { mean, halfDifference: half };
}
