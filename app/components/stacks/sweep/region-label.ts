/** Cells that must lie about a place for words to stand there. */
const ROOM = 2;

/**
 * The place of a map deepest inside what a test holds for, in shares of its axes: where the words of a region stand. Null where it is
 * too small for any.
 */
export function deepestPlace(cells: number, isIn: (place: number) => boolean): { x: number; y: number } | null {
  const side = cells + 1;
  const depth = Array.from({ length: side * side }, (_, n) => (isIn(n) ? Infinity : 0));
  const at = (column: number, row: number) =>
    column < 0 || row < 0 || column >= side || row >= side ? 0 : (depth[row * side + column] ?? 0);
  // Two passes give every place its distance to the nearest that is not inside.
  for (const step of [1, -1])
    for (let n = 0; n < side * side; n += 1) {
      const place = step === 1 ? n : side * side - 1 - n;
      const [column, row] = [place % side, Math.floor(place / side)];
      const near = Math.min(at(column - step, row), at(column, row - step), at(column + step, row - step));
      depth[place] = Math.min(depth[place] ?? 0, near + 1);
    }
  const deepest = depth.reduce((best, value, n) => (value > (depth[best] ?? 0) ? n : best), 0);
  if ((depth[deepest] ?? 0) <= ROOM) return null;
  return { x: (deepest % side) / cells, y: Math.floor(deepest / side) / cells };
}
