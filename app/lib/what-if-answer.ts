import { EngineInputError } from "#app/engine/errors.ts";
import { answerSentences } from "#app/engine/flow/answer.ts";
import { judgeFlow, type AssessedStep, type JudgedFlow } from "#app/engine/flow/judge.ts";
import type { FlowInput } from "#app/engine/flow/model.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { Outcome } from "#app/engine/vocabulary.ts";
import { refusalReason } from "./worker-run.ts";

/** An assessment made in the browser: the engine's own, with its sentences; or why there is none. */
export type Answer =
  { computed: true; assessment: JudgedFlow; sentences: string[] } | { computed: false; reason: string };

/** Assesses a flow as the server would, with the same code; the derivations, which nothing here shows, are left out. */
export function answerOf(input: FlowInput, limits: SiteLimits): Answer {
  try {
    const assessment = judgeFlow(input, limits);
    return { computed: true, assessment, sentences: answerSentences(input, assessment) };
  } catch (error) {
    if (!(error instanceof EngineInputError)) throw error;
    return { computed: false, reason: refusalReason(error) };
  }
}

/** What of an answer a pane shows: little enough to be sent from a worker after every key. */
export type ToldAnswer =
  | {
      computed: true;
      outcome: Outcome;
      /** where the verdict arises first; null when it is clear */
      step: number | null;
      sentences: string[];
      /** steps that come out otherwise than in the flow as it is; null where that one cannot be computed */
      changed: StepChange[] | null;
    }
  | { computed: false; reason: string };

/** An answer as a pane shows it, beside that to the flow as it is. */
export function toldAnswer(answer: Answer, present: Answer): ToldAnswer {
  if (!answer.computed) return answer;
  const { assessment, sentences } = answer;
  const { outcome, step } = assessment.verdict;
  const before = present.computed ? sameSlots(present.assessment, assessment) : null;
  const changed = before && changedSteps(before, assessment);
  return { computed: true, outcome, step, sentences, changed };
}

/** Of the flow as it is, what is of the same slots as an answer: of one that parts by slot the same leg, whichever is its worst. */
function sameSlots(present: JudgedFlow, { slots }: JudgedFlow): Pick<JudgedFlow, "steps"> | null {
  if (!slots) return present.slots ? null : present;
  return present.legs?.find((leg) => leg.slots.join() === slots.join()) ?? null;
}

/** How the wafer lies after a step, in words; a curled one has a radius, never a bow. */
function lies({ state }: AssessedStep): string {
  const { atRoom } = state;
  if (!atRoom) return "held flat";
  if (atRoom.rollRadius !== null)
    return `rolls up, radius ${formatQuantity(atRoom.rollRadius, "length", { unit: "mm" })}`;
  if (state.lies === "flat") return "flat";
  return `${state.lies} ${formatQuantity(atRoom.warp, "length", { unit: "µm", significant: 3 })}`;
}

/** A step that comes out otherwise than before. */
export interface StepChange {
  number: number;
  title: string;
  was: { outcome: Outcome; lies: string };
  becomes: { outcome: Outcome; lies: string };
}

/** Less than this share of change in a warp is not worth a row. */
const NOTABLE = 0.02;

/** The steps whose outcome, support or shape differ between two assessments of the same steps. */
export function changedSteps(before: Pick<JudgedFlow, "steps">, after: Pick<JudgedFlow, "steps">): StepChange[] {
  return before.steps.flatMap((was, index): StepChange[] => {
    const becomes = after.steps[index];
    if (!becomes) return [];
    const [old, now] = [was.state.atRoom?.warp ?? 0, becomes.state.atRoom?.warp ?? 0];
    const bends = Math.abs(now - old) > NOTABLE * Math.max(Math.abs(old), Math.abs(now));
    if (was.outcome === becomes.outcome && lies(was) === lies(becomes)) return [];
    if (was.outcome === becomes.outcome && !bends) return [];
    return [
      {
        number: was.state.number,
        title: was.state.step.title,
        was: { outcome: was.outcome, lies: lies(was) },
        becomes: { outcome: becomes.outcome, lies: lies(becomes) },
      },
    ];
  });
}
