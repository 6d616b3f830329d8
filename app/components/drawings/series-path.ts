import { coordinate } from "./coordinate.ts";
import type { PlotPoint, PlotScales } from "./plot.ts";

/** A series as path text. */
export function seriesPath(points: readonly PlotPoint[], scales: PlotScales): string {
  return points
    .map(
      (point, index) => `${index === 0 ? "M" : "L"}${coordinate(scales.x(point.x))} ${coordinate(scales.y(point.y))}`,
    )
    .join("");
}
