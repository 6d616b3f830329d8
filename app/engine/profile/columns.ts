import { EngineInputError } from "../errors.ts";

/** A scan as two columns of equal length: positions and heights, m. Height is positive upwards, device side up. */
export interface ScanColumns {
  x: ArrayLike<number>;
  z: ArrayLike<number>;
}

/** Most points of one scan. */
export const MOST_POINTS = 2_000_000;

/** A scan in ascending order of position. */
export interface AscendingColumns {
  x: Float64Array;
  z: Float64Array;
  /** place in the scan as given of every point; null when it was in ascending order already */
  order: Int32Array | null;
}

/**
 * A scan in ascending order of position. One that ascends already is not copied when it comes as typed arrays, one that descends
 * is turned over, anything else is sorted; the first two in linear time.
 * @throws EngineInputError for columns of unequal length, too many points, or a value that is not finite
 */
export function ascendingColumns(field: string, { x, z }: ScanColumns): AscendingColumns {
  const count = x.length;
  if (z.length !== count) throw new EngineInputError(field, `has ${count} positions but ${z.length} heights`);
  if (count > MOST_POINTS) throw new EngineInputError(field, `${count} points are too many`, `up to ${MOST_POINTS}`);
  const positions = x instanceof Float64Array ? x : Float64Array.from(x);
  const heights = z instanceof Float64Array ? z : Float64Array.from(z);
  let ascends = true;
  let descends = true;
  let last = positions[0] ?? 0;
  for (let n = 0; n < count; n += 1) {
    const position = positions[n] ?? 0;
    // Infinity less itself is not a number either.
    if (position - position !== 0) refuse(`${field}[${n}].x`);
    const height = heights[n] ?? 0;
    if (height - height !== 0) refuse(`${field}[${n}].z`);
    if (position < last) ascends = false;
    else if (position > last) descends = false;
    last = position;
  }
  if (ascends) return { x: positions, z: heights, order: null };
  const order = new Int32Array(count);
  for (let n = 0; n < count; n += 1) order[n] = descends ? count - 1 - n : n;
  if (!descends) order.sort((a, b) => (positions[a] ?? 0) - (positions[b] ?? 0) || a - b);
  return { x: picked(positions, order), z: picked(heights, order), order };
}

function refuse(field: string): never {
  throw new EngineInputError(field, "must be a finite number", "any finite number");
}

function picked(values: Float64Array, order: Int32Array): Float64Array {
  const out = new Float64Array(order.length);
  for (let n = 0; n < order.length; n += 1) out[n] = values[order[n] ?? 0] ?? 0;
  return out;
}

/** First index of an ascending column whose value is at least `limit`. */
export function firstFrom(values: Float64Array, limit: number): number {
  let [low, high] = [0, values.length];
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((values[middle] ?? 0) < limit) low = middle + 1;
    else high = middle;
  }
  return low;
}

/** Number of distinct values of an ascending column, counted up to `enough`. */
export function distinctUpTo(values: Float64Array, enough: number): number {
  let count = values.length > 0 ? 1 : 0;
  for (let n = 1; n < values.length && count < enough; n += 1) if (values[n] !== values[n - 1]) count += 1;
  return count;
}

/** Points as columns. */
export function columnsOf(points: readonly { x: number; z: number }[]): { x: Float64Array; z: Float64Array } {
  const x = new Float64Array(points.length);
  const z = new Float64Array(points.length);
  points.forEach((point, n) => {
    x[n] = point.x;
    z[n] = point.z;
  });
  return { x, z };
}

/** The values of which `keep` is 1, in order; the column itself when that is all of them. */
export function kept(values: Float64Array, keep: Uint8Array): Float64Array {
  const out = new Float64Array(values.length);
  let count = 0;
  for (let n = 0; n < values.length; n += 1) {
    if (keep[n] !== 1) continue;
    out[count] = values[n] ?? 0;
    count += 1;
  }
  return count === values.length ? values : out.subarray(0, count);
}
