import type { PlotAxis } from "./plot.ts";

/** Value to px along an axis; `start` is the place of its lower end. Values outside the range land outside. */
export function plotScale(axis: PlotAxis, start: number, end: number): (value: number) => number {
  const on = axis.scale === "log" ? Math.log : (value: number) => value;
  const from = on(axis.from);
  const slope = (end - start) / (on(axis.to) - from);
  return (value) => start + (on(value) - from) * slope;
}
