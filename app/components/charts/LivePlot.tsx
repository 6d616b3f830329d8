import {
  CartesianGrid,
  Line,
  LineChart,
  usePlotArea,
  useXAxisScale,
  useYAxisScale,
  XAxis,
  YAxis,
  ZIndexLayer,
} from "recharts";
import { colour } from "../drawings/colour.ts";
import {
  PLOT_DASHES,
  type Plot,
  type PlotAxis,
  type PlotFrame,
  type PlotScales,
  type PlotTick,
} from "../drawings/plot.ts";
import { PlotOver } from "../drawings/PlotOver.tsx";
import { plotScale } from "../drawings/plot-scale.ts";
import { PlotUnder } from "../drawings/PlotUnder.tsx";
import { roomyTicks } from "../drawings/roomy-ticks.ts";

export interface LivePlotProps {
  plot: Plot;
  label: string;
  /** px */
  width: number;
  height: number;
  frame: PlotFrame;
  textSize: number;
  /** whether series are named in a list below instead of at their ends */
  narrow: boolean;
}

/**
 * The plot that is read: the library draws axes, grid and lines; limits, regime, markers and labels are the same parts as on paper,
 * placed by the library's own scales. Loaded only once somebody reaches for a chart.
 */
export default function LivePlot({ plot, label, width, height, frame, textSize, narrow }: LivePlotProps) {
  const xTicks = roomyTicks(plot.x.ticks, plotScale(plot.x, frame.left, frame.right), textSize);
  return (
    <div role="img" aria-label={label}>
      <LineChart
        width={width}
        height={height}
        data={rowsOf(plot)}
        margin={{ top: frame.top, right: width - frame.right, bottom: 0, left: 0 }}
        accessibilityLayer={false}
      >
        <ZIndexLayer zIndex={-200}>
          <Layer part="under" plot={plot} narrow={narrow} textSize={textSize} />
        </ZIndexLayer>
        <CartesianGrid vertical={false} stroke={colour("line")} />
        <XAxis
          dataKey="x"
          {...axisProps(plot.x, xTicks, textSize)}
          height={height - frame.bottom}
          tickLine={{ stroke: colour("ink") }}
          label={
            plot.x.title === undefined
              ? undefined
              : {
                  value: plot.x.title,
                  position: "insideBottom",
                  fill: colour("quiet"),
                  fontSize: textSize,
                  offset: 2,
                }
          }
        />
        <YAxis {...axisProps(plot.y, plot.y.ticks, textSize)} width={frame.left} tickLine={false} />
        {plot.series.map((series) =>
          series.dash === "none" ? null : (
            <Line
              key={series.id}
              dataKey={series.id}
              type="linear"
              stroke={colour(series.colourToken)}
              strokeWidth={PLOT_DASHES[series.dash].width}
              strokeDasharray={PLOT_DASHES[series.dash].array}
              dot={false}
              activeDot={false}
              isAnimationActive={false}
              connectNulls={series.gaps === undefined}
            />
          ),
        )}
        <ZIndexLayer zIndex={700}>
          <Layer part="over" plot={plot} narrow={narrow} textSize={textSize} />
        </ZIndexLayer>
      </LineChart>
    </div>
  );
}

type LayerProps = Pick<LivePlotProps, "plot" | "narrow" | "textSize"> & { part: "under" | "over" };

function Layer({ part, plot, narrow, textSize }: LayerProps) {
  const placed = usePlaced();
  if (placed === null) return null;
  if (part === "under") return <PlotUnder plot={plot} {...placed} />;
  return <PlotOver plot={plot} {...placed} textSize={textSize} withoutEndLabels={narrow} />;
}

/** The plotting area and the scales as the library has them. */
function usePlaced(): { frame: PlotFrame; scales: PlotScales } | null {
  const area = usePlotArea();
  const x = useXAxisScale();
  const y = useYAxisScale();
  if (area === undefined || x === undefined || y === undefined) return null;
  return {
    frame: { left: area.x, right: area.x + area.width, top: area.y, bottom: area.y + area.height },
    scales: { x: (value) => x(value) ?? NaN, y: (value) => y(value) ?? NaN },
  };
}

function axisProps(axis: PlotAxis, ticks: readonly PlotTick[], textSize: number) {
  const texts = new Map(ticks.map((tick) => [tick.value, tick.text]));
  return {
    type: "number" as const,
    scale: axis.scale,
    domain: [axis.from, axis.to] as [number, number],
    allowDataOverflow: true,
    ticks: ticks.map((tick) => tick.value),
    tickFormatter: (value: number) => texts.get(value) ?? "",
    interval: 0 as const,
    axisLine: { stroke: colour("ink") },
    tick: { fill: colour("ink"), fontSize: textSize },
  };
}

/**
 * All series in rows by x, as the library wants them; a series has no entry where it has no point. Every gap has a row, so that
 * there is something to break the line at.
 */
function rowsOf(plot: Plot): Record<string, number>[] {
  const rows = new Map<number, Record<string, number>>();
  for (const series of plot.series) {
    for (const { from, to } of series.dash === "none" ? [] : (series.gaps ?? [])) {
      const middle = (from + to) / 2;
      if (!rows.has(middle)) rows.set(middle, { x: middle });
    }
    for (const point of series.points) {
      const row = rows.get(point.x) ?? { x: point.x };
      row[series.id] = point.y;
      rows.set(point.x, row);
    }
  }
  return [...rows.values()].sort((a, b) => (a.x ?? 0) - (b.x ?? 0));
}
