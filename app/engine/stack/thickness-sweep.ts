import { EngineInputError } from "../errors.ts";
import { criticalLinearCurvature } from "../plate/critical-load.ts";
import type { ShapeRegime } from "../vocabulary.ts";
import { estimateStack, freeDisc } from "./estimate-stack.ts";
import { withThickness, type StackInput } from "./model.ts";

/** One point of the curve warp against remaining silicon. */
export interface SweepPoint {
  thickness: number;
  warp: number;
  /** size of Stoney's bow, for comparison */
  linearWarp: number;
  regime: ShapeRegime;
}

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
/** Ratio of neighbouring thicknesses at which the load is looked at from the thick end. */
const STRIDE = 1.04;
const HALVINGS = 50;

/**
 * Thickness of silicon below which the free wafer rolls about one axis, m, between 1 µm and `upTo`; `upTo` when it rolls even
 * there, null when it does not roll in that range.
 *
 * The search comes from the thick end and stops at the first thickness that rolls: films that balance each other at one
 * thickness only can leave a flat stretch further down, and the limit above it is the one that matters.
 */
export function curlingThickness(stack: StackInput, upTo: number): number | null {
  const rolls = (thickness: number) => {
    const { disc } = freeDisc(withThickness(stack, thickness));
    return Math.abs(disc.linearCurvature) > criticalLinearCurvature(disc);
  };
  if (rolls(upTo)) return upTo;
  let stable = upTo;
  while (stable > THINNEST) {
    const next = Math.max(THINNEST, stable / STRIDE);
    if (rolls(next)) return boundary(rolls, next, stable);
    stable = next;
  }
  return null;
}

/** Where `rolls` changes between a thickness that does and a thicker one that does not. */
function boundary(rolls: (thickness: number) => boolean, rolling: number, stable: number): number {
  let [low, high] = [rolling, stable];
  for (let halving = 0; halving < HALVINGS; halving++) {
    const middle = Math.sqrt(low * high);
    if (rolls(middle)) low = middle;
    else high = middle;
  }
  return high;
}
