import { columnsOf } from "./columns.ts";
import { fitScan, type FitOptions, type ProfileFit } from "./fit-scan.ts";
import type { ProfilePoint } from "./points.ts";

export type { FitOptions, ProfileFit } from "./fit-scan.ts";

/** `fitScan` of a list of points. */
export function fitProfile(points: readonly ProfilePoint[], o: FitOptions): ProfileFit {
  return fitScan(columnsOf(points), o);
}
