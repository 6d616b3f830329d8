import { colour } from "./colour.ts";
import { limitsInList } from "./limits-in-list.ts";
import { PLOT_DASHES, type Plot } from "./plot.ts";
import { PlotMarker } from "./PlotMarker.tsx";

export interface PlotLegendProps {
  plot: Plot;
}

/** The series of a plot as a list with their line and marker, where there is no room at the line ends, and limits where they are too many to be named in the plot. */
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
      {limitsInList(plot) && <Limits plot={plot} />}
    </ul>
  );
}

function Limits({ plot }: PlotLegendProps) {
  const across = (plot.yLimits ?? []).map((limit) => ({
    ...limit,
    path: "M0 6H40",
    token: "stop" as const,
    dash: "6 3",
  }));
  const upright = (plot.xLimits ?? []).map((limit) => ({
    ...limit,
    path: "M20 0V12",
    token: "ink" as const,
    dash: "2 3",
  }));
  return [...across, ...upright].map(({ value, lines, path, token, dash }) => (
    <li key={`${token} ${value}`} className="flex items-center gap-2">
      <svg className="flex-none" width="40" height="12" aria-hidden="true">
        <path d={path} stroke={colour(token)} strokeDasharray={dash} />
      </svg>
      {lines.join(" ")}
    </li>
  ));
}
