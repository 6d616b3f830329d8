import { siliconBiaxialModulus } from "../silicon/biaxial-modulus.ts";
import { siliconStiffness } from "../silicon/elastic-constants.ts";

/**
 * Resistance of a plate to a difference of its two curvatures, over its biaxial modulus: (C11 − C12)/M for a difference along
 * the axes, 2 C44/M for one between them. Both are (1 − ν)/(1 + ν) for an isotropic plate.
 */
export interface ShearRatios {
  along: number;
  between: number;
}

/** The ratios of an isotropic plate. */
export function isotropicRatios(poissonsRatio: number): ShearRatios {
  const ratio = (1 - poissonsRatio) / (1 + poissonsRatio);
  return { along: ratio, between: ratio };
}

/**
 * λ: stiffness of the membrane over the biaxial modulus, the inverse of its compliance averaged over all directions; 1 − ν for
 * an isotropic plate. It is what a uniform product of curvatures works against, whatever the direction of the roll.
 */
export function membraneStiffness({ along, between }: ShearRatios): number {
  return 4 / (2 + 1 / along + 1 / between);
}

/** The ratios of a silicon (001) wafer at 25 °C with the axes along <100>; temperature moves them by some 1e-5 per kelvin. */
export function siliconRatios(): ShearRatios {
  const { c11, c12, c44 } = siliconStiffness();
  const modulus = siliconBiaxialModulus("100");
  return { along: (c11 - c12) / modulus, between: (2 * c44) / modulus };
}

/** Poisson's ratio whose range of shapes the tables of silicon (001) share. */
export const SILICON_RANGE = 0.28;
