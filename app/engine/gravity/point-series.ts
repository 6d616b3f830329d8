/**
 * Small deflection of a circular plate of radius 1 with a free edge under a force along the circle of radius `at` that varies
 * as cos mθ: w = w_m(r) cos mθ in units of q a⁴/D. The force is the mth harmonic of a point force equal to the plate's whole
 * weight, 1/at per length. Exact; m is 2 or more.
 *
 * w_m = at²/(8m) × (F + G): F is the plate without end, G lets go of moment and shear at the rim.
 * Source: own derivation by separation of variables; checked by the equations of equilibrium and by Nelson et al. 1982.
 */
export interface Harmonic {
  at: number;
  /** at²/(8m) */
  scale: number;
  m: number;
  /** G = (at r)^m (constant + square r²) */
  constant: number;
  square: number;
}

export function harmonic(m: number, at: number, nu: number): Harmonic {
  const inverse = 1 / (at * at);
  const square = (-(1 - nu) / (3 + nu)) * (inverse - m / (m + 1));
  const moment = (m + 1) * (m + 2 - nu * (m - 2)) * square;
  const constant = -(inverse * (m - 2 - nu * (m + 2)) - (1 - nu) * m + moment) / ((1 - nu) * m * (m - 1));
  return { at, scale: (at * at) / (8 * m), m, constant, square };
}

/** w_m at r, given (at r)^m and the mth power of the smaller over the larger of r and at. */
export function harmonicValue(h: Harmonic, r: number, product: number, ratio: number): number {
  const { at, m } = h;
  const square = (r / at) * (r / at);
  const whole = r <= at ? 1 / (m - 1) - square / (m + 1) : square / (m - 1) - 1 / (m + 1);
  return h.scale * (ratio * whole + product * (h.constant + h.square * r * r));
}
