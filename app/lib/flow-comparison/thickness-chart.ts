import type { SiteLimits } from "#app/engine/rules/limits.ts";
import type { ComparisonChart } from "#app/schemas/comparison.ts";
import type { LetteredCurve } from "../comparison/crossing-words.ts";
import type { Crossing } from "../comparison/crossings.ts";
import { thicknessLines } from "../comparison/limit-lines.ts";
import { thinningCurve } from "./curve.ts";
import type { ComparedFlow } from "./figures.ts";
import type { Thinning } from "./thinning.ts";

interface Thinned extends ComparedFlow {
  thinning: Thinning;
}

/** The flows that thin their wafer, with how. */
export function thinnedFlows(flows: readonly ComparedFlow[]): Thinned[] {
  return flows.flatMap((flow) => (flow.figures?.thinning ? [{ ...flow, thinning: flow.figures.thinning }] : []));
}

/** Warps over silicon thickness, each over the thicknesses that its flow goes through. */
export const thinningCurves = (flows: readonly Thinned[]): LetteredCurve[] =>
  flows.map(({ letter, thinning: { at, range } }) => ({ letter, curve: at, range }));

/** The chart over silicon thickness. */
export function thicknessChart(
  flows: readonly Thinned[],
  {
    scale,
    range,
    limits,
    warpLimits,
    crossings,
  }: Pick<ComparisonChart, "scale" | "range" | "warpLimits"> & {
    limits: SiteLimits;
    crossings: readonly (Crossing & { number: number })[];
  },
): ComparisonChart {
  const inRange = ({ value }: { value: number }) => value > range.from && value < range.to;
  return {
    scale,
    range,
    curves: flows.map((flow) => thinningCurve(flow, flow.thinning, range)),
    thicknessLimits: thicknessLines(
      flows.map(({ silicon }) => silicon.diameter),
      limits,
    ).filter(inRange),
    warpLimits,
    crossings: crossings.map(({ thickness, warp, number }) => ({ x: thickness, y: warp, number })),
  };
}
