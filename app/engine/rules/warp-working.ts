import type { LyingShape } from "../flow/shape.ts";
import { laminateWorking } from "../laminate/working.ts";
import { freeWaferShapeWorking } from "../plate/working.ts";
import type { Working } from "../working.ts";

/** The working of a warp: the free disc's shape, from the curvature of the laminate at that temperature. */
export function warpWorking(shape: LyingShape): Working {
  return {
    ...freeWaferShapeWorking(shape.disc),
    from: [laminateWorking(shape.layers, { temperature: shape.temperature })],
  };
}
