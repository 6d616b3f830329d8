import { columnsOf } from "./columns.ts";
import { matchScans } from "./match-scans.ts";
import type { ProfilePoint } from "./points.ts";

/** One position at which both scans have a height, m. */
export interface ScanPair {
  x: number;
  before: number;
  after: number;
}

/** `matchScans` of two lists of points. */
export function commonPoints(pre: readonly ProfilePoint[], post: readonly ProfilePoint[]): ScanPair[] {
  const { x, before, after } = matchScans(columnsOf(pre), columnsOf(post));
  return Array.from(x, (at, n) => ({ x: at, before: before[n] ?? 0, after: after[n] ?? 0 }));
}
