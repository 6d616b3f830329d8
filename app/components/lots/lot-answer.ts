import type { SubmissionResult } from "@conform-to/react";

/** What the page of a lot answers when one of its forms was not taken: which one, and for which hold or stop. */
export type LotAnswer = { intent: string; block?: string; lastResult: SubmissionResult<string[]> } | null | undefined;

/** The answer to one of the forms on the page; nothing for the others. */
export function answerTo(answer: LotAnswer, intent: string, block?: string): SubmissionResult<string[]> | null {
  return answer?.intent === intent && answer.block === block ? answer.lastResult : null;
}
