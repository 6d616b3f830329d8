import { isotropicRatios, SILICON_RANGE, siliconRatios } from "../shear-ratios.ts";
import type { TableSize } from "./build-table.ts";
import { chebyshevPoints, type StateFamily } from "./states.ts";

/** Isotropic plates, ν from 0 to 0.5. */
export const ISOTROPIC_SIZE: TableSize = { along: 24, across: 16, energy: [20, 14, 6], measures: [16, 11, 5] };

export function isotropicFamilies(): StateFamily[] {
  return chebyshevPoints(7).map((z) => {
    const poissonsRatio = (1 + z) / 4;
    return { ratios: isotropicRatios(poissonsRatio), poissonsRatio, z };
  });
}

/** Silicon (001), one family rolled about <100> and one about <110>; each fills a table of its own. */
export const SILICON_SIZE: TableSize = { along: 24, across: 16, energy: [20, 14, 1], measures: [16, 11, 1] };

export function siliconFamilies(): { soft: StateFamily; hard: StateFamily } {
  const { along, between } = siliconRatios();
  return {
    soft: { ratios: { along, between }, poissonsRatio: SILICON_RANGE, z: 0 },
    hard: { ratios: { along: between, between: along }, poissonsRatio: SILICON_RANGE, z: 0 },
  };
}
