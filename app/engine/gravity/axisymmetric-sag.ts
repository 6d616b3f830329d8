/**
 * A circular plate of radius 1 under its own weight on supports of full symmetry, small deflections: w(r) in units of q a⁴/D,
 * up positive, zero on the support. Equilibrium ∇⁴w = −1 with a free edge, exact.
 * Source: Timoshenko and Woinowsky-Krieger 1959, chapter 3; Chen 2003, equation 47.75, for the ring under the rim.
 */
export type Profile = (r: number) => number;

/** On a ring of radius `b`, the plate going on to both sides. */
export function ringProfile(b: number, nu: number): Profile {
  // Outside the ring the inner solution goes on with the jump of shear of the ring's force, 1/(2b) per length.
  const beyond = (r: number) => (r <= b ? 0 : ((r * r + b * b) * Math.log(r / b) - (r * r - b * b)) / 8);
  const slope = (-2 * Math.log(b) + b * b - 1) / 8;
  const bend = (-2 * Math.log(b) + 1 - b * b) / 8;
  const c1 = ((12 + 4 * nu) / 64 - bend - nu * slope) / (2 * (1 + nu));
  const c0 = b ** 4 / 64 - c1 * b * b;
  return (r) => c0 + c1 * r * r - r ** 4 / 64 + beyond(r);
}

/** On one point under the centre. The rim droops by (7 + 3ν)/(64 (1 + ν)). */
export function centrePointProfile(nu: number): Profile {
  const c1 = (1 + 3 * nu) / (32 * (1 + nu)) - 1 / 8;
  return (r) => c1 * r * r - r ** 4 / 64 + (r > 0 ? (r * r * Math.log(r)) / 8 : 0);
}

/** Held flat on a disc of radius `c`: clamped there, free outside. */
export function centreCupProfile(c: number, nu: number): Profile {
  const square = c * c;
  // Slope zero at c and radial moment zero at the rim give the two constants.
  const atCup = (square * square) / 16 - (2 * square * Math.log(c) + square) / 8;
  const d1 = ((1 - nu) * atCup - (3 + nu) / 16) / (2 * (1 + nu + (1 - nu) * square));
  const d2 = atCup - 2 * square * d1;
  const shape = (r: number) => d1 * r * r + (d2 + (r * r) / 8) * Math.log(r) - r ** 4 / 64;
  const atZero = shape(c);
  return (r) => (r <= c ? 0 : shape(r) - atZero);
}
