import type { ReadProfile } from "./scan-reading/one-profile.ts";

/**
 * A profile as if its line had been run the other way. Positions that count from the wafer's centre are turned about it; those that
 * count from one end of the scan, about its middle.
 */
export function runBackwards({ points, reading }: ReadProfile): ReadProfile {
  const { from, to } = reading;
  const about = from < 0 && to > 0 ? 0 : from + to;
  return {
    points: { x: points.x.map((x) => about - x).reverse(), z: points.z.toReversed() },
    reading: { ...reading, from: about - to, to: about - from },
  };
}
