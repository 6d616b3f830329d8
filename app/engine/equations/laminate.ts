import type { Equation } from "./equation.ts";

const layer = [
  { symbol: "M_i", meaning: "biaxial modulus of layer i", unit: "Pa" },
  { symbol: "f_i", meaning: "area fraction of layer i", unit: "1" },
  { symbol: "h_i", meaning: "thickness of layer i", unit: "m" },
] as const;

export const LAMINATE = {
  "free-strain": {
    title: "Free strain of a layer",
    formula: "e = integral from T_0 to T_ref of α_base dT + integral from T_ref to T of α dT − σ / M + ε_p",
    symbols: [
      { symbol: "e", meaning: "strain that the layer would take if nothing held it", unit: "1" },
      { symbol: "σ", meaning: "its stress while flat on a thick wafer at T_ref", unit: "Pa" },
      { symbol: "M", meaning: "its biaxial modulus", unit: "Pa" },
      { symbol: "α", meaning: "its expansion", unit: "1/K" },
      { symbol: "α_base", meaning: "expansion of the base layer, silicon where there is any", unit: "1/K" },
      { symbol: "T_0", meaning: "298.15 K", unit: "K" },
      { symbol: "T_ref", meaning: "temperature at which σ holds", unit: "K" },
      { symbol: "ε_p", meaning: "plastic strain of a metal that has yielded", unit: "1" },
    ],
    range: "The order in which layers came does not matter while they are elastic.",
    sources: ["eigenstrain-convention", "freund-suresh-2003"],
    caution: "A stress quoted on an already bent or already coated wafer is another quantity.",
  },
  laminate: {
    title: "Curvature of a stack of layers",
    formula:
      "κ = −Σ M_i f_i h_i (e_i − ε_m) (z_i − z_n) / D, z_n = Σ M_i f_i h_i z_i / A, ε_m = Σ M_i f_i h_i e_i / A, A = Σ M_i f_i h_i, D = Σ M_i f_i h_i (h_i^2 / 12 + (z_i − z_n)^2)",
    symbols: [
      { symbol: "κ", meaning: "curvature, positive for a bowl (top face concave)", unit: "1/m" },
      ...layer,
      { symbol: "e_i", meaning: "free strain of layer i", unit: "1" },
      { symbol: "z_i", meaning: "height of the middle of layer i", unit: "m" },
      { symbol: "z_n", meaning: "height of the neutral plane", unit: "m" },
      { symbol: "ε_m", meaning: "strain of the stack held flat", unit: "1" },
      { symbol: "A", meaning: "stretching stiffness", unit: "N/m" },
      { symbol: "D", meaning: "biaxial bending stiffness about the neutral plane", unit: "N·m" },
    ],
    range:
      "Perfect bonds, layers of any thickness, equal in both directions, small slopes. Away from the edge by some adhesive thicknesses.",
    sources: ["townsend-barnett-brunner-1987", "hsueh-2002", "hsueh-lee-chuang-2003", "freund-floro-chason-1999"],
    caution: "A free thin wafer may not follow it: see the shape of a free wafer.",
  },
  "sliding-pair": {
    title: "Curvature of a pair whose plates slide",
    formula: "κ = (D_1 κ_1 + D_2 κ_2) / (D_1 + D_2)",
    symbols: [
      { symbol: "κ", meaning: "curvature that both plates share, positive for a bowl", unit: "1/m" },
      { symbol: "κ_1", meaning: "curvature of the wafer by itself, κ_2 of the carrier", unit: "1/m" },
      { symbol: "D_1", meaning: "biaxial bending stiffness of the wafer by itself, D_2 of the carrier", unit: "N·m" },
    ],
    range:
      "An adhesive above its flow point: no shear between the plates, no gap. A carrier that slides on the other face counts as a third plate. On cooling the pair locks at the flow point in the state found there.",
    sources: ["sliding-pair"],
  },
  "balancing-film": {
    title: "Back-side film that makes the wafer flat",
    formula: "κ(h_b) = 0 at T",
    symbols: [
      { symbol: "κ", meaning: "curvature of the stack with the film, positive for a bowl", unit: "1/m" },
      { symbol: "h_b", meaning: "thickness of the outermost back-side film", unit: "m" },
      { symbol: "T", meaning: "temperature at which the wafer is flat", unit: "K" },
    ],
    range: "Elastic films. At other temperatures a bow is left wherever the films expand differently.",
    sources: ["inverse-questions"],
    caution: "Balanced moments leave the stresses: a flat wafer is not a wafer without stress.",
  },
  "effective-thickness": {
    title: "Effective thickness of a stack",
    formula: "h_eff = sqrt(12 D / A)",
    symbols: [
      { symbol: "h_eff", meaning: "thickness of one layer with the same ratio of stiffnesses", unit: "m" },
      { symbol: "D", meaning: "biaxial bending stiffness about the neutral plane", unit: "N·m" },
      { symbol: "A", meaning: "stretching stiffness", unit: "N/m" },
    ],
    range: "Stands for the thickness in the shape of a free wafer when films are thick or plates are bonded.",
    sources: ["plate-perturbation"],
  },
} as const satisfies Record<string, Equation>;
