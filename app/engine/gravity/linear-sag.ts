import { centreCupProfile, centrePointProfile, ringProfile, type Profile } from "./axisymmetric-sag.ts";
import { extremes } from "./extremes.ts";
import { pointSag } from "./point-sag.ts";
import { railsSag } from "./rails-sag.ts";
import type { RelativeCarrying, RelativeSupport } from "./support.ts";

/** Heights of a plate of radius 1 in units of q a⁴/D, up positive, zero at the supports. */
export interface LinearSag {
  centre: number;
  rimHigh: number;
  rimLow: number;
  peakToValley: number;
  /** Root mean square about the mean height; null where it is not worked out. */
  rms: number | null;
}

/** Sag of small deflections on any support, for ν from 0 to 0.5. */
export function linearSag(support: RelativeSupport, nu: number): LinearSag {
  switch (support.kind) {
    case "ring":
      return ofProfile(ringProfile(support.at, nu));
    case "centre-point":
      return ofProfile(centrePointProfile(nu));
    case "centre-cup":
      return ofProfile(centreCupProfile(support.at, nu));
    default:
      return carriedLinearSag(support, nu);
  }
}

/** The same on points or rails. */
export function carriedLinearSag(support: RelativeCarrying, nu: number): LinearSag {
  return support.kind === "points"
    ? onPoints(support.count, support.at, nu)
    : { ...railsSag(support.at, nu), rms: null };
}

function ofProfile(profile: Profile): LinearSag {
  const rim = profile(1);
  const { low, high } = extremes(profile, 0, 1);
  return { centre: profile(0), rimHigh: rim, rimLow: rim, peakToValley: high - low, rms: null };
}

/** Highest and lowest places lie on the mirror lines: through a support, or midway between two. */
function onPoints(count: number, at: number, nu: number): LinearSag {
  const sag = pointSag(count, at, nu);
  const [through, between] = [extremes(sag.onSupport, 0, 1), extremes(sag.midway, 0, 1)];
  const rim = [sag.onSupport(1), sag.midway(1)];
  return {
    centre: sag.onSupport(0),
    rimHigh: Math.max(...rim),
    rimLow: Math.min(...rim),
    peakToValley: Math.max(through.high, between.high) - Math.min(through.low, between.low),
    rms: sag.rms,
  };
}
