import { centrePointProfile, ringProfile } from "../gravity/axisymmetric-sag.ts";
import { extremes } from "../gravity/extremes.ts";
import { GAUSS_TEN } from "../gravity/gauss.ts";

/**
 * A bowed plate of radius 1 sucked onto a flat, without friction: the part near the rim that still stands off. All lengths in
 * wafer radii; `curvature` is |κ| R, `pressure` p R³/D, both positive. Small deflections, ∇⁴w = −pressure where the plate is
 * free, and height, slope and bending all zero where it touches.
 *
 * Equilibrium is integrated once by hand; what is left are integrals over u = ln r, in which nothing cancels however narrow
 * the free part is. Source: own derivation; the narrow limit is a strip, L = sqrt(2 m/p).
 */
export interface Lift {
  /** Largest height over the flat. */
  height: number;
  /** Width of the free part, from the rim inwards. */
  length: number;
}

/** ln of the smallest radius of contact that is told from a point: 4e-18 of the wafer's radius. */
const POINT = -40;

/** A bowl, edges up: touches from the centre outwards, the rim stands off by `height`. */
export function bowlLift(curvature: number, pressure: number, nu: number): Lift {
  // Touching at the centre alone, as good as true while the suction is weak.
  const centreOnly = { height: curvature / 2 + pressure * centrePointProfile(nu)(1), length: 1 };
  const excess = (from: number) => {
    const moment = integral(from, 0, (u) => squareGap(u) / 2 - ((1 - nu) * squareGap(u) ** 2) / 4);
    return pressure * moment - (1 + nu) * curvature;
  };
  if (!(excess(POINT) > 0)) return centreOnly;
  const from = contactEdge(excess);
  return { height: pressure * integral(from, 0, (u) => (squareGap(u) / 4) * dip(u)), length: -Math.expm1(from) };
}

/** A dome, edges down: the rim seals first, then the centre touches; `height` is that of the hump left inside the rim. */
export function domeLift(curvature: number, pressure: number, nu: number): Lift {
  const sag = ringProfile(1, nu);
  const standing = (r: number) => (curvature / 2) * (1 - r * r) + pressure * sag(r);
  if (standing(0) >= 0) return { height: extremes(standing, 0, 1).high, length: 1 };
  // Touching at the centre alone: the chuck's force there is that of a plate on its rim, loaded at its centre.
  const pushed = (r: number) => 1 - r * r + (r > 0 ? ((2 * (1 + nu)) / (3 + nu)) * r * r * Math.log(r) : 0);
  const onPoint = (r: number) => standing(r) - standing(0) * pushed(r);
  // Shear is zero at the radius sqrt(1 − δ); δ follows from the rim lying on the flat.
  const shearless = (from: number) => integral(from, 0, (u) => squareGap(u) * dip(u)) / integral(from, 0, dip);
  const excess = (from: number) => {
    const delta = shearless(from);
    const moment = integral(from, 0, (u) => {
      const shear = squareGap(u) - delta;
      return shear / 2 - ((1 - nu) * shear * squareGap(u)) / 4;
    });
    return -pressure * moment - (1 + nu) * curvature;
  };
  if (!(excess(POINT) > 0)) return { height: extremes(onPoint, 0, 1).high, length: 1 };
  const from = contactEdge(excess);
  const delta = shearless(from);
  // Slope times radius at ln r, and height there.
  const slope = (to: number) =>
    integral(from, to, (u) => ((squareGap(u) - delta) * Math.exp(2 * to) * squareGap(u - to)) / 4);
  const crest = bisect((to) => slope(to) < 0, from, 0);
  const height = integral(from, crest, (u) => ((squareGap(u) - delta) / 4) * Math.exp(2 * crest) * dip(u - crest));
  return { height: pressure * height, length: -Math.expm1(from) };
}

/** 1 − r² with u = ln r. */
function squareGap(u: number): number {
  return -Math.expm1(2 * u);
}

/** (1 − r²)/2 + r² ln r: deflection at the rim of a unit of shear at r; by its series where the difference loses digits. */
function dip(u: number): number {
  if (u < -0.2) return squareGap(u) / 2 + u * Math.exp(2 * u);
  let [sum, term] = [0, 2 * u * u];
  for (let k = 0; k < 14; k += 1) {
    sum += term / (k + 2);
    term *= (2 * u) / (k + 1);
  }
  return sum;
}

/** Integral over u, in panels of unit length at most. */
function integral(from: number, to: number, f: (u: number) => number): number {
  const panels = Math.max(1, Math.ceil(to - from));
  const half = (to - from) / (2 * panels);
  let sum = 0;
  for (let n = 0; n < panels; n += 1) {
    const middle = from + (2 * n + 1) * half;
    for (const [node, weight] of GAUSS_TEN) sum += weight * f(middle + half * node);
  }
  return sum * half;
}

/** ln of the radius of contact: where `excess`, which grows as the free part does, is zero. */
function contactEdge(excess: (from: number) => number): number {
  return -Math.exp(bisect((log) => excess(-Math.exp(log)) > 0, Math.log(1e-12), Math.log(-POINT)));
}

/** Where a condition that is false at `low` and true at `high` turns. */
function bisect(condition: (at: number) => boolean, low: number, high: number): number {
  let [below, above] = [low, high];
  for (let n = 0; n < 60; n += 1) {
    const middle = (below + above) / 2;
    if (condition(middle)) above = middle;
    else below = middle;
  }
  return above;
}
