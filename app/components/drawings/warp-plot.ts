import type { Plot, PlotLimit, PlotSeries, PlotTick } from "./plot.ts";
import { seriesValue } from "./series-value.ts";

export interface WarpPlotInput {
  /** x: silicon thickness, m; y: warp of the free wafer, m. The first is the stack as drawn. */
  series: readonly Omit<PlotSeries, "markersAt">[];
  /** The site's thickness limits, m, each with a label of two lines. */
  thicknessLimits?: readonly PlotLimit[];
  /** The equipment's warp limits, m. */
  warpLimits?: readonly PlotLimit[];
  /** Thickness at which the wafer as drawn starts to curl, m, with its label, such as 'curls below 307 µm'. */
  curling?: { thickness: number; label: string };
  /** m */
  chosenThickness?: number;
  /** Values with their unit, for the read-out and the table. */
  formatThickness: (metres: number) => string;
  formatWarp: (metres: number) => string;
}

const MICROMETRE = 1e-6;
const INSIDE_REGIME = "curled about one axis";
/** Warps beyond these are outside what anyone reads off a plot, m. */
const LEAST_WARP = 5e-6;
const GREATEST_WARP = 100e-3;
/** Markers stand at every doubling of this, m. */
const FIRST_MARKER = 30e-6;

/** Warp against silicon thickness on two logarithmic axes, for the screen's chart and the sheet's plot alike. */
export function warpPlot(input: WarpPlotInput): Plot {
  const thicknesses = input.series.flatMap((series) => series.points.map((point) => point.x));
  const thinnest = Math.min(...thicknesses);
  const thickest = Math.max(...thicknesses);
  const warps = [
    ...input.series.flatMap((series) => series.points.map((point) => point.y)),
    ...(input.warpLimits ?? []).map((limit) => limit.value),
  ].filter((warp) => warp >= LEAST_WARP && warp <= GREATEST_WARP);
  const lowest = Math.min(...warps) / 1.15;
  const highest = Math.max(...warps) * 1.15;
  const marks = doublings(FIRST_MARKER, thickest).filter((mark) => mark > thinnest);
  const series = input.series.map((each) => ({ ...each, markersAt: each.marker === "none" ? undefined : marks }));
  const plot: Plot = {
    x: {
      scale: "log",
      from: thinnest,
      to: thickest,
      ticks: thicknessTicks(thinnest, thickest),
      title: "Silicon thickness, µm",
      format: input.formatThickness,
    },
    y: {
      scale: "log",
      from: lowest,
      to: highest,
      ticks: oneTwoFive(lowest, highest)
        .filter(({ digit }) => digit === 1)
        .map(({ value }) => ({ value, text: decadeText(value) })),
      minor: oneTwoFive(lowest, highest)
        .filter(({ digit }) => digit !== 1)
        .map(({ value }) => value),
      format: input.formatWarp,
    },
    series,
    xLimits: input.thicknessLimits,
    yLimits: input.warpLimits,
    regime: input.curling && {
      upTo: input.curling.thickness,
      label: input.curling.label,
      inside: INSIDE_REGIME,
    },
  };
  const drawn = plot.series[0];
  if (input.chosenThickness === undefined || drawn === undefined) return plot;
  const warp = seriesValue(plot, drawn, input.chosenThickness);
  return warp === null ? plot : { ...plot, chosen: { x: input.chosenThickness, y: warp } };
}

export function doublings(first: number, last: number): number[] {
  const values: number[] = [];
  for (let value = first; value < last; value *= 2) values.push(value);
  return values;
}

/** 1, 2 and 5 of every decade within a range. */
export function oneTwoFive(from: number, to: number): { value: number; digit: number }[] {
  const values: { value: number; digit: number }[] = [];
  for (let decade = Math.floor(Math.log10(from)); decade <= Math.log10(to); decade += 1) {
    for (const digit of [1, 2, 5]) {
      const value = digit * 10 ** decade;
      if (value >= from && value <= to) values.push({ value, digit });
    }
  }
  return values;
}

/** 1, 2, 5 of every decade in micrometres, and the full thickness where it is not close to one of them. */
export function thicknessTicks(from: number, to: number): PlotTick[] {
  const values = oneTwoFive(from * 0.999, to).map(({ value }) => value);
  const last = values.at(-1) ?? from;
  if (to / last > 1.3) values.push(to);
  return values.map((value) => ({
    // Powers of ten come out a last digit off: a tick at the end of the axis must still lie on it.
    value: Math.min(to, Math.max(from, value)),
    text: String(Math.round(value / MICROMETRE)),
  }));
}

/** A power of ten of metres in the unit that keeps it short. */
export function decadeText(metres: number): string {
  return metres >= 0.999e-3 ? `${Math.round(metres * 1000)}\u00A0mm` : `${Math.round(metres / MICROMETRE)}\u00A0µm`;
}
