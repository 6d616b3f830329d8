import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { ComparisonChart } from "#app/schemas/comparison.ts";
import { limitLines } from "../stack-chart.ts";
import { NO_TOOL } from "./asked.ts";

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
