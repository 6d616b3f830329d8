import type { FlowConflict } from "#app/schemas/flow-plan.ts";
import { versionOf } from "#app/server/form.server.ts";
import { problem } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { runAssessment } from "../assessments/assessments.server.ts";
import { idFrom } from "../uuid.server.ts";
import { removeFlow } from "./flows.server.ts";
import type { FlowSaved } from "./change-flow.server.ts";
import { copyFlow } from "./new-flow.server.ts";
import { applyWhatIf } from "./what-if.server.ts";
import { changeStep, walkHistory, type StepMove } from "./steps.server.ts";

/** Where a thing done to a flow leads, or why it was not done. */
export type FlowIntentResult =
  | { path: string }
  /** `again` is the change to post once more, when the person keeps to it */
  | { status: 409; conflict: FlowConflict; again: string | null }
  | { status: 422; fault: { step: number | null; reason: string } };

/** Does what a form of the flow's page asks for: assess, copy, remove, undo, redo, or change one of its steps. */
export async function doFlowIntent(scope: ActorScope, flowId: string, formData: FormData): Promise<FlowIntentResult> {
  const change = formData.get("change");
  const version = versionOf(formData);
  if (typeof change === "string") return doStepChange(scope, flowId, change, version);
  const intent = formData.get("intent");
  switch (intent) {
    case "assess": {
      const ran = await runAssessment(scope, flowId);
      if (ran.outcome === "stored") return { path: `/assessments/${ran.id}` };
      return { status: 422, fault: { step: ran.step, reason: ran.reason } };
    }
    case "copy": {
      const copied = await copyFlow(scope, flowId);
      if (copied.outcome === "saved") return { path: `/flows/${copied.id}` };
      throw problem(409, "Somebody copied this flow at the same moment. Please try again.");
    }
    case "remove":
      await removeFlow(scope, flowId);
      return { path: "/flows" };
    case "undo":
    case "redo": {
      const saved = await walkHistory(scope, { flowId, version }, intent);
      return refusalOf(saved, null) ?? { path: `/flows/${flowId}?done=${intent}` };
    }
    case "what-if": {
      const saved = await applyWhatIf(scope, { flowId, version }, formData.get("changes"));
      const refusal = refusalOf(saved, null);
      return refusal ?? { path: `/flows/${flowId}?done=what-if` };
    }
    default:
      throw problem(400, "That is nothing that can be done to a flow.");
  }
}

function refusalOf(saved: FlowSaved, again: string | null): FlowIntentResult | null {
  if (saved.outcome === "conflict") return { status: 409, conflict: saved.conflict, again };
  if (saved.outcome === "name taken")
    throw problem(409, "Another flow of the program has been given that name. Rename one of them first.");
  return null;
}

/** 'up <id>', 'to <id> 5': the kind of change, the step, and the place where it goes. */
function readMove(change: string): { move: StepMove; stepId: string } {
  const [kind, id, place] = change.split(" ");
  const stepId = idFrom(id, "step");
  const number = Number.parseInt(place ?? "", 10);
  if (kind === "up" || kind === "down" || kind === "remove" || kind === "copy") return { move: { kind }, stepId };
  if (kind === "to" && Number.isInteger(number)) return { move: { kind, number }, stepId };
  throw problem(400, "That is nothing that can be done to a step.");
}

async function doStepChange(
  scope: ActorScope,
  flowId: string,
  change: string,
  version: number | null,
): Promise<FlowIntentResult> {
  const { move, stepId } = readMove(change);
  const saved = await changeStep(scope, { flowId, version, stepId }, move);
  const refusal = refusalOf(saved, change);
  if (refusal || saved.outcome !== "saved") return refusal ?? { path: `/flows/${flowId}` };
  return { path: `/flows/${flowId}?step=${saved.id}&done=${move.kind}` };
}
