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
} as const satisfies Record<string, Equation>;
