import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { bareFrom, lengthWords, limitWords, shapeWords, thicknessWords } from "../stack-words.ts";
import type { ComparedStack } from "./figures.ts";

/** The answer of a comparison in sentences: what each does at its own thickness, and which may be thinned farthest bare. */
export function comparisonSummary(stacks: readonly ComparedStack[], temperature: string, limits: SiteLimits): string[] {
  const known = stacks.flatMap(({ letter, figures }) => (figures ? [{ letter, ...figures.estimated }] : []));
  const lacking = stacks.filter(({ figures }) => !figures).map(({ letter }) => letter);
  const warps = known.toSorted((a, b) => a.answer.shape.warp_m - b.answer.shape.warp_m);
  const [least, most] = [warps[0], warps.at(-1)];
  const sentences: string[] = [];
  if (least && most && least !== most) {
    const at = (each: typeof least) =>
      `${each.letter} at ${thicknessWords(each.request.wafer.thickness_m)} ${lies(shapeWords(each.answer.shape, limits.flatWithin.value))}`;
    sentences.push(
      lengthWords(least.answer.shape.warp_m) === lengthWords(most.answer.shape.warp_m)
        ? `At ${temperature}, free, all warp by ${lengthWords(least.answer.shape.warp_m)} at their own thickness.`
        : `At ${temperature}, free, ${at(least)}; ${at(most)}.`,
    );
  }
  const bare = bareSentence(known.map((each) => ({ letter: each.letter, from: bareFrom(each, limits) })));
  if (bare) sentences.push(bare);
  if (lacking.length > 0) sentences.push(`Cannot be estimated: ${lacking.join(", ")}.`);
  return sentences;
}

const lies = (words: string) => (words.startsWith("rolls") ? words : `lies ${words}`);

function bareSentence(found: readonly { letter: string; from: number | null }[]): string | null {
  const limits = found.flatMap(({ letter, from }) => (from === null ? [] : [{ letter, from: limitWords(from) }]));
  const [first] = limits;
  if (!first || limits.length < 2) return null;
  if (limits.every(({ from }) => from === first.from)) return `All may be lifted bare down to ${first.from}.`;
  return `Bare down to: ${limits.map(({ letter, from }) => `${letter} ${from}`).join(", ")}.`;
}
