import { requireWithin } from "../../inputs.ts";
import { contours, type ContourPoint } from "../../window/contours.ts";
import { extremes } from "./shape-figures.ts";
import { surfaceEvaluator, type Surface } from "./surface.ts";

/** Lines of equal height inside the disk of a surface. */
export interface SurfaceContours {
  /** m, of the disk */
  radius: number;
  /** lowest and highest height on it, m */
  low: number;
  high: number;
  /** between two levels, m: 1, 2 or 5 times a power of ten */
  step: number;
  levels: { height: number; lines: ContourPoint[][] }[];
}

/** Cells across the disk. */
const CELLS = 120;
const DEFAULT_LEVELS = 10;
/** Cells by which the grid lies off the middle, so that lines of a symmetric shape do not run through its corners. */
const SHIFT = { x: 0.37, y: 0.21 } as const;

/**
 * Contours of a surface as polylines, m, for screen and paper alike: marching squares on a grid of 120 by 120 cells that reaches
 * beyond the disk, cut off at its rim. Levels are multiples of a round step, about `count` of them.
 */
export function surfaceContours(surface: Surface, count = DEFAULT_LEVELS): SurfaceContours {
  requireWithin("count", count, 1, 100, "1");
  const { radius } = surface;
  const ends = extremes(surface);
  const [low, high] = [ends.low.z, ends.high.z];
  const step = roundStep((high - low) / count);
  if (step === 0) return { radius, low, high, step, levels: [] };
  const reach = radius * (1 + 4 / CELLS);
  // In cells counted from 1, so that no crossing lies at zero, where pieces that meet could not be told by their digits.
  const axis = Array.from({ length: CELLS + 1 }, (_, n) => n + 1);
  const metres = (cell: number, shift: number) => (2 * reach * (cell - 1 + shift)) / CELLS - reach;
  const height = surfaceEvaluator(surface);
  const outside = radius + (3 * reach) / CELLS;
  const values = axis.flatMap((row) =>
    axis.map((column) => {
      const [x, y] = [metres(column, SHIFT.x), metres(row, SHIFT.y)];
      return Math.hypot(x, y) > outside ? null : height(x, y);
    }),
  );
  const levels: SurfaceContours["levels"] = [];
  for (let n = Math.ceil(low / step); n * step <= high; n += 1) {
    const lines = contours(axis, axis, values, n * step).flatMap((line) =>
      insideDisk(
        line.map(({ x, y }) => ({ x: metres(x, SHIFT.x), y: metres(y, SHIFT.y) })),
        radius,
      ),
    );
    if (lines.length > 0) levels.push({ height: n * step, lines });
  }
  return { radius, low, high, step, levels };
}

/** Smallest of 1, 2, 5 times a power of ten that is at least `least`; 0 for none. */
function roundStep(least: number): number {
  if (!(least > 0)) return 0;
  const power = 10 ** Math.floor(Math.log10(least));
  for (const times of [1, 2, 5]) if (times * power >= least * (1 - 1e-9)) return times * power;
  return 10 * power;
}

/** The parts of a polyline inside the disk, each ending on its rim. */
function insideDisk(line: readonly ContourPoint[], radius: number): ContourPoint[][] {
  const parts: ContourPoint[][] = [];
  let part: ContourPoint[] = [];
  const within = ({ x, y }: ContourPoint) => Math.hypot(x, y) <= radius;
  line.forEach((point, n) => {
    const last = line[n - 1];
    if (last && within(last) !== within(point)) {
      const cut = onRim(last, point, radius);
      part.push(cut);
      if (!within(point)) {
        parts.push(part);
        part = [];
      }
    }
    if (within(point)) part.push(point);
  });
  parts.push(part);
  return parts.filter(({ length }) => length > 1);
}

/** Where a straight piece with one end inside crosses the rim. */
function onRim(a: ContourPoint, b: ContourPoint, radius: number): ContourPoint {
  const [dx, dy] = [b.x - a.x, b.y - a.y];
  const [square, half, rest] = [dx * dx + dy * dy, a.x * dx + a.y * dy, a.x * a.x + a.y * a.y - radius * radius];
  const root = Math.sqrt(Math.max(0, half * half - square * rest));
  const share = rest <= 0 ? (-half + root) / square : (-half - root) / square;
  return { x: a.x + share * dx, y: a.y + share * dy };
}
