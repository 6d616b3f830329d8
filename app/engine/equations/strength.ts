import type { Equation } from "./equation.ts";

const modulus = { symbol: "E_b", meaning: "E/(1 − ν^2) along a roll, E/(1 − ν) of a sphere", unit: "Pa" } as const;
const thickness = { symbol: "h", meaning: "wafer thickness", unit: "m" } as const;
const area = { symbol: "A", meaning: "area under tension; A_0 of the pieces tested", unit: "m2" } as const;
const characteristic = {
  symbol: "σ_0",
  meaning: "strength at which 63.2 % of the pieces tested broke",
  unit: "Pa",
} as const;

export const STRENGTH = {
  "bending-stress": {
    title: "Stress of a bent wafer",
    formula: "σ = E_b h / (2 ρ)",
    symbols: [
      { symbol: "σ", meaning: "tension at the outer face", unit: "Pa" },
      modulus,
      thickness,
      { symbol: "ρ", meaning: "radius of curvature", unit: "m" },
    ],
    range: "Silicon (100): 169.6 GPa for a roll along <110>, 141.0 along <100>, 180.2 for a sphere. Elastic, no film.",
    sources: ["timoshenko-woinowsky-krieger-1959", "silicon-properties-note"],
  },
  "minimum-bend-radius": {
    title: "Smallest radius of a bent wafer",
    formula: "ρ_min = E_b h / (2 σ)",
    symbols: [
      { symbol: "ρ_min", meaning: "smallest radius of curvature", unit: "m" },
      modulus,
      thickness,
      { symbol: "σ", meaning: "stress allowed at the outer face", unit: "Pa" },
    ],
    range: "As for the stress of a bent wafer.",
    sources: ["timoshenko-woinowsky-krieger-1959", "silicon-properties-note"],
    caution:
      "Whole wafers: 50 to 100 MPa with a ground edge, 150 MPa relieved and trimmed (common practice, no source). Strengths of dies do not apply.",
  },
  weibull: {
    title: "Probability of failure",
    formula: "P = 1 − exp(−(A / A_0) (σ / σ_0)^m)",
    symbols: [
      { symbol: "P", meaning: "probability that the part breaks", unit: "1" },
      area,
      { symbol: "σ", meaning: "uniform tension", unit: "Pa" },
      characteristic,
      { symbol: "m", meaning: "Weibull modulus", unit: "1" },
    ],
    range: "Flaws of one kind, spread evenly over the area.",
    sources: ["weibull-1951"],
    caution: "Far below the stresses tested it ranks steps and predicts nothing.",
  },
  "weibull-size": {
    title: "Strength of a part of another size",
    formula: "σ_A = σ_0 (A_0 / A)^(1/m)",
    symbols: [
      { symbol: "σ_A", meaning: "characteristic strength of the part", unit: "Pa" },
      characteristic,
      area,
      { symbol: "m", meaning: "Weibull modulus", unit: "1" },
    ],
    range: "As for the probability of failure.",
    sources: ["weibull-1951"],
  },
} as const satisfies Record<string, Equation>;
