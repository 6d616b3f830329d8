import { EngineInputError } from "../errors.ts";
import { ascendingColumns, firstFrom, type ScanColumns } from "./columns.ts";

/** Heights of two scans at the same positions, ascending, m. */
export interface MatchedScans {
  x: Float64Array;
  before: Float64Array;
  after: Float64Array;
  /** widest distance between two positions of the second scan in the common range, m */
  widestSpacing: number;
}

/**
 * Both scans at the positions of the first one within the range that both cover; the second is interpolated straight between its
 * neighbours. Points at one position become one, at their mean height. Linear time for scans that ascend or descend.
 *
 * A straight line over a spacing d misses a curve of curvature κ by up to κ d²/8 (`interpolationError`). On equal spacings the
 * miss repeats itself along the scan and leaves the curvature alone.
 * @throws EngineInputError for scans that do not overlap, values that are not finite
 */
export function matchScans(pre: ScanColumns, post: ScanColumns): MatchedScans {
  const first = merged(ascendingColumns("pre", pre));
  const second = merged(ascendingColumns("post", post));
  const last = second.x.length - 1;
  const low = last < 0 ? 0 : firstFrom(first.x, second.x[0] ?? 0);
  const from = low;
  let to = last < 0 ? 0 : firstFrom(first.x, second.x[last] ?? 0);
  if (last >= 0 && first.x[to] === second.x[last]) to += 1;
  if (to <= from) throw new EngineInputError("post", "does not overlap the scan before the film");
  const x = first.x.subarray(from, to);
  const after = new Float64Array(x.length);
  let next = 0;
  let widestSpacing = 0;
  for (let n = 0; n < x.length; n += 1) {
    const at = x[n] ?? 0;
    while (next < last && (second.x[next] ?? 0) < at) next += 1;
    const [high, height] = [second.x[next] ?? 0, second.z[next] ?? 0];
    if (high === at || next === 0) {
      after[n] = height;
      continue;
    }
    const [below, heightBelow] = [second.x[next - 1] ?? 0, second.z[next - 1] ?? 0];
    after[n] = heightBelow + ((height - heightBelow) * (at - below)) / (high - below);
    widestSpacing = Math.max(widestSpacing, high - below);
  }
  return { x, before: first.z.subarray(from, to), after, widestSpacing };
}

/** Largest miss of straight interpolation over `spacing` (m) on a curve of this curvature (1/m), m: κ d²/8. */
export function interpolationError(spacing: number, curvature: number): number {
  return (Math.abs(curvature) * spacing * spacing) / 8;
}

/** Points at the same position as one, at their mean height; the columns themselves when there are none. */
function merged({ x, z }: { x: Float64Array; z: Float64Array }): { x: Float64Array; z: Float64Array } {
  let distinct = x.length > 0 ? 1 : 0;
  for (let n = 1; n < x.length; n += 1) if (x[n] !== x[n - 1]) distinct += 1;
  if (distinct === x.length) return { x, z };
  const [atX, atZ] = [new Float64Array(distinct), new Float64Array(distinct)];
  let out = -1;
  let count = 0;
  for (let n = 0; n < x.length; n += 1) {
    const position = x[n] ?? 0;
    if (n === 0 || position !== atX[out]) {
      if (out >= 0) atZ[out] = (atZ[out] ?? 0) / count;
      out += 1;
      count = 0;
      atX[out] = position;
    }
    atZ[out] = (atZ[out] ?? 0) + (z[n] ?? 0);
    count += 1;
  }
  if (out >= 0) atZ[out] = (atZ[out] ?? 0) / count;
  return { x: atX, z: atZ };
}
