import { seriesValue } from "./series-value.ts";
import type { Plot, PlotFrame, PlotScales, PlotSeries } from "./plot.ts";

/**
 * Where the words of a reference line stand: just below and left of a falling line (right of a rising one), at the place
 * along it that keeps farthest from other curves and vertical lines. Null when none of it is in the plot.
 * @param width of the words, px
 * @param verticals places of the plot's vertical lines, px
 */
export function alongLabel(
  plot: Plot,
  series: PlotSeries,
  scales: PlotScales,
  frame: PlotFrame,
  width: number,
  verticals: readonly number[],
): { x: number; y: number; anchor: "start" | "end" } | null {
  let best: { x: number; y: number; anchor: "start" | "end"; clear: number } | null = null;
  for (let index = 1; index < series.points.length - 1; index += 1) {
    const point = series.points[index];
    const next = series.points[index + 1];
    if (point === undefined || next === undefined) continue;
    const x = scales.x(point.x);
    const y = scales.y(point.y);
    const falling = scales.y(next.y) > y;
    const from = falling ? x - 6 - width : x + 6;
    const base = y + 15;
    if (from < frame.left + 4 || from + width > frame.right - 4 || y < frame.top + 24 || base > frame.bottom - 40)
      continue;
    const middle = from + width / 2;
    const fromLines = verticals.map((line) => Math.max(0, Math.abs(line - middle) - width / 2));
    const fromCurves = plot.series.flatMap((other) => {
      if (other === series) return [];
      const value = seriesValue(plot, other, point.x);
      return value === null ? [] : [Math.abs(scales.y(value) - base)];
    });
    const clear = Math.min(40, ...fromLines, ...fromCurves);
    if (best === null || clear > best.clear) {
      best = { x: falling ? x - 6 : x + 6, y: base, anchor: falling ? "end" : "start", clear };
    }
  }
  return best;
}
