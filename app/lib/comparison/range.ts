import { RULES } from "#app/schemas/ranges.ts";
import type { ComparisonFaults } from "#app/schemas/comparison.ts";
import { readQuantity } from "../read-quantity.ts";
import type { ComparisonAsked } from "./asked.ts";

interface Range {
  from: number;
  to: number;
}

/** Range of silicon thickness that a comparison asks for, m, and what is wrong with what was typed, which does not count. */
export function comparedRange(
  { from, to }: Pick<ComparisonAsked, "from" | "to">,
  usual: Range,
): { range: Range; faults: ComparisonFaults } {
  const faults: ComparisonFaults = {};
  const end = (name: "from" | "to", typed: string) => {
    if (typed === "") return usual[name];
    const answer = readQuantity(typed, RULES.siliconThickness);
    if (answer.ok) return answer.value;
    faults[name] = answer.message;
    return usual[name];
  };
  const range = { from: end("from", from), to: end("to", to) };
  if (range.to > range.from * 1.01) return { range, faults };
  faults.to = "The range is empty: type a thickness above its thin end.";
  return { range: usual, faults };
}
