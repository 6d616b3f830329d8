import { solveFor } from "#app/engine/inverse/solve-for.ts";
import type { StackInput } from "#app/engine/stack/model.ts";
import { LEAST_DRAWN } from "../stack-chart.ts";
import { warpAt } from "./figures.ts";

/** A thickness at which two stacks warp alike, m. */
export interface Crossing {
  thickness: number;
  warp: number;
}

/** How the warps of two stacks lie to each other over a range of thickness. `thinner` warps more at its thin end. */
export type PairOfWarps =
  | { kind: "the same" }
  | { kind: "apart"; thinner: "first" | "second" }
  | { kind: "crossing"; thinner: "first" | "second"; at: Crossing[] };

interface Range {
  from: number;
  to: number;
}

/** Places at which the difference is looked at before it is halved. */
const SAMPLES = 120;
/** Share of the warp below which a difference is none. */
const ALIKE = 1e-7;

/** The warp of a stack as a function of its thickness, which remembers: every pair asks at the same places. */
export function warpCurve(stack: StackInput): (thickness: number) => { warp: number; rolledUp: boolean } {
  const known = new Map<number, { warp: number; rolledUp: boolean }>();
  return (thickness) => {
    const found = known.get(thickness) ?? warpAt(stack, thickness);
    known.set(thickness, found);
    return found;
  };
}

type Curve = ReturnType<typeof warpCurve>;

/**
 * Where two stacks warp alike, thinnest first: the root of the difference of their full models, to the last digit. Not counted are
 * places where one of them snaps past the other, so that both are never alike, where both are as good as flat, and where both are
 * rolled past half a turn.
 * @throws EngineInputError when the range is empty
 */
export function warpCrossings(first: Curve, second: Curve, { from, to }: Range): PairOfWarps {
  const difference = (thickness: number) => first(thickness).warp - second(thickness).warp;
  const alike = (thickness: number) => {
    const [one, other] = [first(thickness).warp, second(thickness).warp];
    return Math.abs(one - other) <= ALIKE * Math.max(one, other, LEAST_DRAWN);
  };
  const places = Array.from({ length: SAMPLES }, (_, n) => from * (to / from) ** (n / (SAMPLES - 1)));
  if (places.every(alike)) return { kind: "the same" };
  const answer = solveFor({ model: difference, from, to, target: 0, samples: SAMPLES, logarithmic: true });
  const roots = answer.kind === "answer" ? [answer.value, ...answer.others] : [];
  const at = roots
    .filter(alike)
    .map((thickness) => ({ thickness, ...first(thickness) }))
    .filter(({ warp, rolledUp }) => warp >= LEAST_DRAWN && !rolledUp)
    .map(({ thickness, warp }) => ({ thickness, warp }))
    .toSorted((a, b) => a.thickness - b.thickness);
  const apart = places.find((place) => !alike(place)) ?? from;
  const thinner = difference(apart) > 0 ? "first" : "second";
  return at.length === 0 ? { kind: "apart", thinner } : { kind: "crossing", thinner, at };
}
