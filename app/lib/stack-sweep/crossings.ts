import { EngineInputError } from "#app/engine/errors.ts";
import { solveFor } from "#app/engine/inverse/solve-for.ts";
import type { StackInput } from "#app/engine/stack/model.ts";
import { answerValue, type SweepAnswer } from "./answers.ts";
import type { SweepAxis } from "./axis.ts";
import { sweptFigures } from "./figures.ts";

/** Where an answer takes a limit along one input, SI. */
export interface LimitCrossings {
  /** in ascending order; `jump`: it is on either side of the limit there, and never at it */
  at: { value: number; jump: boolean }[];
  /** whether the answer is above the limit just below the first place */
  aboveBefore: boolean;
  /** least and greatest that was met, and where; null where nothing could be computed */
  least: { input: number; value: number } | null;
  most: { input: number; value: number } | null;
}

/** Places that the answer is looked at first. */
const SAMPLES = 160;
/** Share of the limit within which a root is one, and not a jump past it. */
const AT_IT = 1e-5;

/**
 * Where an answer takes a limit along an input, the others as the stack has them: roots of the full model, to the last digit.
 */
export function limitCrossings(stack: StackInput, axis: SweepAxis, answer: SweepAnswer, limit: number): LimitCrossings {
  const { from, to, log, input } = axis;
  const known: { input: number; value: number }[] = [];
  const model = (value: number) => {
    const found = answerValue(answer, sweptFigures(input.put(stack, value)));
    if (found === null) throw new EngineInputError("answer", "means nothing here");
    known.push({ input: value, value: found });
    return found;
  };
  const solved = solveFor({ model, from, to, target: limit, samples: SAMPLES, logarithmic: log });
  const roots = solved.kind === "answer" ? [solved.value, ...solved.others] : [];
  const at = roots.flatMap((value) => {
    const here = answerOrNone(answer, input.put(stack, value));
    // An answer that ends between two places is on no side of the limit at its end.
    if (here === null) return [];
    return [{ value, jump: Math.abs(here - limit) > AT_IT * Math.max(Math.abs(limit), Number.MIN_VALUE) }];
  });
  const extreme = (further: (a: number, b: number) => boolean) =>
    known.reduce<{ input: number; value: number } | null>(
      (best, next) => (best === null || further(next.value, best.value) ? next : best),
      null,
    );
  return {
    at,
    aboveBefore: solved.kind === "answer" && solved.aboveAtFrom,
    least: extreme((a, b) => a < b),
    most: extreme((a, b) => a > b),
  };
}

function answerOrNone(answer: SweepAnswer, stack: StackInput): number | null {
  try {
    return answerValue(answer, sweptFigures(stack));
  } catch (error) {
    if (error instanceof EngineInputError) return null;
    throw error;
  }
}
