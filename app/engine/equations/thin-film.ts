import type { Equation } from "./equation.ts";

const wafer = { symbol: "h", meaning: "wafer thickness", unit: "m" } as const;
const film = { symbol: "h_f", meaning: "film thickness", unit: "m" } as const;
const modulus = { symbol: "M", meaning: "biaxial modulus of the wafer, E/(1 − ν)", unit: "Pa" } as const;
const stress = { symbol: "σ_f", meaning: "film stress, tension positive", unit: "Pa" } as const;
const curvature = { symbol: "κ", meaning: "curvature, positive for a bowl", unit: "1/m" } as const;
const radius = { symbol: "R", meaning: "wafer radius", unit: "m" } as const;
const sagitta = {
  symbol: "s",
  meaning: "height of the rim over the centre, sign of the curvature",
  unit: "m",
} as const;

const thin =
  "Film far thinner than the wafer (about 3 h_f/h of error for a film as stiff as the wafer), uniform over the whole wafer; small slopes; bow well below the wafer's thickness.";

export const THIN_FILM = {
  "stoney-curvature": {
    title: "Curvature from a thin film's stress",
    formula: "κ = 6 σ_f h_f / (M h^2)",
    symbols: [curvature, stress, film, modulus, wafer],
    range: thin,
    sources: ["stoney-1909", "feng-huang-rosakis-2007"],
    caution: "A film on the back side bends the other way.",
  },
  "stoney-stress": {
    title: "Stress of a thin film from a change of curvature",
    formula: "σ_f = M h^2 (κ − κ_0) / (6 h_f)",
    symbols: [
      stress,
      modulus,
      wafer,
      { ...curvature, meaning: "curvature with the film, positive for a bowl" },
      { symbol: "κ_0", meaning: "curvature before the film", unit: "1/m" },
      film,
    ],
    range: thin,
    sources: ["stoney-1909", "feng-huang-rosakis-2007"],
    caution: "Stoney's own paper used E for a strip; a wafer needs E/(1 − ν).",
  },
  "film-force": {
    title: "Force of a film per width",
    formula: "N = σ h_f f",
    symbols: [
      { symbol: "N", meaning: "film force, tension positive", unit: "N/m" },
      { symbol: "σ", meaning: "film stress", unit: "Pa" },
      film,
      { symbol: "f", meaning: "area fraction covered", unit: "1" },
    ],
    range: "Wide lines, grids and areas; narrow parallel lines pull along their length only.",
    sources: ["freund-suresh-2003"],
  },
  "bow-parabola": {
    title: "Bow from curvature",
    formula: "s = κ R^2 / 2",
    symbols: [sagitta, curvature, radius],
    range: "Uniform curvature; within 0.1 % while the slope κR at the rim is below 0.1.",
    sources: ["semi-mf534", "semi-mf1390"],
    caution: "The standard bow is −s: the centre above the reference plane with the device side up is positive.",
  },
  "bow-arc": {
    title: "Bow of an arc",
    formula: "s = (1 − cos κR) / κ",
    symbols: [sagitta, curvature, { ...radius, meaning: "wafer radius, measured along the wafer" }],
    range: "Up to half a turn from centre to rim; beyond it the height of the roll, 2/κ, is kept.",
    sources: ["plate-perturbation"],
    caution: "The standard bow is −s: the centre above the reference plane with the device side up is positive.",
  },
  "mismatch-stress": {
    title: "Thermal stress of a film on a thick wafer",
    formula: "σ(T) = M_f × integral from T_0 to T of (α_Si − α_f) dT",
    symbols: [
      { symbol: "σ", meaning: "thermal part of the film stress, tension positive", unit: "Pa" },
      { symbol: "M_f", meaning: "biaxial modulus of the film", unit: "Pa" },
      { symbol: "α_Si", meaning: "expansion of the wafer", unit: "1/K" },
      { symbol: "α_f", meaning: "expansion of the film", unit: "1/K" },
      { symbol: "T_0", meaning: "temperature at which the film is free of thermal stress", unit: "K" },
    ],
    range: "Elastic film. Metals that yield and polymers above their zero-stress temperature do not follow it.",
    sources: ["freund-suresh-2003", "okada-tokumaru-1984"],
  },
} as const satisfies Record<string, Equation>;
