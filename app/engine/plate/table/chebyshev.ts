import { at } from "./elements.ts";

/**
 * Sums of products of Chebyshev polynomials, c_ijk T_i(x) T_j(y) T_k(z), over i/n_x + j/n_y + k/n_z < 1: a smooth function of
 * three variables with the fewest coefficients for one error.
 */
export type Extent = readonly [nx: number, ny: number, nz: number];

/** 1, with room for the rounding of sums of thirds and the like. */
const BELOW_ONE = 1 - 1e-9;

/** Calls back for every i, j, k of a sum, in the order in which tables list the coefficients. */
export function eachTerm([nx, ny, nz]: Extent, visit: (i: number, j: number, k: number) => void): void {
  for (let i = 0; i < nx; i += 1) {
    for (let j = 0; i / nx + j / ny < BELOW_ONE; j += 1) {
      for (let k = 0; i / nx + j / ny + k / nz < BELOW_ONE; k += 1) visit(i, j, k);
    }
  }
}

/** Number of coefficients. */
export function termCount(extent: Extent): number {
  let count = 0;
  eachTerm(extent, () => (count += 1));
  return count;
}

/** A sum in x and y alone: the coefficients of row i from `starts[i]` on, up to `starts[i + 1]`. */
export interface PlaneSum {
  starts: Int32Array;
  coefficients: Float64Array;
}

/** T_0 to T_(count − 1) at `x`. */
export function polynomials(count: number, x: number): Float64Array {
  const values = new Float64Array(count);
  let [value, next] = [1, x];
  for (let n = 0; n < count; n += 1) {
    values[n] = value;
    [value, next] = [next, 2 * x * next - value];
  }
  return values;
}

/** The sum at one z. `values` are the coefficients in the order of `eachTerm`, in units of `quantum`. */
export function atThird(extent: Extent, values: readonly number[], quantum: number, z: number): PlaneSum {
  const [nx, ny, nz] = extent;
  const third = polynomials(nz, z);
  const coefficients = new Float64Array(nx * ny);
  const starts = new Int32Array(nx + 1);
  let [position, count] = [0, 0];
  for (let i = 0; i < nx; i += 1) {
    for (let j = 0; i / nx + j / ny < BELOW_ONE; j += 1) {
      const left = BELOW_ONE - i / nx - j / ny;
      let sum = 0;
      for (let k = 0; k / nz < left; k += 1) {
        sum += (values[position] ?? 0) * at(third, k);
        position += 1;
      }
      coefficients[count] = sum * quantum;
      count += 1;
    }
    starts[i + 1] = count;
  }
  return { starts, coefficients };
}
