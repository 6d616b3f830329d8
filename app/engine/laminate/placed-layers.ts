import { EngineInputError } from "../errors.ts";
import { freeStrain, type NamedLayer } from "./free-strain.ts";

/** A checked layer at its height in a stack, with its free strain at one temperature. */
export interface PlacedLayer {
  thickness: number;
  /** Pa */
  biaxialModulus: number;
  /** Biaxial modulus times area fraction, Pa. */
  coveredModulus: number;
  /** The same times thickness, N/m. */
  stiffness: number;
  /** Height of the layer's middle over the mid-plane of the stack, m. */
  centre: number;
  /** In the middle of the layer, `flowed` in it. */
  freeStrain: number;
  /** Strain that the layer has flowed since it was stated. */
  flowed: number;
}

/** Puts layers, bottom to top, on one another, their free strains taken at `temperature` (K) against the base layer. */
export function placeLayers(layersBottomToTop: readonly NamedLayer[], temperature: number): PlacedLayer[] {
  const base = findBase(layersBottomToTop);
  let total = 0;
  for (const { layer } of layersBottomToTop) total += layer.thickness;
  let below = 0;
  return layersBottomToTop.map((entry) => {
    const { thickness, biaxialModulus, coverage } = entry.layer;
    const centre = below + thickness / 2 - total / 2;
    below += thickness;
    return {
      thickness,
      biaxialModulus,
      coveredModulus: biaxialModulus * coverage,
      stiffness: biaxialModulus * coverage * thickness,
      centre,
      freeStrain: freeStrain(entry, base, temperature),
      flowed: 0,
    };
  });
}

/** The layer whose flat state is the zero of strain: the first that expands as silicon, else the thickest. */
export function findBase(layers: readonly NamedLayer[]): NamedLayer {
  const silicon = layers.find(({ layer }) => layer.cte === "silicon");
  if (silicon) return silicon;
  const [first, ...rest] = layers;
  if (!first) throw new EngineInputError("layers", "the stack is empty", "at least one layer");
  return rest.reduce((thickest, next) => (next.layer.thickness > thickest.layer.thickness ? next : thickest), first);
}

/** Lets a placed layer flow by a strain, tension positive: it is longer for good. */
export function letFlow(layer: PlacedLayer, by: number): void {
  layer.freeStrain += by;
  layer.flowed += by;
}
