import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { balanceLayers } from "../laminate/solve-laminate.ts";
import { bendsUnequally, layersOf } from "./layers.ts";
import type { FlowInput } from "./model.ts";
import { placeStack, statedLayers } from "./settle.ts";
import { lyingShape, type LyingShape } from "./shape.ts";
import { siliconEntries } from "./silicon.ts";
import type { WaferState } from "./state.ts";
import { unequalCurvature } from "./unequal.ts";

/**
 * Shape at 25 °C of a wafer of the flow, let go, if its silicon had another thickness (m). Its films are as they are: what they
 * have yielded at the thickness that the flow gave them is kept.
 * @throws EngineInputError when the thickness is not above zero, or the wafer would bend beyond anything that can be computed
 */
export function thinnedShape(wafer: FlowInput["wafer"], state: WaferState, thickness: number): LyingShape {
  const thinned: WaferState = {
    ...state,
    bonds: [],
    siliconEntries: siliconEntries(state.orientation, thickness, state.groundFaceForce, state.incoming),
  };
  const temperature = ROOM_TEMPERATURE;
  const stack = placeStack(layersOf(thinned, temperature, []), temperature);
  const solution = balanceLayers(stack.placed);
  const unequal = bendsUnequally(thinned) ? unequalCurvature(stack, temperature, null) : undefined;
  return lyingShape(wafer, { layers: () => statedLayers(stack), solution, temperature, bonded: false, unequal });
}
