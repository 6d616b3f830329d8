import { EngineInputError } from "../errors.ts";
import type { NamedLayer } from "./free-strain.ts";
import { checkLayer, ROOM_TEMPERATURE, type Layer } from "./layer.ts";
import {
  bendingStiffnessOf,
  bendStacks,
  curvatureOf,
  forceOf,
  LAYER_VALUES,
  MODULUS_FACTORS,
  MOST_LAYERS,
  neutralPlaneOf,
  stretchingOf,
} from "./laminate-sums.ts";
import { placeLayers, type PlacedLayers } from "./placed-layers.ts";

export { findBase } from "./placed-layers.ts";

/** How a stack bends and stretches as a whole. */
export interface LaminateBalance {
  /** 1/m, positive when the top face (device side) is concave. */
  curvature: number;
  /** Strain of the stack's mid-plane against the flat base at 298.15 K. */
  midplaneStrain: number;
  /** Height of the neutral plane over the mid-plane, m. */
  neutralPlane: number;
  /** Biaxial bending stiffness about the neutral plane, N·m: M h³/12 for one layer. */
  bendingStiffness: number;
  /** Stretching stiffness, the sum of M h, N/m. */
  stretchingStiffness: number;
  /** sqrt(12 D/A) with the bending stiffness D and the stretching stiffness A, m: the thickness of one layer for one layer. */
  effectiveThickness: number;
}

export interface LaminateOptions {
  /** K, default 298.15 */
  temperature?: number;
  /** a second stack on top that slides, bottom to top */
  slidingOn?: readonly Layer[];
  /** a third one that slides on the other face */
  alsoSlidingOn?: readonly Layer[];
}

export interface LaminateResult extends LaminateBalance {
  /** Free strain of each layer, as by `layerFreeStrain`. */
  freeStrain: number[];
  /** Stress in each layer itself at its lower face, Pa. */
  stressBottom: number[];
  /** Stress in each layer itself at its upper face, Pa. */
  stressTop: number[];
  /** Mean of the two, which is the layer's mean because stress is linear through it, Pa. */
  meanStress: number[];
}

/**
 * Curvature and stresses of a stack of layers, bottom to top, bonded perfectly and free of outside forces, at `temperature`
 * (K, default 298.15). Any number of layers of any thickness; equal in both directions of the plane. Layers whose stress
 * differs along x and y, and line patterns, are directional and come separately.
 *
 * A layer that covers part of the area counts with its coverage in stiffness and in force; its stress is that in the film.
 * Strain is linear through the stack; the base, whose flat state at 298.15 K is the zero of strain, is the first layer that
 * expands as silicon, else the thickest. The curvature holds while the slope stays small; whether the wafer can follow it
 * is a question for `freeWaferShape`. Bad input throws `EngineInputError` naming the layer.
 *
 * `slidingOn` is a second stack that lies on the first and slides on it without friction, as on an adhesive that has become a
 * liquid: both take one curvature, each stays free of force, so their bending stiffnesses add and so do the moments that each
 * would bend itself with. `alsoSlidingOn` is a third one on the lower face, of which the same holds. Strains and stresses are
 * those of the first stack; base and zero of strain too.
 *
 * Source: Townsend, Barnett and Brunner 1987; Hsueh 2002; Hsueh, Lee and Chuang 2003. Two layers: Freund, Floro and Chason 1999.
 * Sliding: own derivation.
 */
export function solveLaminate(layersBottomToTop: readonly Layer[], o: LaminateOptions = {}): LaminateResult {
  const named = layersBottomToTop.map((layer, n): NamedLayer => {
    const field = `layers[${n}]`;
    return { layer: checkLayer(layer, field), field };
  });
  const temperature = o.temperature ?? ROOM_TEMPERATURE;
  const placed = placeLayers(named, temperature);
  const sliding = [o.slidingOn, o.alsoSlidingOn].flatMap((stack) =>
    stack ? [solveLaminate(stack, { temperature })] : [],
  );
  const balance = balanceLayers(placed, joinPlates(sliding));
  const result: LaminateResult = { ...balance, freeStrain: [], stressBottom: [], stressTop: [], meanStress: [] };
  for (let n = 0; n < placed.count; n += 1) {
    const half = (placed.thickness[n] ?? 0) / 2;
    const centre = placed.centre[n] ?? 0;
    result.freeStrain.push(placed.freeStrain[n] ?? 0);
    result.stressBottom.push(stressAt(placed, n, centre - half, balance));
    result.stressTop.push(stressAt(placed, n, centre + half, balance));
    result.meanStress.push(stressAt(placed, n, centre, balance));
  }
  return result;
}

