import { requireCurvature, requireModulus, requireStress, requireThickness } from "../inputs.ts";

export interface StoneyFilm {
  /** m */
  filmThickness: number;
  /** m */
  substrateThickness: number;
  /** Biaxial modulus E/(1 − ν) of the substrate, Pa. */
  biaxialModulus: number;
}

/**
 * Curvature, 1/m, that a thin film of stress `filmStress` (Pa, tension positive) on the device side gives a flat wafer:
 * κ = 6 σ h_f / (M h²). Positive is a bowl. A film on the back side bends the other way: negate the result.
 *
 * Valid for a film far thinner than the wafer (the error is about 3 h_f/h for a film as stiff as the wafer), a uniform film
 * over the whole wafer, small slopes and a bow well below the wafer's thickness. Bad input throws `EngineInputError`.
 * Source: Stoney 1909 in its biaxial form; Feng, Huang and Rosakis 2007, equation (1).
 */
export function stoneyCurvature(i: StoneyFilm & { filmStress: number }): number {
  const { force, stiffness } = thinFilm(i);
  return (requireStress("filmStress", i.filmStress) * force) / stiffness;
}

/**
 * Stress, Pa, of a thin film from the change of curvature that it made (1/m, positive towards a bowl seen from the film's
 * side): σ = M h² Δκ / (6 h_f). Same range and source as `stoneyCurvature`, of which it is the inverse.
 */
export function stoneyStress(i: StoneyFilm & { curvatureChange: number }): number {
  const { force, stiffness } = thinFilm(i);
  return (requireCurvature("curvatureChange", i.curvatureChange) * stiffness) / force;
}

/** Six film thicknesses (m) over M h² (N): the one place where Stoney's relation is written. */
function thinFilm(i: StoneyFilm): { force: number; stiffness: number } {
  const film = requireThickness("filmThickness", i.filmThickness);
  const wafer = requireThickness("substrateThickness", i.substrateThickness);
  return { force: 6 * film, stiffness: requireModulus("biaxialModulus", i.biaxialModulus) * wafer * wafer };
}
