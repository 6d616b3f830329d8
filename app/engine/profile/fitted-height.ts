import { beyondParabola } from "./circle.ts";
import type { ProfileFit } from "./fit-scan.ts";

/** Height of the fitted curve at a position, m: the parabola, or the circle where the scan was steep. */
export function fittedHeight(fit: ProfileFit, x: number): number {
  const slope = Math.tan(fit.tilt);
  const distance = x - fit.centre;
  const parabola = (fit.curvature * (1 + slope * slope) ** 1.5 * distance * distance) / 2;
  const rest = fit.steep ? beyondParabola(distance, fit.curvature, slope) : 0;
  return levelHeight(fit, x) + parabola + rest;
}

/** Height of the straight part of a fit at a position, m: what is taken away to level the scan at its middle. */
export function levelHeight(fit: ProfileFit, x: number): number {
  return fit.offset + Math.tan(fit.tilt) * (x - fit.centre);
}
