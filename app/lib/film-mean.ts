import type { Measured } from "#app/engine/measured.ts";
import { acceptedValue, type AcceptedReading } from "#app/engine/profile/lot-figures/accepted-value.ts";
import type { FilmStressState, StressMean } from "#app/schemas/film-stress.ts";

/** A value of a film's history as its mean needs it; SI, standard uncertainties. */
export interface MeanReading {
  value: number;
  standardUncertainty: number;
  /** the part of it that values from other scans share */
  commonUncertainty: number;
  measuredAt: Date;
  state: FilmStressState;
}

/** Digits that a mean keeps in the library: far beyond its uncertainty, and short enough to be read in a form. */
const DIGITS = 5;

const rounded = (value: number) => Number(value.toPrecision(DIGITS));
const day = (date: Date) => date.toISOString().slice(0, 10);

/** What the engine makes a mean of: each value with its own uncertainty, and the largest of what they share. */
export function meanInputs(values: readonly MeanReading[]): { readings: AcceptedReading[]; common: number } {
  const counted = values.filter(({ state }) => state === "accepted");
  return {
    readings: counted.map(({ value, standardUncertainty, commonUncertainty }) => ({
      value,
      standardUncertainty: Math.sqrt(Math.max(0, standardUncertainty ** 2 - commonUncertainty ** 2)),
    })),
    common: Math.max(0, ...counted.map(({ commonUncertainty }) => commonUncertainty)),
  };
}

/** The mean of the values that count, as the library would keep it; null when none does. */
export function stressMean(values: readonly MeanReading[]): StressMean | null {
  const { readings, common } = meanInputs(values);
  if (readings.length === 0) return null;
  const found = acceptedValue(readings, common);
  const counted = values.filter(({ state }) => state === "accepted");
  const days = counted.map(({ measuredAt }) => day(measuredAt)).toSorted();
  const [from = "", to = from] = [days[0], days.at(-1)];
  const stress: Measured = {
    value: rounded(found.mean),
    // The library's half-width of a rectangular interval: over √3 it gives back the standard uncertainty of the next film.
    tolerance: rounded(found.tolerance),
    source: "measured here",
    note: meanNote(found.count, from, to),
    on: to,
    meanOf: found.count,
  };
  const { count, standardUncertainty, spread, remark } = found;
  return { stress, count, standardUncertainty, spread, remark };
}

/** 'mean of 7 accepted values, 2026-09-02 to 2026-12-01'; no wafer and no program is named, because the library is the site's. */
function meanNote(count: number, from: string, to: string): string {
  if (count === 1) return `1 accepted value, ${to}`;
  return `mean of ${count} accepted values, ${from === to ? to : `${from} to ${to}`}`;
}
