import { EngineInputError } from "../errors.ts";

/** One point of a scan across the wafer: position and height, m. Height is positive upwards, device side up. */
export interface ProfilePoint {
  x: number;
  z: number;
}

/** Fewest points from which a curvature with an uncertainty is taken. */
export const FEWEST_POINTS = 7;

/** Refuses fewer points than a fit can be trusted with. */
export function requireEnough(field: string, count: number): void {
  if (count < FEWEST_POINTS) {
    throw new EngineInputError(field, `${count} usable points are too few`, `at least ${FEWEST_POINTS}`);
  }
}
