import { problem } from "#app/server/problem.server.ts";
import { versionOf } from "#app/server/form.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { runAssessment } from "../assessments/assessments.server.ts";
import { idFrom } from "../uuid.server.ts";
import { removeFlow } from "./flows.server.ts";
import { copyFlow } from "./new-flow.server.ts";
import { changeStep, STEP_MOVES } from "./steps.server.ts";

/** Where a thing done to a flow leads, or why it was not done. */
export type FlowIntentResult =
  | { path: string }
  | { status: 409; conflict: { by: string; at: string } }
  | { status: 422; fault: { step: number | null; reason: string } };

/** Does what a form of the flow's page asks for: assess, copy, remove, or change one of its steps. */
export async function doFlowIntent(scope: ActorScope, flowId: string, formData: FormData): Promise<FlowIntentResult> {
  const change = formData.get("change");
  if (typeof change === "string") return doStepChange(scope, flowId, change, versionOf(formData));
  switch (formData.get("intent")) {
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
    default:
      throw problem(400, "That is nothing that can be done to a flow.");
  }
}

async function doStepChange(
  scope: ActorScope,
  flowId: string,
  change: string,
  version: number | null,
): Promise<FlowIntentResult> {
  const [name, id] = change.split(" ");
  const move = STEP_MOVES.find((known) => known === name);
  if (!move) throw problem(400, "That is nothing that can be done to a step.");
  const stepId = idFrom(id, "step");
  const saved = await changeStep(scope, { flowId, version, stepId }, move);
  if (saved.outcome === "conflict") return { status: 409, conflict: saved.conflict };
  if (saved.outcome !== "saved") throw problem(409, "Somebody else changed this flow. Please try again.");
  if (move === "remove") return { path: `/flows/${flowId}` };
  const moved = move === "copy" ? "" : `&moved=${move}`;
  return { path: `/flows/${flowId}?step=${saved.id}${moved}` };
}
