import { EngineInputError } from "#app/engine/errors.ts";
import { controlChart, type ChartValue } from "#app/engine/profile/lot-figures/control-chart.ts";
import { controlLimitsWorking } from "#app/engine/profile/lot-figures/working.ts";
import { shownWorking } from "#app/lib/shown-working.ts";
import type { StressChart, StressValueRow } from "#app/schemas/film-stress.ts";

/** Instruments that have values, the one with most first. */
export function instrumentsOf(rows: readonly StressValueRow[]): string[] {
  const counts = new Map<string, number>();
  for (const { instrument } of rows) counts.set(instrument, (counts.get(instrument) ?? 0) + 1);
  return [...counts].toSorted(([a, many], [b, more]) => more - many || a.localeCompare(b)).map(([name]) => name);
}

/** Values of one instrument with the limits that they give by themselves. */
export function chartOf(rows: readonly StressValueRow[], instrument: string): StressChart {
  const own = rows.filter((row) => row.instrument === instrument);
  const values = own.map(({ value, standardUncertainty, measuredAt, state }) => ({
    value,
    standardUncertainty,
    measuredAt,
    excluded: state === "set aside",
  }));
  const asked: ChartValue[] = own.map(({ value, state }) => ({
    value,
    excluded: state === "set aside" ? "set aside" : null,
  }));
  try {
    const { ranges, limits, signals } = controlChart(asked);
    const working = shownWorking(controlLimitsWorking(asked, "Pa"));
    return { instrument, values, ranges, limits, signals, tooFew: null, working };
  } catch (error) {
    if (!(error instanceof EngineInputError)) throw error;
    const counted = asked.filter(({ excluded }) => !excluded).length;
    const tooFew = `${counted === 1 ? "One value counts" : `${counted} values count`} here: limits come from five on, and are loose below twenty.`;
    return { instrument, values, ranges: values.map(() => null), limits: null, signals: [], tooFew, working: null };
  }
}
