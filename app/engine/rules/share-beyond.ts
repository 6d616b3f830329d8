import { normalShareBelow } from "../uncertainty/random/inverse-normal.ts";
import type { SourceKind } from "../vocabulary.ts";

/**
 * How many wafers are expected beyond a limit, in words, from a figure with a standard uncertainty taken as normal.
 * Empty when the uncertainty is unknown or the share too small to mention.
 */
export function shareBeyond(value: number, uncertainty: number | null, limit: number): string {
  if (uncertainty === null || uncertainty === 0) return "";
  const share = normalShareBelow((value - limit) / uncertainty);
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
