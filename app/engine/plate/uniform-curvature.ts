/**
 * Equilibrium of a free circular plate whose two principal curvatures are each uniform, under moments that alone would bend it
 * to two given curvatures.
 *
 * With mean A and half difference D of the two curvatures, both times R²/(4h), and P = A² − D² (their product):
 *
 *   A (1 + α P) = A_0,   D (1 − β P) = D_0,
 *
 * where A_0 and D_0 belong to small deflections. α measures how stretching resists the mean curvature, β how it drives the
 * wafer to roll about one axis. Uniform curvatures of an isotropic plate have α = 1 − ν and β = 1 + ν; this is the same system
 * as a + ν b + (1 − ν²) a b² = a_0 + ν b_0 and its mirror. A state is stable while its energy has a minimum there and
 * P < 1/β, which is the resistance to twisting the roll axis.
 * Source: Freund 2000; Masters and Salamon 1993; stability by own derivation.
 */
export interface PlateCoefficients {
  alpha: number;
  beta: number;
}

/** Mean and half difference of two curvatures along x and y, times R²/(4h). */
export interface CurvaturePair {
  mean: number;
  halfDifference: number;
}

/** Curvature of the bowl under equal moments, while it stays one: the positive root of A (1 + α A²) = `load`. */
export function equalCurvature(load: number, alpha: number): number {
  const scale = Math.sqrt(3 * alpha);
  return (2 / scale) * Math.sinh(Math.asinh(1.5 * load * scale) / 3);
}

/** Mean curvature at which equal moments let the plate go over into a roll. */
export function onsetCurvature({ beta }: PlateCoefficients): number {
  return 1 / Math.sqrt(beta);
}

/** Equal small-deflection curvature at which the roll begins, times R²/(4h): 2/(1 + ν)^1.5 for uniform curvature. */
export function onsetLoad(c: PlateCoefficients): number {
  return onsetCurvature(c) * (1 + c.alpha / c.beta);
}

/** Equal and opposite small-deflection curvature beyond which a saddle snaps into a roll, times R²/(4h). */
export function saddleOnsetLoad({ alpha, beta }: PlateCoefficients): number {
  return (1 + beta / alpha) / Math.sqrt(alpha);
}

/**
 * The stable state that the plate reaches as the load grows from zero. It always exists and is unique but for the free choice
 * of sign when one part of the load is exactly zero: then x is the axis that rolls, and a snapped saddle is a bowl.
 */
export function stableState(load: CurvaturePair, c: PlateCoefficients): CurvaturePair {
  const a = Math.abs(load.mean);
  const d = Math.abs(load.halfDifference);
  return withSigns(magnitudes(a, d, c), load, 1);
}

/**
 * A second stable state, or null: the snapped shape, whose mean curvature is opposite to the load's. Only moments of opposite
 * sign that are far apart have one. The roll about the other axis under equal moments is the same shape and is not listed.
 */
export function snappedState(load: CurvaturePair, c: PlateCoefficients): CurvaturePair | null {
  const a = Math.abs(load.mean);
  const d = Math.abs(load.halfDifference);
  if (d <= saddleOnsetLoad(c)) return null;
  if (a === 0) return withSigns(magnitudes(0, d, c), load, -1);
  const product = snappedProduct(a, d, c);
  if (product === null) return null;
  const halfDifference = d / (1 - c.beta * product);
  return withSigns({ mean: meanFrom(a, product, halfDifference, c), halfDifference }, load, -1);
}

function withSigns(size: CurvaturePair, load: CurvaturePair, meanSign: 1 | -1): CurvaturePair {
  return {
    mean: meanSign * (load.mean < 0 ? -size.mean : size.mean),
    halfDifference: load.halfDifference < 0 ? -size.halfDifference : size.halfDifference,
  };
}

/** Absolute mean and half difference of the state on the loading path. */
function magnitudes(a: number, d: number, c: PlateCoefficients): CurvaturePair {
  const { alpha, beta } = c;
  if (d === 0) {
    const bowl = equalCurvature(a, alpha);
    if (bowl <= onsetCurvature(c)) return { mean: bowl, halfDifference: 0 };
    const mean = a / (1 + alpha / beta);
    return { mean, halfDifference: Math.sqrt(Math.max(0, mean * mean - 1 / beta)) };
  }
  // Falls from +infinity to −infinity between P = −1/α and P = 1/β, so bisection finds its one root.
  const residual = (p: number) => (a / (1 + alpha * p)) ** 2 - (d / (1 - beta * p)) ** 2 - p;
  const product = bisect(residual, -1 / alpha, 1 / beta);
  const drive = 1 - beta * product;
  if (drive < 1e-3) {
    // The same for D near the other end: from D² = A² − P.
    const mean = a / (1 + alpha * product);
    return { mean, halfDifference: Math.sqrt(Math.max(0, mean * mean - product)) };
  }
  const halfDifference = d / drive;
  return { mean: meanFrom(a, product, halfDifference, c), halfDifference };
}

/** |A| from A (1 + α P) = A_0, or from A² = P + D² where the bracket is a difference of almost equal numbers. */
function meanFrom(a: number, product: number, halfDifference: number, { alpha }: PlateCoefficients): number {
  const stretch = Math.abs(1 + alpha * product);
  return stretch < 1e-3 ? Math.sqrt(Math.max(0, product + halfDifference ** 2)) : a / stretch;
}

/** Root of a falling function between two ends at which it may be infinite, or the end nearest to it. */
function bisect(f: (p: number) => number, low: number, high: number): number {
  let [below, above] = [low, high];
  for (;;) {
    const middle = (below + above) / 2;
    if (middle <= below || middle >= above) return middle;
    if (f(middle) > 0) below = middle;
    else above = middle;
  }
}

/**
 * Product of curvatures of the snapped state. Between the saddle without mean curvature and P = −1/α the mean load that holds
 * a state rises from zero and falls back to zero; the stable branch is the falling one, nearest to −1/α.
 */
function snappedProduct(a: number, d: number, { alpha, beta }: PlateCoefficients): number | null {
  const top = -1 / alpha;
  const saddle = bisect((p) => -((d / (1 - beta * p)) ** 2) - p, -d * d, top);
  const holdingLoad = (p: number) => -(1 + alpha * p) * Math.sqrt(Math.max(0, (d / (1 - beta * p)) ** 2 + p));
  const steps = 512;
  let inner = top;
  for (let n = 1; n <= steps; n += 1) {
    const outer = top + (saddle - top) * (n / steps) ** 2;
    if (holdingLoad(outer) >= a) return bisect((p) => holdingLoad(p) - a, outer, inner);
    inner = outer;
  }
  return null;
}
