import type { PlotAxis, PlotTick } from "#app/components/drawings/plot.ts";
import { multiples, niceStep } from "#app/components/drawings/plot-ticks.ts";
import { decadeText, oneTwoFive } from "#app/components/drawings/warp-plot.ts";

/** Warps beyond these are outside what anyone reads off a plot, m. */
const LEAST_WARP = 5e-6;
const GREATEST_WARP = 100e-3;

/** An axis that has room for these warps and limits, m, which are all sizes. */
export function warpAxis(warps: readonly number[], scale: PlotAxis["scale"]) {
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

/** Ticks of a linear axis with the unit behind each. */
export function linearTicks(from: number, to: number, unit: number, symbol: string): PlotTick[] {
  return multiples(niceStep((to - from) / 7), from, to).map((value) => ({
    // Powers of ten come out a last digit apart on server and screen: a tick at the end of the axis must lie on it on both.
    value: Math.min(to, Math.max(from, Number(value.toPrecision(12)))),
    text: `${Number((value / unit).toPrecision(6))}${symbol}`,
  }));
}
