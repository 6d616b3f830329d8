/** Solution of a square system by Gauss elimination with row pivoting. Throws when it is singular. */
export function solveDense(matrix: readonly (readonly number[])[], right: readonly number[]): number[] {
  const size = right.length;
  const rows = matrix.map((row, n) => Float64Array.from([...row, right[n] ?? 0]));
  const entry = (n: number, k: number) => rows[n]?.[k] ?? 0;
  for (let k = 0; k < size; k += 1) {
    let pivot = k;
    for (let n = k + 1; n < size; n += 1) if (Math.abs(entry(n, k)) > Math.abs(entry(pivot, k))) pivot = n;
    const [row, other] = [rows[pivot], rows[k]];
    if (!row || !other || row[k] === 0) throw new Error("singular system");
    rows[pivot] = other;
    rows[k] = row;
    for (let n = k + 1; n < size; n += 1) {
      const lower = rows[n];
      if (!lower) continue;
      const share = (lower[k] ?? 0) / (row[k] ?? 1);
      if (share === 0) continue;
      for (let m = k; m <= size; m += 1) lower[m] = (lower[m] ?? 0) - share * (row[m] ?? 0);
    }
  }
  const solution = new Array<number>(size).fill(0);
  for (let k = size - 1; k >= 0; k -= 1) {
    let rest = entry(k, size);
    for (let m = k + 1; m < size; m += 1) rest -= entry(k, m) * (solution[m] ?? 0);
    solution[k] = rest / entry(k, k);
  }
  return solution;
}
