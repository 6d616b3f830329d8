import type { Plot, PlotFrame } from "./plot.ts";
import { textWidth } from "./text-width.ts";

/**
 * Margins of a plot: left for the ticks' text, below for ticks and title, right for the labels at the line ends (60 to
 * 170 px), or next to none where the series are listed below.
 */
export function plotFrame(plot: Plot, width: number, height: number, textSize: number, endLabels: boolean): PlotFrame {
  const ticks = Math.max(...plot.y.ticks.map((tick) => textWidth(tick.text, textSize)), 0);
  const labels = plot.series
    .filter(({ labelled = "end" }) => labelled === "end")
    .map((series) => textWidth(series.endLabel ?? series.label, textSize, true) + 18);
  const right = endLabels ? Math.min(170, Math.max(60, ...labels)) : 12;
  return {
    left: Math.ceil(ticks + 10),
    right: width - Math.ceil(right),
    top: textSize,
    bottom: height - Math.ceil(textSize * (plot.x.title === undefined ? 2 : 3.5)),
  };
}
