import type { CrossingWords } from "#app/schemas/stack-comparison.ts";
import { count } from "../count-words.ts";
import { lengthWords, limitWords, thicknessWords } from "../stack-words.ts";
import { warpCrossings, warpCurve, type Crossing, type PairOfWarps } from "./crossings.ts";
import type { ComparedStack } from "./figures.ts";

interface Range {
  from: number;
  to: number;
}

/** Where each two of the stacks warp alike within a range: the numbered places, and a sentence for every pair. */
export function allCrossings(
  stacks: readonly ComparedStack[],
  range: Range,
): { marks: (Crossing & { number: number })[]; words: CrossingWords[] } {
  const known = stacks.flatMap(({ letter, figures }) => (figures ? [{ letter, curve: warpCurve(figures.stack) }] : []));
  const marks: (Crossing & { number: number })[] = [];
  const words = known.flatMap((first, n) =>
    known.slice(n + 1).map((second): CrossingWords => {
      const pair = warpCrossings(first.curve, second.curve, range);
      const numbered = (pair.kind === "crossing" ? pair.at : []).map((at, index) => ({
        ...at,
        number: marks.length + index + 1,
      }));
      marks.push(...numbered);
      return {
        key: `${first.letter}${second.letter}`,
        numbers: numbered.map(({ number }) => number),
        sentence: pairSentence(first.letter, second.letter, pair, range),
      };
    }),
  );
  return { marks, words };
}

/** Thicknesses at which two warps are alike need more than whole µm: they are read against each other. */
const crossedAt = ({ thickness, warp }: Crossing) => `${lengthWords(thickness)} (${lengthWords(warp)})`;

/** One pair in words: where their warps are equal, and which warps more where it is thin. */
export function pairSentence(first: string, second: string, pair: PairOfWarps, { from, to }: Range): string {
  const both = `${first} and ${second}`;
  if (pair.kind === "rolled up")
    return `${both} cannot be told apart up to ${thicknessWords(to)}: one of them is rolled past half a turn.`;
  const rolled = pair.from > from ? ` Below ${limitWords(pair.from)} one of them is rolled past half a turn.` : "";
  const end = limitWords(pair.from);
  const range = `from ${end} to ${thicknessWords(to)}`;
  if (pair.kind === "the same") return `${both} warp the same ${range}.${rolled}`;
  const more = pair.thinner === "first" ? first : second;
  if (pair.kind === "apart") return `${both} are nowhere equal ${range}: ${more} warps more at ${end}.${rolled}`;
  const places = pair.at.map(crossedAt);
  const last = places.pop() ?? "";
  const where = places.length === 0 ? last : `${places.join(", ")} and ${last}`;
  const times = pair.at.length === 1 ? "" : ` ${count(pair.at.length)} times,`;
  const than = pair.at.length === 1 ? "that" : "the first of these";
  return `${both} warp alike${times} at ${where}. Thinner than ${than}, ${more} warps more.${rolled}`;
}
