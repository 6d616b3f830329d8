import { coordinate } from "./coordinate.ts";
import { isBroken } from "./series-gaps.ts";
import type { PlotScales, PlotSeries } from "./plot.ts";

/** A series as path text; the pen is lifted over its gaps. */
export function seriesPath(series: Pick<PlotSeries, "points" | "gaps">, scales: PlotScales): string {
  return series.points
    .map((point, index) => {
      const before = series.points[index - 1];
      const move = before === undefined || isBroken(series, before.x, point.x);
      return `${move ? "M" : "L"}${coordinate(scales.x(point.x))} ${coordinate(scales.y(point.y))}`;
    })
    .join("");
}
