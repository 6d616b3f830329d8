import { criticalLinearCurvature } from "../../plate/critical-load.ts";
import { freeWaferShape, type PlateInput } from "../../plate/free-wafer-shape.ts";

/** Halvings of the range in which the small-deflection curvature is sought: more than a double's digits need no more. */
const HALVINGS = 60;

/**
 * Curvature by small-deflection theory, 1/m, under which a scan of the free wafer shows the parabola curvature `scanned` (1/m): what
 * is shown grows with it up to the onset of rolling. Null beyond that: the wafer cannot hold such a bowl.
 * Source: own computation ('plate-von-karman').
 */
export function linearCurvatureOf(plate: PlateInput, scanned: number): number | null {
  const onset = criticalLinearCurvature(plate) * (1 - 1e-9);
  const size = Math.abs(scanned);
  if (size >= shown(plate, onset)) return null;
  let [low, high] = [size, onset];
  for (let n = 0; n < HALVINGS && high - low > 1e-15 * high; n += 1) {
    const middle = (low + high) / 2;
    if (shown(plate, middle) < size) low = middle;
    else high = middle;
  }
  return (Math.sign(scanned) * (low + high)) / 2;
}

/** Curvature of the parabola that a scan of the free wafer shows, 1/m. */
const shown = (plate: PlateInput, linearCurvature: number) =>
  freeWaferShape({ ...plate, linearCurvature }).parabolaCurvatureMajor;
