import { colour } from "./colour.ts";
import { PLOT_DASHES, type Plot } from "./plot.ts";
import { PlotMarker } from "./PlotMarker.tsx";

export interface PlotLegendProps {
  plot: Plot;
}

/** The series of a plot as a list with their line and marker, where there is no room at the line ends. */
export function PlotLegend({ plot }: PlotLegendProps) {
  return (
    <ul className="grid gap-1 text-label">
      {plot.series.map((series) => (
        <li key={series.id} className="flex items-center gap-2">
          <svg className="flex-none" width="40" height="12" aria-hidden="true">
            {series.dash === "none" ? null : (
              <path
                d="M0 6H40"
                stroke={colour(series.colourToken)}
                strokeWidth={PLOT_DASHES[series.dash].width}
                strokeDasharray={PLOT_DASHES[series.dash].array}
              />
            )}
            <PlotMarker marker={series.marker} x={20} y={6} colourToken={series.colourToken} />
          </svg>
          {series.label}
        </li>
      ))}
    </ul>
  );
}
