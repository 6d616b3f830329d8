import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { ComparedCurve, ComparisonChart } from "#app/schemas/stack-comparison.ts";
import { NO_TOOL } from "./asked.ts";
import { drawnCurve, LEAST_DRAWN, limitLines, shortened } from "../stack-chart.ts";
import type { Crossing } from "./crossings.ts";
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
      },
    ];
  });
}

/** The site's thickness limits for the diameters of all stacks; those of one diameter name it where there are several. */
export function thicknessLines(diameters: readonly number[], limits: SiteLimits): ComparisonChart["thicknessLimits"] {
  const sizes = [...new Set(diameters)];
  const found = new Map<number, ComparisonChart["thicknessLimits"][number]>();
  for (const diameter of sizes)
    for (const { value, lines } of limitLines(diameter, limits)) {
      const [what = "", below = ""] = lines;
      const size = formatQuantity(diameter, "length", { unit: "mm" });
      const whole = sizes.length > 1 && what !== "carrier" ? `${what}, ${size}` : what;
      const known = found.get(value);
      found.set(value, {
        value,
        lines: [known && known.lines[0] !== whole ? `${known.lines[0]}; ${whole}` : whole, below],
      });
    }
  return [...found.values()].toSorted((a, b) => a.value - b.value);
}

/** A tool with the warp that it takes, m. */
export interface ComparedTool {
  id: string;
  name: string;
  edgesUp: number | null;
  edgesDown: number | null;
  largestDiameter: number;
}

/**
 * Limits of the tools that are drawn: those of the chosen one, or the least and the greatest that any tool takes which takes the
 * largest of the wafers.
 */
export function warpLines(
  tools: readonly ComparedTool[],
  chosen: string,
  diameters: readonly number[],
): ComparisonChart["warpLimits"] {
  if (chosen === NO_TOOL) return [];
  const tool = tools.find(({ id }) => id === chosen);
  if (tool) return linesOf(tool);
  const largest = Math.max(0, ...diameters);
  const known = tools
    .filter(({ largestDiameter }) => largestDiameter >= largest * (1 - 1e-9))
    .flatMap(({ name, edgesUp, edgesDown }) =>
      edgesUp === null || edgesDown === null ? [] : [{ name, least: Math.min(edgesUp, edgesDown) }],
    );
  const [first, ...rest] = known;
  if (!first) return [];
  const strictest = rest.reduce((low, next) => (next.least < low.least ? next : low), first);
  const lenient = rest.reduce((high, next) => (next.least > high.least ? next : high), first);
  const line = ({ name, least }: typeof first, word: string) => ({
    value: least,
    lines: [`${micrometres(least)}, ${word}: ${shortName(name)}`],
  });
  return strictest.least === lenient.least
    ? [line(strictest, "strictest")]
    : [line(strictest, "strictest"), line(lenient, "most lenient")];
}

function linesOf({ name, edgesUp, edgesDown }: ComparedTool): ComparisonChart["warpLimits"] {
  const line = (value: number, which: string) => ({
    value,
    lines: [`${which}${micrometres(value)}: ${shortName(name)}`],
  });
  if (edgesUp !== null && edgesUp === edgesDown) return [line(edgesUp, "")];
  return [
    ...(edgesUp === null ? [] : [line(edgesUp, "edges up ")]),
    ...(edgesDown === null ? [] : [line(edgesDown, "edges down ")]),
  ];
}

const micrometres = (metres: number) => formatQuantity(metres, "length", { unit: "µm" });
/** The name of a tool stands inside the plot, where a phone has room for this many letters. */
const shortName = (name: string) => (name.length <= 30 ? name : `${name.slice(0, 29).trimEnd()}…`);

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
