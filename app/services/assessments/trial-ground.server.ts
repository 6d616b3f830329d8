import { legFlows } from "#app/engine/flow/legs.ts";
import type { Catalogue } from "#app/engine/trial/catalogue.ts";
import { legAnswer } from "#app/lib/assessment-leg.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import type { TrialHead, TrialQuestion } from "#app/schemas/trial.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { findAssessment } from "./assessments.server.ts";
import { readCatalogue } from "./catalogue.server.ts";
import { isOutOfDate } from "./out-of-date.server.ts";
import { presentFlow } from "./present-inputs.server.ts";

/** An assessment with what can be tried instead of what it rests on. */
export interface TrialGround extends TrialHead {
  input: AssessmentInput;
  catalogue: Catalogue;
  programId: string;
}

/**
 * What trials of an assessment begin from; refused to whom its program is a wall. Of a flow that parts by slot it is the leg that the
 * address asks for by `leg`, else the worst.
 */
export async function trialGround(
  scope: ActorScope,
  assessmentId: string | undefined,
  search: URLSearchParams = new URLSearchParams(),
): Promise<TrialGround> {
  return inScope(scope, async (em) => {
    const assessment = await findAssessment(em, scope, assessmentId);
    const { id, number, flow, flowName, program, engineVersion, inputHash, input } = assessment;
    const present = await presentFlow(em, scope, flow.id);
    const old = isOutOfDate({ engineVersion, inputHash, input: input.$ }, present.input);
    const may =
      mayInProgram(scope.actor, "edit stacks and flows", program.id) &&
      mayInProgram(scope.actor, "run assessments", program.id);
    const leg = legOf(assessment.result, search);
    return {
      id,
      leg,
      revision: revisionLetters(number),
      flow: { id: flow.id, name: flowName },
      input: leg ? { ...input.$, flow: legFlows(input.$.flow)[leg.number - 1] ?? input.$.flow } : input.$,
      catalogue: await readCatalogue(em),
      barred: may ? (old ? "out of date" : null) : "role",
      mayAssess: mayInProgram(scope.actor, "run assessments", program.id),
      programId: program.id,
    };
  });
}

function legOf(result: AssessmentResult, search: URLSearchParams): TrialHead["leg"] {
  const { legs } = legAnswer(result, search.get("leg"));
  return legs && { number: legs.chosen.number, slots: legs.chosen.slots };
}

/** The part of it that a page shows. */
export const trialHead = ({ id, leg, revision, flow, barred, mayAssess }: TrialGround): TrialHead => ({
  id,
  leg,
  revision,
  flow,
  barred,
  mayAssess,
});

/** What trials ask of the engine. */
export const trialQuestion = ({ input: { flow, limits }, catalogue }: TrialGround): TrialQuestion => ({
  flow,
  limits,
  catalogue,
});

/**
 * The ground of trials for the engine in the browser of somebody who may assess the flow, who is given the same for a what-if; refused
 * to everybody else.
 */
export async function sentGround(
  scope: ActorScope,
  assessmentId: string | undefined,
  search: URLSearchParams = new URLSearchParams(),
): Promise<TrialGround> {
  const ground = await trialGround(scope, assessmentId, search);
  requireInProgram(scope, "run assessments", ground.programId, "assessment");
  return ground;
}
