import { EngineInputError } from "../errors.ts";
import { worstOutcome } from "../flow/judge.ts";
import type { FlowInput } from "../flow/model.ts";
import { requireFinite } from "../inputs.ts";
import { standingOf } from "../remedy/try-change.ts";
import type { SiteLimits } from "../rules/limits.ts";
import { applyChange, type FlowChange } from "../trial/change.ts";
import { judged, walked, walkVariant } from "../trial/trial-walk.ts";
import type { Outcome } from "../vocabulary.ts";

/** One input of a process window: its range, SI, and the change that puts it at a value. */
export interface WindowAxis {
  from: number;
  to: number;
  change: (value: number) => FlowChange;
}

/** What the flow comes to at one place of a window. */
export interface WindowPoint {
  outcome: Outcome;
  /** smallest share of a limit that is left; null where nothing has one or nothing can be computed */
  margin: number | null;
  /** rule and step of the worst finding, the first of them; null when all is clear */
  first: { rule: number; step: number } | null;
}

/** A process window: points row by row, x running fastest. */
export interface ProcessWindow {
  /** values of the two inputs, SI */
  x: number[];
  y: number[];
  points: WindowPoint[];
  /** how many places were walked; the others lie among walked ones that agree */
  walks: number;
}

export interface WindowProgress {
  /** places walked */
  done: number;
  /** places known to need a walk: more when the verdict turns between those looked at so far */
  of: number;
  /** the window as far as it is known; null before the first look is complete */
  soFar(): ProcessWindow | null;
}

/** Spacing of the first look, in cells. */
const COARSE = 4;

/**
 * Verdict and margin over two inputs. Looked at in every fourth place first; only where the corners of a block disagree, or their
 * margins change sign, is it looked at closer, so that a window of 41 by 41 costs a few hundred walks. Within a block whose
 * corners agree the outcome is theirs and the margin is interpolated: an island smaller than a block is missed. Yields after
 * every walk, so that it can be left with the window as far as it is known. Nominal values.
 * @param cells number of cells along each side, a multiple of 4, from 4 to 80; default 40
 * @param step number of the only step that is judged; null for all of them
 * @throws EngineInputError when a range is empty or the cells are no such number
 */
export function* processWindow(
  flow: FlowInput,
  limits: SiteLimits,
  axes: { x: WindowAxis; y: WindowAxis },
  { cells = 40, step = null }: { cells?: number; step?: number | null } = {},
): Generator<WindowProgress, ProcessWindow> {
  for (const [name, { from, to }] of Object.entries(axes))
    if (requireFinite(`${name}.from`, from) === requireFinite(`${name}.to`, to))
      throw new EngineInputError(name, "the range of the input is empty", "two different ends");
  if (!Number.isInteger(cells) || cells % COARSE !== 0 || cells < COARSE || cells > 80)
    throw new EngineInputError("cells", "is no multiple of 4", "4 to 80");
  const base = walked(flow, limits);
  const [x, y] = [valuesOf(axes.x, cells), valuesOf(axes.y, cells)];
  const side = cells + 1;
  const points: (WindowPoint | undefined)[] = new Array<WindowPoint | undefined>(side * side);
  let walks = 0;
  let lookedOver = false;
  const look = (at: number) => {
    const [valueX, valueY] = [x[at % side], y[Math.floor(at / side)]];
    if (valueX === undefined || valueY === undefined) return;
    walks += 1;
    const changes = [axes.x.change(valueX), axes.y.change(valueY)];
    points[at] = pointOf(() => {
      const variant = changes.reduce((changed, change) => applyChange(changed, change, NOTHING), flow);
      const findings = judged(walkVariant(base, variant, limits), limits);
      return step === null ? findings : findings.filter((finding) => finding.step === step);
    });
  };
  const known = (): ProcessWindow => ({ x, y, points: filled(points, side), walks });
  const soFar = () => (lookedOver ? known() : null);
  // Every fourth place, then those about blocks whose corners disagree, which are halved until they are cells.
  for (let size = COARSE; size >= 1; size /= 2) {
    const places = size === COARSE ? everyPlace(side, size) : turningPlaces(points, side, size);
    const of = walks + places.length;
    for (const at of places) {
      look(at);
      yield { done: walks, of, soFar };
    }
    lookedOver = true;
  }
  return known();
}

