import { RULES } from "#app/schemas/ranges.ts";
import { readQuantity } from "../read-quantity.ts";
import { viewTemperature } from "../stack-view.ts";
import type { ComparisonAsked } from "./asked.ts";

/** Thin end of the curves unless another is asked for, m. */
const THIN_END = 20e-6;

/** Temperature and range that a comparison asks for: what counts, what was understood, and what is wrong. SI. */
export interface ComparedOver {
  /** K; null for 25 °C */
  temperature: number | null;
  range: { from: number; to: number };
  /** what is wrong with a field, by its name; what is wrong does not count */
  faults: Partial<Record<"at" | "from" | "to", string>>;
}

/** Reads them. @param thickest the thickest of the wafers as bought, m */
export function comparedOver({ at, from, to }: ComparisonAsked, thickest: number): ComparedOver {
  const faults: ComparedOver["faults"] = {};
  const { temperature, read } = viewTemperature(at);
  if (read && !read.ok) faults.at = read.message;
  const end = (name: "from" | "to", typed: string, otherwise: number) => {
    if (typed === "") return otherwise;
    const answer = readQuantity(typed, RULES.siliconThickness);
    if (answer.ok) return answer.value;
    faults[name] = answer.message;
    return otherwise;
  };
  const range = { from: end("from", from, Math.min(THIN_END, thickest / 2)), to: end("to", to, thickest) };
  if (range.to > range.from * 1.01) return { temperature, range, faults };
  faults.to = "The range is empty: type a thickness above its thin end.";
  return { temperature, range: { from: Math.min(THIN_END, thickest / 2), to: thickest }, faults };
}
