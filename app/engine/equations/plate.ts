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
      "Uniform film, gravity left out, up to S_cr: within 0.5 % of a full von Karman solution. Unequal curvatures are solved as the pair of equations of a rolled wafer. Silicon (100): 2.5 %.",
    sources: ["freund-2000", "masters-salamon-1993", "plate-perturbation", "plate-von-karman"],
    caution: "The centre flattens and the rim bends more: centre, parabola and bow give different curvatures.",
  },
  "free-wafer-curled": {
    title: "Bow of a free wafer that has rolled",
    formula: "A (1 + α P) = (S_x + S_y) / 2, B (1 − β P) = (S_x − S_y) / 2, P = A^2 − B^2, s = 2 h (A + B)",
    symbols: [
      { symbol: "A", meaning: "mean of the two curvatures times R^2/(4h)", unit: "1" },
      { symbol: "B", meaning: "half their difference times R^2/(4h)", unit: "1" },
      {
        symbol: "S_x",
        meaning: "curvature along x by small-deflection theory times R^2/(4h); S_y likewise",
        unit: "1",
      },
      { symbol: "α", meaning: "tends to 1 − ν in a long roll", unit: "1" },
      { symbol: "β", meaning: "tends to 1 + ν in a long roll", unit: "1" },
      sagitta,
      thickness,
    ],
    range:
      "Past S_cr. Within 2 % of a full von Karman solution for equal curvatures and ν from 0.16 to 0.45, 3 % for unequal ones, 7 % for opposite ones; slopes of any size by the arc.",
    sources: ["freund-2000", "finot-1997", "plate-von-karman"],
    caution: "A real wafer rolls early and gradually, about the axis that an uneven film, the notch or a wedge picks.",
  },
  "critical-curvature": {
    title: "Curvature at which a free wafer starts to roll",
    formula: "κ_cr = 4 h S_cr / R^2, S_cr = 2 f / (1 + ν)^1.5",
    symbols: [
      { symbol: "κ_cr", meaning: "small-deflection curvature at the onset", unit: "1/m" },
      onset,
      { symbol: "f", meaning: "true onset over that of uniform curvature: 0.987 + 0.239 ν − 0.196 ν^2", unit: "1" },
      radius,
      thickness,
      poisson,
    ],
    range: "Uniform film; ν from 0 to 0.45, within 0.1 % of a full von Karman solution. Silicon (100): S_cr = 1.344.",
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
    formula: "s_3 = (s_x + s_y) / 2",
    symbols: [
      { symbol: "s_3", meaning: "centre against the plane of three rim points, sign of the curvature", unit: "m" },
      { symbol: "s_x", meaning: "rim over centre along x; s_y likewise along y", unit: "m" },
    ],
    range: "Three equally spaced points at the rim; the azimuth does not matter. A curled wafer reads up to 5 % more.",
    sources: ["semi-mf534"],
    caution: "A saddle has no bow and a roll half of its edge lift: never judge a thin wafer by bow alone.",
  },
  warp: {
    title: "Warp",
    formula: "w = max z − min z",
    symbols: [
      { symbol: "w", meaning: "peak to valley of the median surface from its least-squares plane", unit: "m" },
      { symbol: "z", meaning: "height of the median surface over that plane", unit: "m" },
    ],
    range: "Free wafer, gravity compensated. The standard covers wafers of about 100 µm and more.",
    sources: ["semi-mf1390", "marks-hassan-cheong-2014"],
  },
} as const satisfies Record<string, Equation>;
