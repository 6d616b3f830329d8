import type { PlaneBox } from "#app/components/drawings/plane.ts";
import { textWidth } from "#app/components/drawings/text-width.ts";
import type { DrawnLevel } from "#app/schemas/stack-sweep.ts";

/** A label on a line of a map: its middle, px. */
export interface LevelLabel {
  x: number;
  y: number;
  width: number;
  text: string;
  limit: boolean;
}

interface Rectangle {
  x: number;
  y: number;
  width: number;
  height: number;
}

/** A line shorter than this stays without a label, px. */
const SHORTEST = 70;
/** Where along a line a label may stand, best first. */
const PLACES = [0.5, 0.34, 0.66, 0.2, 0.8, 0.1, 0.9, 0.42, 0.58, 0.27, 0.73];
/** As many lines of one level as are labelled. */
const EACH = 2;
const PADDING = 3;

/**
 * Where the values of a map's lines stand: on the line, inside the frame, clear of each other and of what is `taken`. Limits choose
 * first; a line along which nothing is free stays without.
 */
export function levelLabels(
  levels: readonly (Pick<DrawnLevel, "lines"> & { text: string; limit: boolean })[],
  box: PlaneBox,
  textSize: number,
  taken: readonly Rectangle[] = [],
): LevelLabel[] {
  const held = [...taken];
  const found: LevelLabel[] = [];
  for (const { lines, text, limit } of levels.toSorted((a, b) => Number(b.limit) - Number(a.limit))) {
    const [width, height] = [textWidth(text, textSize, limit) + 2 * PADDING, textSize * 1.25];
    const measured = lines.map((line) => inPixels(line, box)).filter(({ length }) => length >= SHORTEST);
    for (const line of measured.toSorted((a, b) => b.length - a.length).slice(0, EACH)) {
      const at = PLACES.map((share) => pointAlong(line, share)).find(({ x, y }) => {
        const rectangle = { x: x - width / 2, y: y - height / 2, width, height };
        return isInside(rectangle, box) && !held.some((other) => overlap(rectangle, other));
      });
      if (!at) continue;
      held.push({ x: at.x - width / 2, y: at.y - height / 2, width, height });
      found.push({ ...at, width, text, limit });
    }
  }
  return found;
}

interface Measured {
  points: { x: number; y: number; along: number }[];
  length: number;
}

function inPixels(line: readonly { x: number; y: number }[], box: PlaneBox): Measured {
  let along = 0;
  let last: { x: number; y: number } | null = null;
  const points = line.map(({ x: shareX, y: shareY }) => {
    const [x, y] = [box.atX(shareX), box.atY(shareY)];
    if (last) along += Math.hypot(x - last.x, y - last.y);
    last = { x, y };
    return { x, y, along };
  });
  return { points, length: along };
}

function pointAlong({ points, length }: Measured, share: number): { x: number; y: number } {
  const found = points.find(({ along }) => along >= share * length) ?? points.at(-1);
  return { x: found?.x ?? 0, y: found?.y ?? 0 };
}

const isInside = ({ x, y, width, height }: Rectangle, box: PlaneBox) =>
  x >= box.left + 2 && y >= box.top + 2 && x + width <= box.right - 2 && y + height <= box.bottom - 2;

const overlap = (a: Rectangle, b: Rectangle) =>
  a.x < b.x + b.width && b.x < a.x + a.width && a.y < b.y + b.height && b.y < a.y + a.height;
