import { EngineInputError } from "../errors.ts";
import { requireFinite } from "../inputs.ts";

/** A question: at which input does a figure take a value? */
export interface InverseQuestion {
  /** the figure as a function of the input; an EngineInputError means that it does not exist there */
  model: (input: number) => number;
  /** range of the input; the search begins at `from`, which may be the larger end */
  from: number;
  to: number;
  target: number;
  /** places at which the figure is looked at first, default 96; roots closer than their spacing show as a turn of the figure */
  samples?: number;
  /** spreads the places evenly over powers of ten; both ends positive */
  logarithmic?: boolean;
}

/** Why there is no answer. */
export type NoAnswer = "always above" | "always below" | "cannot be computed";

export type InverseAnswer =
  | {
      kind: "answer";
      /** the input nearest to `from` */
      value: number;
      /** further inputs with the same figure, in the order of the search: the figure is not monotone */
      others: number[];
      /** whether the figure lies above the target at `from` */
      aboveAtFrom: boolean;
    }
  | {
      kind: "no answer";
      why: NoAnswer;
      /** least and largest figure found, and the inputs where they are; null when there is none */
      least: { input: number; value: number } | null;
      most: { input: number; value: number } | null;
    };

interface Sample {
  input: number;
  /** figure less target */
  off: number;
}

const SAMPLES = 96;
const MOST_HALVINGS = 200;

/**
 * All inputs at which a figure takes a value, the one nearest to `from` first. Looked at in `samples` places, bracketed between
 * those where it changes side, and halved down to the last digit, so every answer is one to far better than 0.1 %. Where
 * the figure turns back between two places without changing side, the turn is sought out, so a pair of close roots is found
 * unless the figure turns twice there.
 * @throws EngineInputError when the range is empty or the target is no number
 */
export function solveFor(question: InverseQuestion): InverseAnswer {
  const { from, to, target, logarithmic = false } = question;
  requireFinite("target", target);
  if (requireFinite("from", from) === requireFinite("to", to) || (logarithmic && !(from > 0 && to > 0)))
    throw new EngineInputError(
      "range",
      "the range of the input is empty",
      "two different ends, positive if logarithmic",
    );
  const off = (input: number) => figureOff(question, input);
  const found = places(question).map((input): Sample => ({ input, off: off(input) }));
  const known = found.filter((sample) => Number.isFinite(sample.off));
  const roots: number[] = [];
  const add = (root: number) => {
    if (roots.at(-1) !== root) roots.push(root);
  };
  known.forEach((here, n) => {
    const [before, after] = [known[n - 1], known[n + 1]];
    if (here.off === 0) add(here.input);
    if (!after) return;
    if (here.off * after.off < 0) {
      add(halve(off, here, after));
    } else if (before && turnsTowardsZero(before, here, after)) {
      const turn = extremum(off, before, after, Math.sign(here.off));
      if (turn.off * here.off > 0) return;
      add(halve(off, before, turn));
      if (turn.off !== 0) add(halve(off, turn, after));
    }
  });
  const first = known[0];
  const [value, ...others] = roots;
  if (first && value !== undefined) return { kind: "answer", value, others, aboveAtFrom: first.off > 0 };
  return noAnswer(known, target);
}

function noAnswer(known: Sample[], target: number): InverseAnswer {
  const figure = ({ input, off }: Sample) => ({ input, value: off + target });
  const [first, ...rest] = known;
  if (!first) return { kind: "no answer", why: "cannot be computed", least: null, most: null };
  const least = rest.reduce((low, next) => (next.off < low.off ? next : low), first);
  const most = rest.reduce((high, next) => (next.off > high.off ? next : high), first);
  const why = first.off > 0 ? "always above" : "always below";
  return { kind: "no answer", why, least: figure(least), most: figure(most) };
}

function figureOff({ model, target }: InverseQuestion, input: number): number {
  try {
    return model(input) - target;
  } catch (error) {
    if (error instanceof EngineInputError) return NaN;
    throw error;
  }
}

function places({ from, to, samples = SAMPLES, logarithmic = false }: InverseQuestion): number[] {
  const last = Math.max(2, Math.round(samples)) - 1;
  return Array.from({ length: last + 1 }, (_, n) => {
    if (n === 0) return from;
    if (n === last) return to;
    return logarithmic ? from * (to / from) ** (n / last) : from + ((to - from) * n) / last;
  });
}

function turnsTowardsZero(before: Sample, here: Sample, after: Sample): boolean {
  const same = before.off * here.off > 0 && here.off * after.off > 0;
  return same && Math.abs(here.off) <= Math.abs(before.off) && Math.abs(here.off) < Math.abs(after.off);
}

/** Root between two places on different sides, by halving: slow, safe, exact to the last digit. */
function halve(off: (input: number) => number, one: Sample, other: Sample): number {
  let [low, high] = [one, other];
  for (let n = 0; n < MOST_HALVINGS; n += 1) {
    const middle = (low.input + high.input) / 2;
    if (middle === low.input || middle === high.input) break;
    const value = off(middle);
    if (value === 0) return middle;
    if (Number.isFinite(value) && value * low.off < 0) high = { input: middle, off: value };
    else low = { input: middle, off: value };
    if (Math.abs(high.input - low.input) <= 1e-13 * Math.abs(middle)) break;
  }
  return (low.input + high.input) / 2;
}

const GOLDEN = (Math.sqrt(5) - 1) / 2;

/** Where a figure that turns between two places comes nearest to zero, or the first place beyond zero. */
function extremum(off: (input: number) => number, one: Sample, other: Sample, sign: number): Sample {
  const height = (input: number) => sign * off(input);
  let [low, high] = [one.input, other.input];
  for (let n = 0; n < 60; n += 1) {
    const [left, right] = [high - GOLDEN * (high - low), low + GOLDEN * (high - low)];
    const [atLeft, atRight] = [height(left), height(right)];
    if (atLeft <= 0) return { input: left, off: sign * atLeft };
    if (atRight <= 0) return { input: right, off: sign * atRight };
    if (atLeft < atRight) high = right;
    else low = left;
  }
  const middle = (low + high) / 2;
  return { input: middle, off: off(middle) };
}
