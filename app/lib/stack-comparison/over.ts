import type { ComparisonFaults } from "#app/schemas/comparison.ts";
import type { ComparisonAsked } from "../comparison/asked.ts";
import { comparedRange } from "../comparison/range.ts";
import { viewTemperature } from "../stack-view.ts";

/** Thin end of the curves unless another is asked for, m. */
const THIN_END = 20e-6;

/** Temperature and range that a comparison of stacks asks for: what counts, and what is wrong. SI. */
export interface ComparedOver {
  /** K; null for 25 °C */
  temperature: number | null;
  range: { from: number; to: number };
  /** what is wrong with a field; what is wrong does not count */
  faults: ComparisonFaults;
}

/** Reads them. @param thickest the thickest of the wafers as bought, m */
export function comparedOver(asked: ComparisonAsked, thickest: number): ComparedOver {
  const { temperature, read } = viewTemperature(asked.at);
  const { range, faults } = comparedRange(asked, { from: Math.min(THIN_END, thickest / 2), to: thickest });
  return { temperature, range, faults: read && !read.ok ? { at: read.message, ...faults } : faults };
}
