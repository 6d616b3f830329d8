import { profilePlot, type ProfilePlotInput } from "../drawings/profile-plot.ts";
import { ChartFigure } from "./ChartFigure.tsx";

export interface ProfileChartProps {
  data: ProfilePlotInput;
  /** Accessible name, such as 'Profile at 0°'. */
  label: string;
  /** What it shows, in one sentence. */
  summary: string;
}

/** Profiles before and after a film, their difference and the parabola fitted to it; the rim that was left out is ruled. */
export function ProfileChart({ data, label, summary }: ProfileChartProps) {
  return <ChartFigure plot={profilePlot(data)} label={label} summary={summary} xName="Position" />;
}
