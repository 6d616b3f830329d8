import type { StackInput } from "#app/engine/stack/model.ts";
import { contours, type ContourPoint, type FindCrossing } from "#app/engine/window/contours.ts";
import { answerValue, type SweepAnswer } from "./answers.ts";
import { valueAt, type SweepAxis } from "./axis.ts";
import type { SweptFigures } from "./figures.ts";
import { sweptPlace, type SweptPlace } from "./model.ts";

/** Cells along each side of a map. */
export const MAP_CELLS = 40;
/** A crossing is sought until it lies within this share of a cell's side: a cell is some 16 px. */
const CLOSE = 1 / 50;
const MOST_STEPS = 30;

/** A map of a stack over two of its inputs; the places row by row, x running fastest. */
export interface SweptMap {
  places: SweptPlace[];
  /** the stack with both inputs at shares, 0 to 1, of their axes */
  stackAt: (x: number, y: number) => StackInput;
  /** what is there; remembered, since a line and the outline that runs along it look at the same places */
  look: (x: number, y: number) => SweptPlace;
}

/** Works out every place of the grid by the full model. */
export function sweptMap(stack: StackInput, x: SweepAxis, y: SweepAxis): SweptMap {
  const stackAt = (alongX: number, alongY: number) =>
    y.input.put(x.input.put(stack, valueAt(x, alongX)), valueAt(y, alongY));
  const known = new Map<string, SweptPlace>();
  const look = (alongX: number, alongY: number) => {
    const key = `${alongX} ${alongY}`;
    const place = known.get(key) ?? sweptPlace(stackAt(alongX, alongY));
    known.set(key, place);
    return place;
  };
  const places = GRID.flatMap((row) => GRID.map((column) => sweptPlace(stackAt(shareOf(column), shareOf(row)))));
  return { places, stackAt, look };
}

/** Cells are counted from 1, so that no crossing lies at zero, where pieces that meet could not be told by their digits. */
const GRID = Array.from({ length: MAP_CELLS + 1 }, (_, n) => n + 1);
const shareOf = (cell: number) => (cell - 1) / MAP_CELLS;

/** A figure whose lines are drawn. `folded`: it has no sign, and comes down to zero in a cusp where the bend turns over. */
export interface Field {
  of: (figures: SweptFigures) => number | null;
  folded: boolean;
}

/** A field that is straight through zero, with a level on either side of it. */
type Straight = (figures: SweptFigures) => number | null;

function unfolded({ of, folded }: Field): Straight[] {
  if (!folded) return [of];
  return ([1, -1] as const).map((way) => (figures) => {
    const value = of(figures);
    return value === null ? null : way * figures.side * value;
  });
}

/**
 * Lines on which a field of a map takes a level, in shares of its axes; where they cross the sides of the cells is found on the
 * full model, to a fraction of a pixel.
 */
export function levelLines({ places, look }: SweptMap, field: Field, level: number): ContourPoint[][] {
  return unfolded(field).flatMap((straight) => {
    const values = places.map(({ figures }) => figures && finite(straight(figures)));
    return contours(GRID, GRID, values, level, crossingOf(look, straight, level)).map(inShares);
  });
}

/** The part of a map where a field is above a level, as closed outlines: along its lines and the map's own edge. */
export function regionAbove({ places, look }: SweptMap, field: Field, level: number): ContourPoint[][] {
  // A ring about the map, on its edge, that lies below the level closes what runs out of it.
  const [first = 1, last = 1] = [GRID[0], GRID.at(-1)];
  const ringed = [first, ...GRID, last];
  const side = GRID.length;
  const below = level - 1;
  return unfolded(field).flatMap((straight) => {
    const values = ringed.flatMap((_, row) =>
      ringed.map((__, column) => {
        if (row === 0 || column === 0 || row > side || column > side) return below;
        const figures = places[(row - 1) * side + column - 1]?.figures;
        return (figures && finite(straight(figures))) ?? below;
      }),
    );
    const find = crossingOf(look, straight, level);
    return contours(ringed, ringed, values, level, (one, other) =>
      one.x === other.x && one.y === other.y ? { x: one.x, y: one.y } : find(one, other),
    ).map(inShares);
  });
}

const finite = (value: number | null) => (value === null || !Number.isFinite(value) ? null : value);

const inShares = (line: readonly ContourPoint[]) => line.map(({ x, y }) => ({ x: shareOf(x), y: shareOf(y) }));

/**
 * Finds a crossing on the full model: by false position, each guess taken a little beyond the root, so that it soon lies between
 * two places that are close together.
 */
function crossingOf(look: SweptMap["look"], field: Straight, level: number): FindCrossing {
  return (one, other) => {
    const at = (share: number) => ({ x: one.x + (other.x - one.x) * share, y: one.y + (other.y - one.y) * share });
    let [low, high] = [
      { share: 0, off: one.off },
      { share: 1, off: other.off },
    ];
    const root = () => low.share + ((high.share - low.share) * low.off) / (low.off - high.off);
    for (let step = 0; step < MOST_STEPS && high.share - low.share > 2 * CLOSE; step += 1) {
      // False position may creep along a bent curve: now and then the stretch is halved.
      const guess = step % 4 === 3 ? (low.share + high.share) / 2 : root();
      const beyond = guess - low.share < high.share - guess ? guess + CLOSE : guess - CLOSE;
      const place = at(beyond);
      const { figures } = look(shareOf(place.x), shareOf(place.y));
      const value = figures && finite(field(figures));
      if (value === null) return at(guess);
      const here = { share: beyond, off: value - level };
      const [toLow = 1, toHigh = 1] = [low, high].map((end) =>
        Math.abs((here.off * (here.share - end.share)) / (here.off - end.off)),
      );
      if (here.off > 0 === low.off > 0) low = here;
      else high = here;
      // By the chords to both ends it is close: the slope of a curve that bends one way lies between theirs.
      if (Math.max(toLow, toHigh) < CLOSE) break;
    }
    return at(root());
  };
}

/** The answer at every place, null where it has none. */
export const mapValues = ({ places }: SweptMap, answer: SweepAnswer): (number | null)[] =>
  places.map(({ figures }) => figures && answerValue(answer, figures));
