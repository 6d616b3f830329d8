import type { LyingShape } from "../flow/shape.ts";
import type { LaminateOptions } from "../laminate/solve-laminate.ts";
import { laminateWorking } from "../laminate/working.ts";
import { freeWaferShapeWorking } from "../plate/working.ts";
import type { Working } from "../working.ts";

/** The working of a warp: the free disc's shape, from the curvature of the laminate at that temperature. */
export function warpWorking(shape: LyingShape): Working {
  return {
    ...freeWaferShapeWorking(shape.disc),
    from: [laminateWorking(shape.layers, laminateOptions(shape))],
  };
}

function laminateOptions({ temperature, slidingOn }: LyingShape): LaminateOptions {
  return slidingOn ? { temperature, slidingOn } : { temperature };
}
