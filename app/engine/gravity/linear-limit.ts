import { edgeRingRatio, threePointRatio } from "./large-sag.ts";
import type { RelativeCarrying, RelativeSupport } from "./support.ts";

/** Small deflections count as right while the sag is within this share of that of large ones. */
const WITHIN = 0.05;

/** Points from here outwards count as under the rim. */
const AT_RIM = 0.97;

/**
 * Peak to valley over thickness up to which small deflections stay within 5 % of von Karman's theory, for supports whose large
 * deflection has no table. Least of what was computed for ν from 0 to 0.45: rings of 0.3 to 1 of the radius 0.287 (at 0.7;
 * 0.35 to 0.47 elsewhere), centre point 0.39, cups 0.397, three points outside 0.9 of the radius 1.24, inside 0.47, more
 * points as a ring, rails 0.69. Own computation, shapes that keep the symmetry of the support.
 */
const LIMITS = {
  ring: 0.28,
  "centre-point": 0.38,
  "centre-cup": 0.38,
  rails: 0.6,
  threePointsOutside: 1.2,
  threePointsInside: 0.45,
  morePoints: 0.28,
} as const;

export interface LargeSag {
  linearValid: boolean;
  /** Peak to valley over thickness between which large deflections keep it; null where nothing is known but the upper bound. */
  range: { low: number; high: number } | null;
}

/**
 * Whether small deflections hold at the load `q` = q a⁴/(D h) for a linear peak to valley of `sag` thicknesses, and what large
 * deflections make of it. On a ring under the rim: von Karman's value. On three points at the rim: his value up to Q = 300.
 * On three points and rails beyond that: 0.6 to 1.0 of the linear sag, because the wafer folds nearly without stretching.
 * Elsewhere the linear sag is an upper bound and no more is said.
 */
export function largeSag(support: RelativeSupport, q: number, nu: number, sag: number): LargeSag {
  if (support.kind === "points" || support.kind === "rails") return carriedLargeSag(support, q, nu, sag);
  if (support.kind === "ring" && support.at === 1) return known(edgeRingRatio(q, nu), sag);
  return upTo(LIMITS[support.kind], sag, null);
}

/** The same on points or rails. */
export function carriedLargeSag(support: RelativeCarrying, q: number, nu: number, sag: number): LargeSag {
  const threePoints = support.kind === "points" && support.count === 3;
  if (threePoints && support.at >= AT_RIM) {
    const ratio = threePointRatio(q, nu);
    return ratio === null ? { linearValid: false, range: band(sag) } : known(ratio, sag);
  }
  return upTo(limitOf(support), sag, threePoints || support.kind === "rails" ? band(sag) : null);
}

/** Small deflections up to a limit, `beyond` from there. */
function upTo(limit: number, sag: number, beyond: LargeSag["range"]): LargeSag {
  const linearValid = sag <= limit;
  return { linearValid, range: linearValid ? { low: (1 - WITHIN) * sag, high: sag } : beyond };
}

function known(ratio: number, sag: number): LargeSag {
  return { linearValid: ratio >= 1 - WITHIN, range: { low: ratio * sag, high: ratio * sag } };
}

/**
 * Common practice, no source. Computed ratios reach down to 0.58 on three points and, up to Q = 1000, to 0.70 on rails near the
 * rim for ν = 0.16, 0.60 for 0.30, 0.48 for 0.45.
 */
function band(sag: number): { low: number; high: number } {
  return { low: 0.6 * sag, high: sag };
}

function limitOf(support: RelativeCarrying): number {
  if (support.kind === "rails") return LIMITS.rails;
  if (support.count > 3) return LIMITS.morePoints;
  return support.at >= 0.9 ? LIMITS.threePointsOutside : LIMITS.threePointsInside;
}
