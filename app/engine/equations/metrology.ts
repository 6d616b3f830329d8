import type { Equation } from "./equation.ts";
import { SCANS } from "./scans.ts";

export const METROLOGY = {
  "profile-fit": {
    title: "Curvature of a scan",
    formula: "z = c_0 + c_1 x + c_2 x^2 by least squares, κ = 2 c_2 / (1 + c_1^2)^1.5",
    symbols: [
      { symbol: "z", meaning: "height", unit: "m" },
      { symbol: "x", meaning: "position from the middle of the scan", unit: "m" },
      { symbol: "κ", meaning: "curvature, positive for a bowl", unit: "1/m" },
      { symbol: "c_1", meaning: "tilt at the middle", unit: "1" },
      { symbol: "c_2", meaning: "half the curvature of the parabola", unit: "1/m" },
    ],
    range:
      "Edge left out; a scan steeper than 0.03 is fitted by a circle. Spikes and steps are told by bisquare weights (4.685 times the scatter) and left out. Scatter independent from point to point, or with a memory short against the scan.",
    sources: [
      "gum-2008",
      "forsythe-1957",
      "beaton-tukey-1974",
      "holland-welsch-1977",
      "rousseeuw-1984",
      "rousseeuw-leroy-1987",
      "muller-2007",
      "scan-scatter",
      "common-practice",
    ],
    caution: "A fourth-order share beyond 5 % that is no chance says that the shape is not spherical.",
  },
  "film-stress-from-profiles": {
    title: "Film stress from a scan before and after",
    formula: "κ − κ_0 from z_post − z_pre, σ_f = M h^2 (κ − κ_0) / (6 h_f)",
    symbols: [
      { symbol: "z_pre", meaning: "scan before the film; z_post after it, same azimuth and supports", unit: "m" },
      { symbol: "σ_f", meaning: "film stress, tension positive", unit: "Pa" },
      { symbol: "M", meaning: "biaxial modulus of the wafer", unit: "Pa" },
      { symbol: "h", meaning: "wafer thickness", unit: "m" },
      { symbol: "h_f", meaning: "film thickness", unit: "m" },
    ],
    range: "As for Stoney's relation. Subtraction removes the wafer's own shape and most of gravity.",
    sources: ["stoney-1909", "feng-huang-rosakis-2007", "gum-2008"],
  },
  "first-order-uncertainty": {
    title: "Standard uncertainty, first order",
    formula: "u^2 = Σ u_i^2, u_i = (df/dx_i) u(x_i)",
    symbols: [
      { symbol: "u", meaning: "standard uncertainty of the figure, in its own unit", unit: "1" },
      { symbol: "u_i", meaning: "share of input i: its uncertainty times the slope of the figure", unit: "1" },
      { symbol: "x_i", meaning: "input i, in its own unit", unit: "1" },
    ],
    range: "Independent inputs, figure close to linear over their uncertainties.",
    sources: ["gum-2008"],
    caution:
      "A tolerance is the half-width of the interval believed to hold the value: its standard uncertainty is tolerance/sqrt(3).",
  },
  "monte-carlo-uncertainty": {
    title: "Standard uncertainty and probability by Monte Carlo",
    formula: "u^2 = Σ (f_k − f_m)^2 / (N − 1), P = N_L / N",
    symbols: [
      { symbol: "u", meaning: "standard uncertainty of the figure, in its own unit", unit: "1" },
      { symbol: "f_k", meaning: "figure for draw k of all inputs, in its own unit", unit: "1" },
      { symbol: "f_m", meaning: "mean of the draws", unit: "1" },
      { symbol: "N", meaning: "number of draws", unit: "1" },
      { symbol: "P", meaning: "probability that the figure is beyond the limit L", unit: "1" },
      { symbol: "N_L", meaning: "draws whose figure is beyond L", unit: "1" },
    ],
    range: "Any model that can be computed for every draw. The standard errors of mean and P say what N leaves open.",
    sources: [
      "gum-supplement-1-2008",
      "blackman-vigna-2021",
      "marsaglia-tsang-2000",
      "wichura-1988",
      "cranley-patterson-1976",
      "cools-kuo-nuyens-2006",
      "sampling-layers",
    ],
    caution: "It is as good as the distributions of the inputs; a tolerance alone is taken as rectangular.",
  },
  "pair-calibration": {
    title: "Locked-in modulus and carrier expansion from measured pairs",
    formula: "χ^2 = Σ ((s_k − f_k(p)) / u_k)^2 least, u(p) from (J^T J)^(-1), J_kj = (df_k/dp_j) / u_k",
    symbols: [
      { symbol: "χ", meaning: "misfit; χ^2 is near the degrees of freedom when the u_k are honest", unit: "1" },
      { symbol: "s_k", meaning: "sagitta measured at 25 °C after a step, sign of the curvature", unit: "m" },
      { symbol: "f_k", meaning: "the same by the full walk of the flow", unit: "m" },
      { symbol: "u_k", meaning: "standard uncertainty of s_k", unit: "m" },
      { symbol: "p", meaning: "what is sought: logarithm of the locked-in modulus, carrier expansion", unit: "1" },
    ],
    range:
      "Same bonding material and carrier in all pairs, independent errors. Refused while a value stays open: a modulus not known to a factor of two, an expansion not to 1 ppm/K, or both changing the bows alike.",
    sources: ["levenberg-1944", "marquardt-1963", "gum-supplement-2-2011"],
    caution: "All other inputs count as exact: what is wrong with them goes into the values.",
  },
  "lot-share": {
    title: "Share of a lot's wafers beyond a limit",
    formula: "P(c) = share of w with f(c, w) > L, u^2(P) = var of P(c) over c",
    symbols: [
      { symbol: "P", meaning: "share of wafers beyond the limit", unit: "1" },
      { symbol: "c", meaning: "what is common to all wafers of the lot", unit: "1" },
      { symbol: "w", meaning: "what differs from wafer to wafer", unit: "1" },
      { symbol: "f", meaning: "figure of one wafer, in its own unit", unit: "1" },
      { symbol: "L", meaning: "limit of the figure", unit: "1" },
    ],
    range: "Wafers of one lot differ independently of each other; the lot's common part is not known exactly.",
    sources: ["gum-supplement-1-2008", "sampling-layers"],
    caution: "A tolerance that is common to the lot moves all its wafers together and does not spread them.",
  },
  ...SCANS,
} as const satisfies Record<string, Equation>;
