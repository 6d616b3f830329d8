import {
  applyStiffness,
  isotropicStiffness,
  siliconPlaneStiffness,
  type PlaneTensor,
  type SiliconDirection,
} from "../../directional/plane-stiffness.ts";
import { requireCurvature, requireThickness } from "../../inputs.ts";
import { requireOrientation, type Orientation } from "../../silicon/orientation.ts";
import { siliconPlateConstants } from "../../silicon/plane-constants.ts";

export interface DirectionalStressInput {
  /** change of curvature, post less pre, 1/m: w = x² x/2 + y² y/2 + twist x y, x at azimuth 0 (towards the notch) */
  change: { x: number; y: number; twist: number };
  /** m */
  filmThickness: number;
  /** m */
  substrateThickness: number;
  orientation: Orientation;
  /** crystal direction from the centre to the notch of a (100) wafer; default 110 */
  notch?: SiliconDirection;
}

export interface DirectionalStress {
  /** Pa, tension positive; xy is the shear */
  stress: PlaneTensor;
  /** the larger principal stress (with its sign), the one across it, and the angle of its line from azimuth 0, rad */
  principal: { high: number; low: number; angle: number };
}

/**
 * Stress of a thin film that differs with direction, from the change of curvature in all directions: N = h² Q κ/6 with the silicon's
 * stiffness Q in the plane, along x, y and in shear, and σ = N/h_f. With equal curvatures it is Stoney's relation.
 * Thin film, small deflections, uniform film.
 * @throws EngineInputError for inputs out of range
 * Source: own derivation (the inverse of the thin directional laminate); Freund and Suresh 2003, chapter 3.
 */
export function directionalFilmStress(i: DirectionalStressInput): DirectionalStress {
  const thickness = requireThickness("substrateThickness", i.substrateThickness);
  const per = (thickness * thickness) / (6 * requireThickness("filmThickness", i.filmThickness));
  const bent: PlaneTensor = {
    x: requireCurvature("change.x", i.change.x),
    y: requireCurvature("change.y", i.change.y),
    // Engineering shear strain goes with twice the twist.
    xy: 2 * requireCurvature("change.twist", i.change.twist),
  };
  const moment = applyStiffness(stiffnessOf(i), bent);
  const stress = { x: moment.x * per, y: moment.y * per, xy: moment.xy * per };
  const [mean, half] = [(stress.x + stress.y) / 2, (stress.x - stress.y) / 2];
  const apart = Math.hypot(half, stress.xy);
  return { stress, principal: { high: mean + apart, low: mean - apart, angle: Math.atan2(stress.xy, half) / 2 } };
}

function stiffnessOf({ orientation, notch = "110" }: DirectionalStressInput) {
  if (requireOrientation("orientation", orientation) === "100") return siliconPlaneStiffness(notch);
  const { youngsModulus, poissonsRatio } = siliconPlateConstants("111");
  return isotropicStiffness(youngsModulus, poissonsRatio);
}
