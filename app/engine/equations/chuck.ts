import type { Equation } from "./equation.ts";

const stiffness = { symbol: "D", meaning: "bending stiffness, M h^3 / (12 (1 + ν))", unit: "N·m" } as const;
const modulus = { symbol: "M", meaning: "biaxial modulus of the wafer", unit: "Pa" } as const;
const thickness = { symbol: "h", meaning: "wafer thickness", unit: "m" } as const;
const curvature = { symbol: "κ", meaning: "curvature as the wafer lies on the chuck", unit: "1/m" } as const;

export const CHUCK = {
  "chuck-pressure-bowl": {
    title: "Pressure that brings the rim of a bowl down",
    formula: "p_1 = 64 D (1 + ν) w / ((7 + 3ν) R^4)",
    symbols: [
      { symbol: "p_1", meaning: "pressure difference", unit: "Pa" },
      stiffness,
      { symbol: "w", meaning: "gap under the rim", unit: "m" },
      { symbol: "R", meaning: "wafer radius", unit: "m" },
      { symbol: "ν", meaning: "Poisson's ratio", unit: "1" },
    ],
    range:
      "Wafer seated at its centre alone, uniform suction, small deflections: a third of the gap is left at this pressure.",
    sources: ["timoshenko-woinowsky-krieger-1959"],
    caution: "The seal decides whether suction builds up: the gap matters, not this pressure.",
  },
  "chuck-pressure-dome": {
    title: "Pressure at which the centre of a dome touches",
    formula: "p_1 = 64 D (1 + ν) w / ((5 + ν) R^4)",
    symbols: [
      { symbol: "p_1", meaning: "pressure difference", unit: "Pa" },
      stiffness,
      { symbol: "w", meaning: "gap under the centre", unit: "m" },
      { symbol: "R", meaning: "wafer radius", unit: "m" },
      { symbol: "ν", meaning: "Poisson's ratio", unit: "1" },
    ],
    range: "Wafer seated on its rim, uniform suction, small deflections.",
    sources: ["timoshenko-woinowsky-krieger-1959", "chen-2003"],
    caution: "A hump of some twentieth of the gap is left inside the rim.",
  },
  "chuck-surface-stress": {
    title: "Stress at the faces of a wafer made flat",
    formula: "σ = M h κ / 2",
    symbols: [
      { symbol: "σ", meaning: "change at the faces, opposite on the two", unit: "Pa" },
      modulus,
      thickness,
      curvature,
    ],
    range: "Uniform curvature.",
    sources: ["timoshenko-woinowsky-krieger-1959"],
  },
  "chuck-rim-lift": {
    title: "Lift left at the rim on a vacuum chuck",
    formula: "z = m^2 / (2 p D), L = sqrt(2 m / p), m = M h^3 κ / 12 for a narrow rim",
    symbols: [
      { symbol: "z", meaning: "height left over the chuck", unit: "m" },
      { symbol: "m", meaning: "moment per width that flattens the wafer", unit: "N" },
      { symbol: "L", meaning: "width of the ring that stands off", unit: "m" },
      { symbol: "p", meaning: "pressure difference", unit: "Pa" },
      stiffness,
      modulus,
      thickness,
      curvature,
    ],
    range:
      "A bowl; the strip shown is the limit of the plate with one-sided contact that is solved, 1 % off at 0.5 mm of bow on a full-thickness wafer. A dome keeps a hump of about 0.07 m^2 / (p D).",
    sources: ["chuck-contact"],
  },
  "flat-chuck-stress": {
    title: "Stress of a layer while the stack is held flat",
    formula: "σ_i = q_i (ε − e_i), ε = A^(−1) N",
    symbols: [
      { symbol: "σ_i", meaning: "stress in layer i", unit: "Pa" },
      { symbol: "q_i", meaning: "stiffness of layer i in the plane", unit: "Pa" },
      { symbol: "ε", meaning: "strain of the flat stack", unit: "1" },
      { symbol: "e_i", meaning: "free strain of layer i", unit: "1" },
      { symbol: "A", meaning: "stretching stiffness", unit: "N/m" },
      { symbol: "N", meaning: "force of the free strains", unit: "N/m" },
    ],
    range: "Flat and free to slide.",
    sources: ["jones-1999", "freund-suresh-2003"],
  },
} as const satisfies Record<string, Equation>;
