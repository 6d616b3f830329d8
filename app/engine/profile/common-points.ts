import { EngineInputError } from "../errors.ts";
import { requirePoints, sortedByPosition, type ProfilePoint } from "./points.ts";

/** One position at which both scans have a height, m. */
export interface ScanPair {
  x: number;
  before: number;
  after: number;
}

/**
 * Heights of two scans at the positions of the first one within the range that both cover, in ascending order; the second is
 * interpolated between its neighbours.
 * Refuses, with `EngineInputError`: scans that do not overlap, values that are not finite.
 */
export function commonPoints(pre: readonly ProfilePoint[], post: readonly ProfilePoint[]): ScanPair[] {
  requirePoints("pre", pre);
  requirePoints("post", post);
  const after = sortedByPosition(post);
  const first = after[0];
  const last = after.at(-1);
  const common = first && last ? sortedByPosition(pre).filter(({ x }) => x >= first.x && x <= last.x) : [];
  if (common.length === 0) throw new EngineInputError("post", "does not overlap the scan before the film");
  let next = 0;
  return common.map(({ x, z }) => {
    while ((after[next]?.x ?? x) < x) next += 1;
    return { x, before: z, after: interpolate(after[next - 1], after[next], x) };
  });
}

function interpolate(low: ProfilePoint | undefined, high: ProfilePoint | undefined, x: number): number {
  if (!low || high?.x === x) return high?.z ?? 0;
  if (!high) return low.z;
  return low.z + ((high.z - low.z) * (x - low.x)) / (high.x - low.x);
}
