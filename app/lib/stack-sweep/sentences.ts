import { temperatureWords } from "../stack-words.ts";
import { inUnit, type SweepAnswer } from "./answers.ts";
import type { SweepAxis } from "./axis.ts";
import type { LimitCrossings } from "./crossings.ts";
import { inSentence } from "./in-sentence.ts";
import type { SweepInput } from "./inputs.ts";
import type { SweepLimit } from "./limits.ts";

/** A value of an input with its unit. */
export const inputText = ({ rule, unit }: Pick<SweepInput, "rule" | "unit">, value: number) =>
  inUnit(value, rule.dimension, unit);

/** What the stack itself comes to. */
export function ownSentence(
  axes: readonly SweepAxis[],
  answer: SweepAnswer,
  own: { value: number | null; curled: boolean; temperature: number },
): string {
  const values = axes.map(({ input }) => `${inSentence(input.label)} ${inputText(input, input.value)}`).join(" and ");
  const temperature = axes.some(({ input }) => input.key === "temperature")
    ? ""
    : `, ${temperatureWords(own.temperature)}`;
  const as = `As it is, ${values}${temperature}`;
  if (own.value === null) return `${as}: ${answer.none}.`;
  return `${as}, ${answer.noun} is ${answer.words(own.value)}${own.curled ? ", curled about one axis" : ""}.`;
}

/** Where an answer takes a limit along an input, as a sentence. `others`: what is held, and at which value. */
export function crossingSentence(
  axis: SweepAxis,
  answer: SweepAnswer,
  limit: SweepLimit,
  { at, aboveBefore, least, most }: LimitCrossings,
  others: readonly SweepInput[],
): string {
  const { input } = axis;
  const held = others.map((other) => `${inSentence(other.label)} ${inputText(other, other.value)}`).join(" and ");
  const begin = held === "" ? capital(answer.noun) : `With ${held}, ${answer.noun}`;
  const value = `${answer.words(limit.value)}${limit.of === "" ? "" : ` (${limit.of})`}`;
  const where = at.map((place) => `${inputText(input, place.value)}${place.jump ? " (it jumps past it there)" : ""}`);
  const last = where.pop();
  if (last === undefined) return nowhere(begin, value, axis, answer, { least, most });
  const places = where.length === 0 ? last : `${where.join(", ")} and ${last}`;
  const verb = at.every(({ jump }) => jump) ? "passes" : "reaches";
  const turn = at.length === 1 ? ` ${aboveBefore ? "Below" : "Above"} that it is more.` : "";
  return `${begin} ${verb} ${value} at ${placed(input, places)}.${turn}`;
}

/** 'at 84 µm of silicon', 'at temperature 150 °C'. */
const placed = ({ key, label }: SweepInput, places: string) =>
  key === "silicon" ? `${places} of silicon` : `${inSentence(label)} ${places}`;

function nowhere(
  begin: string,
  value: string,
  { input, from, to }: SweepAxis,
  answer: SweepAnswer,
  { least, most }: Pick<LimitCrossings, "least" | "most">,
): string {
  const range = `from ${inputText(input, from)} to ${inputText(input, to)}`;
  if (!least || !most) return `${begin} is nowhere to be told ${range}: ${answer.none}.`;
  const place = ({ input: at, value: found }: NonNullable<LimitCrossings["least"]>) =>
    `${answer.words(found)}, at ${inputText(input, at)}`;
  return `${begin} nowhere reaches ${value} ${range}: it is ${place(least)}, at least and ${place(most)}, at most.`;
}

const capital = (words: string) => words.charAt(0).toUpperCase() + words.slice(1);

/** From least to greatest over what is drawn. */
export function rangeSentence(values: readonly (number | null)[], answer: SweepAnswer): string {
  const known = values.filter((value) => value !== null);
  if (known.length === 0)
    return `Nowhere in this range is there ${answer.noun.replace(/^the /, "a ")}: ${answer.none}.`;
  const [least, most] = [Math.min(...known), Math.max(...known)];
  return answer.words(least) === answer.words(most)
    ? `Over this range ${answer.noun} stays at ${answer.words(most)}.`
    : `Over this range ${answer.noun} goes from ${answer.words(least)} to ${answer.words(most)}.`;
}
