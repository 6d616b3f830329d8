import type { CourseStep, CourseValue } from "#app/lib/warp-course.ts";
import type { ColourToken } from "./colour.ts";
import type { Plot, PlotBand, PlotDash, PlotMarker, PlotPoint, PlotSeries, PlotStretch } from "./plot.ts";
import { multiples, niceStep, signedTick } from "./plot-ticks.ts";

/** One line along the flow; null where it has no value. */
export interface CourseLine {
  id: string;
  label: string;
  dash: PlotDash;
  marker: PlotMarker;
  colourToken: ColourToken;
  values: readonly (CourseValue | null)[];
  /** draws its uncertainty as a band */
  band?: boolean;
}

export interface CoursePlotInput {
  /** one for each place on the axis, from 1 */
  places: readonly { tick: string; name: string }[];
  lines: readonly CourseLine[];
  /** what the tools take at each place */
  limits: readonly CourseStep["limits"][];
  /** places at which it has rolled up and has no bow */
  rolled: readonly number[];
  /** a place that is looked at */
  chosen?: number;
  formatWarp: (metres: number) => string;
}

const MICROMETRE = 1e-6;
/** Limits farther away than this many times the largest value are left off: the curves would lie flat on the axis. */
const FAR = 2.5;
/** The least that the axis shows on either side, m. */
const LEAST = 20e-6;

/** Warp as it lies along a flow: edges up above the axis, edges down below, with the limits of each step's tool. */
export function coursePlot(input: CoursePlotInput): Plot {
  const { places, lines, limits, chosen } = input;
  const values = lines.flatMap((line) => line.values.flatMap((value) => (value ? ends(value) : [])));
  const largest = Math.max(LEAST, ...values.map(Math.abs));
  const seen = limits
    .flatMap(({ up, down }) => [up ?? 0, -(down ?? 0)])
    .filter((limit) => Math.abs(limit) < FAR * largest);
  const highest = Math.max(LEAST, ...values, ...seen) * 1.06;
  const lowest = Math.min(-LEAST, ...values, ...seen) * 1.06;
  const step = niceStep((highest - lowest) / 6);
  const [first] = lines;
  const at = chosen === undefined ? null : (first?.values[chosen - 1] ?? null);
  return {
    x: {
      scale: "linear",
      from: 0,
      to: places.length + 1,
      ticks: places.map(({ tick }, index) => ({ value: index + 1, text: tick })),
      stops: places.map((_, index) => index + 1),
      title: "Step; edges up above 0, edges down below",
      format: (place) => places[Math.round(place) - 1]?.name ?? "",
    },
    y: {
      scale: "linear",
      from: lowest,
      to: highest,
      ticks: multiples(step, lowest, highest).map((value) => ({
        value,
        text: `${signedTick(value / MICROMETRE)}\u00A0µm`,
      })),
      format: input.formatWarp,
    },
    series: [...lines.map(lineSeries), ...limitSeries(limits)],
    bands: lines.filter(({ band }) => band).map(bandOf),
    leftOut: input.rolled.map((place) => ({ from: place - 0.5, to: place + 0.5 })),
    chosen: chosen !== undefined && at ? { x: chosen, y: at.warp } : undefined,
  };
}

const ends = ({ warp, uncertainty }: CourseValue) => [warp - uncertainty, warp + uncertainty];

function lineSeries({ id, label, dash, marker, colourToken, values }: CourseLine): PlotSeries {
  const points = values.flatMap((value, index) => (value ? [{ x: index + 1, y: value.warp }] : []));
  const gaps = between(points).filter(({ from, to }) => to - from > 1);
  return { id, label, dash, marker, colourToken, points, gaps, markersAt: points.map(({ x }) => x) };
}

/** The tools' limits as dashes, each at its own step. */
function limitSeries(limits: CoursePlotInput["limits"]): PlotSeries[] {
  const series = (id: string, label: string, of: (limit: CourseStep["limits"]) => number | null): PlotSeries => {
    const points = limits.flatMap((limit, index) => {
      const value = of(limit);
      return value === null ? [] : [{ x: index + 1, y: value }];
    });
    const places = points.map(({ x }) => x);
    return {
      id,
      label,
      dash: "none",
      marker: "dash",
      colourToken: "stop",
      points,
      gaps: between(points),
      markersAt: places,
      labelled: "none",
    };
  };
  return [
    series("up", "upper limit", ({ up }) => up),
    series("down", "lower limit", ({ down }) => (down === null ? null : -down)),
  ].filter(({ points }) => points.length > 0);
}

/** The stretches between neighbours. */
const between = (points: readonly PlotPoint[]): PlotStretch[] =>
  points.slice(1).map(({ x }, index) => ({ from: points[index]?.x ?? x, to: x }));

function bandOf({ colourToken, values }: CourseLine): PlotBand {
  const runs: { x: number; low: number; high: number }[][] = [];
  values.forEach((value, index) => {
    if (!value || value.uncertainty === 0) return;
    const point = { x: index + 1, low: value.warp - value.uncertainty, high: value.warp + value.uncertainty };
    const run = runs.at(-1);
    if (run?.at(-1)?.x === index) run.push(point);
    else runs.push([point]);
  });
  return { colourToken, runs };
}
