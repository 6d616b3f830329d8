import { randomUUID } from "node:crypto";
import { legFlows } from "#app/engine/flow/legs.ts";
import type { FlowChange } from "#app/engine/trial/change.ts";
import { planWith } from "#app/lib/flow-change.ts";
import { changePhrase } from "#app/lib/change-phrase.ts";
import { changeWords } from "#app/lib/flow-change-words.ts";
import { readFlowChanges } from "#app/schemas/flow-change.ts";
import { problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { copyFlow } from "../flows/new-flow.server.ts";
import { readFlow } from "../flows/read-flow.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { findAssessment, runAssessment } from "./assessments.server.ts";
import { readCatalogue } from "./catalogue.server.ts";
import { isOutOfDate } from "./out-of-date.server.ts";
import { presentFlow } from "./present-inputs.server.ts";

/** Where a trial leads: to both assessments side by side, or to the copy that could not be assessed. */
export interface Trial {
  path: string;
}

/**
 * Copies the flow of an assessment, makes the posted changes in the copy, and assesses it. The flow itself stays as it is. Of a flow
 * that parts by slot the changes were tried on the leg of that number; what other legs share with it changes for them too.
 * @throws 400 for changes that no page of ours sends, 403 for a role that may not, 409 when the assessment is out of date: what was
 * tried rests on what stood then
 */
export async function tryOnCopy(
  scope: ActorScope,
  assessmentId: string | undefined,
  posted: FormDataEntryValue | null,
  leg: FormDataEntryValue | null = null,
): Promise<Trial> {
  const changes = readFlowChanges(posted);
  if (!changes) throw problem(400, "This change cannot be tried. Open the assessment again and choose it anew.");
  const { id, flowId } = await tryable(scope, assessmentId);
  const copied = await copyFlow(scope, flowId, async (em, plan) => {
    const flow = await readFlow(em, scope, flowId);
    const { input } = await presentFlow(em, scope, flowId);
    const catalogue = await readCatalogue(em);
    const stressOf = (step: number, film: number) =>
      flow.steps[step - 1]?.films.filter(({ change }) => change === "adds")[film]?.stress ?? null;
    const tried = legFlows(input.flow)[Number(leg) - 1];
    const context = { catalogue, stressOf, newId: randomUUID, slot: tried?.leg?.slots[0] };
    return {
      plan: changes.reduce((next, change) => planWith(next, change, context), plan),
      words: `Changed: ${changes.map((change: FlowChange) => changePhrase(changeWords(change, tried ?? input.flow, catalogue))).join("; ")}`,
    };
  });
  if (copied.outcome !== "saved") throw problem(409, "Somebody copied this flow at the same moment. Please try again.");
  const ran = await runAssessment(scope, copied.id);
  return { path: ran.outcome === "stored" ? `/assessments/${ran.id}/compare?with=${id}` : `/flows/${copied.id}` };
}

/** The assessment's flow, if it may be copied and is still the one that was assessed. */
async function tryable(scope: ActorScope, assessmentId: string | undefined): Promise<{ id: string; flowId: string }> {
  return inScope(scope, async (em) => {
    const assessment = await findAssessment(em, scope, assessmentId);
    requireInProgram(scope, "edit stacks and flows", assessment.program.id, "assessment");
    const { engineVersion, inputHash, input, flow } = assessment;
    const present = await presentFlow(em, scope, flow.id);
    if (isOutOfDate({ engineVersion, inputHash, input: input.$ }, present.input))
      throw problem(
        409,
        "The flow, or something that it uses, has been changed since this assessment. Run it again, then try the change.",
      );
    return { id: assessment.id, flowId: flow.id };
  });
}
