import type { Equation } from "./equation.ts";

const radius = { symbol: "R", meaning: "wafer radius", unit: "m" } as const;
const thickness = { symbol: "h", meaning: "thickness, or effective thickness of a stack", unit: "m" } as const;
const poisson = { symbol: "ν", meaning: "Poisson's ratio", unit: "1" } as const;
const load = { symbol: "S", meaning: "curvature by small-deflection theory times R^2/(4h)", unit: "1" } as const;
const onset = { symbol: "S_cr", meaning: "S at which the wafer starts to roll about one axis", unit: "1" } as const;
const sagitta = { symbol: "s", meaning: "rim over centre along the axis that bends most", unit: "m" } as const;

export const PLATE = {
  "free-wafer-bowl": {
    title: "Bow of a free wafer before it rolls",
    formula: "K (1 + (1 − ν) (17 + 5ν) / 12 × K^2) = S, S = κ_lin R^2 / (4h), s = 2 h K",
    symbols: [
      { symbol: "K", meaning: "bow over twice the thickness", unit: "1" },
      load,
      { symbol: "κ_lin", meaning: "curvature by small-deflection theory", unit: "1/m" },
      sagitta,
      radius,
      thickness,
      poisson,
    ],
    range:
      "Uniform film, equal in all directions, gravity left out, up to S_cr. The figure is the plate solved in full, as for a rolled wafer; this formula, exact for small bows, is within 0.3 % of it, within 0.7 % for silicon (100) with ν = 0.28.",
    sources: ["freund-2000", "masters-salamon-1993", "plate-perturbation", "plate-von-karman"],
    caution: "The centre flattens and the rim bends more: centre, parabola and bow give different curvatures.",
  },
  "free-wafer-curled": {
    title: "Bow of a free wafer, rolled or under unequal curvatures",
    formula:
      "A (1 + de/d(A^2)) = (S_x + S_y) / 2, B (1 + de/d(B^2) / τ) = (S_x − S_y) / 2, e = λ m P^2 / 2, P = A^2 − B^2, s = 2 h K",
    symbols: [
      { symbol: "A", meaning: "mean of the two curvatures, averaged over the area, times R^2/(4h)", unit: "1" },
      { symbol: "B", meaning: "half their difference, averaged over the area, times R^2/(4h)", unit: "1" },
      {
        symbol: "S_x",
        meaning: "curvature along x by small-deflection theory times R^2/(4h); S_y likewise",
        unit: "1",
      },
      { symbol: "e", meaning: "energy of stretching over that of bending", unit: "1" },
      { symbol: "m", meaning: "share left of uniform curvature's resistance, tabulated over A, B and ν", unit: "1" },
      { symbol: "λ", meaning: "1 − ν; for silicon (100) by the crystal's constants", unit: "1" },
      { symbol: "τ", meaning: "(1 − ν)/(1 + ν); for silicon (100) by the crystal's constants", unit: "1" },
      { symbol: "K", meaning: "bow over twice the thickness of the shape with these A and B", unit: "1" },
      sagitta,
      thickness,
    ],
    range:
      "Uniform film, gravity left out. The bow along the axis that bends most is within 0.2 % of a full von Karman solution up to 20 times S_cr for ν from 0 to 0.45, for silicon (100) and for curvatures of either sign; beyond it tends to the exact limit of a long roll. Slopes of any size by the arc. m = 1 is uniform curvature in closed form, up to a fifth off.",
    sources: ["freund-2000", "finot-1997", "plate-von-karman", "plate-endless-roll"],
    caution: "A real wafer rolls early and gradually, about the axis that an uneven film, the notch or a wedge picks.",
  },
  "critical-curvature": {
    title: "Curvature at which a free wafer starts to roll",
    formula: "κ_cr = 4 h S_cr / R^2, S_cr = 2 f / (1 + ν)^1.5",
    symbols: [
      { symbol: "κ_cr", meaning: "small-deflection curvature at the onset", unit: "1/m" },
      onset,
      {
        symbol: "f",
        meaning:
          "true onset over that of uniform curvature, from the plate solved in full: 0.987 + 0.239 ν − 0.196 ν^2",
        unit: "1",
      },
      radius,
      thickness,
      poisson,
    ],
    range:
      "Uniform film; ν from 0 to 0.45, within 0.05 % of a full von Karman solution, f as written within 0.1 %. Silicon (100): S_cr = 1.344.",
    sources: ["freund-2000", "freund-suresh-2003", "plate-von-karman"],
  },
  "critical-film-force": {
    title: "Film force at which a free wafer starts to roll",
    formula: "N_cr = (2/3) M h^3 S_cr / R^2",
    symbols: [
      { symbol: "N_cr", meaning: "force of a thin film over the whole wafer", unit: "N/m" },
      { symbol: "M", meaning: "biaxial modulus of the wafer", unit: "Pa" },
      onset,
      radius,
      thickness,
    ],
    range: "Thin film; as for the critical curvature.",
    sources: ["freund-2000", "stoney-1909", "plate-von-karman"],
    caution: "1 µm at 100 MPa is 100 N/m: a free 300 mm wafer of 100 µm takes about 7 N/m.",
  },
  "roll-radius": {
    title: "Radius of a rolled wafer",
    formula: "r = 1 / |κ_p|",
    symbols: [
      { symbol: "r", meaning: "radius of the roll", unit: "m" },
      { symbol: "κ_p", meaning: "curvature of the least-squares parabola along the rolled diameter", unit: "1/m" },
    ],
    range: "Curled wafers.",
    sources: ["plate-von-karman"],
  },
  "three-point-bow": {
    title: "Three-point bow",
    formula: "s_3 = mean height of the rim over the centre",
    symbols: [
      { symbol: "s_3", meaning: "centre against the plane of three rim points, sign of the curvature", unit: "m" },
    ],
    range:
      "Three equally spaced points at the rim, averaged over where they lie: their azimuth moves the reading of a curled wafer by up to 0.3 % of its edge lift. Half the sum of the two bows for a bowl, a little more for a roll.",
    sources: ["semi-mf534", "plate-von-karman"],
    caution: "A saddle has no bow and a roll half of its edge lift: never judge a thin wafer by bow alone.",
  },
  warp: {
    title: "Warp",
    formula: "w = max z − min z",
    symbols: [
      { symbol: "w", meaning: "peak to valley of the median surface from its least-squares plane", unit: "m" },
      { symbol: "z", meaning: "height of the median surface over that plane", unit: "m" },
    ],
    range:
      "Free wafer, gravity compensated, of the whole surface: a roll's lowest point lies beside its centre. The standard covers wafers of about 100 µm and more.",
    sources: ["semi-mf1390", "marks-hassan-cheong-2014", "plate-von-karman"],
  },
} as const satisfies Record<string, Equation>;
