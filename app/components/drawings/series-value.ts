import { isBroken } from "./series-gaps.ts";
import type { Plot, PlotPoint, PlotSeries } from "./plot.ts";

/**
 * Value of a series at x, interpolated along the line as it is drawn (straight in the plot's own scales); null outside
 * the series.
 */
export function seriesValue(plot: Plot, series: PlotSeries, x: number): number | null {
  const after = series.points.findIndex((point) => point.x >= x);
  const right = series.points[after];
  if (right === undefined) return null;
  if (right.x === x) return right.y;
  const left: PlotPoint | undefined = series.points[after - 1];
  if (left === undefined || isBroken(series, left.x, right.x)) return null;
  const onX = plot.x.scale === "log" ? Math.log : identity;
  const share = (onX(x) - onX(left.x)) / (onX(right.x) - onX(left.x));
  if (plot.y.scale === "log") return left.y * (right.y / left.y) ** share;
  return left.y + (right.y - left.y) * share;
}

function identity(value: number): number {
  return value;
}
