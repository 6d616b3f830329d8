import type { Predicted } from "#app/schemas/prediction.ts";
import type { PlotAxis } from "./plot.ts";
import { multiples, niceStep, signedTick } from "./plot-ticks.ts";

/** A point of a parity plot, SI, standard uncertainties. */
export interface ParityMark {
  id: string;
  predicted: number;
  predictedUncertainty: number;
  measured: number;
  measuredUncertainty: number;
  /** of a step or film that the model is off at */
  off: boolean;
}

/** Bars reach this many standard uncertainties. */
export const BAR = 2;

const UNITS: Record<Predicted, { symbol: string; size: number; least: number }> = {
  bow: { symbol: "µm", size: 1e-6, least: 1e-6 },
  stress: { symbol: "MPa", size: 1e6, least: 1e5 },
};
const ROOM = 0.05;

/** The one scale of both axes: every point with its bars lies within it, and equal lengths mean equal figures. */
export function parityAxis(of: Predicted, marks: readonly ParityMark[]): PlotAxis {
  const { symbol, size, least } = UNITS[of];
  const ends = marks.flatMap(({ predicted: p, predictedUncertainty: u, measured: m, measuredUncertainty: v }) => [
    p - BAR * u,
    p + BAR * u,
    m - BAR * v,
    m + BAR * v,
  ]);
  const [low, high] = [Math.min(...ends), Math.max(...ends)];
  const room = Math.max(least, (high - low) * ROOM);
  const [from, to] = [low - room, high + room];
  return {
    scale: "linear",
    from,
    to,
    ticks: multiples(niceStep((to - from) / 5), from, to).map((value) => ({ value, text: signedTick(value / size) })),
    title: symbol,
    format: (value) => `${signedTick(value / size)}\u00A0${symbol}`,
  };
}
