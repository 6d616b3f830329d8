import type { Working } from "../working.ts";
import { bumpCover } from "./bump-cover.ts";
import { thicknessBudget, type ThicknessBudgetInput } from "./thickness-budget.ts";

/** The sum of `thicknessBudget` as data, linear or as the root of the sum of squares. */
export function thicknessBudgetWorking(i: ThicknessBudgetInput, sum: "linear" | "root sum square"): Working {
  const budget = thicknessBudget(i);
  const linear = sum === "linear";
  return {
    equation: linear ? "thickness-budget-linear" : "thickness-budget",
    inputs: [
      ...i.contributions.map(({ name, variation }, n) => ({
        symbol: `t_${n + 1}`,
        meaning: `thickness variation, ${name}`,
        value: variation,
        unit: "m" as const,
      })),
      { symbol: "t_max", meaning: `allowed, by the ${budget.governedBy}`, value: budget.allowed, unit: "m" },
    ],
    result: linear
      ? { symbol: "t_lin", meaning: "sum of the contributions", value: budget.linear, unit: "m" }
      : { symbol: "t_rss", meaning: "root of the sum of squares", value: budget.rootSumSquare, unit: "m" },
  };
}

/** The ratio of `bumpCover` as data. */
export function bumpCoverWorking(i: Parameters<typeof bumpCover>[0]): Working {
  return {
    equation: "bump-cover",
    inputs: [
      { symbol: "b", meaning: "bump height", value: i.bumpHeight, unit: "m" },
      { symbol: "t", meaning: "adhesive thickness", value: i.adhesiveThickness, unit: "m" },
    ],
    result: { symbol: "r", meaning: "share of the adhesive that a bump takes", value: bumpCover(i).ratio, unit: "1" },
  };
}
