import type { Equation } from "./equation.ts";

export const DIE = {
  "die-warp": {
    title: "Warp of a free die",
    formula: "w = max z − min z, z = κ_x x^2 / 2 + κ_y y^2 / 2 + t x y",
    symbols: [
      { symbol: "w", meaning: "highest less lowest place of the die", unit: "m" },
      { symbol: "z", meaning: "height over the centre", unit: "m" },
      { symbol: "κ_x", meaning: "curvature along x at that temperature; κ_y along y", unit: "1/m" },
      { symbol: "t", meaning: "twist", unit: "1/m" },
      { symbol: "x", meaning: "position, up to half the edge; y likewise", unit: "m" },
    ],
    range: "Free die, elastic layers, small deflections: edge up to about 0.4 of its critical size.",
    sources: ["jones-1999"],
    caution: "Metals that yield and solder that melts move it; an attached die does not follow it.",
  },
  "die-critical-size": {
    title: "Edge of the die that would start to roll",
    formula: "a_cr = sqrt(4 π h S_cr / |κ|)",
    symbols: [
      { symbol: "a_cr", meaning: "edge of a square die", unit: "m" },
      { symbol: "h", meaning: "effective thickness of the stack", unit: "m" },
      { symbol: "S_cr", meaning: "critical load of a disc", unit: "1" },
      { symbol: "κ", meaning: "larger principal curvature by small deflections", unit: "1/m" },
    ],
    range: "Estimate: the disc of equal area.",
    sources: ["die-critical-size", "plate-von-karman"],
  },
  "thickness-budget-linear": {
    title: "Thickness variation, all at their worst",
    formula: "t_lin = Σ t_i",
    symbols: [
      { symbol: "t_lin", meaning: "sum of the contributions", unit: "m" },
      { symbol: "t_i", meaning: "contribution i, highest less lowest thickness", unit: "m" },
    ],
    range: "Worst case. Allowed: the smaller of 10 % of the final thickness and the protrusion of the vias.",
    sources: ["common-practice"],
  },
  "thickness-budget": {
    title: "Thickness variation, independent contributions",
    formula: "t_rss = sqrt(Σ t_i^2)",
    symbols: [
      { symbol: "t_rss", meaning: "root of the sum of squares", unit: "m" },
      { symbol: "t_i", meaning: "contribution i, highest less lowest thickness", unit: "m" },
    ],
    range:
      "Independent contributions. Allowed: the smaller of 10 % of the final thickness and the protrusion of the vias.",
    sources: ["common-practice"],
  },
  "bump-cover": {
    title: "Bump height against adhesive",
    formula: "r = b / t",
    symbols: [
      { symbol: "r", meaning: "share of the adhesive that a bump takes", unit: "1" },
      { symbol: "b", meaning: "bump height", unit: "m" },
      { symbol: "t", meaning: "adhesive thickness", unit: "m" },
    ],
    range: "At most 0.70, with 5 to 10 µm of adhesive left over the bumps.",
    sources: ["common-practice"],
  },
} as const satisfies Record<string, Equation>;
