import { requireCurvature } from "../inputs.ts";
import { criticalLinearCurvature } from "../plate/critical-load.ts";
import { freeWaferShape, type PlateInput } from "../plate/free-wafer-shape.ts";
import type { Orientation } from "../silicon/orientation.ts";
import { siliconPlateConstants } from "../silicon/plane-constants.ts";

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

/** Halvings of the range in which the small-deflection curvature is sought: more than a double's digits need no more. */
const HALVINGS = 60;

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
  const onset = criticalLinearCurvature(plate) * (1 - 1e-9);
  const [before, after] = [requireCurvature("before", i.before), requireCurvature("after", i.after)];
  const largest = scanned(plate, onset);
  if (Math.max(Math.abs(before), Math.abs(after)) >= largest) return { understatedBy: null, curled: true };
  if (before === after) return { understatedBy: 0, curled: false };
  const linear = (curvature: number) => Math.sign(curvature) * linearFor(plate, Math.abs(curvature), onset);
  return { understatedBy: (linear(after) - linear(before)) / (after - before) - 1, curled: false };
}

/** Curvature that a scan of the free wafer shows under a small-deflection curvature, 1/m. */
const scanned = (plate: PlateInput, linearCurvature: number) =>
  freeWaferShape({ ...plate, linearCurvature }).parabolaCurvatureMajor;

/** The small-deflection curvature under which a scan shows `curvature`; what is shown grows with it up to the onset. */
function linearFor(plate: PlateInput, curvature: number, onset: number): number {
  let [low, high] = [curvature, onset];
  for (let n = 0; n < HALVINGS; n += 1) {
    const middle = (low + high) / 2;
    if (scanned(plate, middle) < curvature) low = middle;
    else high = middle;
  }
  return (low + high) / 2;
}
