/** A place in a window, in its own coordinates. */
export interface ContourPoint {
  x: number;
  y: number;
}

/** A corner of a cell with how far the field is off the level there. */
export type ContourCorner = ContourPoint & { off: number };

/** Where between two corners on different sides of a level the field takes it. Asked once for each side of a cell. */
export type FindCrossing = (one: ContourCorner, other: ContourCorner) => ContourPoint;

/**
 * Lines on which a field over a grid takes a level, by marching squares. Where along a cell's side it does is found by straight
 * interpolation, unless `find` knows better. A saddle is cut by the mean of its corners. A cell with an unknown corner is left out.
 * Pieces that meet are joined; a closed line ends where it begins.
 * @param values row by row, x running fastest; null where unknown
 */
export function contours(
  x: readonly number[],
  y: readonly number[],
  values: readonly (number | null)[],
  level: number,
  find: FindCrossing = straight,
): ContourPoint[][] {
  const pieces: [ContourPoint, ContourPoint][] = [];
  const cross = onceForEachSide(find);
  for (let row = 0; row + 1 < y.length; row += 1)
    for (let column = 0; column + 1 < x.length; column += 1)
      if (isCrossed(values, row * x.length + column, x.length, level))
        pieces.push(...cellPieces(x, y, values, level, column, row, cross));
  return joined(pieces);
}

/** The cells on both sides ask from the same corners, if in turn, and are told the same. */
function onceForEachSide(find: FindCrossing): FindCrossing {
  const found = new Map<string, ContourPoint>();
  return (one, other) => {
    const [first, last] = one.y < other.y || (one.y === other.y && one.x <= other.x) ? [one, other] : [other, one];
    const side = `${first.x} ${first.y} ${last.x} ${last.y}`;
    const at = found.get(side) ?? find(first, last);
    found.set(side, at);
    return at;
  };
}

/** Whether the corners of a cell are known and lie on both sides of the level: most cells are passed over here, without an object. */
function isCrossed(values: readonly (number | null)[], at: number, width: number, level: number): boolean {
  const [a, b, c, d] = [values[at], values[at + 1], values[at + width], values[at + width + 1]];
  if (a === null || a === undefined || b === null || b === undefined) return false;
  if (c === null || c === undefined || d === null || d === undefined) return false;
  const above = a >= level;
  return b >= level !== above || c >= level !== above || d >= level !== above;
}

function cellPieces(
  x: readonly number[],
  y: readonly number[],
  values: readonly (number | null)[],
  level: number,
  column: number,
  row: number,
  find: FindCrossing,
): [ContourPoint, ContourPoint][] {
  const corners: ContourCorner[] = [];
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
    return next && corner.off >= 0 !== next.off >= 0 ? [find(corner, next)] : [];
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

function straight(one: ContourCorner, other: ContourCorner): ContourPoint {
  const share = one.off / (one.off - other.off);
  return { x: one.x + (other.x - one.x) * share, y: one.y + (other.y - one.y) * share };
}

const same = (a: ContourPoint, b: ContourPoint) => a.x === b.x && a.y === b.y;

/** Pieces end to end. Ends are compared by key: a crossing in a corner of the grid is found along several sides. */
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
