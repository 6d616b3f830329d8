import { at } from "../table/elements.ts";

/**
 * Polynomials on the unit disc, r^m p(r²) cos mθ or sin mθ with p a Jacobi polynomial: Zernike's functions for the deflection,
 * and the same times (1 − r²)², which leaves an edge free of forces, for Airy's stress function. They are products of one
 * radial and one angular function, so that every integral over the disc is a sum over a few radii.
 */
export interface DiscFunction {
  /** m */
  order: number;
  phase: "cos" | "sin";
  /** p, p′ and p″ at t = r². */
  jet: (t: number) => [number, number, number];
}

/** Which of the four mirror classes: even or odd in x, even or odd in y. */
export type Parity = "even" | "twist" | "odd-x" | "odd-y";

const CLASSES: Record<Parity, { phase: "cos" | "sin"; lowest: 0 | 1 | 2 }> = {
  even: { phase: "cos", lowest: 0 },
  twist: { phase: "sin", lowest: 2 },
  "odd-x": { phase: "cos", lowest: 1 },
  "odd-y": { phase: "sin", lowest: 1 },
};

/**
 * Deflections up to `degree` without the rigid ones and without uniform curvature: the area means of ∇²w, of w_xx − w_yy and
 * of w_xy of each are zero.
 */
export function deflections(parity: Parity, degree: number): DiscFunction[] {
  const { phase, lowest } = CLASSES[parity];
  const found: DiscFunction[] = [];
  for (let order = lowest; order <= degree; order += 2) {
    const first = order === 0 ? 2 : order <= 2 ? 1 : 0;
    for (let k = first; order + 2 * k <= degree; k += 1) found.push({ order, phase, jet: deflectionJet(order, k) });
  }
  return found;
}

/** Stress functions (1 − r²)² r^m P_k, the factor after the bracket up to `degree`. */
export function stressFunctions(parity: Parity, degree: number): DiscFunction[] {
  const { phase, lowest } = CLASSES[parity];
  const found: DiscFunction[] = [];
  for (let order = lowest; order <= degree; order += 2) {
    for (let k = 0; order + 2 * k <= degree; k += 1) found.push({ order, phase, jet: stressJet(order, k) });
  }
  return found;
}

/** Uniform curvature: r² with order 0, r² cos 2θ or r² sin 2θ with order 2. */
export function uniformBend(order: 0 | 2, phase: "cos" | "sin"): DiscFunction {
  return { order, phase, jet: (t) => (order === 0 ? [t, 1, 0] : [1, 0, 0]) };
}

function deflectionJet(order: number, k: number): DiscFunction["jet"] {
  const jet = (t: number) => jacobiJet(k, 0, order, t);
  const [atRim, slopeAtRim] = jet(1);
  if (order === 0) {
    const [atCentre] = jet(0);
    return (t) => {
      const [p, dp, ddp] = jet(t);
      return [p - atCentre - slopeAtRim * t, dp - slopeAtRim, ddp];
    };
  }
  if (order !== 2) return jet;
  const mean = slopeAtRim / 2 + atRim;
  return (t) => {
    const [p, dp, ddp] = jet(t);
    return [p - mean, dp, ddp];
  };
}

function stressJet(order: number, k: number): DiscFunction["jet"] {
  return (t) => {
    const [p, dp, ddp] = jacobiJet(k, 4, order, t);
    const s = 1 - t;
    return [s * s * p, s * (s * dp - 2 * p), s * s * ddp - 4 * s * dp + 2 * p];
  };
}

/** P_k^(alpha, beta)(2 t − 1) and its first two derivatives by t. */
function jacobiJet(k: number, alpha: number, beta: number, t: number): [number, number, number] {
  const first = k + alpha + beta + 1;
  return [
    jacobi(k, alpha, beta, t),
    first * jacobi(k - 1, alpha + 1, beta + 1, t),
    first * (first + 1) * jacobi(k - 2, alpha + 2, beta + 2, t),
  ];
}

function jacobi(k: number, alpha: number, beta: number, t: number): number {
  if (k < 0) return 0;
  const x = 2 * t - 1;
  let previous = 1;
  if (k === 0) return previous;
  let value = (alpha - beta + (alpha + beta + 2) * x) / 2;
  for (let n = 2; n <= k; n += 1) {
    const sum = 2 * n + alpha + beta;
    const next =
      ((sum - 1) * (sum * (sum - 2) * x + alpha * alpha - beta * beta) * value -
        2 * (n + alpha - 1) * (n + beta - 1) * sum * previous) /
      (2 * n * (n + alpha + beta) * (sum - 2));
    [previous, value] = [value, next];
  }
  return value;
}

/**
 * A function's second derivatives along a radius, split by angle. With H = (w_xx + w_yy)/2, D = (w_xx − w_yy)/2, T = w_xy,
 *   H = h Re(ε e^(imθ)),   D − iT = ε a e^(i(m−2)θ) + ε* b e^(−i(m+2)θ),   ε = 1 for cos, −i for sin.
 */
export interface Profile {
  order: number;
  phase: "cos" | "sin";
  value: Float64Array;
  h: Float64Array;
  a: Float64Array;
  b: Float64Array;
}

/** Profiles at the radii whose squares are `squares`. */
export function profileOf({ order, phase, jet }: DiscFunction, squares: Float64Array): Profile {
  const profile = {
    order,
    phase,
    value: new Float64Array(squares.length),
    h: new Float64Array(squares.length),
    a: new Float64Array(squares.length),
    b: new Float64Array(squares.length),
  };
  for (let n = 0; n < squares.length; n += 1) {
    const t = at(squares, n);
    const r = Math.sqrt(t);
    const [p, dp, ddp] = jet(t);
    profile.value[n] = r ** order * p;
    profile.h[n] = 2 * r ** order * ((order + 1) * dp + t * ddp);
    profile.a[n] = spin(order, r, t, [p, dp, ddp]);
    profile.b[n] = r ** (order + 2) * ddp;
  }
  return profile;
}

/** r^(m−2) (m (m − 1) p + 2 m t p′ + t² p″), with the powers of r taken together where m is below 2. */
function spin(order: number, r: number, t: number, [p, dp, ddp]: [number, number, number]): number {
  if (order === 0) return t * ddp;
  if (order === 1) return r * (2 * dp + t * ddp);
  return r ** (order - 2) * (order * (order - 1) * p + 2 * order * t * dp + t * t * ddp);
}
