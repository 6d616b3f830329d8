import type { Movement, OutOfDate } from "#app/schemas/assessment-changes.ts";
import type { AnswerSummary } from "./result-comparison.ts";

/** 'Out of date: 2 inputs have changed since 2026-12-01, and engine 0.2.0 has come in place of 0.1.0'. */
export function outOfDateTitle(changed: Pick<OutOfDate, "engine" | "changes"> | null, createdAt: string): string {
  const since = createdAt.slice(0, 10);
  if (!changed) return `Out of date: the flow, or something that it uses, has changed since ${since}`;
  const { changes, engine } = changed;
  const inputs =
    changes.length === 0
      ? null
      : `${changes.length === 1 ? "one input has" : `${changes.length} inputs have`} changed since ${since}`;
  const newer = engine && `engine ${engine.to} has come in place of ${engine.from}`;
  return `Out of date: ${[inputs, newer].filter(Boolean).join(", and ")}`;
}

/** How far the answer moves, in one or two sentences. */
export function movementSentence(movement: Movement): string {
  if (movement.outcome === "not computable")
    return `As it is now nothing can be computed: ${movement.step === null ? "" : `step ${movement.step}, `}${movement.reason}.`.replace(
      /\.\.$/,
      ".",
    );
  const { before, after, moved } = movement;
  const verdict =
    before.outcome === after.outcome
      ? `The verdict stays ${placed(before) === placed(after) ? placed(before) : `${before.outcome}, now ${after.where ?? "at no step"}`}`
      : `The verdict goes from ${before.outcome} to ${placed(after)}`;
  const steps =
    moved.length === 0
      ? "no step’s finding or support changes"
      : moved.length === 1
        ? "one step’s finding or support changes"
        : `finding or support changes at ${moved.length} steps`;
  return [`${verdict}; ${steps}.`, tightestSentence(before, after), movement.slots].filter(Boolean).join(" ");
}

const placed = ({ outcome, where }: AnswerSummary) => (where === null ? outcome : `${outcome}, ${where}`);

/** 'Tightest: from 102 ± 12 µm at step 5, 68 % of its limit, to …'. */
function tightestSentence({ tightest: before }: AnswerSummary, { tightest: after }: AnswerSummary): string {
  if (!before || !after) return "";
  const was = `${before.warp} at step ${before.step}, ${before.share} of its limit`;
  const is = `${after.warp} at step ${after.step}, ${after.share}`;
  return before.warp === after.warp && before.step === after.step && before.share === after.share
    ? `Tightest, as before: ${was}.`
    : `Tightest: from ${was}, to ${is}.`;
}
