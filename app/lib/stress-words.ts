import { formatQuantity, formatWithUncertainty } from "#app/engine/units/format.ts";
import type { StressMean } from "#app/schemas/film-stress.ts";
import { formatMeasured } from "./format-measured.ts";
import { COVERAGE } from "./scan-answer.ts";

/** A stress with its expanded uncertainty, k = 2. */
export const expandedStress = (value: number, standardUncertainty: number): string =>
  formatWithUncertainty(value, COVERAGE * standardUncertainty, "stress", { unit: "MPa", sign: true });

/** A stress with the half-width that the library keeps. */
export const libraryStress = (stress: StressMean["stress"]): string =>
  formatMeasured(stress, "stress", { unit: "MPa", sign: true });

/** What the half-width of a mean means, so that nobody takes it for the ± of a measurement. */
export function toleranceWords({ stress, standardUncertainty }: StressMean): string {
  const [half, standard] = [stress.tolerance ?? 0, standardUncertainty].map((value) =>
    formatQuantity(value, "stress", { unit: "MPa", significant: 2 }),
  );
  return `The library keeps a half-width, ±\u00A0${half}, of an interval within which every value is as likely. It is √3 times the standard uncertainty of the next film, ${standard}: the engine divides by √3 and has it back.`;
}

/** What a mean rests on, a sentence. */
export function meanSentence({ count, spread, remark }: StressMean): string {
  const by = formatQuantity(spread, "stress", { unit: "MPa", significant: 2 });
  if (count === 1) return remark ?? "It rests on one value.";
  const rests = `It rests on ${count} values; their standard deviation is ${by}.`;
  return remark ? `${rests} ${remark}` : rests;
}
