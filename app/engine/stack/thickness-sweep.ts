import { EngineInputError } from "../errors.ts";
import type { ShapeRegime } from "../vocabulary.ts";
import { estimateStack } from "./estimate-stack.ts";
import type { StackInput } from "./model.ts";

/** One point of the curve warp against remaining silicon. */
export interface SweepPoint {
  thickness: number;
  warp: number;
  /** size of Stoney's bow, for comparison */
  linearWarp: number;
  regime: ShapeRegime;
}

const withThickness = (stack: StackInput, thickness: number): StackInput => ({
  ...stack,
  wafer: { ...stack.wafer, thickness },
});

/**
 * Warp of the free wafer over a range of silicon thickness (m), at `points` thicknesses spaced evenly on a logarithmic scale.
 * @throws EngineInputError when the range is empty or fewer than two points are asked
 */
export function thicknessSweep(stack: StackInput, range: { from: number; to: number; points: number }): SweepPoint[] {
  const { from, to, points } = range;
  if (!(from > 0) || !(to > from))
    throw new EngineInputError("sweep", "the range of thickness is empty", "0 m < from < to");
  if (!Number.isInteger(points) || points < 2 || points > 500)
    throw new EngineInputError("sweep.points", "the number of points is out of range", "2 to 500");
  return Array.from({ length: points }, (_, index) => {
    const thickness = index === points - 1 ? to : from * (to / from) ** (index / (points - 1));
    const { shape, stoney } = estimateStack(withThickness(stack, thickness));
    return { thickness, warp: shape.warp, linearWarp: Math.abs(stoney.sagitta), regime: shape.regime };
  });
}

const THINNEST = 1e-6;
const HALVINGS = 60;

/**
 * Thickness below which the free wafer rolls about one axis, m, between 1 µm and `upTo`; null when it does not roll in that
 * range. The load falls steadily with thickness, so one root is all there is.
 */
export function curlingThickness(stack: StackInput, upTo: number): number | null {
  const rolls = (thickness: number) => estimateStack(withThickness(stack, thickness)).shape.stabilityRatio > 1;
  if (!rolls(THINNEST)) return null;
  if (rolls(upTo)) return upTo;
  let [low, high] = [THINNEST, upTo];
  for (let halving = 0; halving < HALVINGS; halving++) {
    const middle = Math.sqrt(low * high);
    if (rolls(middle)) low = middle;
    else high = middle;
  }
  return high;
}
