import type { ColourToken } from "#app/components/drawings/colour.ts";
import type { PlotDash, PlotMarker } from "#app/components/drawings/plot.ts";

interface LineStyle {
  dash: PlotDash;
  marker: PlotMarker;
  colourToken: ColourToken;
}

const FIRST: LineStyle = { dash: "solid", marker: "circle", colourToken: "silicon" };
const OTHERS: readonly LineStyle[] = [
  { dash: "chain", marker: "square", colourToken: "copper" },
  { dash: "dotted", marker: "triangle", colourToken: "clear" },
  { dash: "long", marker: "diamond", colourToken: "need" },
  { dash: "double", marker: "down", colourToken: "caution" },
  { dash: "sparse", marker: "cross", colourToken: "ink" },
];

/** Dash, marker and colour by the letter of a column, so that black on paper tells lines apart as well. */
export const lineStyle = (letter: string): LineStyle => OTHERS[letter.charCodeAt(0) - 66] ?? FIRST;
