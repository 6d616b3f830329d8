import { colour } from "../drawings/colour.ts";
import type { Plot, PlotFrame } from "../drawings/plot.ts";
import { plotScale } from "../drawings/plot-scale.ts";
import { seriesValue } from "../drawings/series-value.ts";

export interface PlotCursorProps {
  plot: Plot;
  /** Value on the x axis. */
  x: number;
  /** Of the drawing that it lies over, px. */
  width: number;
  height: number;
  frame: PlotFrame;
}

/** The read-out's cursor, laid over a plot: a line across it and a dot on every curve. */
export function PlotCursor({ plot, x, width, height, frame }: PlotCursorProps) {
  const at = plotScale(plot.x, frame.left, frame.right)(x);
  const y = plotScale(plot.y, frame.bottom, frame.top);
  return (
    <svg className="pointer-events-none absolute top-0 left-0" width={width} height={height} aria-hidden="true">
      <path d={`M${at} ${frame.top}V${frame.bottom}`} stroke={colour("copper")} />
      {plot.series.map((series) => {
        const value = seriesValue(plot, series, x);
        if (value === null || value < plot.y.from || value > plot.y.to) return null;
        return <circle key={series.id} cx={at} cy={y(value)} r="3" fill={colour(series.colourToken)} />;
      })}
    </svg>
  );
}
