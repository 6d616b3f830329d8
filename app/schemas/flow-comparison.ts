import type { CourseStep, CourseValue } from "#app/lib/warp-course.ts";
import type { ComparedWords, ComparisonChart, ComparisonView } from "./comparison.ts";

/** One flow along the places of a chart. */
export interface ComparedCourseLine {
  letter: string;
  /** at the end of its line */
  label: string;
  /** as it lies at 25 °C; null where it has no such step, something holds it flat, or it has rolled up */
  values: (CourseValue | null)[];
}

/** What the chart of a comparison along the steps is drawn from; SI. */
export interface StepsChart {
  scale: "log" | "linear";
  /** steps of any of the flows, aligned */
  places: { tick: string; name: string }[];
  lines: ComparedCourseLine[];
  /** the strictest that a tool of the step takes, or what the chosen tool takes */
  limits: CourseStep["limits"][];
  /** where flows have rolled up, by place from 1, with their letters */
  rolled: { from: number; to: number; label: string }[];
  /** the warp that uses most of its tool's limit, by the place from 1 after which the wafer lies with it, m, with sign */
  tightest: { letter: string; x: number; y: number }[];
  /** where two flows change places, by place from 1 */
  crossings: { x: number; y: number; number: number }[];
}

/** What a comparison of flows draws: over silicon thickness, or along the steps. */
export type FlowChart = { along: "thickness"; chart: ComparisonChart } | { along: "steps"; chart: StepsChart };

/** Flows side by side, in words and as a chart. */
export interface ComparedFlows extends ComparedWords {
  drawn: FlowChart;
  /** flows that cannot be walked, each with its reason */
  notWalked: { letter: string; name: string; reason: string }[];
  /** what the figures are of: the flows as they stand now, and which of them no assessment says so of */
  basis: string;
}

export type FlowComparisonView = ComparisonView<ComparedFlows>;
