import type { StackInput } from "#app/engine/stack/model.ts";
import { answerValue, type SweepAnswer } from "./answers.ts";
import { isOn, valuesOn, type SweepAxis } from "./axis.ts";
import { sweptPlace, type SweptPlace } from "./model.ts";

/** Cells of a curve. */
const CELLS = 160;
const HALVINGS = 40;

/** A place of a curve: the input, SI, with what is there. */
export type CurvePlace = SweptPlace & { at: number };

interface Stretch {
  from: number;
  to: number;
}

/** A stack over one of its inputs: places in ascending order, with those at which something ends or begins. */
export interface SweptCurve {
  places: CurvePlace[];
  /** where it is curled, SI */
  curled: Stretch[];
}

/**
 * Works out a curve by the full model: evenly spread places, those that are `wanted`, and the last ones before it begins to curl and
 * before the answer ends.
 */
export function sweptCurve(
  stack: StackInput,
  axis: SweepAxis,
  answer: SweepAnswer,
  wanted: readonly number[],
): SweptCurve {
  const look = (at: number): CurvePlace => ({ ...sweptPlace(axis.input.put(stack, at)), at });
  const values = [...valuesOn(axis, CELLS), ...wanted.filter((value) => isOn(axis, value))];
  const even = [...new Set(values)].toSorted((a, b) => a - b).map(look);
  const curls = ({ figures }: SweptPlace) => figures !== null && figures.load > 1;
  const has = ({ figures }: SweptPlace) => figures !== null && answerValue(answer, figures) !== null;
  const edged = withEdges(even, look, curls);
  const closer = [...edged, ...closerToOnset(edged, look, curls)].toSorted((a, b) => a.at - b.at);
  const places = withEdges(closer, look, has);
  return { places, curled: stretches(places, curls) };
}

/** Adds the two places between which something turns, wherever it does. */
function withEdges(
  places: readonly CurvePlace[],
  look: (at: number) => CurvePlace,
  is: (place: CurvePlace) => boolean,
): CurvePlace[] {
  return places.flatMap((place, n) => {
    const next = places[n + 1];
    if (!next || is(place) === is(next)) return [place];
    let [low, high] = [place, next];
    for (let halving = 0; halving < HALVINGS; halving += 1) {
      const at = (low.at + high.at) / 2;
      if (at <= low.at || at >= high.at) break;
      const middle = look(at);
      if (is(middle) === is(low)) low = middle;
      else high = middle;
    }
    return [place, low, high].filter((each, index, all) => each !== next && all.indexOf(each) === index);
  });
}

/** Where a wafer begins to curl its bend sets in like a square root: the curve needs more places there. */
const CLOSER = [1 / 256, 1 / 64, 1 / 16, 1 / 4];

/** More places on the curled side of every onset. */
function closerToOnset(
  places: readonly CurvePlace[],
  look: (at: number) => CurvePlace,
  curls: (place: CurvePlace) => boolean,
): CurvePlace[] {
  return places.flatMap((place, n) => {
    const next = places[n + 1];
    if (!next || curls(place) === curls(next)) return [];
    const [edge, further] = curls(place) ? [place, places[n - 1]] : [next, places[n + 2]];
    return further ? CLOSER.map((share) => look(edge.at + (further.at - edge.at) * share)) : [];
  });
}

/** Runs of neighbouring places of which something holds. */
function stretches(places: readonly CurvePlace[], holds: (place: CurvePlace) => boolean): Stretch[] {
  const found: Stretch[] = [];
  places.forEach((place, n) => {
    if (!holds(place)) return;
    const before = places[n - 1];
    const last = found.at(-1);
    if (last && before && holds(before)) last.to = place.at;
    else found.push({ from: place.at, to: place.at });
  });
  return found;
}

/** The curve of the answer, and the stretches over which it has none. */
export function answerCurve(
  { places }: SweptCurve,
  answer: SweepAnswer,
): { points: { x: number; y: number }[]; gaps: Stretch[] } {
  const points = places.flatMap(({ at, figures }) => {
    const y = figures && answerValue(answer, figures);
    return y === null ? [] : [{ x: at, y }];
  });
  const known = new Set(points.map(({ x }) => x));
  const gaps: Stretch[] = [];
  let last: number | null = null;
  let open = false;
  for (const { at } of places) {
    if (!known.has(at)) {
      open = true;
      continue;
    }
    if (open && last !== null) gaps.push({ from: last, to: at });
    [last, open] = [at, false];
  }
  return { points, gaps };
}
