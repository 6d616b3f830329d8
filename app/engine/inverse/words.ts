import { formatQuantity } from "../units/format.ts";
import type { Dimension } from "../units/dimensions.ts";
import type { InverseAnswer } from "./solve-for.ts";

/** How a figure and an input of a question are shown. */
export interface Wording {
  /** such as 'warp' */
  figure: string;
  /** such as 'silicon thickness' */
  input: string;
  figureDimension: Dimension;
  inputDimension: Dimension;
}

/** What a question came to, in a sentence: the answer with what else solves it, or why there is none. */
export function answerInWords(answer: InverseAnswer, wording: Wording): string {
  const figure = (value: number) => formatQuantity(value, wording.figureDimension, { significant: 3 });
  const input = (value: number) => formatQuantity(value, wording.inputDimension, { significant: 4 });
  if (answer.kind === "answer") {
    const { value, others } = answer;
    if (others.length === 0) return `${capital(wording.input)} ${input(value)}.`;
    return `${capital(wording.input)} ${input(value)}. The ${wording.figure} is not monotone: it takes the same value at ${others.map(input).join(", ")}.`;
  }
  const { why, least, most } = answer;
  if (!least || !most) return `No answer: the ${wording.figure} cannot be computed anywhere in the range.`;
  return why === "always above"
    ? `No answer: the ${wording.figure} is above it everywhere in the range, least ${figure(least.value)} at ${input(least.input)}.`
    : `No answer: the ${wording.figure} is below it everywhere in the range, most ${figure(most.value)} at ${input(most.input)}.`;
}

const capital = (text: string) => text.charAt(0).toUpperCase() + text.slice(1);
