import { colour } from "#app/components/drawings/colour.ts";
import { PLOT_DASHES, type Plot } from "#app/components/drawings/plot.ts";
import { PlotMarker } from "#app/components/drawings/PlotMarker.tsx";

/** Line and marker of a member, 40 px long about y = 0; nothing for one that has no curve. */
export function PlotKey({ plot, letter }: { plot: Plot; letter: string }) {
  const series = plot.series.find(({ id }) => id === letter);
  if (!series) return null;
  const { array, width } = PLOT_DASHES[series.dash];
  return (
    <>
      <path d="M0 0H40" stroke={colour(series.colourToken)} strokeWidth={width} strokeDasharray={array} />
      <PlotMarker marker={series.marker} x={20} y={0} colourToken={series.colourToken} />
    </>
  );
}
