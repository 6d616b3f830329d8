import { ringProfile, type Profile } from "./axisymmetric-sag.ts";
import { GAUSS_TEN } from "./gauss.ts";
import { harmonic, harmonicValue, type Harmonic } from "./point-series.ts";

/**
 * A circular plate of radius 1 under its own weight on `count` points equally spaced on the circle of radius `at`, small
 * deflections, in units of q a⁴/D, up positive, zero at the points.
 */
export interface PointSag {
  /** Height at radius r on the ray through a support, and on the ray midway between two. */
  onSupport: Profile;
  midway: Profile;
  /** Height at any place. */
  at: (r: number, angle: number) => number;
  /** Root mean square about the mean plane. */
  rms: number;
}

/** Harmonics beyond this order change nothing above 1e-6 of the sag. */
const HIGHEST = 600;

/**
 * Sum of the ring's own solution and the harmonics count, 2 count, 3 count … of the points. The series is exact for a plate
 * without thickness; broken off, it is within 1e-6. Source: as `harmonic`.
 */
export function pointSag(count: number, at: number, nu: number): PointSag {
  const orders = Math.max(24, Math.floor(HIGHEST / count));
  const harmonics = Array.from({ length: orders }, (_, k) => harmonic(count * (k + 1), at, nu));
  const ring = ringProfile(at, nu);
  const sum = (r: number, cosine: (k: number) => number) => ring(r) + series(harmonics, r, count, cosine);
  // What the ring calls zero is the mean height along the circle: the points themselves lie lower or higher.
  const zero = sum(at, () => 1);
  return {
    onSupport: (r) => sum(r, () => 1) - zero,
    midway: (r) => sum(r, (k) => (k % 2 === 0 ? 1 : -1)) - zero,
    at: (r, angle) => sum(r, (k) => Math.cos(k * count * angle)) - zero,
    rms: rootMeanSquare(ring, harmonics, at),
  };
}

/** Σ w_m(r) cos mθ over the harmonics m = count k, k from 1. */
function series(harmonics: readonly Harmonic[], r: number, count: number, cosine: (k: number) => number): number {
  const [first] = harmonics;
  if (!first || r === 0) return 0;
  const product = (first.at * r) ** count;
  const ratio = (Math.min(r, first.at) / Math.max(r, first.at)) ** count;
  let [products, ratios, total, k] = [1, 1, 0, 0];
  for (const h of harmonics) {
    products *= product;
    ratios *= ratio;
    k += 1;
    if (products + ratios < 1e-14) break;
    total += harmonicValue(h, r, products, ratios) * cosine(k);
  }
  return total;
}

/** By Parseval's sum around each circle and quadrature along the radius, split at the supports. */
function rootMeanSquare(ring: Profile, harmonics: readonly Harmonic[], at: number): number {
  let [mean, square] = [0, 0];
  const parts = at < 1 ? [0, at, 1] : [0, 1];
  for (const [n, from] of parts.slice(0, -1).entries()) {
    const to = parts[n + 1] ?? 1;
    for (const [node, weight] of GAUSS_TEN) {
      const r = (from + to + (to - from) * node) / 2;
      // 2 r dr over the disc.
      const share = weight * (to - from) * r;
      const level = ring(r);
      mean += share * level;
      square += share * level * level;
      for (const h of harmonics) {
        const w = harmonicValue(h, r, (at * r) ** h.m, (Math.min(r, at) / Math.max(r, at)) ** h.m);
        square += (share * w * w) / 2;
        if (Math.abs(w) < 1e-10) break;
      }
    }
  }
  return Math.sqrt(square - mean * mean);
}
