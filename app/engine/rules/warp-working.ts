import type { LyingShape } from "../flow/shape.ts";
import { directionalLaminateWorking } from "../directional/working.ts";
import { laminateWorking } from "../laminate/working.ts";
import { freeWaferShapeWorking } from "../plate/working.ts";
import type { Working } from "../working.ts";

/** The working of a warp: the free disc's shape, from the curvature of the laminate at that temperature. */
export function warpWorking(shape: LyingShape): Working {
  return { ...freeWaferShapeWorking(shape.disc), from: laminateWorkings(shape) };
}

/** The sliding carrier of a pair whose directions differ is left out of its working: the wafer's own curvatures are shown. */
function laminateWorkings({ layers, unequal, temperature, slidingOn }: LyingShape): Working[] {
  if (!unequal) return [laminateWorking(layers, slidingOn ? { temperature, slidingOn } : { temperature })];
  return (["curvatureX", "curvatureY"] as const).map((part) =>
    directionalLaminateWorking(unequal.layers, part, { temperature }),
  );
}
