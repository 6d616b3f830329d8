import { EngineInputError } from "../errors.ts";
import { freeStrain, type NamedLayer } from "./free-strain.ts";
import { checkLayer, ROOM_TEMPERATURE, type Layer } from "./layer.ts";
import {
  bendingStiffnessOf,
  LAMINATE_SUMS,
  laminateSums,
  meanStrainOf,
  neutralPlaneOf,
  strainPerHeightOf,
  stretchingOf,
} from "./laminate-sums.ts";

export interface LaminateResult {
  /** 1/m, positive when the top face (device side) is concave. */
  curvature: number;
  /** Strain of the stack's mid-plane against the flat base at 298.15 K. */
  midplaneStrain: number;
  /** Height of the neutral plane over the mid-plane, m. */
  neutralPlane: number;
  /** Biaxial bending stiffness about the neutral plane, N·m: M h³/12 for one layer. */
  bendingStiffness: number;
  /** sqrt(12 D/A) with the bending stiffness D and the stretching stiffness A, m: the thickness of one layer for one layer. */
  effectiveThickness: number;
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
 * Source: Townsend, Barnett and Brunner 1987; Hsueh 2002; Hsueh, Lee and Chuang 2003. Two layers: Freund, Floro and Chason 1999.
 */
export function solveLaminate(layersBottomToTop: readonly Layer[], o: { temperature?: number } = {}): LaminateResult {
  const temperature = o.temperature ?? ROOM_TEMPERATURE;
  const layers = place(layersBottomToTop, temperature);
  const { stretching, neutralPlane, meanStrain, bendingStiffness, strainPerHeight } = bend(layers);
  const stressAt = (l: PlacedLayer, z: number) =>
    l.biaxialModulus * (meanStrain - l.freeStrain + strainPerHeight * (z - neutralPlane));
  return {
    curvature: strainPerHeight === 0 ? 0 : -strainPerHeight,
    midplaneStrain: meanStrain - strainPerHeight * neutralPlane,
    neutralPlane,
    bendingStiffness,
    effectiveThickness: Math.sqrt((12 * bendingStiffness) / stretching),
    freeStrain: layers.map((l) => l.freeStrain),
    stressBottom: layers.map((l) => stressAt(l, l.centre - l.thickness / 2)),
    stressTop: layers.map((l) => stressAt(l, l.centre + l.thickness / 2)),
    meanStress: layers.map((l) => stressAt(l, l.centre)),
  };
}

/**
 * Sums through the stack taken twice: about the mid-plane to find the neutral plane and the mean strain, then about those, so
 * that nothing large cancels for a thin film on a wafer.
 */
function bend(layers: readonly PlacedLayer[]) {
  const thickness = Float64Array.from(layers, (l) => l.thickness);
  const modulus = Float64Array.from(layers, (l) => l.coveredModulus);
  const bottom = -sum(layers, (l) => l.thickness) / 2;
  const sums = new Float64Array(LAMINATE_SUMS);
  const sumAbout = (plane: number, strain: number) => {
    const pressure = Float64Array.from(layers, (l) => l.coveredModulus * (l.freeStrain - strain));
    laminateSums(layers.length, thickness, 0, modulus, pressure, bottom - plane, sums);
  };
  sumAbout(0, 0);
  const stretching = stretchingOf(sums);
  if (!(stretching > 0)) {
    throw new EngineInputError("layers", "no layer covers any area, so the stack has no stiffness");
  }
  const neutralPlane = neutralPlaneOf(sums);
  const meanStrain = meanStrainOf(sums);
  sumAbout(neutralPlane, meanStrain);
  return {
    stretching,
    neutralPlane,
    meanStrain,
    bendingStiffness: bendingStiffnessOf(sums),
    strainPerHeight: strainPerHeightOf(sums),
  };
}

interface PlacedLayer {
  thickness: number;
  biaxialModulus: number;
  /** Biaxial modulus times area fraction, Pa. */
  coveredModulus: number;
  /** Height of the layer's middle over the mid-plane of the stack, m. */
  centre: number;
  freeStrain: number;
}

function place(layersBottomToTop: readonly Layer[], temperature: number): PlacedLayer[] {
  const named: NamedLayer[] = layersBottomToTop.map((layer, n) => {
    const field = `layers[${n}]`;
    return { layer: checkLayer(layer, field), field };
  });
  const base = findBase(named);
  const total = sum(named, ({ layer }) => layer.thickness);
  let below = 0;
  return named.map((entry) => {
    const { thickness, biaxialModulus, coverage } = entry.layer;
    const centre = below + thickness / 2 - total / 2;
    below += thickness;
    return {
      thickness,
      biaxialModulus,
      coveredModulus: biaxialModulus * coverage,
      centre,
      freeStrain: freeStrain(entry, base, temperature),
    };
  });
}

/** The layer whose flat state is the zero of strain: the first that expands as silicon, else the thickest. */
export function findBase(layers: NamedLayer[]): NamedLayer {
  const silicon = layers.find(({ layer }) => layer.cte === "silicon");
  if (silicon) return silicon;
  const [first, ...rest] = layers;
  if (!first) throw new EngineInputError("layers", "the stack is empty", "at least one layer");
  return rest.reduce((thickest, next) => (next.layer.thickness > thickest.layer.thickness ? next : thickest), first);
}

function sum<T>(items: readonly T[], of: (item: T) => number): number {
  return items.reduce((total, item) => total + of(item), 0);
}
