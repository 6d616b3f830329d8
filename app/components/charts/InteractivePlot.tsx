import { useLayoutEffect, useRef, useState, type PointerEvent } from "react";
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
import { plotFrame } from "../drawings/plot-frame.ts";
import { PlotOver } from "../drawings/PlotOver.tsx";
import { plotScale } from "../drawings/plot-scale.ts";
import { PlotUnder } from "../drawings/PlotUnder.tsx";
import { roomyTicks } from "../drawings/roomy-ticks.ts";
import { axisValue, nearestStop } from "./axis-value.ts";
import { PlotCursor } from "./PlotCursor.tsx";
import { PlotReadOut } from "./PlotReadOut.tsx";

export interface InteractivePlotProps {
  plot: Plot;
  label: string;
  xName: string;
}

const TEXT = 12.5;
const NARROW = 560;

/**
 * The chart on a screen: the library draws axes, grid and lines; limits, regime, markers and labels are the same parts
 * as on paper, placed by the library's own scales. Client only, and loaded only where a chart is shown.
 */
export default function InteractivePlot({ plot, label, xName }: InteractivePlotProps) {
  const [holder, width] = useWidth();
  const [read, setRead] = useState<number | null>(null);
  const narrow = width < NARROW;
  const height = narrow ? 320 : 428;
  const frame = plotFrame(plot, width, height, TEXT, !narrow);
  const at = read ?? plot.chosen?.x ?? nearestStop(plot.x, axisValue(plot.x, 0.5));
  const follow = (event: PointerEvent<HTMLDivElement>) => {
    if (event.pointerType !== "mouse") return;
    const x = event.clientX - event.currentTarget.getBoundingClientRect().left;
    setRead(nearestStop(plot.x, axisValue(plot.x, (x - frame.left) / (frame.right - frame.left))));
  };
  return (
    <div ref={holder}>
      {width === 0 ? null : (
        <>
          <div role="img" aria-label={label} onPointerMove={follow}>
            <LineChart
              width={width}
              height={height}
              data={rowsOf(plot)}
              margin={{ top: frame.top, right: width - frame.right, bottom: 0, left: 0 }}
              accessibilityLayer={false}
            >
              <ZIndexLayer zIndex={-200}>
                <Layer part="under" plot={plot} narrow={narrow} />
              </ZIndexLayer>
              <CartesianGrid vertical={false} stroke={colour("line")} />
              <XAxis
                dataKey="x"
                {...axisProps(plot.x, roomyTicks(plot.x.ticks, plotScale(plot.x, frame.left, frame.right), TEXT))}
                height={height - frame.bottom}
                tickLine={{ stroke: colour("ink") }}
                label={
                  plot.x.title === undefined
                    ? undefined
                    : {
                        value: plot.x.title,
                        position: "insideBottom",
                        fill: colour("quiet"),
                        fontSize: TEXT,
                        offset: 2,
                      }
                }
              />
              <YAxis {...axisProps(plot.y, plot.y.ticks)} width={frame.left} tickLine={false} />
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
                <Layer part="over" plot={plot} narrow={narrow} />
                {read === null ? null : <Cursor plot={plot} x={read} />}
              </ZIndexLayer>
            </LineChart>
          </div>
          <PlotReadOut plot={plot} xName={xName} at={at} frame={frame} onRead={setRead} />
        </>
      )}
    </div>
  );
}

/** The width of an element, kept up to date. */
function useWidth() {
  const ref = useRef<HTMLDivElement>(null);
  const [width, setWidth] = useState(0);
  useLayoutEffect(() => {
    const element = ref.current;
    if (element === null) return undefined;
    setWidth(element.clientWidth);
    const observer = new ResizeObserver(() => setWidth(element.clientWidth));
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return [ref, width] as const;
}

function Layer({ part, plot, narrow }: { part: "under" | "over"; plot: Plot; narrow: boolean }) {
  const placed = usePlaced();
  if (placed === null) return null;
  if (part === "under") return <PlotUnder plot={plot} {...placed} />;
  return <PlotOver plot={plot} {...placed} textSize={TEXT} withoutEndLabels={narrow} />;
}

function Cursor({ plot, x }: { plot: Plot; x: number }) {
  const placed = usePlaced();
  return placed === null ? null : <PlotCursor plot={plot} x={x} {...placed} />;
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

function axisProps(axis: PlotAxis, ticks: readonly PlotTick[]) {
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
    tick: { fill: colour("ink"), fontSize: TEXT },
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
