import type { PlotAxis } from "../drawings/plot.ts";

/** The value at a share (0 to 1) of an axis. */
export function axisValue(axis: PlotAxis, share: number): number {
  const within = Math.min(1, Math.max(0, share));
  if (axis.scale === "log") return axis.from * (axis.to / axis.from) ** within;
  return axis.from + (axis.to - axis.from) * within;
}

/** The stop of an axis next to a value; the value itself on an axis without stops. */
export function nearestStop({ stops = [] }: PlotAxis, value: number): number {
  return (
    stops.reduce<number | null>(
      (best, stop) => (best === null || Math.abs(stop - value) < Math.abs(best - value) ? stop : best),
      null,
    ) ?? value
  );
}
