import type { FlowChange } from "../trial/change.ts";
import type { Outcome } from "../vocabulary.ts";
import { outcomeRank } from "../vocabulary.ts";
import type { Candidate, Range } from "./candidates.ts";
import { better, standingAfter, type Place, type Standing, type Trials } from "./try-change.ts";

/** A change with how the rule then judges the step. */
export interface TriedChange {
  change: FlowChange;
  standing: Standing;
  /** how much it changes, as a share of what was planned; a choice counts as a quarter, a film that was not there as a half */
  size: number;
}

/** What a candidate came to: the smallest change that reaches the outcome, or the one that got nearest to it. */
export interface CandidateAnswer {
  reached: TriedChange | null;
  nearest: TriedChange | null;
}

const CHOICE_SIZE = 0.25;
const NEW_FILM_SIZE = 0.5;
/** Share of the way at which a range is looked at: a figure that turns back may pass in the middle and fail at the end. */
const LOOKED_AT = [1, 0.5, 0.2];
const HALVINGS = 12;

/** The smallest change of a candidate with which the rule judges the step no worse than `wanted`. */
export function smallestChange(trials: Trials, place: Place, candidate: Candidate, wanted: Outcome): CandidateAnswer {
  const good = ({ outcome }: Standing) => outcomeRank(outcome) <= outcomeRank(wanted);
  if (candidate.kind === "choice") {
    const standing = standingAfter(trials, place, [candidate.change]);
    const tried = standing && { change: candidate.change, standing, size: CHOICE_SIZE };
    return { reached: tried && good(tried.standing) ? tried : null, nearest: tried };
  }
  const at = (value: number) => tryValue(trials, place, candidate, value);
  let nearest: TriedChange | null = null;
  for (const share of LOOKED_AT) {
    const value = candidate.from + (candidate.to - candidate.from) * share;
    const tried = at(value);
    if (!tried) continue;
    if (!nearest || better(tried.standing, nearest.standing)) nearest = tried;
    if (good(tried.standing)) return { reached: shrink(at, good, candidate, { value, tried }), nearest };
  }
  return { reached: null, nearest };
}

function tryValue(trials: Trials, place: Place, candidate: Range, value: number): TriedChange | null {
  const change = candidate.change(value);
  const standing = standingAfter(trials, place, [change]);
  const size = candidate.from === 0 ? NEW_FILM_SIZE : Math.abs(value / candidate.from - 1);
  return standing && { change, standing, size };
}

/** From a value that reaches the outcome back towards what is planned, and then to a round figure that still does. */
function shrink(
  at: (value: number) => TriedChange | null,
  good: (standing: Standing) => boolean,
  { from }: Range,
  found: { value: number; tried: TriedChange },
): TriedChange {
  let [bad, best] = [from, found];
  for (let halving = 0; halving < HALVINGS; halving += 1) {
    const middle = (bad + best.value) / 2;
    const tried = at(middle);
    if (tried && good(tried.standing)) best = { value: middle, tried };
    else bad = middle;
  }
  for (const digits of [2, 3, 4]) {
    const rounded = roundAway(best.value, from, digits);
    const tried = between(rounded, best.value, found.value) ? at(rounded) : null;
    if (tried && good(tried.standing)) return tried;
  }
  return best.tried;
}

const between = (value: number, one: number, other: number) =>
  value >= Math.min(one, other) && value <= Math.max(one, other);

/** Rounded to some digits, away from what is planned. Temperatures are rounded on their own scale, to whole kelvin from 0.15. */
function roundAway(value: number, from: number, digits: number): number {
  if (value === 0) return 0;
  const celsius = value > 200 && from > 200 && from < 2000 ? 273.15 : 0;
  const shown = value - celsius;
  const step = celsius ? 10 ** (3 - digits) : 10 ** (Math.floor(Math.log10(Math.abs(shown))) - digits + 1);
  const rounded = (value > from ? Math.ceil(shown / step) : Math.floor(shown / step)) * step;
  return Number((rounded + celsius).toPrecision(12));
}