/** Stress in layer `n` itself at a height over the mid-plane (m), Pa. */
function stressAt(
  { biaxialModulus, freeStrain }: PlacedLayers,
  n: number,
  z: number,
  { midplaneStrain, curvature }: LaminateBalance,
): number {
  return (biaxialModulus[n] ?? 0) * (midplaneStrain - curvature * z - (freeStrain[n] ?? 0));
}

/** A stack that takes the same curvature as another and slides on it. */
export type SlidingPlate = Pick<LaminateBalance, "curvature" | "bendingStiffness" | "stretchingStiffness">;

/** Plates that all slide and take one curvature, as one: none for none. */
export function joinPlates([first, ...others]: readonly SlidingPlate[]): SlidingPlate | undefined {
  return others.reduce<SlidingPlate | undefined>((a, b) => a && joinTwo(a, b), first);
}

function joinTwo(a: SlidingPlate, b: SlidingPlate): SlidingPlate {
  const bendingStiffness = a.bendingStiffness + b.bendingStiffness;
  return {
    bendingStiffness,
    curvature: (a.bendingStiffness * a.curvature + b.bendingStiffness * b.curvature) / bendingStiffness,
    stretchingStiffness: a.stretchingStiffness + b.stretchingStiffness,
  };
}

/** The part of `solveLaminate` that concerns the stack as a whole, for layers that are checked and placed already. */
export function balanceLayers(layers: PlacedLayers, slidingOn?: SlidingPlate): LaminateBalance {
  const { neutralPlane, meanStrain, ...alone } = bend(layers);
  const moment =
    alone.strainPerHeight * alone.bendingStiffness - (slidingOn ? slidingOn.bendingStiffness * slidingOn.curvature : 0);
  const bendingStiffness = alone.bendingStiffness + (slidingOn?.bendingStiffness ?? 0);
  const stretching = alone.stretching + (slidingOn?.stretchingStiffness ?? 0);
  const strainPerHeight = slidingOn ? moment / bendingStiffness : alone.strainPerHeight;
  return {
    curvature: strainPerHeight === 0 ? 0 : -strainPerHeight,
    midplaneStrain: meanStrain - strainPerHeight * neutralPlane,
    neutralPlane,
    bendingStiffness,
    stretchingStiffness: stretching,
    effectiveThickness: Math.sqrt((12 * bendingStiffness) / stretching),
  };
}

/**
 * Sums through the stack taken twice: about the mid-plane to find the neutral plane and the mean strain, then about those, so
 * that nothing large cancels for a thin film on a wafer.
 */
function bend(layers: PlacedLayers) {
  const { count, total } = layers;
  if (count > MOST_LAYERS) {
    throw new EngineInputError("layers", `${count} are given`, `at most ${MOST_LAYERS}`);
  }
  MODULUS_FACTORS.fill(1, 0, count);
  for (let n = 0; n < count; n += 1) {
    LAYER_VALUES[n] = layers.thickness[n] ?? 0;
    LAYER_VALUES[count + n] = layers.coveredModulus[n] ?? 0;
  }
  bendAbout(layers, -total / 2, 0);
  const stretching = stretchingOf(0);
  if (!(stretching > 0)) {
    throw new EngineInputError("layers", "no layer covers any area, so the stack has no stiffness");
  }
  const neutralPlane = neutralPlaneOf(0);
  const meanStrain = -forceOf(0) / stretching;
  bendAbout(layers, -total / 2 - neutralPlane, meanStrain);
  return {
    stretching,
    neutralPlane,
    meanStrain,
    bendingStiffness: bendingStiffnessOf(0),
    strainPerHeight: -curvatureOf(0),
  };
}

/** Bends the stack in `LAYER_VALUES`, its lowest face at a height `bottom`, free strains taken over `strain`. */
function bendAbout({ count, coveredModulus, freeStrain }: PlacedLayers, bottom: number, strain: number): void {
  for (let n = 0; n < count; n += 1) {
    LAYER_VALUES[2 * count + n] = -(coveredModulus[n] ?? 0) * ((freeStrain[n] ?? 0) - strain);
  }
  bendStacks(1, count, bottom);
}
