import type { Equation } from "./equation.ts";

const sag = { symbol: "w", meaning: "highest less lowest place of the wafer", unit: "m" } as const;
const stiffness = { symbol: "D", meaning: "bending stiffness", unit: "N·m" } as const;
const weight = { symbol: "q", meaning: "weight per area, ρ g h", unit: "Pa" } as const;
const radius = { symbol: "R", meaning: "wafer radius", unit: "m" } as const;
const poisson = { symbol: "ν", meaning: "Poisson's ratio", unit: "1" } as const;
const coefficient = { symbol: "k", meaning: "coefficient of the support", unit: "1" } as const;

const small =
  "Flat wafer, small deflections: a few tenths of the thickness where the wafer must stretch, more on three points and rails. Silicon (100) as isotropic: 0.03 % on a ring under the rim, 1 % on three points there, up to 9 % on three inner points, 17 % on four.";
const caution = "Bow and sag do not add in a wafer thin enough to roll.";

export const GRAVITY = {
  "plate-stiffness": {
    title: "Bending stiffness of a plate",
    formula: "D = E h^3 / (12 (1 − ν^2))",
    symbols: [
      stiffness,
      { symbol: "E", meaning: "Young's modulus", unit: "Pa" },
      { symbol: "h", meaning: "thickness", unit: "m" },
      poisson,
    ],
    range: "Isotropic plate.",
    sources: ["timoshenko-woinowsky-krieger-1959"],
  },
  "sag-edge-ring": {
    title: "Sag on a ring under the rim",
    formula: "w = (5 + ν) q R^4 / (64 (1 + ν) D)",
    symbols: [sag, weight, radius, stiffness, poisson],
    range: small,
    sources: ["chen-2003", "timoshenko-woinowsky-krieger-1959"],
    caution,
  },
  "sag-ring": {
    title: "Sag on a ring",
    formula: "w = k q R^4 / D, k from w(r) = c_0 + c_1 r^2 − r^4/64 + ((r^2 + b^2) ln(r/b) − r^2 + b^2)/8 beyond b",
    symbols: [
      sag,
      coefficient,
      weight,
      radius,
      stiffness,
      { symbol: "b", meaning: "radius of the ring over that of the wafer", unit: "1" },
    ],
    range: small,
    sources: ["timoshenko-woinowsky-krieger-1959"],
    caution,
  },
  "sag-points": {
    title: "Sag on points equally spaced on a circle",
    formula: "w = k q R^4 / D, k from the ring's solution and the harmonics n, 2n, 3n of n points",
    symbols: [
      sag,
      coefficient,
      weight,
      radius,
      stiffness,
      { symbol: "n", meaning: "number of points", unit: "1" },
      { symbol: "b", meaning: "radius of their circle over that of the wafer", unit: "1" },
    ],
    range: small,
    sources: ["nelson-lubliner-mast-1982", "plate-gravity", "plate-gravity-cubic"],
    caution,
  },
  "sag-centre-point": {
    title: "Droop over a point under the centre",
    formula: "w = (7 + 3ν) q R^4 / (64 (1 + ν) D)",
    symbols: [sag, weight, radius, stiffness, poisson],
    range: small,
    sources: ["timoshenko-woinowsky-krieger-1959"],
    caution,
  },
  "sag-centre-cup": {
    title: "Droop over a cup that holds the centre flat",
    formula: "w = k q R^4 / D, k of a ring plate clamped at its inner edge c and free outside",
    symbols: [
      sag,
      coefficient,
      weight,
      radius,
      stiffness,
      { symbol: "c", meaning: "radius of the cup over that of the wafer", unit: "1" },
    ],
    range: small,
    sources: ["timoshenko-woinowsky-krieger-1959"],
    caution,
  },
  "sag-rails": {
    title: "Sag on two parallel rails",
    formula: "w = k q R^4 / D, k from a table of contact solutions",
    symbols: [
      sag,
      coefficient,
      weight,
      radius,
      stiffness,
      { symbol: "c", meaning: "half the spacing of the rails over the radius of the wafer", unit: "1" },
    ],
    range:
      "Rails push and never pull. Table within 0.2 % (2 % near c = 0.47). Small deflections as on points. Silicon (100): constants of the direction across the rails, 1 % at c above 0.9, 12 % at 0.5.",
    sources: ["plate-gravity", "plate-gravity-cubic"],
    caution,
  },
  "sag-large": {
    title: "Sag beyond small deflections",
    formula: "w_large = r(Q) w, Q = q R^4 / (D h)",
    symbols: [
      { symbol: "w_large", meaning: "highest less lowest place", unit: "m" },
      { symbol: "w", meaning: "the same by small deflections", unit: "m" },
      { symbol: "r", meaning: "ratio by von Karman's theory", unit: "1" },
      { symbol: "Q", meaning: "load over what bends the wafer by its thickness", unit: "1" },
      { symbol: "h", meaning: "thickness", unit: "m" },
    ],
    range:
      "Ring under the rim: within 0.1 %, full symmetry. Three points at the rim: within 1 % up to Q = 300; beyond, and on rails, r is 0.6 to 1 (common practice, no source).",
    sources: ["plate-gravity-large", "common-practice"],
    caution: "On a continuous ring a thin wafer sags far less than on points: never use one for the other.",
  },
} as const satisfies Record<string, Equation>;
