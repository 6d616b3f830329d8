import { stoneyStress } from "../stoney/stoney.ts";
import { checkPlate, type PlateInput } from "./free-wafer-shape.ts";
import { criticalLoad } from "./shape-model.ts";

/**
 * Curvature of small-deflection theory, 1/m, at which a free wafer under equal bending starts to roll about one axis:
 * 4 h S_cr/R². The wafer's own curvature is smaller by then. Within 0.05 % of a full von Karman solution for ν from 0 to 0.45
 * and for silicon (100). The axes of the load do not matter: a crystal rolls about <100> whatever the load's axes.
 * Source: Freund 2000, with the true onset by own computation ('plate-von-karman').
 */
export function criticalLinearCurvature(i: PlateInput): number {
  const { radius, thickness, kind } = checkPlate(i);
  return (4 * thickness * criticalLoad(kind)) / (radius * radius);
}

/**
 * Film force, N/m, of a thin film over the whole wafer at which it starts to roll: M h² κ_cr/6, that is (2/3) M h³ S_cr/R².
 * It falls with the cube of the thickness: 1 µm of film at 100 MPa is 100 N/m, a 100 µm wafer of 300 mm takes some 7 N/m.
 */
export function criticalFilmForce(i: PlateInput): number {
  const { thickness, biaxialModulus } = checkPlate(i);
  // The force is stress times thickness, so Stoney's relation for a film of the wafer's own thickness gives it.
  const stress = stoneyStress({
    curvatureChange: criticalLinearCurvature(i),
    filmThickness: thickness,
    substrateThickness: thickness,
    biaxialModulus,
  });
  return stress * thickness;
}
