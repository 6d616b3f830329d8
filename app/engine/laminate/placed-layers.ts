import { EngineInputError } from "../errors.ts";
import { newColumn } from "./column.ts";
import { freeStrain, type NamedLayer } from "./free-strain.ts";

/**
 * Checked layers at their heights in a stack, bottom to top, with their free strains at one temperature: one column for each
 * figure, because a flow places hundreds of thousands of layers and an object for each would cost more than the sums.
 */
export interface PlacedLayers {
  count: number;
  /** m */
  thickness: Float64Array;
  /** Pa */
  biaxialModulus: Float64Array;
  /** Biaxial modulus times area fraction, Pa. */
  coveredModulus: Float64Array;
  /** Height of the layer's middle over the mid-plane of the stack, m. */
  centre: Float64Array;
  /** In the middle of the layer, `flowed` in it. */
  freeStrain: Float64Array;
  /** Strain that the layer has flowed since it was stated. */
  flowed: Float64Array;
  /** Thickness of the whole stack, m. */
  total: number;
}

/** Puts layers, bottom to top, on one another, their free strains taken at `temperature` (K) against the base layer. */
export function placeLayers(layersBottomToTop: readonly NamedLayer[], temperature: number): PlacedLayers {
  const base = findBase(layersBottomToTop);
  const placed = emptyColumns(layersBottomToTop.length);
  let total = 0;
  for (const { layer } of layersBottomToTop) total += layer.thickness;
  placed.total = total;
  let below = 0;
  let n = 0;
  for (const entry of layersBottomToTop) {
    const { thickness, biaxialModulus, coverage } = entry.layer;
    placed.thickness[n] = thickness;
    placed.biaxialModulus[n] = biaxialModulus;
    placed.coveredModulus[n] = biaxialModulus * coverage;
    placed.centre[n] = below + thickness / 2 - total / 2;
    placed.freeStrain[n] = freeStrain(entry, base, temperature);
    below += thickness;
    n += 1;
  }
  return placed;
}

function emptyColumns(count: number): PlacedLayers {
  return {
    count,
    thickness: newColumn(count),
    biaxialModulus: newColumn(count),
    coveredModulus: newColumn(count),
    centre: newColumn(count),
    freeStrain: newColumn(count),
    flowed: newColumn(count),
    total: 0,
  };
}

/** The layer whose flat state is the zero of strain: the first that expands as silicon, else the thickest. */
export function findBase(layers: readonly NamedLayer[]): NamedLayer {
  let thickest: NamedLayer | undefined;
  for (const entry of layers) {
    if (entry.layer.cte === "silicon") return entry;
    if (!thickest || entry.layer.thickness > thickest.layer.thickness) thickest = entry;
  }
  if (!thickest) throw new EngineInputError("layers", "the stack is empty", "at least one layer");
  return thickest;
}

/** Lets the placed layer at `at` flow by a strain, tension positive: it is longer for good. */
export function letFlow(placed: PlacedLayers, at: number, by: number): void {
  placed.freeStrain[at] = (placed.freeStrain[at] ?? 0) + by;
  placed.flowed[at] = (placed.flowed[at] ?? 0) + by;
}
