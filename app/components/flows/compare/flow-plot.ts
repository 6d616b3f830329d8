import { comparisonPlot } from "#app/components/comparison/comparison-plot.ts";
import type { Plot } from "#app/components/drawings/plot.ts";
import type { FlowChart } from "#app/schemas/flow-comparison.ts";
import { stepsPlot } from "./steps-plot.ts";

/** What a comparison of flows draws, as a plot. */
export const flowPlot = (drawn: FlowChart): Plot =>
  drawn.along === "thickness" ? comparisonPlot(drawn.chart) : stepsPlot(drawn.chart);
