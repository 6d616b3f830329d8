import { ascendingColumns, firstFrom, type ScanColumns } from "../columns.ts";

/** The part of a scan at least `edgeExclusion` from either end, ascending. */
export function columnsInside(scan: ScanColumns, edgeExclusion: number): { x: Float64Array; z: Float64Array } {
  const { x, z } = ascendingColumns("scan", scan);
  const low = firstFrom(x, (x[0] ?? 0) + edgeExclusion);
  const high = firstFrom(x, (x[x.length - 1] ?? 0) - edgeExclusion);
  return { x: x.subarray(low, high), z: z.subarray(low, high) };
}

/** Left out at either end where nothing else is said, m. Common practice, no source. */
export const USUAL_EXCLUSION = 3e-3;
