import type { ColourToken } from "#app/components/drawings/colour.ts";
import type { Plot, PlotBand, PlotDash, PlotMark, PlotMarker, PlotTick } from "#app/components/drawings/plot.ts";
import { multiples, niceStep } from "#app/components/drawings/plot-ticks.ts";
import { decadeText, doublings, oneTwoFive, thicknessTicks } from "#app/components/drawings/warp-plot.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { ComparedCurve, ComparisonChart } from "#app/schemas/stack-comparison.ts";

/** Dash, marker and colour by the place of a stack, so that black on paper tells them apart as well. */
const STYLES: readonly { dash: PlotDash; marker: PlotMarker; colourToken: ColourToken }[] = [
  { dash: "solid", marker: "circle", colourToken: "silicon" },
  { dash: "chain", marker: "square", colourToken: "copper" },
  { dash: "dotted", marker: "triangle", colourToken: "clear" },
  { dash: "long", marker: "diamond", colourToken: "need" },
  { dash: "double", marker: "down", colourToken: "caution" },
  { dash: "sparse", marker: "cross", colourToken: "ink" },
];

/** Warps beyond these are outside what anyone reads off a plot, m. */
const LEAST_WARP = 5e-6;
const GREATEST_WARP = 100e-3;
/** Half the width of the band along a curled stretch: a share on a logarithmic axis, a share of the axis on a linear one. */
const BAND_LOG = 0.09;
const BAND_LINEAR = 0.012;
/** Markers stand at every doubling of this, m; those of each stack a little on, so that they do not hide each other. */
const FIRST_MARKER = 24e-6;
const MARKER_SHIFT = 1.09;

/** A warp or thickness with its unit, for read-out and table. */
const lengthText = (metres: number) => formatQuantity(metres, "length", { significant: 3, trim: true });
const thicknessText = (metres: number) => formatQuantity(metres, "length", { unit: "µm", significant: 3, trim: true });

/** Stacks in one plot of warp against remaining thickness, on two logarithmic axes or two linear ones. */
export function comparisonPlot(chart: ComparisonChart): Plot {
  const { curves, range, scale, thicknessLimits, warpLimits, crossings } = chart;
  const styled = curves.flatMap((curve, place) => {
    const style = STYLES[curve.letter.charCodeAt(0) - 65] ?? STYLES[place];
    return style && curve.points.length > 1 ? [{ curve, ...style, place }] : [];
  });
  const axis = warpAxis(chart);
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
      markersAt: markers(chart, place),
    })),
    xLimits: thicknessLimits,
    yLimits: warpLimits,
    bands: styled.flatMap(({ curve, colourToken }) => curledBand(curve, colourToken, scale, axis.to)),
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

function warpAxis({ curves, warpLimits, scale }: ComparisonChart) {
  const warps = [...curves.flatMap(({ points }) => points.map(({ y }) => y)), ...warpLimits.map(({ value }) => value)];
  const seen = warps.filter((warp) => warp >= LEAST_WARP && warp <= GREATEST_WARP);
  const highest = (seen.length > 0 ? Math.max(...seen) : LEAST_WARP * 10) * (scale === "log" ? 1.15 : 1.05);
  if (scale === "linear") {
    const [unit, symbol] = highest >= 5e-3 ? [1e-3, "mm"] : [1e-6, "µm"];
    return { from: 0, to: highest, ticks: linearTicks(0, highest, unit, `\u00A0${symbol}`) };
  }
  const lowest = (seen.length > 0 ? Math.min(...seen) : LEAST_WARP) / 1.15;
  const values = oneTwoFive(lowest, highest);
  const decades = values.filter(({ digit }) => digit === 1);
  // Less than a decade has no two decades to tell by: 2 and 5 are written out too.
  const written = decades.length > 1 ? decades : values;
  return {
    from: lowest,
    to: highest,
    ticks: written.map(({ value }) => ({ value, text: decadeText(value) })),
    minor: values.filter((each) => !written.includes(each)).map(({ value }) => value),
  };
}

function linearTicks(from: number, to: number, unit: number, symbol: string): PlotTick[] {
  return multiples(niceStep((to - from) / 7), from, to).map((value) => ({
    // Powers of ten come out a last digit apart on server and screen: a tick at the end of the axis must lie on it on both.
    value: Math.min(to, Math.max(from, Number(value.toPrecision(12)))),
    text: `${Number((value / unit).toPrecision(6))}${symbol}`,
  }));
}

/** The curled stretch of a curve as a band along it. */
function curledBand(
  { points, onset }: ComparedCurve,
  colourToken: ColourToken,
  scale: ComparisonChart["scale"],
  highest: number,
): PlotBand[] {
  if (!onset) return [];
  const run = points
    .filter(({ x }) => x <= onset.x)
    .map(({ x, y }) =>
      scale === "log"
        ? { x, low: y / (1 + BAND_LOG), high: y * (1 + BAND_LOG) }
        : { x, low: y - BAND_LINEAR * highest, high: y + BAND_LINEAR * highest },
    );
  return run.length > 1 ? [{ colourToken, runs: [run] }] : [];
}
