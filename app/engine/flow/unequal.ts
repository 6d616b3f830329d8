import type { DirectionalLayer } from "../directional/layer.ts";
import { factor } from "../directional/factor.ts";
import { addStiffness, addTensor, applyStiffness, type PlaneTensor } from "../directional/plane-stiffness.ts";
import {
  principalCurvatures,
  solveDirectionalLaminate,
  type DirectionalLaminateResult,
} from "../directional/solve-directional-laminate.ts";
import { EngineInputError } from "../errors.ts";
import { directionalEntry } from "./layers.ts";
import type { PlacedStack } from "./settle.ts";
import type { StackEntry } from "./stack-entry.ts";

/** Curvatures of a stack whose two directions differ, 1/m, bowl positive; w = κ_x x²/2 + κ_y y²/2 + twist x y. */
export interface UnequalCurvature {
  curvatureX: number;
  curvatureY: number;
  twist: number;
  /** along its own axes: the larger curvature, the other, and the angle of the first from x, rad */
  principal: { major: number; minor: number; angle: number };
  effectiveThickness: number;
  layers: DirectionalLayer[];
}

/**
 * Curvatures with both directions apart, of a stack that has been settled. What its metals and polymers have flowed is that of
 * the mean of both directions, and a pair that slid has locked at the mean too: right while the directions differ little.
 */
export function unequalCurvature(
  { entries, placed }: PlacedStack,
  temperature: number,
  slidingOn: StackEntry[] | null,
): UnequalCurvature {
  const layers = entries.map((entry, at) => directionalEntry(entry, placed.flowed[at] ?? 0));
  const wafer = solveDirectionalLaminate(layers, { temperature });
  if (!slidingOn) {
    const { curvatureX, curvatureY, twist, principal, effectiveThickness } = wafer;
    return { curvatureX, curvatureY, twist, principal, effectiveThickness, layers };
  }
  const carrier = solveDirectionalLaminate(
    slidingOn.map((entry) => directionalEntry(entry, 0)),
    { temperature },
  );
  return { ...sharedCurvature(wafer, carrier), layers };
}

/** Two plates that take one curvature and slide: their moments and bending stiffnesses add. */
function sharedCurvature(a: DirectionalLaminateResult, b: DirectionalLaminateResult) {
  const stiffness = factor(addStiffness(a.freeBendingStiffness, b.freeBendingStiffness));
  if (!stiffness)
    throw new EngineInputError("layers", "leave the pair without stiffness in some direction of the plane");
  const { x, y, xy } = stiffness.solve(addTensor(momentOf(a), momentOf(b)));
  const stretching = [a, b].map(({ stretchingStiffness: q }) => (q.xx + 2 * q.xy + q.yy) / 2);
  const bending = [a, b].map(({ effectiveThickness }, n) => ((stretching[n] ?? 0) * effectiveThickness ** 2) / 12);
  const total = (values: number[]) => values.reduce((sum, value) => sum + value, 0);
  return {
    curvatureX: x,
    curvatureY: y,
    twist: xy / 2,
    principal: principalCurvatures(x, y, xy / 2),
    effectiveThickness: Math.sqrt((12 * total(bending)) / total(stretching)),
  };
}

function momentOf({ freeBendingStiffness, curvatureX, curvatureY, twist }: DirectionalLaminateResult): PlaneTensor {
  return applyStiffness(freeBendingStiffness, { x: curvatureX, y: curvatureY, xy: 2 * twist });
}
