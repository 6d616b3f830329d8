import { EngineInputError } from "../errors.ts";
import { requireWithin } from "../inputs.ts";
import { estimateStack, freeDisc } from "../stack/estimate-stack.ts";
import { withThickness, type StackFilm, type StackInput } from "../stack/model.ts";
import { solveFor, type InverseAnswer } from "./solve-for.ts";

/** Range in which silicon thickness is sought, m. */
export interface ThicknessRange {
  thinnest: number;
  thickest: number;
}

const warpOf = (stack: StackInput) => estimateStack(stack).shape.warp;

/**
 * Least silicon, m, at which the free wafer's warp keeps a limit (m) all the way from the thick end down to it. Films that
 * balance at one thickness can leave a further stretch within the limit: those ends are in `others`. Answers to 0.1 % of the
 * thickness and better; 'always below' means that the whole range keeps the limit.
 * @throws EngineInputError naming the input
 */
export function leastThickness(stack: StackInput, warpLimit: number, range: ThicknessRange): InverseAnswer {
  return solveFor({
    model: (thickness) => warpOf(withThickness(stack, thickness)),
    from: range.thickest,
    to: range.thinnest,
    target: requireLimit(warpLimit),
    samples: 160,
    logarithmic: true,
  });
}

/** What of a film is sought. */
export type FilmQuantity = "thickness" | "stress";

/** Place of a film in its stack, and what of it is sought. */
export interface SoughtFilm {
  at: number;
  quantity: FilmQuantity;
}

/** The stack with one quantity of one film changed. */
export function withFilm(stack: StackInput, film: SoughtFilm, value: number): StackInput {
  return {
    ...stack,
    films: stack.films.map((one, n) => (n === film.at ? { ...one, [film.quantity]: value } : one)),
  };
}

/**
 * Most of one film, by thickness (m) or by stress (Pa), that keeps the free wafer's warp within a limit (m), sought from `from`
 * to `to`. A film that first balances others has a first end at which the warp comes within the limit: `aboveAtFrom` is true
 * then, and `others` holds the end that is the most.
 * @throws EngineInputError naming the input
 */
export function mostFilm(
  stack: StackInput,
  film: SoughtFilm,
  warpLimit: number,
  range: { from: number; to: number },
): InverseAnswer {
  if (!stack.films[film.at])
    throw new EngineInputError("film", "is not in the stack", `0 to ${stack.films.length - 1}`);
  return solveFor({
    model: (value) => warpOf(withFilm(stack, film, value)),
    ...range,
    target: requireLimit(warpLimit),
    samples: 160,
    logarithmic: film.quantity === "thickness",
  });
}

/** A back-side film that makes the wafer flat at one temperature, and what is left at others. */
export interface Balance {
  answer: InverseAnswer;
  /** sagitta at each temperature with the answer, m, curvature's sign; empty without one */
  residual: { temperature: number; sagitta: number }[];
}

/** A film that is to be put on the back side, its thickness left open. */
export type BackFilm = Omit<StackFilm, "side" | "thickness">;

/** The stack with an outermost back-side film of a thickness (m). */
export function withBackFilm(stack: StackInput, film: BackFilm, thickness: number): StackInput {
  return { ...stack, films: [...stack.films, { ...film, side: "back", thickness }] };
}

/**
 * Thickness of an outermost back-side film, m, that makes the free wafer flat at the stack's temperature, and the sagitta that is
 * left at `others` (K), where the films no longer balance. With lines the mean of both directions is made flat.
 * @throws EngineInputError naming the input
 */
export function balancingFilm(
  stack: StackInput,
  film: BackFilm,
  range: ThicknessRange,
  others: readonly number[] = [],
): Balance {
  const answer = solveFor({
    model: (thickness) => freeDisc(withBackFilm(stack, film, thickness)).laminate.curvature,
    from: range.thinnest,
    to: range.thickest,
    target: 0,
    logarithmic: true,
  });
  if (answer.kind === "no answer") return { answer, residual: [] };
  const residual = others.map((temperature) => ({
    temperature,
    sagitta: estimateStack({ ...withBackFilm(stack, film, answer.value), temperature }).shape.bowMajor,
  }));
  return { answer, residual };
}

function requireLimit(limit: number): number {
  return requireWithin("warpLimit", limit, 1e-9, 1, "m");
}
