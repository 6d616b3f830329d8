import { requireCurvature, requireModulus, requirePoisson, requireRadius, requireThickness } from "../../inputs.ts";
import { solveLaminate } from "../../laminate/solve-laminate.ts";
import type { Orientation } from "../../silicon/orientation.ts";
import { siliconPlateConstants } from "../../silicon/plane-constants.ts";
import { stoneyStress } from "../../stoney/stoney.ts";
import { formatQuantity } from "../../units/format.ts";
import { linearCurvatureOf } from "./linear-curvature.ts";

export interface FullModelInput {
  /** curvature of the parabola through the scan before and after the film, 1/m, film side up */
  before: number;
  after: number;
  /** of the wafer, m */
  radius: number;
  /** m */
  substrateThickness: number;
  orientation: Orientation;
  /** m */
  filmThickness: number;
  /** stiffness of the film; left out, it is taken as stiff as the wafer */
  film?: { youngsModulus: number; poissonsRatio: number };
}

export interface StressBothWays {
  /** by Stoney's relation, Pa */
  stoney: number;
  /** by laminate and plate, Pa: the stress that the film has on a rigid substrate; null when the wafer has rolled */
  full: number | null;
  /** full over Stoney less 1; null with it */
  difference: number | null;
  /** they differ by more than 1 %, so that both are to be shown */
  differs: boolean;
  /** share of the difference by the film's thickness and stiffness, and by the size of the deflection */
  byThickness: number | null;
  byDeflection: number | null;
  sentence: string;
}

/** Share from which both stresses are shown. */
export const WORTH_BOTH = 0.01;

const percent = (share: number) =>
  formatQuantity(Math.abs(share), "fraction", { unit: "%", significant: 2, trim: true });

/**
 * Stress of a film from the curvatures of a scan before and after it, by Stoney's relation and by the full model, which also holds
 * for films that are not thin against the wafer and for bows that are not small: the curvatures of the free wafer's true shape are led
 * back to those of small deflections (plate), and these to the stress of the film in the stack (laminate).
 *
 * The wafer's own curvature before the film counts as part of its shape, and the film as deposited on it. Valid up to the onset of
 * rolling; beyond it there is no stress by either. Film uniform over the wafer, gravity left out or equal in both scans.
 * Round trip through laminate and plate within 1e-9 (tested).
 * @throws EngineInputError for inputs out of range
 * Source: Stoney 1909; Freund, Floro and Chason 1999; Freund 2000; own computation ('plate-von-karman').
 */
export function stressBothWays(i: FullModelInput): StressBothWays {
  const [before, after] = [requireCurvature("before", i.before), requireCurvature("after", i.after)];
  requireRadius("radius", i.radius);
  requireThickness("substrateThickness", i.substrateThickness);
  const silicon = siliconPlateConstants(i.orientation);
  const biaxialModulus = silicon.youngsModulus / (1 - silicon.poissonsRatio);
  const stoney = stoneyStress({ ...i, biaxialModulus, curvatureChange: after - before });
  const film = i.film ?? silicon;
  requireModulus("film.youngsModulus", film.youngsModulus);
  requirePoisson("film.poissonsRatio", film.poissonsRatio);
  const unit = 1e6;
  const wafer = { ...silicon, thickness: i.substrateThickness };
  const stack = solveLaminate([wafer, { ...film, thickness: i.filmThickness, stress: unit }]);
  const plate = { radius: i.radius, ...silicon, crystal: i.orientation };
  const linearBefore = linearCurvatureOf({ ...plate, thickness: i.substrateThickness }, before);
  const linearAfter = linearCurvatureOf({ ...plate, thickness: stack.effectiveThickness }, after);
  if (linearBefore === null || linearAfter === null)
    return {
      stoney,
      full: null,
      difference: null,
      differs: true,
      byThickness: null,
      byDeflection: null,
      sentence:
        "A free wafer of this thickness cannot hold that curvature as a bowl: it has rolled, and neither relation gives a stress.",
    };
  const change = linearAfter - linearBefore;
  const full = (change * unit) / stack.curvature;
  if (stoney === 0) return { ...NOTHING, stoney, full: 0 };
  const difference = full / stoney - 1;
  const byDeflection = change / (after - before) - 1;
  const byThickness = (1 + difference) / (1 + byDeflection) - 1;
  const differs = Math.abs(difference) > WORTH_BOTH;
  const stiffness = i.film ? "" : " The film's stiffness is not given and taken as the wafer's.";
  const more = full > 0 === difference > 0 ? "further towards tension" : "further towards compression";
  return {
    stoney,
    full,
    difference,
    differs,
    byThickness,
    byDeflection,
    sentence: differs
      ? `The full model lies ${percent(difference)} ${more}: ${percent(byThickness)} by the film's thickness, ${percent(byDeflection)} by the size of the bow.${stiffness}`
      : `The full model agrees with the thin-film relation within 1 %.${stiffness}`,
  };
}

const NOTHING = {
  difference: 0,
  differs: false,
  byThickness: 0,
  byDeflection: 0,
  sentence: "The scans show no change of curvature.",
};
