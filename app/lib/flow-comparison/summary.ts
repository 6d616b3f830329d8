import type { ComparedFlow } from "./figures.ts";

/** The answer of a comparison of flows in sentences: what each comes to, which has most room, and which cannot be walked. */
export function flowSummary(flows: readonly ComparedFlow[]): string[] {
  const walked = flows.flatMap(({ letter, figures }) => (figures ? [{ letter, ...figures }] : []));
  const verdicts = walked.map(({ letter, result: { verdict, steps } }) => {
    const title = steps.find(({ number }) => number === verdict.step)?.title;
    return title === undefined || verdict.outcome === "caution"
      ? `${letter} ${verdict.outcome}`
      : `${letter} ${verdict.outcome}, first at step ${verdict.step}, ${title}`;
  });
  const used = walked
    .flatMap(({ letter, deciding }) =>
      deciding?.limit ? [{ letter, share: deciding.warp / deciding.limit.value, step: deciding.judgedAt }] : [],
    )
    .toSorted((a, b) => a.share - b.share);
  const [least, most] = [used[0], used.at(-1)];
  const percent = ({ share }: { share: number }) => `${Math.round(100 * share)}\u00A0%`;
  const sentences = verdicts.length > 0 ? [`${verdicts.join("; ")}.`] : [];
  if (least && most && least !== most)
    sentences.push(
      percent(least) === percent(most)
        ? `At their tightest steps all use ${percent(least)} of their limit.`
        : `Most room at its tightest step: ${least.letter}, ${percent(least)} of the limit at step ${least.step}; least: ${most.letter}, ${percent(most)} at step ${most.step}.`,
    );
  const lacking = flows.filter(({ figures }) => !figures).map(({ letter }) => letter);
  if (lacking.length > 0) sentences.push(`Cannot be walked: ${lacking.join(", ")}.`);
  return sentences;
}
