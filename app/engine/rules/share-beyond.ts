import type { SourceKind } from "../vocabulary.ts";

/**
 * How many wafers are expected beyond a limit, in words, from a figure with a standard uncertainty taken as normal.
 * Empty when the uncertainty is unknown or the share too small to mention.
 */
export function shareBeyond(value: number, uncertainty: number | null, limit: number): string {
  if (uncertainty === null || uncertainty === 0) return "";
  const share = 1 - normalDistribution((limit - value) / uncertainty);
  if (share < 0.001) return "";
  if (share < 0.05) return "With the tolerances given, fewer than 1 wafer in 20 is expected beyond it.";
  if (share < 0.2) return "With the tolerances given, fewer than 1 wafer in 5 is expected beyond it.";
  if (share < 0.5) return "With the tolerances given, up to half of the wafers are expected beyond it.";
  if (share < 0.95) return "With the tolerances given, more than half of the wafers are expected beyond it.";
  return "With the tolerances given, nearly all wafers are expected beyond it.";
}

/** Inputs named beside a share: more are not read. */
const NAMED = 3;

/** What such a share rests on: the assumed inputs by name, else the input that moves it most. Empty when there is neither. */
export function sharedBy(budget: readonly { input: string; source: SourceKind }[]): string {
  const assumed = budget.filter(({ source }) => source === "assumed").slice(0, NAMED);
  if (assumed.length > 0) return `Assumed: ${assumed.map(({ input }) => input).join("; ")}.`;
  const [first] = budget;
  return first ? `It rests most on ${first.input}.` : "";
}

/** Standard normal distribution function, absolute error below 7.5e-8 (Abramowitz & Stegun 1964, 26.2.17, from memory). */
export function normalDistribution(z: number): number {
  const t = 1 / (1 + 0.2316419 * Math.abs(z));
  const tail =
    (Math.exp(-(z * z) / 2) / Math.sqrt(2 * Math.PI)) *
    t *
    (0.31938153 + t * (-0.356563782 + t * (1.781477937 + t * (-1.821255978 + t * 1.330274429))));
  return z >= 0 ? 1 - tail : tail;
}
