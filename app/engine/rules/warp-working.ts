import type { LyingShape } from "../flow/shape.ts";
import { directionalLaminateWorking } from "../directional/working.ts";
import { laminateWorking } from "../laminate/working.ts";
import { freeWaferShapeWorking } from "../plate/working.ts";
import type { Working } from "../working.ts";

/** The working of a warp: the free disc's shape, from the curvature of the laminate at that temperature. */
export function warpWorking(shape: LyingShape): Working {
  return { ...freeWaferShapeWorking(shape.disc), from: laminateWorkings(shape) };
}

/** Sliding carriers of a wafer whose directions differ are left out of its working: the wafer's own curvatures are shown. */
function laminateWorkings({ layers, unequal, temperature, slidingOn }: LyingShape): Working[] {
  if (!unequal) {
    const [one, other] = slidingOn?.map((plate) => [plate]) ?? [];
    return [
      laminateWorking(layers, {
        temperature,
        ...(one ? { slidingOn: one } : {}),
        ...(other ? { alsoSlidingOn: other } : {}),
      }),
    ];
  }
  return (["curvatureX", "curvatureY"] as const).map((part) =>
    directionalLaminateWorking(unequal.layers, part, { temperature }),
  );
}
