import type { BondState } from "../flow/bond.ts";
import type { WaferState } from "../flow/state.ts";
import { SILICON_DENSITY } from "../silicon/density.ts";

/** Density of a bonding material, kg/m³, common practice, no source: it weighs a fiftieth of a pair. */
const BONDING_MATERIAL_DENSITY = 1100;

/** Density taken for glass whose own is not given, kg/m³: upper end of carrier glasses, common practice, no source. */
export const USUAL_GLASS_DENSITY = 2500;

/** Density of a bond's carrier, kg/m³; null for glass that has none given. */
export function carrierDensity(bond: BondState): number | null {
  if (bond.carrier.density) return bond.carrier.density.value;
  return bond.carrier.material === "silicon" ? SILICON_DENSITY : null;
}

/** Mass per area of a wafer with its carriers, kg/m², films left out (below 1 %); `glass` stands for an unknown density. */
export function arealMass({ silicon, bonds }: WaferState, glass: number): number {
  return bonds.reduce(
    (sum, bond) =>
      sum +
      bond.carrier.thickness.value * (carrierDensity(bond) ?? glass) +
      bond.thickness.value * BONDING_MATERIAL_DENSITY,
    silicon.value * SILICON_DENSITY,
  );
}
