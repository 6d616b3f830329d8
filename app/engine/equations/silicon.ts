import type { Equation } from "./equation.ts";

const modulus = { symbol: "M", meaning: "biaxial modulus in the plane of the wafer", unit: "Pa" } as const;
const constants = [
  { symbol: "C_11", meaning: "elastic constant of the crystal", unit: "Pa" },
  { symbol: "C_12", meaning: "elastic constant of the crystal", unit: "Pa" },
] as const;
const range =
  "Lightly doped silicon, 150 to 1000 K. About 0.9 % lower per 100 K; heavy doping changes it by up to some 3 %.";

export const SILICON = {
  "biaxial-modulus-001": {
    title: "Biaxial modulus of silicon (100)",
    formula: "M = C_11 + C_12 − 2 C_12^2 / C_11",
    symbols: [modulus, ...constants],
    range,
    sources: ["cubic-layer-exercise", "silicon-properties-note", "hopcroft-nix-kenny-2010"],
    caution: "180.2 GPa at 25 °C. Never pair E = 169 GPa with ν = 0.28: that gives 235 GPa.",
  },
  "biaxial-modulus-111": {
    title: "Biaxial modulus of silicon (111)",
    formula: "M = 6 C_44 (C_11 + 2 C_12) / (C_11 + 2 C_12 + 4 C_44)",
    symbols: [modulus, ...constants, { symbol: "C_44", meaning: "elastic constant of the crystal", unit: "Pa" }],
    range,
    sources: ["cubic-layer-exercise", "silicon-properties-note", "brantley-1973"],
    caution: "229.0 GPa at 25 °C, a quarter stiffer than (100).",
  },
  "silicon-expansion": {
    title: "Expansion of silicon",
    formula: "α = (3.725 (1 − exp(−0.00588 (T − 124))) + 0.0005548 T) × 10^(−6)",
    symbols: [
      { symbol: "α", meaning: "linear expansion coefficient", unit: "1/K" },
      { symbol: "T", meaning: "temperature in kelvin", unit: "K" },
    ],
    range: "120 to 1500 K; the data scatter by 0.2 ppm/K about it.",
    sources: ["okada-tokumaru-1984"],
    caution: "At 25 °C it lies 1.4 % below the recommended 2.59 ppm/K.",
  },
  "silicon-thermal-strain": {
    title: "Thermal strain of silicon",
    formula: "ε = F(T) − F(T_0), F = 3.725 (T + exp(−0.00588 (T − 124)) / 0.00588) + 0.0002774 T^2, in 10^(−6)",
    symbols: [
      { symbol: "ε", meaning: "thermal strain from T_0 to T", unit: "1" },
      { symbol: "T", meaning: "temperature in kelvin", unit: "K" },
      { symbol: "T_0", meaning: "starting temperature in kelvin", unit: "K" },
    ],
    range: "120 to 1500 K.",
    sources: ["okada-tokumaru-1984"],
  },
} as const satisfies Record<string, Equation>;
