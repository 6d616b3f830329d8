import type { Equation } from "./equation.ts";

const force = { symbol: "N_x", meaning: "film force along x, tension positive; N_y along y", unit: "N/m" } as const;
const film = { symbol: "h_f", meaning: "film thickness", unit: "m" } as const;
const share = {
  symbol: "g",
  meaning: "share of the blanket stress kept across a line or in an island",
  unit: "1",
} as const;

export const DIRECTIONAL = {
  "directional-laminate": {
    title: "Curvatures of a stack whose directions differ",
    formula:
      "(κ_x, κ_y, 2 t) = −(D − B A^(−1) B)^(−1) (Q − B A^(−1) N), A = Σ q_i f_i h_i, B = Σ q_i f_i h_i z_i, D = Σ q_i f_i h_i (h_i^2 / 12 + z_i^2), N = Σ q_i f_i h_i e_i, Q = Σ q_i f_i h_i z_i e_i",
    symbols: [
      { symbol: "κ_x", meaning: "curvature along x, positive for a bowl; κ_y along y", unit: "1/m" },
      { symbol: "t", meaning: "twist, in w = κ_x x^2/2 + κ_y y^2/2 + t x y", unit: "1/m" },
      { symbol: "q_i", meaning: "stiffness of layer i in the plane, three by three", unit: "Pa" },
      { symbol: "f_i", meaning: "area fraction of layer i", unit: "1" },
      { symbol: "h_i", meaning: "thickness of layer i", unit: "m" },
      { symbol: "z_i", meaning: "height of the middle of layer i", unit: "m" },
      { symbol: "e_i", meaning: "free strains of layer i", unit: "1" },
    ],
    range:
      "Perfect bonds, small slopes, any thickness. Equal to the laminate of equal directions where they are equal.",
    sources: ["jones-1999", "townsend-barnett-brunner-1987"],
    caution: "A free thin wafer may not follow it: see the shape of a free wafer.",
  },
  "patterned-film": {
    title: "Force of a film cut into lines",
    formula: "N_x = f σ h_f (1 − ν (1 − g)), N_y = f g σ h_f",
    symbols: [
      { ...force, meaning: "force along the lines, tension positive; N_y across them" },
      { symbol: "σ", meaning: "stress of the blanket film", unit: "Pa" },
      film,
      { symbol: "f", meaning: "area fraction covered", unit: "1" },
      { symbol: "ν", meaning: "Poisson's ratio of the film", unit: "1" },
      share,
    ],
    range:
      "Lines along x with free side walls. Wide lines, g = 1, and narrow tall lines, g = 0, are exact; islands pull with f g σ h_f both ways, a random pattern with f σ h_f.",
    sources: ["shen-suresh-blech-1996", "wikstrom-1999", "common-practice", "edge-relief-elements"],
    caution: "Lines embedded in another film are stiffer across.",
  },
  "edge-relief": {
    title: "Share of the stress that a line keeps across its width",
    formula: "g = 1 − tanh(a) / a, a = w / (2 l), l = c h_f (1 + E_f / E_0)",
    symbols: [
      share,
      { symbol: "a", meaning: "half width over transfer length", unit: "1" },
      { symbol: "w", meaning: "width of a line, edge or diameter of an island", unit: "m" },
      { symbol: "l", meaning: "length over which stress builds up from an edge", unit: "m" },
      film,
      { symbol: "E_f", meaning: "Young's modulus of the film", unit: "Pa" },
      { symbol: "E_0", meaning: "150 GPa", unit: "Pa" },
      { symbol: "c", meaning: "1 for lines, 1.5 for islands", unit: "1" },
    ],
    range:
      "Practical shear lag on silicon. Against finite elements within 0.09 for lines and 0.14 for islands, of the blanket force.",
    sources: ["common-practice", "edge-relief-elements"],
  },
  "directional-stoney": {
    title: "Curvatures from unequal forces of a thin film",
    formula: "κ_x = 6 (N_x − ν N_y) / (E h^2), κ_y = 6 (N_y − ν N_x) / (E h^2)",
    symbols: [
      { symbol: "κ_x", meaning: "curvature along x, positive for a bowl; κ_y along y", unit: "1/m" },
      force,
      { symbol: "E", meaning: "Young's modulus of the wafer along the film's axes", unit: "Pa" },
      { symbol: "ν", meaning: "its Poisson's ratio", unit: "1" },
      { symbol: "h", meaning: "wafer thickness", unit: "m" },
    ],
    range: "Film far thinner than the wafer, small slopes, bow well below the wafer's thickness.",
    sources: ["freund-suresh-2003"],
  },
} as const satisfies Record<string, Equation>;
