import type { PlotSeries } from "./plot.ts";

/** Whether a gap of a series lies between two places on the x axis. */
export function isBroken({ gaps }: Pick<PlotSeries, "gaps">, from: number, to: number): boolean {
  return gaps?.some((gap) => gap.from < to && gap.to > from) ?? false;
}
