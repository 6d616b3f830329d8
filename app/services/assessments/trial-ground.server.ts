import type { Catalogue } from "#app/engine/trial/catalogue.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import type { TrialHead } from "#app/schemas/trial.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { findAssessment } from "./assessments.server.ts";
import { readCatalogue } from "./catalogue.server.ts";
import { isOutOfDate } from "./out-of-date.server.ts";
import { presentFlow } from "./present-inputs.server.ts";

/** An assessment with what can be tried instead of what it rests on. */
export interface TrialGround extends TrialHead {
  input: AssessmentInput;
  catalogue: Catalogue;
}

/** What trials of an assessment begin from; refused to whom its program is a wall. */
export async function trialGround(scope: ActorScope, assessmentId: string | undefined): Promise<TrialGround> {
  return inScope(scope, async (em) => {
    const assessment = await findAssessment(em, scope, assessmentId);
    const { id, number, flow, flowName, program, engineVersion, inputHash, input } = assessment;
    const present = await presentFlow(em, scope, flow.id);
    const old = isOutOfDate({ engineVersion, inputHash, input: input.$ }, present.input);
    const may =
      mayInProgram(scope.actor, "edit stacks and flows", program.id) &&
      mayInProgram(scope.actor, "run assessments", program.id);
    return {
      id,
      revision: revisionLetters(number),
      flow: { id: flow.id, name: flowName },
      input: input.$,
      catalogue: await readCatalogue(em),
      barred: may ? (old ? "out of date" : null) : "role",
    };
  });
}

/** The part of it that a page shows. */
export const trialHead = ({ id, revision, flow, barred }: TrialGround): TrialHead => ({ id, revision, flow, barred });
