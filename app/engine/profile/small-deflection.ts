import { requireCurvature } from "../inputs.ts";
import type { PlateInput } from "../plate/free-wafer-shape.ts";
import type { Orientation } from "../silicon/orientation.ts";
import { siliconPlateConstants } from "../silicon/plane-constants.ts";
import { linearCurvatureOf } from "./stress/linear-curvature.ts";

export interface MonitorShapeInput {
  /** Curvature of the parabola through the scan before and after the film, 1/m. */
  before: number;
  after: number;
  /** Wafer radius, m. */
  radius: number;
  /** Silicon thickness, m. */
  thickness: number;
  orientation: Orientation;
}

export interface SmallDeflection {
  /**
   * Share by which Stoney's relation understates the film force, because a bowl of this size is stiffer than small deflections
   * say; 0 for small ones. Null when curled.
   */
  understatedBy: number | null;
  /** The free wafer cannot hold this curvature as a bowl: it has rolled about one axis. */
  curled: boolean;
}

/**
 * How far a scanned monitor is from the small deflections that Stoney's relation assumes, the wafer being free and the film
 * uniform. Valid for slopes up to the onset of rolling; gravity left out.
 *
 * Bad input throws `EngineInputError`. Source: Freund 2000; own computation ('plate-von-karman').
 */
export function smallDeflection(i: MonitorShapeInput): SmallDeflection {
  const plate: PlateInput = {
    radius: i.radius,
    thickness: i.thickness,
    ...siliconPlateConstants(i.orientation),
    crystal: i.orientation,
  };
  const [before, after] = [requireCurvature("before", i.before), requireCurvature("after", i.after)];
  const [linearBefore, linearAfter] = [linearCurvatureOf(plate, before), linearCurvatureOf(plate, after)];
  if (linearBefore === null || linearAfter === null) return { understatedBy: null, curled: true };
  if (before === after) return { understatedBy: 0, curled: false };
  return { understatedBy: (linearAfter - linearBefore) / (after - before) - 1, curled: false };
}
