import type { SheetEngineers } from "#app/schemas/sheet-document.ts";
import type { Plot } from "./plot.ts";
import { decadeText, warpPlot } from "./warp-plot.ts";

const LINES = {
  all: { dash: "solid", marker: "circle" },
  front: { dash: "dotted", marker: "square" },
} as const;

/** How much farther down the axis reaches: the words of the thickness limits stand at its foot, clear of the curves. */
const FOOT = 3;

/** The plot of a sheet from what its document keeps. */
export function sheetPlot(kept: NonNullable<SheetEngineers["plot"]>): Plot {
  const plot = warpPlot({
    series: kept.series.map(({ id, label, points }) => ({ id, label, points, colourToken: "ink", ...LINES[id] })),
    thicknessLimits: kept.thicknessLimits,
    curling: kept.curling ?? undefined,
    chosenThickness: kept.chosenThickness ?? undefined,
    formatThickness: decadeText,
    formatWarp: decadeText,
  });
  return { ...plot, y: { ...plot.y, from: plot.y.from / FOOT } };
}
