import { coursePlot, type CoursePlotInput } from "../drawings/course-plot.ts";
import { ChartFigure } from "./ChartFigure.tsx";

export interface CourseChartProps {
  data: CoursePlotInput;
  /** Accessible name, such as 'Warp along the flow'. */
  label: string;
  /** What it shows, in one sentence. */
  summary: string;
}

/** Warp along a flow as it lies on each tool, with the limits of the tools; one flow or two over each other. */
export function CourseChart({ data, label, summary }: CourseChartProps) {
  return <ChartFigure plot={coursePlot(data)} label={label} summary={summary} xName="Step" />;
}
