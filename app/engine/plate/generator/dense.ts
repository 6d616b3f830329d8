/** Dense linear algebra of the generator: row-major matrices in flat arrays, real and small enough for direct methods. */
import { at } from "../table/elements.ts";

/**
 * Cholesky factor of a symmetric matrix of `size` rows, written over its lower triangle; false when the matrix is not positive
 * definite, which is how the generator recognises an unstable shape.
 */
export function factorise(matrix: Float64Array, size: number): boolean {
  for (let j = 0; j < size; j += 1) {
    const rowJ = matrix.subarray(j * size, j * size + size);
    let diagonal = at(rowJ, j);
    for (let k = 0; k < j; k += 1) diagonal -= at(rowJ, k) ** 2;
    if (!(diagonal > 0)) return false;
    const pivot = Math.sqrt(diagonal);
    rowJ[j] = pivot;
    for (let i = j + 1; i < size; i += 1) {
      const start = i * size;
      let sum = at(matrix, start + j);
      for (let k = 0; k < j; k += 1) sum -= at(matrix, start + k) * at(rowJ, k);
      matrix[start + j] = sum / pivot;
    }
  }
  return true;
}

/** Replaces `right` by L⁻¹ `right`, L the factor that `factorise` left in the lower triangle. */
export function forward(factor: Float64Array, size: number, right: Float64Array): void {
  for (let i = 0; i < size; i += 1) {
    let sum = at(right, i);
    for (let k = 0; k < i; k += 1) sum -= at(factor, i * size + k) * at(right, k);
    right[i] = sum / at(factor, i * size + i);
  }
}

/** Replaces `right` by L⁻ᵀ `right`. */
export function backward(factor: Float64Array, size: number, right: Float64Array): void {
  for (let i = size - 1; i >= 0; i -= 1) {
    const value = at(right, i) / at(factor, i * size + i);
    right[i] = value;
    for (let k = 0; k < i; k += 1) right[k] = at(right, k) - at(factor, i * size + k) * value;
  }
}

/** Replaces every column of `right` (`size` rows, `columns` columns) by L⁻¹ of it. */
export function forwardColumns(factor: Float64Array, size: number, right: Float64Array, columns: number): void {
  for (let i = 0; i < size; i += 1) {
    const row = right.subarray(i * columns, (i + 1) * columns);
    for (let k = 0; k < i; k += 1) {
      const share = at(factor, i * size + k);
      if (share === 0) continue;
      const above = right.subarray(k * columns, (k + 1) * columns);
      for (let c = 0; c < columns; c += 1) row[c] = at(row, c) - share * at(above, c);
    }
    const pivot = at(factor, i * size + i);
    for (let c = 0; c < columns; c += 1) row[c] = at(row, c) / pivot;
  }
}

/** Adds `weight` BᵀB to the symmetric `target`; B has `rows` rows and `size` columns. Both triangles are written. */
export function addSquare(target: Float64Array, size: number, b: Float64Array, rows: number, weight: number): void {
  for (let k = 0; k < rows; k += 1) {
    const row = b.subarray(k * size, (k + 1) * size);
    for (let i = 0; i < size; i += 1) {
      const share = weight * at(row, i);
      if (share === 0) continue;
      const start = i * size;
      for (let j = 0; j <= i; j += 1) target[start + j] = at(target, start + j) + share * at(row, j);
    }
  }
  for (let i = 0; i < size; i += 1) {
    for (let j = 0; j < i; j += 1) target[j * size + i] = at(target, i * size + j);
  }
}

/** Product of a matrix (`rows` rows) and a vector. */
export function multiply(matrix: Float64Array, rows: number, vector: Float64Array): Float64Array {
  const size = vector.length;
  const result = new Float64Array(rows);
  for (let i = 0; i < rows; i += 1) {
    let sum = 0;
    for (let j = 0; j < size; j += 1) sum += at(matrix, i * size + j) * at(vector, j);
    result[i] = sum;
  }
  return result;
}

export function dot(a: Float64Array, b: Float64Array): number {
  let sum = 0;
  for (let i = 0; i < a.length; i += 1) sum += at(a, i) * at(b, i);
  return sum;
}
