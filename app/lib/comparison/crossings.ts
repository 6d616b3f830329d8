import { solveFor } from "#app/engine/inverse/solve-for.ts";
import { LEAST_DRAWN } from "../stack-chart.ts";

/** A thickness at which two wafers warp alike, m. */
export interface Crossing {
  thickness: number;
  warp: number;
}

/**
 * How two warps lie to each other over a range of thickness, as far as neither is rolled past half a turn, where a warp
 * means nothing: from `from` on (m). `thinner` warps more at that end. `no range`: they have no thickness in common.
 */
export type PairOfWarps =
  | { kind: "no range" }
  | { kind: "rolled up" }
  | { kind: "the same"; from: number }
  | { kind: "apart"; from: number; thinner: "first" | "second" }
  | { kind: "crossing"; from: number; thinner: "first" | "second"; at: Crossing[] };

interface Range {
  from: number;
  to: number;
}

/** Places at which the difference is looked at before it is halved. */
const SAMPLES = 120;
/** How often the stretch between two of them is halved for the end of a roll. */
const HALVINGS = 30;
/** Share of the warp below which a difference is none. */
const ALIKE = 1e-7;

/** A warp as a function of silicon thickness, m. */
export type WarpCurve = (thickness: number) => { warp: number; rolledUp: boolean };

/** The same curve, which remembers: every pair asks at the same places. */
export function remembered<Warp extends ReturnType<WarpCurve>>(
  curve: (thickness: number) => Warp,
): (thickness: number) => Warp {
  const known = new Map<number, Warp>();
  return (thickness) => {
    const found = known.get(thickness) ?? curve(thickness);
    known.set(thickness, found);
    return found;
  };
}

/**
 * Where two warps are alike, thinnest first: the root of the difference of their full models, to the last digit. Not counted are
 * places where one of them snaps past the other, so that both are never alike, and where both are as good as flat.
 * @throws EngineInputError when the range is empty
 */
export function warpCrossings(first: WarpCurve, second: WarpCurve, range: Range): PairOfWarps {
  const from = meaningfulFrom((thickness) => first(thickness).rolledUp || second(thickness).rolledUp, range);
  if (from === null) return { kind: "rolled up" };
  const difference = (thickness: number) => first(thickness).warp - second(thickness).warp;
  const alike = (thickness: number) => {
    const [one, other] = [first(thickness).warp, second(thickness).warp];
    return Math.abs(one - other) <= ALIKE * Math.max(one, other, LEAST_DRAWN);
  };
  const unlike = placesIn({ ...range, from }).find((place) => !alike(place));
  if (unlike === undefined) return { kind: "the same", from };
  const thinner = difference(unlike) > 0 ? "first" : "second";
  const answer = solveFor({ model: difference, from, to: range.to, target: 0, samples: SAMPLES, logarithmic: true });
  const roots = answer.kind === "answer" ? [answer.value, ...answer.others] : [];
  const at = roots
    .filter(alike)
    .map((thickness) => ({ thickness, warp: first(thickness).warp }))
    .filter(({ warp }) => warp >= LEAST_DRAWN)
    .toSorted((a, b) => a.thickness - b.thickness);
  return at.length === 0 ? { kind: "apart", from, thinner } : { kind: "crossing", from, thinner, at };
}

const placesIn = ({ from, to }: Range) =>
  Array.from({ length: SAMPLES }, (_, n) => (n === SAMPLES - 1 ? to : from * (to / from) ** (n / (SAMPLES - 1))));

/** The thin end of the stretch, seen from the thick end of the range, over which nothing is rolled up; null when all of it is. */
function meaningfulFrom(rolledUp: (thickness: number) => boolean, range: Range): number | null {
  const places = placesIn(range);
  const last = places.findLastIndex(rolledUp);
  if (last < 0) return range.from;
  let [rolled, open] = [places[last] ?? range.from, places[last + 1]];
  if (open === undefined) return null;
  for (let n = 0; n < HALVINGS; n += 1) {
    const middle = Math.sqrt(rolled * open);
    if (rolledUp(middle)) rolled = middle;
    else open = middle;
  }
  return open < range.to ? open : null;
}
