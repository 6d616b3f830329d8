import { inOwnUnits, asDelivered, ownHead, ownScale, type OwnScale, type OwnUnits } from "#app/lib/own-units.ts";
import type { Plot, PlotAxis, PlotLimit, PlotTick } from "./plot.ts";
import { multiples, niceStep } from "./plot-ticks.ts";
import { oneTwoFive } from "./warp-plot.ts";

/** A plot for whoever reads other units than are delivered: round ticks in those, and every word and read-out with it. */
export function ownPlot(plot: Plot, units: OwnUnits): Plot {
  if (asDelivered(units)) return plot;
  const own = (text: string) => inOwnUnits(text, units);
  const limits = (all: readonly PlotLimit[] | undefined) =>
    all?.map((limit) => ({ ...limit, lines: limit.lines.map(own) }));
  return {
    ...plot,
    x: ownAxis(plot.x, units),
    y: ownAxis(plot.y, units),
    series: plot.series.map((series) => ({ ...series, label: own(series.label) })),
    xLimits: limits(plot.xLimits),
    yLimits: limits(plot.yLimits),
    regime: plot.regime && { ...plot.regime, label: own(plot.regime.label) },
  };
}

/** An axis with round ticks in the reader's unit, its title and its read-out. */
export function ownAxis(axis: PlotAxis, units: OwnUnits): PlotAxis {
  if (asDelivered(units)) return axis;
  const title = axis.title?.replace(/(?<=^|, )\S+$/, (symbol) => ownHead(symbol, units));
  const format = (value: number) => inOwnUnits(axis.format(value), units);
  const scale = ownScale(symbolOf(axis), units);
  const ticks = scale && (axis.scale === "log" ? logTicks(axis, scale) : linearTicks(axis, scale));
  return { ...axis, title, format, ...ticks };
}

/** The unit of an axis as its title, its ticks or, where these say none, its read-out name it. */
function symbolOf({ title, ticks, format, from, to, stops }: PlotAxis): string {
  if (stops !== undefined) return "";
  const texts = [
    title?.replace(/^(?:.*, )?/, "\u00A0"),
    ticks[0]?.text,
    format(Math.abs(to) > Math.abs(from) ? to : from),
  ];
  for (const text of texts) {
    const [, symbol] = /[ \u00A0]([^ \u00A0]+)$/.exec(text ?? "") ?? [];
    if (symbol !== undefined) return symbol;
  }
  return "";
}

/** The same text behind a tick's number in the other unit. */
const suffix = ({ symbol }: OwnScale, ticks: readonly PlotTick[]) =>
  /[ \u00A0]/.test(ticks[0]?.text ?? "") ? `\u00A0${symbol}` : "";

function linearTicks(axis: PlotAxis, scale: OwnScale) {
  const [first, second] = axis.ticks;
  if (first === undefined || second === undefined) return {};
  // A little finer than delivered: the next round step may be twice as wide and leave too few.
  const step = niceStep(0.6 * scale.step(second.value - first.value));
  const after = suffix(scale, axis.ticks);
  return {
    ticks: multiples(step, scale.of(axis.from), scale.of(axis.to)).map((value) => tick(axis, scale, value, after)),
  };
}

/** Ones, twos and fives; on an axis that goes on in another unit, as from 1 mm, only where this one is in use. */
function logTicks(axis: PlotAxis, scale: OwnScale) {
  const foreign = axis.ticks.filter(({ text }) => /\u00A0?mm$/.test(text));
  const end = foreign[0]?.value ?? axis.to;
  const values = oneTwoFive(scale.of(axis.from), scale.of(end)).filter(({ value }) => scale.si(value) < end * 0.95);
  const after = suffix(scale, axis.ticks);
  const written = axis.minor?.length ? values.filter(({ digit }) => digit === 1) : values;
  const shown = written.length + foreign.length > 1 ? written : values;
  return {
    ticks: [...shown.map(({ value }) => tick(axis, scale, value, after)), ...foreign],
    minor: [
      ...values.filter((each) => !shown.includes(each)).map(({ value }) => scale.si(value)),
      ...(axis.minor ?? []).filter((value) => foreign.length > 0 && value > end),
    ],
  };
}

function tick({ from, to }: PlotAxis, scale: OwnScale, value: number, after: string): PlotTick {
  const text = String(Number(Math.abs(value).toPrecision(6)));
  // A tick at the end of the axis must lie on it, on the server as in the browser.
  const place = Math.min(to, Math.max(from, Number(scale.si(value).toPrecision(12))));
  return { value: place, text: `${value < 0 && text !== "0" ? "−" : ""}${text}${after}` };
}