const NOTHING = { carriers: [], materials: [], tools: [] };

const valuesOf = ({ from, to }: WindowAxis, cells: number) =>
  Array.from({ length: cells + 1 }, (_, index) => from + ((to - from) * index) / cells);

function pointOf(judge: () => ReturnType<typeof judged>): WindowPoint {
  try {
    const findings = judge();
    const { outcome, margin } = standingOf(findings);
    const first = outcome === "clear" ? null : findings.find((finding) => finding.outcome === worstOutcome(findings));
    return { outcome, margin, first: first ? { rule: first.rule, step: first.step } : null };
  } catch (error) {
    if (!(error instanceof EngineInputError)) throw error;
    return { outcome: "cannot judge", margin: null, first: null };
  }
}

interface Block {
  column: number;
  row: number;
  size: number;
}

type Points = readonly (WindowPoint | undefined)[];

const cornersOf = (points: Points, side: number, { column, row, size }: Block) =>
  [
    [column, row],
    [column + size, row],
    [column, row + size],
    [column + size, row + size],
  ].map(([along = 0, down = 0]) => points[down * side + along]);

/** Whether all corners are known and come to the same, by the same rule. */
function agree(corners: (WindowPoint | undefined)[]): boolean {
  const [first] = corners;
  return (
    first !== undefined &&
    corners.every(
      (corner) =>
        corner?.outcome === first.outcome &&
        corner.first?.rule === first.first?.rule &&
        Math.sign(corner.margin ?? 0) === Math.sign(first.margin ?? 0),
    )
  );
}

/** Places of a grid, by their index, at a spacing in both directions. */
function everyPlace(side: number, size: number): number[] {
  const along = Array.from({ length: Math.ceil(side / size) }, (_, index) => index * size);
  return along.flatMap((row) => along.map((column) => row * side + column));
}

/** Places at a spacing, not looked at yet, in and about the blocks of twice that whose corners disagree. */
function turningPlaces(points: Points, side: number, size: number): number[] {
  const places = new Set<number>();
  const block = 2 * size;
  for (let row = 0; row + block < side; row += block)
    for (let column = 0; column + block < side; column += block) {
      const corners = cornersOf(points, side, { column, row, size: block });
      // A corner that was not looked at lies in a larger block that agrees.
      if (corners.includes(undefined) || agree(corners)) continue;
      for (const down of [0, size, block])
        for (const along of [0, size, block]) {
          const at = (row + down) * side + column + along;
          if (!points[at]) places.add(at);
        }
    }
  return [...places];
}

/** All places of a grid: those that were not looked at lie among ones that agree, or between those known so far. */
function filled(points: Points, side: number): WindowPoint[] {
  const copy = points.slice();
  for (let size = COARSE; size > 1; size /= 2) fill(copy, side, size);
  return copy.map((point) => point ?? { outcome: "cannot judge", margin: null, first: null });
}

/** Fills the middle places of blocks that were not looked at closer, from the two or four places about them. */
function fill(points: (WindowPoint | undefined)[], side: number, size: number): void {
  const half = size / 2;
  const between = (column: number, row: number, about: [number, number][]) => {
    const at = row * side + column;
    if (points[at]) return;
    const known = about.flatMap(([along, down]) => points[(row + down) * side + column + along] ?? []);
    const [first] = known;
    if (!first) return;
    const margins = known.flatMap(({ margin }) => margin ?? []);
    const mean = margins.reduce((sum, margin) => sum + margin, 0) / margins.length;
    points[at] = { ...first, margin: margins.length === known.length ? mean : null };
  };
  for (let row = 0; row < side; row += size)
    for (let column = half; column < side; column += size)
      between(column, row, [
        [-half, 0],
        [half, 0],
      ]);
  for (let row = half; row < side; row += size)
    for (let column = 0; column < side; column += half)
      between(column, row, [
        [0, -half],
        [0, half],
      ]);
}
