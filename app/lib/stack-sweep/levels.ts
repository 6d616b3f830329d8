import { multiples, niceStep } from "#app/components/drawings/plot-ticks.ts";

/** About as many lines as can be told apart and labelled. */
const LINES = 9;
/** From this ratio on positive values go by powers of ten, where even steps would crowd at one end. */
const WIDE = 12;
/** Levels below this share of the greatest would crowd about where there is nothing. */
const LEAST_SHARE = 1 / 3000;
/** Levels within each power of ten, the closer ones while there is room for them. */
const CLOSER = [1, 2, 5];
const WIDER = [1, 3];

/** Levels for the lines of a map, between the least and the greatest of its values. */
export function levelsOf(values: readonly (number | null)[]): number[] {
  const known = values.filter((value) => value !== null);
  if (known.length === 0) return [];
  const [least, most] = [Math.min(...known), Math.max(...known)];
  if (!(most > least)) return [];
  const inside = (level: number) => level > least && level < most;
  if (least < 0 || most < WIDE * least)
    return multiples(niceStep((most - least) / LINES), least, most)
      .map(clean)
      .filter(inside);
  const from = Math.max(least, most * LEAST_SHARE);
  const closer = byPowers(from, most, CLOSER).filter(inside);
  return closer.length <= LINES + 2 ? closer : byPowers(from, most, WIDER).filter(inside);
}

function byPowers(from: number, to: number, digits: readonly number[]): number[] {
  const found: number[] = [];
  for (let power = Math.floor(Math.log10(from)); power <= Math.log10(to); power += 1)
    found.push(...digits.map((digit) => clean(digit * 10 ** power)).filter((level) => level >= from && level <= to));
  return found;
}

/** Multiples of a step come out a last digit off. */
const clean = (level: number) => Number(level.toPrecision(9)) + 0;
