import { siliconStiffness, type CubicStiffness } from "./elastic-constants.ts";
import { requireOrientation, type Orientation } from "./orientation.ts";

/**
 * Biaxial modulus, Pa, of a cubic crystal whose face is (001) or (111): the equal stress in both directions of the plane per
 * equal strain, with the faces free. Both planes are isotropic in this sense, so no direction is needed.
 * (001): C11 + C12 − 2 C12²/C11. (111): 6 C44 (C11 + 2 C12)/(C11 + 2 C12 + 4 C44).
 * Source: exercise statement 'Biaxial modulus of a zinc-blende epitaxial layer of orientation (hkl)'; Brantley 1973.
 */
export function cubicBiaxialModulus(orientation: Orientation, { c11, c12, c44 }: CubicStiffness): number {
  switch (requireOrientation("orientation", orientation)) {
    case "100":
      return c11 + c12 - (2 * c12 * c12) / c11;
    case "111":
      return (6 * c44 * (c11 + 2 * c12)) / (c11 + 2 * c12 + 4 * c44);
  }
}

/**
 * Biaxial modulus of silicon, Pa, for a wafer of the given face at `temperature` (K, default 298.15, range 150 to 1000).
 * 180.2 GPa for (100) and 229.0 GPa for (111) at 25 °C; it falls by about 0.9 % per 100 K.
 */
export function siliconBiaxialModulus(orientation: Orientation, temperature?: number): number {
  return cubicBiaxialModulus(orientation, siliconStiffness(temperature));
}
