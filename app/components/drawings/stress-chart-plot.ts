import { COVERAGE } from "#app/lib/scan-answer.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { StressChart } from "#app/schemas/film-stress.ts";
import type { Plot, PlotAxis, PlotPoint, PlotSeries } from "./plot.ts";
import { multiples, niceStep, signedTick } from "./plot-ticks.ts";

const MPA = 1e6;
const ROOM = 0.06;

const stressText = (value: number, sign = true) =>
  formatQuantity(value, "stress", { unit: "MPa", significant: 4, sign });

/** Individual values in the order of their measurement, with centre and limits; the values that a test names are squares. */
export function individualsPlot({ values, limits, signals }: StressChart): Plot {
  const named = new Set(signals.flatMap(({ at }) => at));
  const points = values.map(({ value, excluded }, n) => ({ x: n + 1, y: value, excluded, named: named.has(n) }));
  const ends = values.flatMap(({ value, standardUncertainty: u }) => [value - COVERAGE * u, value + COVERAGE * u]);
  return {
    x: orderAxis(values),
    y: stressAxis([...ends, ...(limits ? [limits.lower, limits.upper] : [])], { sign: true }),
    series: [
      {
        ...series(
          "counted",
          "counts",
          points.filter(({ excluded }) => !excluded),
        ),
        dash: "long",
        marker: "circle",
        colourToken: "silicon",
      },
      {
        ...apart(
          "named",
          "named by a test",
          points.filter((point) => point.named),
        ),
        marker: "square",
        colourToken: "stop",
      },
      {
        ...apart(
          "aside",
          "set aside",
          points.filter(({ excluded }) => excluded),
        ),
        marker: "triangle",
        colourToken: "quiet",
      },
      ...(limits ? [centreLine(limits.centre, values.length)] : []),
    ],
    yLimits: limits
      ? [
          { value: limits.upper, lines: [`upper limit ${stressText(limits.upper)}`] },
          { value: limits.lower, lines: [`lower limit ${stressText(limits.lower)}`] },
        ]
      : [],
    bands: [
      {
        colourToken: "silicon",
        runs: values.map(({ value, standardUncertainty: u }, n) => [
          { x: n + 1, low: value - COVERAGE * u, high: value + COVERAGE * u },
        ]),
      },
    ],
  };
}

/** From each value to the one before it that counts, without its sign, with the limit of a single range. */
export function rangesPlot({ values, ranges, limits }: StressChart): Plot {
  const points = ranges.flatMap((range, n) => (range === null ? [] : [{ x: n + 1, y: range }]));
  return {
    x: orderAxis(values),
    y: stressAxis([0, ...points.map(({ y }) => y), ...(limits ? [limits.rangeLimit] : [])], { sign: false }),
    series: [
      { ...series("range", "moving range", points), dash: "long", marker: "circle", colourToken: "silicon" },
      ...(limits ? [{ ...centreLine(limits.meanRange, values.length), label: "mean" }] : []),
    ],
    yLimits: limits ? [{ value: limits.rangeLimit, lines: [`limit ${stressText(limits.rangeLimit, false)}`] }] : [],
  };
}

function orderAxis(values: StressChart["values"]): PlotAxis {
  const last = values.length;
  const step = Math.max(1, niceStep(last / 8));
  const order = Array.from({ length: last }, (_, n) => n + 1);
  return {
    scale: "linear",
    from: 0,
    to: last + 1,
    ticks: order.filter((n) => n === 1 || n % step === 0).map((value) => ({ value, text: String(value) })),
    title: "Value, in the order of measurement",
    stops: order,
    format: (n) => `${n}, ${values[Math.round(n) - 1]?.measuredAt.slice(0, 10) ?? "no value"}`,
  };
}

function stressAxis(shown: readonly number[], { sign }: { sign: boolean }): PlotAxis {
  const [low, high] = [Math.min(...shown), Math.max(...shown)];
  const room = (high - low || Math.abs(high) || MPA) * ROOM;
  const from = sign ? low - room : 0;
  const to = high + room;
  return {
    scale: "linear",
    from,
    to,
    ticks: multiples(niceStep((to - from) / 4), from, to).map((value) => ({
      value,
      text: `${signedTick(value / MPA)}\u00A0MPa`,
    })),
    format: (value) => stressText(value, sign),
  };
}

const series = (id: string, label: string, points: readonly PlotPoint[]) => ({
  id,
  label,
  points: points.map(({ x, y }) => ({ x, y })),
  markersAt: points.map(({ x }) => x),
  labelled: "none" as const,
});

/** Points that no line joins: nothing is read between them. */
const apart = (id: string, label: string, points: readonly PlotPoint[]) => ({
  ...series(id, label, points),
  dash: "none" as const,
  gaps: points.slice(1).map(({ x }, n) => ({ from: points[n]?.x ?? x, to: x })),
});

function centreLine(centre: number, last: number): PlotSeries {
  return {
    id: "centre",
    label: "centre",
    dash: "reference",
    marker: "none",
    colourToken: "quiet",
    points: [
      { x: 0, y: centre },
      { x: last + 1, y: centre },
    ],
    labelled: "end",
  };
}
