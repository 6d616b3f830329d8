import { colour, type ColourToken } from "./colour.ts";
import { coordinate } from "./coordinate.ts";
import type { PlotMarker as Marker } from "./plot.ts";

export interface PlotMarkerProps {
  marker: Marker;
  x: number;
  y: number;
  colourToken: ColourToken;
}

/** Marker of a series: open circle, square, triangle on either end or diamond, a cross, or a short level dash. */
export function PlotMarker({ marker, x, y, colourToken }: PlotMarkerProps) {
  const paint = { fill: colour("raised"), stroke: colour(colourToken), strokeWidth: 1.6 };
  switch (marker) {
    case "circle":
      return <circle cx={coordinate(x)} cy={coordinate(y)} r="3.6" {...paint} />;
    case "square":
      return <rect x={coordinate(x - 3.2)} y={coordinate(y - 3.2)} width="6.4" height="6.4" {...paint} />;
    case "triangle":
      return <path d={`M${coordinate(x)} ${coordinate(y - 4.2)}l4 7h-8z`} {...paint} />;
    case "down":
      return <path d={`M${coordinate(x)} ${coordinate(y + 4.2)}l4 -7h-8z`} {...paint} />;
    case "diamond":
      return <path d={`M${coordinate(x)} ${coordinate(y - 4.6)}l4.6 4.6l-4.6 4.6l-4.6 -4.6z`} {...paint} />;
    case "cross":
      return (
        <path d={`M${coordinate(x - 3.6)} ${coordinate(y - 3.6)}l7.2 7.2m0 -7.2l-7.2 7.2`} {...paint} fill="none" />
      );
    case "dash":
      return <path d={`M${coordinate(x - 8)} ${coordinate(y)}h16`} stroke={colour(colourToken)} strokeWidth={1.6} />;
    case "none":
      return null;
  }
}
