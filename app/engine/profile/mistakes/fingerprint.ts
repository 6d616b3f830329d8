import { columnsInside } from "./inside.ts";
import { polynomialBasis, takeOut } from "../orthogonal-polynomials.ts";
import type { CheckedScan } from "./scan-checks.ts";

/** How the shape beyond the parabola of two scans of one wafer goes together. */
export interface Fingerprint {
  /** correlation of their parts that are equal on both sides of the centre, −1 to 1; null when scatter hides one of them */
  even: number | null;
  /** correlation of their parts that are opposite on both sides */
  odd: number | null;
}

/** Cells on each side of the centre. */
const CELLS = 24;
/** A part counts when it is this many times what its bends from cell to cell say of the scatter. */
const OVER_SCATTER = 4;
/** Ratio of sizes up to which two parts can be of one wafer. */
const LIKE_SIZES = 1.6;

/**
 * Compares what a wafer keeps through a film: the shape beyond tilt and parabola, its even and odd part about the centre each by
 * itself. Same line and side: both correlate. Line run the other way: the odd part turns over. Face down: the even part turns over.
 * Another line: neither correlates. x is zero at the wafer's centre.
 */
export function fingerprint(pre: CheckedScan, post: CheckedScan, edgeExclusion: number): Fingerprint {
  const [first, second] = [columnsInside(pre, edgeExclusion), columnsInside(post, edgeExclusion)];
  const reach = Math.min(reachOf(first.x), reachOf(second.x));
  if (!(reach > 0)) return { even: null, odd: null };
  const [a, b] = [partsOf(first, reach), partsOf(second, reach)];
  if (!a || !b) return { even: null, odd: null };
  return { even: correlation(a.even, b.even), odd: correlation(a.odd, b.odd) };
}

/** How far a scan reaches to the side on which it ends sooner. */
function reachOf(x: Float64Array): number {
  return Math.min(-(x[0] ?? 0), x[x.length - 1] ?? 0);
}

interface Parts {
  even: Float64Array;
  odd: Float64Array;
}

function partsOf({ x, z }: { x: Float64Array; z: Float64Array }, reach: number): Parts | null {
  const cells = 2 * CELLS;
  const mean = new Float64Array(cells);
  const count = new Float64Array(cells);
  const residual = Float64Array.from(z);
  const t = x.map((at) => at / reach);
  takeOut(polynomialBasis(t, 2), t, residual, 0, 2);
  for (let n = 0; n < x.length; n += 1) {
    const cell = Math.floor((((t[n] ?? 0) + 1) / 2) * cells);
    if (cell < 0 || cell >= cells) continue;
    mean[cell] = (mean[cell] ?? 0) + (residual[n] ?? 0);
    count[cell] = (count[cell] ?? 0) + 1;
  }
  for (let cell = 0; cell < cells; cell += 1) {
    if (!count[cell]) return null;
    mean[cell] = (mean[cell] ?? 0) / (count[cell] ?? 1);
  }
  const even = new Float64Array(CELLS);
  const odd = new Float64Array(CELLS);
  for (let k = 0; k < CELLS; k += 1) {
    const [right, left] = [mean[CELLS + k] ?? 0, mean[CELLS - 1 - k] ?? 0];
    even[k] = (right + left) / 2;
    odd[k] = (right - left) / 2;
  }
  levelled(even);
  return { even, odd };
}

/** Takes the mean out, which a shape beyond the parabola does not have. */
function levelled(values: Float64Array): void {
  const mean = values.reduce((sum, value) => sum + value, 0) / values.length;
  for (let n = 0; n < values.length; n += 1) values[n] = (values[n] ?? 0) - mean;
}

/** Correlation of two parts; null when scatter hides one, or they differ so much in size that a film made most of one. */
function correlation(a: Float64Array, b: Float64Array): number | null {
  let [aa, bb, ab] = [0, 0, 0];
  for (let n = 0; n < a.length; n += 1) {
    aa += (a[n] ?? 0) ** 2;
    bb += (b[n] ?? 0) ** 2;
    ab += (a[n] ?? 0) * (b[n] ?? 0);
  }
  if (!standsOut(a, aa) || !standsOut(b, bb)) return null;
  const ratio = Math.sqrt(aa / bb);
  return ratio > LIKE_SIZES || ratio < 1 / LIKE_SIZES ? null : ab / Math.sqrt(aa * bb);
}

/** A shape is smooth over three cells, scatter is not, with a memory of a few percent of the scan neither. */
function standsOut(part: Float64Array, squares: number): boolean {
  let bends = 0;
  for (let n = 1; n + 1 < part.length; n += 1)
    bends += ((part[n + 1] ?? 0) - 2 * (part[n] ?? 0) + (part[n - 1] ?? 0)) ** 2;
  // Of independent cells the second difference has six times their variance.
  return squares > (OVER_SCATTER ** 2 * bends * part.length) / (6 * (part.length - 2));
}
