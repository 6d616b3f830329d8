import { lineStyle } from "#app/components/comparison/line-styles.ts";
import { warpAxis } from "#app/components/comparison/warp-axis.ts";
import { coursePlot } from "#app/components/drawings/course-plot.ts";
import type { Plot, PlotMark, PlotPoint } from "#app/components/drawings/plot.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { LEAST_DRAWN } from "#app/lib/stack-chart.ts";
import type { StepsChart } from "#app/schemas/flow-comparison.ts";

const micrometres = (metres: number) => formatQuantity(metres, "length", { unit: "µm", significant: 3, trim: true });

/** Flows in one plot of warp along the aligned steps: with sign on a linear axis, sizes alone on a logarithmic one. */
export function stepsPlot({ scale, places, lines, limits, rolled, tightest, crossings }: StepsChart): Plot {
  const plot = coursePlot({
    places,
    lines: lines.map(({ letter, label, values }) => ({ id: letter, label, values, ...lineStyle(letter) })),
    limits,
    rolled: [],
    formatWarp: micrometres,
  });
  const signed: Plot = {
    ...plot,
    x: { ...plot.x, title: "Step of the table; edges up above 0" },
    series: plot.series.map((series) => (series.dash === "none" ? series : { ...series, endLabel: series.id })),
    shaded: rolled.map(({ from, to, label }) => ({ from: from - 0.5, to: to + 0.5, label })),
    marks: [
      ...tightest.map(({ letter, x, y }): PlotMark => ({
        kind: "own",
        colourToken: lineStyle(letter).colourToken,
        x,
        y,
      })),
      ...crossings.map(({ x, y, number }): PlotMark => ({
        kind: "crossing",
        colourToken: "ink",
        x,
        y,
        text: String(number),
      })),
    ],
  };
  return scale === "linear" ? signed : sizesOf(signed);
}

/** The same plot by sizes alone, on a logarithmic axis. What is as good as flat has no place there. */
function sizesOf(plot: Plot): Plot {
  const size = ({ x, y }: PlotPoint) => ({ x, y: Math.abs(y) });
  const series = plot.series.map((each) => {
    const points = each.points.map(size).filter(({ y }) => y >= LEAST_DRAWN);
    return { ...each, points, markersAt: points.map(({ x }) => x) };
  });
  const axis = warpAxis(
    series.flatMap(({ points }) => points.map(({ y }) => y)),
    "log",
  );
  return {
    ...plot,
    x: { ...plot.x, title: "Step of the table; sizes alone" },
    y: { scale: "log", ...axis, format: micrometres },
    series,
    marks: plot.marks?.map((mark) => ({ ...mark, ...size(mark) })),
  };
}
