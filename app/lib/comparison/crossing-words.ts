import type { CrossingWords } from "#app/schemas/comparison.ts";
import { count } from "../count-words.ts";
import { lengthWords, limitWords, thicknessWords } from "../stack-words.ts";
import { warpCrossings, type Crossing, type PairOfWarps, type WarpCurve } from "./crossings.ts";

interface Range {
  from: number;
  to: number;
}

/** A curve with its letter, and the thicknesses that it is known for where those are not all of them, m. */
export interface LetteredCurve {
  letter: string;
  curve: WarpCurve;
  range?: Range;
}

/** Where each two of some curves are alike within a range: the numbered places, and a sentence for every pair. */
export function allCrossings(
  curves: readonly LetteredCurve[],
  range: Range,
): { marks: (Crossing & { number: number })[]; words: CrossingWords[] } {
  const marks: (Crossing & { number: number })[] = [];
  const words = curves.flatMap((first, n) =>
    curves.slice(n + 1).map((second): CrossingWords => {
      const shared = inCommon(range, first.range, second.range);
      const pair: PairOfWarps = shared ? warpCrossings(first.curve, second.curve, shared) : { kind: "no range" };
      const numbered = (pair.kind === "crossing" ? pair.at : []).map((at, index) => ({
        ...at,
        number: marks.length + index + 1,
      }));
      marks.push(...numbered);
      return {
        key: `${first.letter}${second.letter}`,
        numbers: numbered.map(({ number }) => number),
        sentence: pairSentence(first.letter, second.letter, pair, shared ?? range),
      };
    }),
  );
  return { marks, words };
}

/** The thicknesses that all of these have; null where there is as good as none. */
function inCommon(...ranges: readonly (Range | undefined)[]): Range | null {
  const known = ranges.filter((range) => range !== undefined);
  const from = Math.max(...known.map((range) => range.from));
  const to = Math.min(...known.map((range) => range.to));
  return to > from * 1.001 ? { from, to } : null;
}

/** Thicknesses at which two warps are alike need more than whole µm: they are read against each other. */
const crossedAt = ({ thickness, warp }: Crossing) => `${lengthWords(thickness)} (${lengthWords(warp)})`;

/** One pair in words: where their warps are equal, and which warps more where it is thin. */
export function pairSentence(first: string, second: string, pair: PairOfWarps, { from, to }: Range): string {
  const both = `${first} and ${second}`;
  if (pair.kind === "no range") return `${both} have no silicon thickness in common here.`;
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
