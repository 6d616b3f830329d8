/** Young's modulus, Pa, at which a film's edges reach twice as far in as those of a very soft one, on silicon. */
const STIFF_FILM = 150e9;

/** Edges on all sides of an island relieve it further in than the two edges of a line. */
const ISLAND_REACH = 1.5;

/**
 * Length, m, over which the stress of a film of `thickness` (m) and `youngsModulus` (Pa) on silicon builds up from a free
 * edge: h_f (1 + E_f/150 GPa), that is one thickness for a polymer and two for copper. Practical shear lag, the length fitted
 * to the plane solution named at `edgeRelief`.
 */
export function transferLength(thickness: number, youngsModulus: number, kind: "line" | "island"): number {
  return thickness * (1 + youngsModulus / STIFF_FILM) * (kind === "island" ? ISLAND_REACH : 1);
}

/**
 * Share g of the blanket film's stress that a line keeps across its width (an island in both directions), on average:
 * g = 1 − tanh(a)/a with a = width/(2 l) and l the transfer length. 0 for narrow tall lines, 1 for wide ones.
 *
 * The form is practical shear lag (common practice, no source). Against plane finite elements of lines with straight walls on
 * thick silicon (own computation; width 0.1 to 100 film thicknesses, coverage 0.2 to 0.8, film from 1 to 270 GPa) g is within
 * 0.09; against round islands within 0.14. Walls that lean, and lines embedded in another film, are relieved less.
 */
export function edgeRelief(width: number, length: number): number {
  const a = width / (2 * length);
  // 1 − tanh(a)/a by its series where the difference would lose digits; the next term is below 1e-16 of it.
  if (a < 0.02) return a * a * (1 / 3 - a * a * (2 / 15 - a * a * (17 / 315 - (a * a * 62) / 2835)));
  return 1 - Math.tanh(a) / a;
}
