import { colour, type ColourToken } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import type { PlotMarker as Marker } from "./plot.ts";

export interface PlotMarkerProps {
  marker: Marker;
  x: number;
  y: number;
  colourToken: ColourToken;
}

/** Marker of a series: open circle, square or triangle, or a short level dash. */
export function PlotMarker({ marker, x, y, colourToken }: PlotMarkerProps) {
  const paint = { fill: colour("raised"), stroke: colour(colourToken), strokeWidth: 1.6 };
  switch (marker) {
    case "circle":
      return <circle cx={coordinate(x)} cy={coordinate(y)} r="3.6" {...paint} />;
    case "square":
      return <rect x={coordinate(x - 3.2)} y={coordinate(y - 3.2)} width="6.4" height="6.4" {...paint} />;
    case "triangle":
      return <path d={`M${coordinate(x)} ${coordinate(y - 4.2)}l4 7h-8z`} {...paint} />;
    case "dash":
      return <path d={`M${coordinate(x - 8)} ${coordinate(y)}h16`} stroke={colour(colourToken)} strokeWidth={1.6} />;
    case "none":
      return null;
  }
}
