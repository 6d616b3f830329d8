/**
 * The value that would stand at place `k` if the first `count` of `values` were in order; moves them about. Linear time on
 * average. Source: Hoare 1961 (find), median of three as pivot, from memory.
 */
function selectInPlace(values: Float64Array, count: number, k: number): number {
  let [low, high] = [0, count - 1];
  while (low < high) {
    const pivot = middleOf(values[low] ?? 0, values[(low + high) >> 1] ?? 0, values[high] ?? 0);
    let [i, j] = [low, high];
    while (i <= j) {
      while ((values[i] ?? 0) < pivot) i += 1;
      while ((values[j] ?? 0) > pivot) j -= 1;
      if (i <= j) {
        const moved = values[i] ?? 0;
        values[i] = values[j] ?? 0;
        values[j] = moved;
        i += 1;
        j -= 1;
      }
    }
    if (k <= j) high = j;
    else if (k >= i) low = i;
    else break;
  }
  return values[k] ?? 0;
}

function middleOf(a: number, b: number, c: number): number {
  return Math.max(Math.min(a, b), Math.min(Math.max(a, b), c));
}

/** Median of the first `count` of `values`, which are moved about. Of an even number the mean of the middle two. */
export function medianInPlace(values: Float64Array, count: number): number {
  const upper = selectInPlace(values, count, count >> 1);
  if (count % 2 === 1) return upper;
  // What is left of the middle is no larger; its largest is the other middle value.
  let lower = Number.NEGATIVE_INFINITY;
  for (let n = 0; n < count >> 1; n += 1) lower = Math.max(lower, values[n] ?? 0);
  return (lower + upper) / 2;
}
