import type { Equation } from "./equation.ts";

export const HANDLING = {
  "thickness-rule": {
    title: "Thickness that decides the support",
    formula: "h_min = h − Δh",
    symbols: [
      { symbol: "h_min", meaning: "thickness compared with the site's limits", unit: "m" },
      { symbol: "h", meaning: "nominal thickness", unit: "m" },
      { symbol: "Δh", meaning: "tolerance, half-width of the interval", unit: "m" },
    ],
    range: "Limits by diameter, set by the site. At a limit: allowed, with caution.",
    sources: ["common-practice", "marks-hassan-cheong-2014"],
  },
  "warp-against-limit": {
    title: "Warp against the tool's limit",
    formula: "w + margin < L: clear; w at most L: caution; w > L: do not run",
    symbols: [
      {
        symbol: "w",
        meaning: "warp of the wafer or pair as loaded, or free at peak, as the tool's limit says",
        unit: "m",
      },
      { symbol: "L", meaning: "limit of the tool for that side, edges up or edges down", unit: "m" },
      { symbol: "margin", meaning: "the site's margin below the limit", unit: "m" },
    ],
    range: "Each tool holds two limits, edges up and edges down.",
    sources: ["common-practice", "semi-mf1390"],
  },
  "inverse-question": {
    title: "Input at which a figure takes a value",
    formula: "f(x) = f_0, the x nearest to x_1 between x_1 and x_2",
    symbols: [
      { symbol: "f", meaning: "figure of the full model, such as the warp, in its own unit", unit: "1" },
      { symbol: "x", meaning: "input that is sought, in its own unit", unit: "1" },
      { symbol: "f_0", meaning: "value that the figure takes, such as a limit", unit: "1" },
      { symbol: "x_1", meaning: "where the search begins; it ends at x_2", unit: "1" },
    ],
    range:
      "Every other input as stated. The answer put back gives the value far better than to 0.1 %; two answers between neighbouring places of the search are found unless the figure turns twice there.",
    sources: ["inverse-questions"],
    caution:
      "A figure that is not monotone has further answers, which are named; a wafer that has begun to roll follows another branch.",
  },
} as const satisfies Record<string, Equation>;
