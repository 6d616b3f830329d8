import type { DirectionalLayer } from "../directional/layer.ts";
import { addTensor, type PlaneTensor } from "../directional/plane-stiffness.ts";
import { solveDirectionalLaminate } from "../directional/solve-directional-laminate.ts";

export interface FlatChuckStress {
  /** Strain of the stack against the flat base at 298.15 K. */
  strain: PlaneTensor;
  /** Stress in each layer while flat, bottom to top, Pa: the same through the layer. */
  stress: PlaneTensor[];
  /** Change of stress at each layer's lower and upper face from free to flat, Pa. */
  changeBottom: PlaneTensor[];
  changeTop: PlaneTensor[];
}

/**
 * Stresses in wafer and films while a stack is held flat on a chuck and free to slide on it, at `temperature` (K, default
 * 298.15). A thin film then carries nearly the stress of its monitor wafer, and the wafer the film forces over its thickness,
 * −N/h; the faces of the wafer change by M h κ/2. Bad input throws `EngineInputError` naming the layer.
 * Source: laminate theory as `solveDirectionalLaminate`, curvature held at zero.
 */
export function flatChuckStress(
  layersBottomToTop: readonly DirectionalLayer[],
  o: { temperature?: number } = {},
): FlatChuckStress {
  const { flatStrain, flatStress, stressBottom, stressTop } = solveDirectionalLaminate(layersBottomToTop, o);
  const change = (free: readonly PlaneTensor[]) => flatStress.map((flat, n) => addTensor(flat, free[n] ?? flat, -1));
  return {
    strain: flatStrain,
    stress: flatStress,
    changeBottom: change(stressBottom),
    changeTop: change(stressTop),
  };
}
