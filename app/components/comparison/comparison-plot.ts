import type { ColourToken } from "#app/components/drawings/colour.ts";
import type { Plot, PlotBand, PlotMark } from "#app/components/drawings/plot.ts";
import { doublings, thicknessTicks } from "#app/components/drawings/warp-plot.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { ComparedCurve, ComparisonChart } from "#app/schemas/comparison.ts";
import { lineStyle } from "./line-styles.ts";
import { linearTicks, warpAxis } from "./warp-axis.ts";

/** Half the width of the band along a curled stretch: a share on a logarithmic axis, a share of the axis on a linear one. */
const BAND_LOG = 0.09;
const BAND_LINEAR = 0.012;
/** Markers stand at every doubling of this, m; those of each line a little on, so that they do not hide each other. */
const FIRST_MARKER = 24e-6;
const MARKER_SHIFT = 1.09;

/** A warp or thickness with its unit, for read-out and table. */
const lengthText = (metres: number) => formatQuantity(metres, "length", { significant: 3, trim: true });
const thicknessText = (metres: number) => formatQuantity(metres, "length", { unit: "µm", significant: 3, trim: true });

/** Several wafers in one plot of warp against remaining thickness, on two logarithmic axes or two linear ones. */
export function comparisonPlot(chart: ComparisonChart): Plot {
  const { curves, range, scale, thicknessLimits, warpLimits, crossings } = chart;
  const styled = curves.flatMap((curve, place) =>
    curve.points.length > 1 ? [{ curve, ...lineStyle(curve.letter), place }] : [],
  );
  const axis = warpAxis(
    [...curves.flatMap(({ points }) => points.map(({ y }) => y)), ...warpLimits.map(({ value }) => value)],
    scale,
  );
  return {
    x: {
      scale,
      ...range,
      ticks: scale === "log" ? thicknessTicks(range.from, range.to) : linearTicks(range.from, range.to, 1e-6, ""),
      title: "Silicon thickness, µm",
      format: thicknessText,
    },
    y: { scale, ...axis, format: lengthText },
    series: styled.map(({ curve, dash, marker, colourToken, place }) => ({
      id: curve.letter,
      label: curve.label,
      dash,
      marker,
      colourToken,
      points: curve.points,
      gaps: curve.gaps,
      markersAt: markers(chart, place),
    })),
    xLimits: thicknessLimits,
    xLimitWords: "top",
    yLimits: warpLimits,
    bands: styled.flatMap(({ curve, colourToken }) => curledBands(curve, colourToken, scale, axis.to)),
    marks: [
      ...styled.flatMap(({ curve: { own, onset }, colourToken }) => [
        ...(onset ? [{ kind: "onset" as const, colourToken, ...onset }] : []),
        ...(own ? [{ kind: "own" as const, colourToken, ...own }] : []),
      ]),
      ...crossings.map(({ x, y, number }): PlotMark => ({
        kind: "crossing",
        colourToken: "ink",
        x,
        y,
        text: String(number),
      })),
    ],
  };
}

/** Where markers stand on a curve. */
function markers({ range, scale }: ComparisonChart, place: number): number[] {
  if (scale === "log")
    return doublings(FIRST_MARKER * MARKER_SHIFT ** place, range.to).filter((mark) => mark > range.from);
  const step = (range.to - range.from) / 8;
  return Array.from({ length: 8 }, (_, n) => range.from + step * (n + 0.2 + 0.12 * place));
}

/** The curled stretches of a curve as bands along it. */
function curledBands(
  { points, curled }: ComparedCurve,
  colourToken: ColourToken,
  scale: ComparisonChart["scale"],
  highest: number,
): PlotBand[] {
  const runs = curled.map(({ from, to }) =>
    points
      .filter(({ x }) => x >= from && x <= to)
      .map(({ x, y }) =>
        scale === "log"
          ? { x, low: y / (1 + BAND_LOG), high: y * (1 + BAND_LOG) }
          : { x, low: y - BAND_LINEAR * highest, high: y + BAND_LINEAR * highest },
      ),
  );
  const drawn = runs.filter((run) => run.length > 1);
  return drawn.length > 0 ? [{ colourToken, runs: drawn }] : [];
}
