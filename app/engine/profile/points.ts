import { EngineInputError } from "../errors.ts";
import { requireFinite } from "../inputs.ts";

/** One point of a scan across the wafer: position and height, m. Height is positive upwards, device side up. */
export interface ProfilePoint {
  x: number;
  z: number;
}

/** Fewest points from which a curvature with an uncertainty is taken. */
export const FEWEST_POINTS = 7;

/** Refuses scans with a value that is no finite number. */
export function requirePoints(field: string, points: readonly ProfilePoint[]): void {
  points.forEach(({ x, z }, n) => {
    requireFinite(`${field}[${n}].x`, x);
    requireFinite(`${field}[${n}].z`, z);
  });
}

/** Refuses fewer points than a fit can be trusted with. */
export function requireEnough(field: string, count: number): void {
  if (count < FEWEST_POINTS) {
    throw new EngineInputError(field, `${count} usable points are too few`, `at least ${FEWEST_POINTS}`);
  }
}

/** Points in order of position; points at the same position become one, at their mean height. */
export function sortedByPosition(points: readonly ProfilePoint[]): ProfilePoint[] {
  const groups = new Map<number, number[]>();
  for (const { x, z } of points) {
    const heights = groups.get(x);
    if (heights) heights.push(z);
    else groups.set(x, [z]);
  }
  return [...groups]
    .map(([x, heights]) => ({ x, z: heights.reduce((total, z) => total + z, 0) / heights.length }))
    .sort((a, b) => a.x - b.x);
}
