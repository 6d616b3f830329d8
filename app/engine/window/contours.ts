/** A place in a window, in its own coordinates. */
export interface ContourPoint {
  x: number;
  y: number;
}

/**
 * Lines on which a field over a grid takes a level, by marching squares with straight interpolation along the cells' sides. A saddle
 * is cut by the mean of its corners. A cell with an unknown corner is left out. Pieces that meet are joined; a closed line ends
 * where it begins.
 * @param values row by row, x running fastest; null where unknown
 */
export function contours(
  x: readonly number[],
  y: readonly number[],
  values: readonly (number | null)[],
  level: number,
): ContourPoint[][] {
  const pieces: [ContourPoint, ContourPoint][] = [];
  for (let row = 0; row + 1 < y.length; row += 1)
    for (let column = 0; column + 1 < x.length; column += 1)
      if (isCrossed(values, row * x.length + column, x.length, level))
        pieces.push(...cellPieces(x, y, values, level, column, row));
  return joined(pieces);
}

/** Whether the corners of a cell are known and lie on both sides of the level: most cells are passed over here, without an object. */
function isCrossed(values: readonly (number | null)[], at: number, width: number, level: number): boolean {
  const [a, b, c, d] = [values[at], values[at + 1], values[at + width], values[at + width + 1]];
  if (a === null || a === undefined || b === null || b === undefined) return false;
  if (c === null || c === undefined || d === null || d === undefined) return false;
  const above = a >= level;
  return b >= level !== above || c >= level !== above || d >= level !== above;
}

type Corner = ContourPoint & { off: number };

function cellPieces(
  x: readonly number[],
  y: readonly number[],
  values: readonly (number | null)[],
  level: number,
  column: number,
  row: number,
): [ContourPoint, ContourPoint][] {
  const corners: Corner[] = [];
  for (const [along, down] of [
    [0, 0],
    [1, 0],
    [1, 1],
    [0, 1],
  ] as const) {
    const value = values[(row + down) * x.length + column + along];
    const [atX, atY] = [x[column + along], y[row + down]];
    if (value === null || value === undefined || atX === undefined || atY === undefined) return [];
    corners.push({ x: atX, y: atY, off: value - level });
  }
  const crossings = corners.flatMap((corner, index) => {
    const next = corners[(index + 1) % 4];
    return next && corner.off >= 0 !== next.off >= 0 ? [crossing(corner, next)] : [];
  });
  const [a, b, c, d] = crossings;
  if (a && b && c && d) {
    const middle = corners.reduce((sum, { off }) => sum + off, 0) / 4;
    // The first corner is cut off from its neighbours when the middle is on the other side.
    return middle >= 0 === (corners[0]?.off ?? 0) >= 0
      ? [
          [a, b],
          [c, d],
        ]
      : [
          [d, a],
          [b, c],
        ];
  }
  return a && b ? [[a, b]] : [];
}

function crossing(one: Corner, other: Corner): ContourPoint {
  const share = one.off / (one.off - other.off);
  return { x: one.x + (other.x - one.x) * share, y: one.y + (other.y - one.y) * share };
}

const same = (a: ContourPoint, b: ContourPoint) => a.x === b.x && a.y === b.y;

/** Pieces end to end. Neighbouring cells compute a crossing from the same two corners, if in turn; so ends are compared by key. */
function joined(pieces: readonly [ContourPoint, ContourPoint][]): ContourPoint[][] {
  const key = ({ x, y }: ContourPoint) => `${x.toPrecision(10)} ${y.toPrecision(10)}`;
  const open = new Map<string, ContourPoint[]>();
  const closed: ContourPoint[][] = [];
  const take = (line: ContourPoint[] | undefined) => {
    if (!line) return;
    for (const end of [line.at(0), line.at(-1)]) if (end) open.delete(key(end));
  };
  for (const [from, to] of pieces) {
    if (same(from, to)) continue;
    const [before, after] = [open.get(key(from)), open.get(key(to))];
    take(before);
    take(after);
    if (before && before === after) {
      closed.push([...before, before[0] ?? from]);
      continue;
    }
    const head = before ? endingAt(before, from, key) : [from];
    const tail = after ? endingAt(after, to, key).toReversed() : [to];
    const line = [...head, ...tail];
    const [first, last] = [line.at(0), line.at(-1)];
    if (first) open.set(key(first), line);
    if (last) open.set(key(last), line);
  }
  return [...closed, ...new Set(open.values())];
}

function endingAt(line: ContourPoint[], end: ContourPoint, key: (point: ContourPoint) => string): ContourPoint[] {
  const last = line.at(-1);
  return last && key(last) === key(end) ? line : line.toReversed();
}
