import { colour } from "../drawings/colour.ts";
import type { Plot, PlotFrame, PlotScales } from "../drawings/plot.ts";
import { seriesValue } from "../drawings/series-value.ts";

export interface PlotCursorProps {
  plot: Plot;
  /** Value on the x axis. */
  x: number;
  frame: PlotFrame;
  scales: PlotScales;
}

/** The read-out's cursor: a line across the plot and a dot on every curve. */
export function PlotCursor({ plot, x, frame, scales }: PlotCursorProps) {
  const at = scales.x(x);
  return (
    <g pointerEvents="none">
      <path d={`M${at} ${frame.top}V${frame.bottom}`} stroke={colour("copper")} />
      {plot.series.map((series) => {
        const value = seriesValue(plot, series, x);
        if (value === null || value < plot.y.from || value > plot.y.to) return null;
        return <circle key={series.id} cx={at} cy={scales.y(value)} r="3" fill={colour(series.colourToken)} />;
      })}
    </g>
  );
}
