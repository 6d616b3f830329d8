import { estimateStack } from "#app/engine/stack/estimate-stack.ts";
import type { StackInput } from "#app/engine/stack/model.ts";
import { standardBow } from "#app/engine/stoney/bow.ts";
import type { ThinnedWafer } from "#app/schemas/thinned-wafer.ts";

/** Redistribution copper and polymer of no particular product: what any such stack does. */
const STACK: StackInput = {
  wafer: { diameter: 0.3, orientation: "100", thickness: 775e-6 },
  films: [
    { side: "front", thickness: 5e-6, stress: 150e6, youngsModulus: 117e9, poissonsRatio: 0.34, coverage: 0.3 },
    { side: "front", thickness: 6e-6, stress: 30e6, youngsModulus: 3e9, poissonsRatio: 0.35 },
  ],
};
const THICKNESSES = [775e-6, 200e-6, 100e-6, 50e-6, 30e-6];

/** The drawing of the sign-in page, computed by the engine like everything else. */
export function thinningStory(): { force: number; wafers: ThinnedWafer[] } {
  const wafers = THICKNESSES.map((thickness): ThinnedWafer => {
    const { shape } = estimateStack({ ...STACK, wafer: { ...STACK.wafer, thickness } });
    return {
      thickness,
      diameter: STACK.wafer.diameter,
      regime: shape.regime,
      warp: shape.warp,
      bow: standardBow(shape.bowMajor),
      rollRadius: shape.rollRadius,
    };
  });
  return { force: estimateStack(STACK).filmForce.front, wafers };
}
