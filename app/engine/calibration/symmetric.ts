/** Share of its own diagonal below which a direction counts as left open. */
const FLOOR = 1e-12;

/** Solver with a small symmetric positive definite matrix, by L D Lᵀ; null when it is singular. */
export function factorSymmetric(
  matrix: readonly (readonly number[])[],
): ((right: readonly number[]) => number[]) | null {
  const size = matrix.length;
  const lower = matrix.map((row) => row.map(() => 0));
  const diagonal: number[] = [];
  const at = (rows: readonly (readonly number[])[], i: number, j: number) => rows[i]?.[j] ?? 0;
  for (let j = 0; j < size; j += 1) {
    let pivot = at(matrix, j, j);
    for (let k = 0; k < j; k += 1) pivot -= at(lower, j, k) ** 2 * (diagonal[k] ?? 0);
    if (!(pivot > FLOOR * at(matrix, j, j)) || !(pivot > 0)) return null;
    diagonal.push(pivot);
    for (let i = j + 1; i < size; i += 1) {
      let value = at(matrix, i, j);
      for (let k = 0; k < j; k += 1) value -= at(lower, i, k) * at(lower, j, k) * (diagonal[k] ?? 0);
      const row = lower[i];
      if (row) row[j] = value / pivot;
    }
  }
  return (right) => {
    const solved = [...right];
    for (let i = 0; i < size; i += 1)
      for (let k = 0; k < i; k += 1) solved[i] = (solved[i] ?? 0) - at(lower, i, k) * (solved[k] ?? 0);
    for (let i = 0; i < size; i += 1) solved[i] = (solved[i] ?? 0) / (diagonal[i] ?? 1);
    for (let i = size - 1; i >= 0; i -= 1)
      for (let k = i + 1; k < size; k += 1) solved[i] = (solved[i] ?? 0) - at(lower, k, i) * (solved[k] ?? 0);
    return solved;
  };
}

/** Inverse of a small symmetric positive definite matrix; null when it is singular. */
export function invertSymmetric(matrix: readonly (readonly number[])[]): number[][] | null {
  const solve = factorSymmetric(matrix);
  return solve && matrix.map((_, n) => solve(matrix.map((__, m) => (m === n ? 1 : 0))));
}
