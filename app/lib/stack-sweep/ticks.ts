import { multiples, niceStep } from "#app/components/drawings/plot-ticks.ts";
import type { PlotTick } from "#app/components/drawings/plot.ts";
import { oneTwoFive } from "#app/components/drawings/warp-plot.ts";
import { fromSi, toSi } from "#app/engine/units/convert.ts";
import { findUnit } from "#app/engine/units/dimensions.ts";
import { formatNumber } from "#app/engine/units/format-number.ts";
import type { DrawnAxis } from "#app/schemas/stack-sweep.ts";

/** Fewest ticks by powers of ten that still tell the scale. */
const FEWEST = 3;

/** Ticks of an axis: round in its own unit, which stands in its name. @param count about as many as there is room for */
export function ticksOn(axis: Pick<DrawnAxis, "dimension" | "unit" | "from" | "to" | "log">, count = 7): PlotTick[] {
  const { dimension, log } = axis;
  const unit = findUnit(dimension, axis.unit);
  if (!unit) return [];
  const [from, to] = [fromSi(axis.from, unit, dimension), fromSi(axis.to, unit, dimension)];
  return roundValues(from, to, log, count).map((value) => ({
    // A tick at the end of the axis lies on it, whatever its last digit.
    value: Math.min(axis.to, Math.max(axis.from, toSi(value, unit, dimension))),
    text: formatNumber(value, { significant: 5, trim: true }),
  }));
}

/** Round values within a range. */
export function roundValues(from: number, to: number, log: boolean, count: number): number[] {
  const byPowers = log ? oneTwoFive(from, to) : [];
  const decades = byPowers.filter(({ digit }) => digit === 1);
  const told = byPowers.length > 2 * count && decades.length >= FEWEST ? decades : byPowers;
  const values =
    told.length >= FEWEST ? told.map(({ value }) => value) : multiples(niceStep((to - from) / count), from, to);
  return values.map((value) => Number(value.toPrecision(12)) + 0);
}
