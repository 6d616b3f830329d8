import { normalShareBelow } from "../uncertainty/random/inverse-normal.ts";

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
