import type { Equation } from "./equation.ts";

export const SCANS = {
  "scan-scatter": {
    title: "Uncertainty of a curvature whose scatter goes together",
    formula: "u_κ = s I spread(κ), I^2 = s_slow^2 / s^2, s_slow^2 = (1/12) Σ q_j^2 led back to the parabola",
    symbols: [
      { symbol: "u_κ", meaning: "standard uncertainty of the curvature", unit: "1/m" },
      { symbol: "s", meaning: "standard deviation of the heights about the parabola", unit: "m" },
      { symbol: "I", meaning: "inflation, 1 for independent scatter", unit: "1" },
      {
        symbol: "q_j",
        meaning: "what the residuals hold of the orthogonal polynomial of degree j, 5 to 16",
        unit: "m",
      },
    ],
    range: "Memory of the scatter up to about 3 % of the scan; slower drift cannot be told from curvature.",
    sources: ["muller-2007", "scan-scatter", "gum-2008"],
  },
  "azimuth-curvatures": {
    title: "Curvatures in all directions from several azimuths",
    formula: "κ(θ) = κ_x cos^2 θ + κ_y sin^2 θ + t sin 2θ by weighted least squares; κ_1, κ_2 = m ± sqrt(d^2 + t^2)",
    symbols: [
      { symbol: "κ_x", meaning: "curvature along azimuth 0, towards the notch; κ_y across it", unit: "1/m" },
      { symbol: "t", meaning: "twist", unit: "1/m" },
      { symbol: "m", meaning: "mean (κ_x + κ_y)/2; d is half of κ_x − κ_y", unit: "1/m" },
    ],
    range: "Three lines at least 5 degrees apart. One line cannot show a saddle, two at right angles not its axis.",
    sources: ["plane-curvature", "gum-supplement-2-2011"],
  },
  "surface-fit": {
    title: "Surface over the wafer in circle polynomials",
    formula:
      "w(ρ, θ) = Σ a_nm R_n^m(ρ) cos mθ, a_nm by least squares, each scan's own level and tilt taken out of both sides",
    symbols: [
      { symbol: "w", meaning: "height over the wafer", unit: "m" },
      { symbol: "a_nm", meaning: "size of one polynomial, order n, m waves around (sine for m below 0)", unit: "m" },
      { symbol: "ρ", meaning: "distance from the centre over the radius of the fitted disk", unit: "1" },
    ],
    range: "Order n needs n + 1 azimuths or enough sites; a lower order is taken otherwise.",
    sources: ["born-wolf-1999", "thibos-2002", "lovell-1963"],
  },
  "bow-three-point": {
    title: "Bow against three points near the rim",
    formula: "b = w(0) − (w_1 + w_2 + w_3) / 3",
    symbols: [
      { symbol: "b", meaning: "bow, centre above the plane with the device side up is positive", unit: "m" },
      {
        symbol: "w_1",
        meaning: "median surface at the first of three points, 120° apart, 3 mm inside the rim",
        unit: "m",
      },
      { symbol: "w", meaning: "median surface", unit: "m" },
    ],
    range: "Weight taken out; wafers of at least 180 µm and at most 250 times as wide as thick (from memory).",
    sources: ["semi-mf534", "marks-hassan-cheong-2014"],
    caution: "A saddle has no bow.",
  },
  "least-squares-plane": {
    title: "Bow, warp and sori against the least-squares plane",
    formula: "W = max(w − p) − min(w − p), b = w(0) − p(0)",
    symbols: [
      { symbol: "W", meaning: "warp of the median surface, sori of the front surface", unit: "m" },
      {
        symbol: "p",
        meaning: "least-squares plane of the surface over the disk that the edge exclusion leaves",
        unit: "m",
      },
      { symbol: "w", meaning: "the surface", unit: "m" },
      { symbol: "b", meaning: "bow, best fit", unit: "m" },
    ],
    range: "Weight taken out; wafers of at least about 100 µm.",
    sources: ["semi-mf1390", "semi-mf1451", "marks-hassan-cheong-2014"],
  },
  "film-stress-full": {
    title: "Film stress by laminate and plate",
    formula: "σ_f = (κ_lin(κ) − κ_lin(κ_0)) / (dκ_lin/dσ)",
    symbols: [
      { symbol: "σ_f", meaning: "stress that the film has on a rigid substrate, tension positive", unit: "Pa" },
      { symbol: "κ", meaning: "curvature of the parabola through the scan after the film; κ_0 before it", unit: "1/m" },
      {
        symbol: "κ_lin",
        meaning: "small-deflection curvature under which the free wafer shows that parabola",
        unit: "1/m",
      },
    ],
    range: "Films of any thickness, bows up to the onset of rolling, film uniform.",
    sources: ["freund-floro-chason-1999", "freund-2000", "plate-von-karman"],
  },
  "directional-film-stress": {
    title: "Film stress along two directions",
    formula: "σ = h^2 Q κ / (6 h_f)",
    symbols: [
      { symbol: "σ", meaning: "stress along x and y and shear", unit: "Pa" },
      { symbol: "h", meaning: "wafer thickness", unit: "m" },
      { symbol: "Q", meaning: "stiffness of silicon in the plane, in the axes of the scans", unit: "Pa" },
      { symbol: "κ", meaning: "change of curvature along x and y, and twice the twist", unit: "1/m" },
      { symbol: "h_f", meaning: "film thickness", unit: "m" },
    ],
    range: "Thin film, small deflections.",
    sources: ["freund-suresh-2003", "gniazdowski-2019", "plane-curvature"],
  },
  "scan-pair-budget": {
    title: "Uncertainty budget of a stress from two scans",
    formula: "u^2 = Σ u_i^2, ν = u^4 / Σ (u_i^4 / ν_i), U = t(ν) u",
    symbols: [
      { symbol: "u", meaning: "standard uncertainty of the stress", unit: "Pa" },
      {
        symbol: "u_i",
        meaning: "contribution of input i; of what both scans share only what is left in their difference",
        unit: "Pa",
      },
      { symbol: "ν", meaning: "effective degrees of freedom", unit: "1" },
      { symbol: "U", meaning: "expanded uncertainty, 95.45 %: twice u for many degrees of freedom", unit: "Pa" },
    ],
    range: "Stress close to linear in its inputs over their uncertainties.",
    sources: ["gum-2008", "welch-satterthwaite"],
  },
  repeatability: {
    title: "Repeatability of a tool",
    formula: "s^2 = Σ Σ (x_ij − m_i)^2 / Σ (n_i − 1), u = s t(ν) / 2",
    symbols: [
      { symbol: "s", meaning: "pooled standard deviation, in the unit of the readings", unit: "1" },
      { symbol: "x_ij", meaning: "reading j of wafer i; m_i its mean, n_i their number", unit: "1" },
      { symbol: "ν", meaning: "degrees of freedom, Σ (n_i − 1)", unit: "1" },
      {
        symbol: "u",
        meaning: "standard uncertainty of one reading for budgets that are expanded with k = 2",
        unit: "1",
      },
    ],
    range: "Wafers taken off and put back between readings.",
    sources: ["gum-2008"],
  },
  "reference-check": {
    title: "Bias of a tool on a wafer of known figure",
    formula: "b = Σ (x_i − X) / n, u_b^2 = u^2 / n + u_X^2",
    symbols: [
      { symbol: "b", meaning: "bias: mean of read less known; told when larger than 2 u_b", unit: "1" },
      { symbol: "x_i", meaning: "reading i, of n", unit: "1" },
      { symbol: "X", meaning: "known figure; u_X its standard uncertainty, common to all readings", unit: "1" },
      { symbol: "u", meaning: "standard uncertainty of one reading, from a repeatability study", unit: "1" },
    ],
    range: "Readings of one wafer on one tool.",
    sources: ["gum-2008"],
  },
  "control-limits": {
    title: "Control limits of individual values",
    formula: "L = m ± 2.66 MR, L_MR = 3.267 MR",
    symbols: [
      { symbol: "L", meaning: "limits of a value", unit: "1" },
      { symbol: "m", meaning: "mean of the values that count", unit: "1" },
      { symbol: "MR", meaning: "mean of the ranges from each value to the next", unit: "1" },
    ],
    range: "Values in the order of their measurement; excluded ones take no part. Loose below 20 values.",
    sources: ["montgomery-spc", "iso-7870-2", "nelson-1984"],
  },
  "accepted-value": {
    title: "Value in use from accepted values",
    formula: "u^2 = (t(n − 1) s / 2)^2 (1 + 1/n) + u_c^2",
    symbols: [
      { symbol: "u", meaning: "standard uncertainty of the next film, for k = 2", unit: "1" },
      { symbol: "s", meaning: "standard deviation of the values about their mean", unit: "1" },
      { symbol: "n", meaning: "number of values that count", unit: "1" },
      { symbol: "u_c", meaning: "what is common to all of them", unit: "1" },
    ],
    range: "One value keeps its own uncertainty.",
    sources: ["gum-2008"],
  },
  "predicted-slope": {
    title: "Measured over predicted",
    formula: "y = a + b x, weights 1 / (u_y^2 + b^2 u_x^2)",
    symbols: [
      { symbol: "y", meaning: "measured", unit: "1" },
      { symbol: "b", meaning: "slope, 1 when the model is right", unit: "1" },
      { symbol: "x", meaning: "predicted", unit: "1" },
    ],
    range: "Three points and more; widened where they scatter more than stated.",
    sources: ["orear-1982", "gum-2008"],
  },
} as const satisfies Record<string, Equation>;
