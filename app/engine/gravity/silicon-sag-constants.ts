import { siliconDirectionalConstants, siliconPlateConstants, type PlateConstants } from "../silicon/plane-constants.ts";
import type { Orientation } from "../silicon/orientation.ts";
import type { Support } from "./support.ts";

/**
 * Young's modulus and Poisson's ratio with which `gravitySag` stands for a silicon wafer on `support`. `across` is the crystal
 * direction that runs across the rails, <110> for a wafer whose notch points along or across them.
 *
 * (111) is isotropic. A (100) wafer on two rails bends across them, so it takes the constants of that direction; on all other
 * supports those averaged over the plane. Error of the sag against the plate with cubic stiffness (own computation,
 * 'plate-gravity-cubic'): ring under the rim 0.03 %, inner rings and centre point up to 3.4 % low, three points at the rim 0.8 %
 * low and at 0.645 of the radius 4 to 9 % low by azimuth, six or more 2 %, four points 5 to 17 % either way by azimuth; rails
 * 0.7 % from 0.9 of the radius on, 2 % at 0.6 to 0.75, 5 % at 0.3 to 0.4, 12 % at 0.5, where the sag is least. The averaged
 * constants would be 21 % off on rails near the rim.
 */
export function siliconSagConstants(
  orientation: Orientation,
  support: Support,
  across: "100" | "110" = "110",
): PlateConstants {
  if (orientation === "100" && support.kind === "rails") return siliconDirectionalConstants(across);
  return siliconPlateConstants(orientation);
}
