import type { WhatIfChange, WhatIfSnapshot } from "#app/schemas/what-if.ts";
import { answerOf, toldAnswer, type Answer, type ToldAnswer } from "./what-if-answer.ts";
import { changedInput } from "./what-if.ts";

/** What is asked: first the flow as it is, then changes of it, each by a key of its own. */
export type WhatIfAsked = { snapshot: WhatIfSnapshot } | { key: string; changes: WhatIfChange[] };

/** What is answered: the flow as it is has no key. */
export interface WhatIfTold {
  key: string | null;
  answer: ToldAnswer;
}

const say = (told: WhatIfTold) => globalThis.postMessage(told);

let known: { snapshot: WhatIfSnapshot; present: Answer } | null = null;

/** Assesses a flow again and again, as changes of it are asked about. */
globalThis.addEventListener("message", ({ data }: MessageEvent<WhatIfAsked>) => {
  if ("snapshot" in data) {
    const present = answerOf(data.snapshot.input, data.snapshot.limits);
    known = { snapshot: data.snapshot, present };
    return say({ key: null, answer: toldAnswer(present, present) });
  }
  if (!known) return undefined;
  const { snapshot, present } = known;
  const answer = answerOf(changedInput(snapshot, data.changes), snapshot.limits);
  return say({ key: data.key, answer: toldAnswer(answer, present) });
});
