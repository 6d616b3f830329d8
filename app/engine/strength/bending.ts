import { EngineInputError } from "../errors.ts";
import { requireThickness, requireWithin } from "../inputs.ts";
import { siliconBiaxialModulus } from "../silicon/biaxial-modulus.ts";
import { siliconPlaneStiffness } from "../directional/plane-stiffness.ts";

/** How silicon (001) is bent: to a cylinder whose curved direction is <100> or <110>, or to a sphere. */
export type BendDirection = "100" | "110" | "biaxial";

/** Stress per strain at the outer face, Pa: E/(1 − ν²) along the bend of a cylinder, E/(1 − ν) of a sphere. */
export function bendingModulus(direction: BendDirection): number {
  switch (direction) {
    case "100":
    case "110":
      return siliconPlaneStiffness(direction).xx;
    case "biaxial":
      return siliconBiaxialModulus("100");
    default:
      throw new EngineInputError("direction", "is not a bend known here", "100, 110 or biaxial");
  }
}

/**
 * Tension, Pa, at the outer face of a silicon (001) wafer of `thickness` (m) bent to `radiusOfCurvature` (m): E' h/(2 ρ), with
 * E' 169.6 GPa for a roll along <110>, 141.0 GPa along <100>, 180.2 GPa for a sphere.
 *
 * A wide roll held from curving across; no film. Elastic, radii far above the thickness. Bad input throws `EngineInputError`.
 * Source: plate theory, Timoshenko and Woinowsky-Krieger 1959; constants as `siliconStiffness`.
 */
export function bendingStress(i: { thickness: number; radiusOfCurvature: number; direction: BendDirection }): number {
  const thickness = requireThickness("thickness", i.thickness);
  const radius = requireWithin("radiusOfCurvature", i.radiusOfCurvature, thickness, 1e9, "m");
  return (bendingModulus(i.direction) * thickness) / (2 * radius);
}

/** Smallest radius, m, to which a wafer may be bent before its outer face reaches `stress` (Pa): the inverse of `bendingStress`. */
export function minimumBendRadius(i: { thickness: number; stress: number; direction: BendDirection }): number {
  const thickness = requireThickness("thickness", i.thickness);
  const stress = requireWithin("stress", i.stress, 1, 1e11, "Pa");
  return (bendingModulus(i.direction) * thickness) / (2 * stress);
}
