import type { SiteLimits } from "#app/engine/rules/limits.ts";
import type { ComparedCurve, ComparisonChart } from "#app/schemas/comparison.ts";
import type { Crossing } from "../comparison/crossings.ts";
import { thicknessLines } from "../comparison/limit-lines.ts";
import { drawnCurve, LEAST_DRAWN, shortened } from "../stack-chart.ts";
import { warpAt, type ComparedStack } from "./figures.ts";

interface Range {
  from: number;
  to: number;
}

/** The curve of each stack that can be estimated, within the range. */
export function comparedCurves(stacks: readonly ComparedStack[], range: Range): ComparedCurve[] {
  return stacks.flatMap(({ letter, name, figures }) => {
    if (!figures) return [];
    const { estimated, stack } = figures;
    const inRange = (thickness: number) => thickness >= range.from && thickness <= range.to;
    const place = (thickness: number | null) => {
      if (thickness === null || !inRange(thickness)) return null;
      const { warp, rolledUp } = warpAt(stack, thickness);
      return rolledUp || warp < LEAST_DRAWN ? null : { x: thickness, y: warp };
    };
    const onset = place(estimated.answer.curls_below_m);
    const points = drawnCurve(estimated, "warp").filter(({ x }) => inRange(x));
    // The kink where it begins to curl lies between two points of the curve.
    const kinked = onset && !points.some(({ x }) => x === onset.x) ? [...points, onset] : points;
    return [
      {
        letter,
        label: `${letter} ${shortened(name)}`,
        points: kinked.toSorted((a, b) => a.x - b.x),
        own: place(estimated.request.wafer.thickness_m),
        onset,
        curled: onset ? [{ from: range.from, to: onset.x }] : [],
      },
    ];
  });
}

/** All of the chart in one place. */
export function comparisonChart(
  stacks: readonly ComparedStack[],
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
    curves: comparedCurves(stacks, range),
    thicknessLimits: thicknessLines(
      stacks.map(({ silicon }) => silicon.diameter),
      limits,
    ).filter(inRange),
    warpLimits,
    crossings: crossings.map(({ thickness, warp, number }) => ({ x: thickness, y: warp, number })),
  };
}
