/**
 * Rows for labels that start at given places, so that none runs into the next: each takes the first row that is free.
 * @param starts left ends in ascending order, px
 * @param widths px
 * @param gap clear space between neighbours in a row, px
 */
export function stackRows(starts: readonly number[], widths: readonly number[], gap = 8): number[] {
  const ends: number[] = [];
  return starts.map((start, index) => {
    let row = 0;
    while ((ends[row] ?? -Infinity) + gap > start) row += 1;
    ends[row] = start + (widths[index] ?? 0);
    return row;
  });
}
