import { warpPlot, type WarpPlotInput } from "../drawings/warp-plot.ts";
import { ChartFigure } from "./ChartFigure.tsx";

export interface WarpChartProps {
  data: WarpPlotInput;
  /** Accessible name, such as 'Warp against silicon thickness, free wafer'. */
  label: string;
  /** What it shows, in one sentence. */
  summary: string;
}

/** Warp of the free wafer against silicon thickness, with the site's thickness limits and the equipment's warp limit. */
export function WarpChart({ data, label, summary }: WarpChartProps) {
  return <ChartFigure plot={warpPlot(data)} label={label} summary={summary} xName="Silicon thickness" />;
}
