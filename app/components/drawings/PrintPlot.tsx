import { colour } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import { PLOT_DASHES, type Plot, type PlotFrame, type PlotScales } from "./plot.ts";
import { plotFrame } from "./plot-frame.ts";
import { PlotOver } from "./PlotOver.tsx";
import { plotScale } from "./plot-scale.ts";
import { PlotUnder } from "./PlotUnder.tsx";
import { roomyTicks } from "./roomy-ticks.ts";
import { seriesPath } from "./series-path.ts";

export interface PrintPlotProps {
  plot: Plot;
  /** What the plot shows, in words. */
  label: string;
  width?: number;
  height?: number;
  /** px; 12.5 on a screen, 10 on a sheet. */
  textSize?: number;
  /** For narrow places: series are named in a list beside it (PlotLegend) instead of at their ends. */
  withoutEndLabels?: boolean;
  className?: string;
}

/**
 * A line plot as plain SVG, drawn on the server: for paper and e-mail, and in the place of the interactive chart until
 * its script has come. A pure function of the same data as that chart.
 */
export function PrintPlot(props: PrintPlotProps) {
  const { plot, label, width = 608, height = 428, textSize = 12.5, withoutEndLabels = false, className } = props;
  const frame = plotFrame(plot, width, height, textSize, !withoutEndLabels);
  const scales = {
    x: plotScale(plot.x, frame.left, frame.right),
    y: plotScale(plot.y, frame.bottom, frame.top),
  };
  return (
    <svg
      className={className ?? "block h-auto w-full"}
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={label}
    >
      <PlotUnder plot={plot} frame={frame} scales={scales} />
      <Grid plot={plot} frame={frame} scales={scales} textSize={textSize} />
      <svg
        x={frame.left}
        y={frame.top}
        width={frame.right - frame.left}
        height={frame.bottom - frame.top}
        viewBox={`${frame.left} ${frame.top} ${frame.right - frame.left} ${frame.bottom - frame.top}`}
        overflow="hidden"
      >
        {plot.series.map((series) =>
          series.dash === "none" ? null : (
            <path
              key={series.id}
              d={seriesPath(series, scales)}
              fill="none"
              stroke={colour(series.colourToken)}
              strokeWidth={PLOT_DASHES[series.dash].width}
              strokeDasharray={PLOT_DASHES[series.dash].array}
              strokeLinejoin="round"
            />
          ),
        )}
      </svg>
      <PlotOver plot={plot} frame={frame} scales={scales} textSize={textSize} withoutEndLabels={withoutEndLabels} />
      <path d={`M${frame.left} ${frame.top}V${frame.bottom}H${frame.right}`} fill="none" stroke={colour("ink")} />
      {plot.x.title === undefined ? null : (
        <text
          x={(frame.left + frame.right) / 2}
          y={height - textSize * 0.5}
          textAnchor="middle"
          style={{ fontSize: textSize, fill: colour("quiet") }}
        >
          {plot.x.title}
        </text>
      )}
    </svg>
  );
}

function Grid(props: { plot: Plot; frame: PlotFrame; scales: PlotScales; textSize: number }) {
  const { plot, frame, scales, textSize } = props;
  return (
    <>
      {roomyTicks(plot.x.ticks, scales.x, textSize).map((tick) => (
        <g key={tick.value}>
          <path d={`M${coordinate(scales.x(tick.value))} ${frame.bottom}v5`} stroke={colour("ink")} />
          <text
            x={coordinate(scales.x(tick.value))}
            y={frame.bottom + textSize * 1.5}
            textAnchor="middle"
            style={{ fontSize: textSize }}
          >
            {tick.text}
          </text>
        </g>
      ))}
      {plot.y.ticks.map((tick) => (
        <g key={tick.value}>
          <path d={`M${frame.left} ${coordinate(scales.y(tick.value))}H${frame.right}`} stroke={colour("line")} />
          <text
            x={frame.left - 6}
            y={coordinate(scales.y(tick.value) + textSize * 0.34)}
            textAnchor="end"
            style={{ fontSize: textSize }}
          >
            {tick.text}
          </text>
        </g>
      ))}
    </>
  );
}
