import type { StepResult } from "#app/schemas/assessment-result.ts";
import type { ComparedCourseLine, StepsChart } from "#app/schemas/flow-comparison.ts";
import { NO_TOOL } from "../comparison/asked.ts";
import type { ComparedTool } from "../comparison/limit-lines.ts";
import { shortened } from "../stack-chart.ts";
import { warpCourse, type CourseStep } from "../warp-course.ts";
import type { AlignedSteps } from "./align-many.ts";
import type { ComparedFlow } from "./figures.ts";
import { placeName } from "./step-rows.ts";

type Limits = CourseStep["limits"];
type Places = readonly AlignedSteps<StepResult>[];

/** The warps of all walked flows along the aligned steps. */
export function courseLines(flows: readonly ComparedFlow[], places: Places): ComparedCourseLine[] {
  return flows.flatMap(({ letter, name, figures }, column) => {
    if (!figures) return [];
    const course = new Map(warpCourse(figures.result).map((step) => [step.number, step]));
    const at = ({ steps }: AlignedSteps<StepResult>) => course.get(steps[column]?.number ?? 0);
    return [{ letter, label: `${letter} ${shortened(name)}`, values: places.map((place) => at(place)?.room ?? null) }];
  });
}

/** The chart along the steps: what is not of the flows themselves is handed in. */
export function stepsChart(
  flows: readonly ComparedFlow[],
  places: Places,
  chart: Pick<StepsChart, "scale" | "lines" | "crossings"> & { tools: readonly ComparedTool[]; tool: string },
): StepsChart {
  const { scale, lines, crossings, tools, tool } = chart;
  return {
    scale,
    places: places.map((place, index) => ({ tick: String(index + 1), name: placeName(place, index) })),
    lines,
    limits: limitsAt(places, tools, tool),
    rolled: rolledStretches(flows, places),
    tightest: tightestPlaces(flows, places, lines),
    crossings,
  };
}

/** Where each flow lies with the warp that decides. One that is of a hot moment stands on no line, which are of 25 °C. */
function tightestPlaces(
  flows: readonly ComparedFlow[],
  places: Places,
  lines: readonly ComparedCourseLine[],
): StepsChart["tightest"] {
  return flows.flatMap(({ letter, figures }, column) => {
    const deciding = figures?.deciding;
    if (!deciding?.limit || deciding.moment !== "atRoom") return [];
    const index = places.findIndex(({ steps }) => steps[column]?.number === deciding.step.number);
    const value = lines.find((line) => line.letter === letter)?.values[index];
    return value ? [{ letter, x: index + 1, y: value.warp }] : [];
  });
}

/** What the tool of each step takes: the strictest where flows use several, or the chosen tool's at every step. */
function limitsAt(places: Places, tools: readonly ComparedTool[], chosen: string): Limits[] {
  if (chosen === NO_TOOL) return places.map(() => ({ up: null, down: null }));
  const tool = tools.find(({ id }) => id === chosen);
  if (tool) return places.map(() => ({ up: tool.edgesUp, down: tool.edgesDown }));
  return places.map(({ steps }) => {
    const taken = steps.flatMap((step) => (step?.equipment ? [step.equipment] : []));
    return {
      up: strictest(taken.map(({ edgesUp }) => edgesUp)),
      down: strictest(taken.map(({ edgesDown }) => edgesDown)),
    };
  });
}

function strictest(limits: readonly (number | null)[]): number | null {
  const known = limits.filter((limit) => limit !== null);
  return known.length > 0 ? Math.min(...known) : null;
}

/** Places at which flows have rolled up as they lie, neighbours with the same flows joined. */
function rolledStretches(flows: readonly ComparedFlow[], places: Places): StepsChart["rolled"] {
  const courses = flows.map(({ figures }) =>
    figures ? new Map(warpCourse(figures.result).map((step) => [step.number, step.rolled])) : null,
  );
  const stretches: StepsChart["rolled"] = [];
  places.forEach(({ steps }, index) => {
    const letters = flows.flatMap(({ letter }, column) =>
      courses[column]?.get(steps[column]?.number ?? 0) ? [letter] : [],
    );
    if (letters.length === 0) return;
    const label = `${letters.join(", ")} ${letters.length === 1 ? "rolls" : "roll"}`;
    const last = stretches.at(-1);
    if (last?.to === index && last.label === label) last.to = index + 1;
    else stretches.push({ from: index + 1, to: index + 1, label });
  });
  return stretches;
}
