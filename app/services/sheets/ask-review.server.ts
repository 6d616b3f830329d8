import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { SheetRevision } from "#app/db/entities/sheet-revision.ts";
import { Sheet } from "#app/db/entities/sheet.ts";
import { problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { findAssessment } from "../assessments/assessments.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { fingerprints, lockSheetOf } from "./revision.server.ts";
import { hasNewer, restsOnOldInputs, type FoundAssessment } from "./still-newest.server.ts";
import { tellReviewAsked } from "./tell.server.ts";

/**
 * Asks for a review of an assessment: from now on its sheet is in review, bound to the inputs and results as they are stored.
 * @throws 409 for a lot's assessment, one that is not the newest or out of date, and while another one of the flow is in review
 */
export async function askReview(scope: ActorScope, assessmentId: string | undefined, note: string): Promise<void> {
  await inScope(scope, async (em) => {
    const assessment = await findAssessment(em, scope, assessmentId);
    requireInProgram(scope, "ask for a review", assessment.program.id, "assessment");
    await lockSheetOf(em, assessment.flow.id);
    const obstacle = await whyNoReview(em, scope, assessment);
    if (obstacle !== null) throw problem(409, obstacle);
    const sheet = (await em.findOne(Sheet, { flow: assessment.flow.id })) ?? (await newSheet(em, scope, assessment));
    const revision = em.create(SheetRevision, {
      id: randomUUID(),
      program: assessment.program.id,
      sheet: sheet.id,
      assessment: assessment.id,
      title: assessment.flowName,
      state: "in review",
      ...fingerprints(assessment),
      note,
      askedAt: new Date(),
      askedBy: scope.actor.id,
    });
    await em.flush();
    await tellReviewAsked(em, scope, revision.id);
  });
}

/** Why no review of this assessment can be asked for now, and what to do; null when it can. */
export async function whyNoReview(
  em: EntityManager,
  scope: ActorScope,
  assessment: FoundAssessment,
): Promise<string | null> {
  if (assessment.lot) return "A lot's own assessment is no revision. Ask for a review of the assessment that it is of.";
  if (await hasNewer(em, assessment))
    return "The flow has been assessed again since. Ask for a review of its newest assessment.";
  if (await restsOnOldInputs(em, scope, assessment))
    return "This assessment is out of date. Run it again, and ask for a review of that one.";
  const known = await em.findOne(SheetRevision, { assessment: assessment.id, state: { $ne: "returned" } });
  if (known) return `This assessment is ${known.state} already. Assess the flow again before asking once more.`;
  const other = await em.findOne(SheetRevision, { sheet: { flow: assessment.flow.id }, state: "in review" });
  return other && "Another assessment of this flow is in review. It has to be returned or released first.";
}

async function newSheet(em: EntityManager, scope: ActorScope, { program, flow }: FoundAssessment): Promise<Sheet> {
  await em.execute("select pg_advisory_xact_lock(hashtextextended(?, 0))", [`sheet numbers of ${program.id}`]);
  const [last] = await em.execute<{ number: number | null }[]>(
    "select max(number) as number from sheet where program_id = ?",
    [program.id],
  );
  return em.create(Sheet, {
    id: randomUUID(),
    program: program.id,
    flow: flow.id,
    number: (last?.number ?? 0) + 1,
    createdAt: new Date(),
    createdBy: scope.actor.id,
  });
}
