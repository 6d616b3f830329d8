import { EngineInputError } from "../errors.ts";
import { requireTemperature } from "../inputs.ts";
import { checkLayer, ROOM_TEMPERATURE, type CheckedLayer, type Layer } from "./layer.ts";
import { thermalStrain } from "./thermal-strain.ts";

/**
 * Free strain of a layer at `temperature` (K): the strain that it would take if nothing held it, measured from the flat state
 * of the base layer at 298.15 K.
 *
 * e = integral of α_base from 298.15 K to T_ref + integral of α from T_ref to T − σ/M + plastic strain,
 *
 * because the layer's `stress` is what it carries while flat on the base as the base is at the layer's reference temperature
 * T_ref. So a film's own history is in e, and adding, deleting or thinning other layers does not change it.
 * A missing expansion is refused where it would be needed, never taken as zero.
 * Source: product convention; physics as in Freund and Suresh 2003, chapter 2.
 */
export function layerFreeStrain(layer: Layer, base: Layer, temperature: number): number {
  return freeStrain(
    { layer: checkLayer(layer, "layer"), field: "layer" },
    { layer: checkLayer(base, "base"), field: "base" },
    temperature,
  );
}

export interface NamedLayer {
  layer: CheckedLayer;
  /** How errors name it. */
  field: string;
}

/** `layerFreeStrain` for layers that have been checked already. */
export function freeStrain(of: NamedLayer, base: NamedLayer, temperature: number): number {
  const target = requireTemperature("temperature", temperature);
  const { referenceTemperature, stress, biaxialModulus, plasticStrain } = of.layer;
  return (
    expansionBetween(base, ROOM_TEMPERATURE, referenceTemperature) +
    expansionBetween(of, referenceTemperature, target) -
    stress / biaxialModulus +
    plasticStrain
  );
}

function expansionBetween({ layer, field }: NamedLayer, from: number, to: number): number {
  if (from === to) return 0;
  if (layer.cte === null) {
    throw new EngineInputError(`${field}.cte`, `is needed from ${from} K to ${to} K and is missing`);
  }
  return thermalStrain(layer.cte, from, to, `${field}.cte`);
}
