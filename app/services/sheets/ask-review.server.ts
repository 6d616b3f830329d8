import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { SheetRevision } from "#app/db/entities/sheet-revision.ts";
import { Sheet } from "#app/db/entities/sheet.ts";
import { problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { findAssessment } from "../assessments/assessments.server.ts";
import { isOutOfDate } from "../assessments/out-of-date.server.ts";
import { presentFlow } from "../assessments/present-inputs.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { fingerprints, lockSheetOf } from "./revision.server.ts";
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
    await refuseReview(em, scope, assessment);
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

type Found = Awaited<ReturnType<typeof findAssessment>>;

/** @throws 409 with the reason why no review of this assessment can be asked for now */
export async function refuseReview(em: EntityManager, scope: ActorScope, assessment: Found): Promise<void> {
  if (assessment.lot)
    throw problem(409, "A lot's own assessment is no revision. Ask for a review of the assessment that it is of.");
  if (await hasNewer(em, assessment))
    throw problem(409, "The flow has been assessed again since. Ask for a review of its newest assessment.");
  const { input } = await presentFlow(em, scope, assessment.flow.id);
  const { engineVersion, inputHash } = assessment;
  if (isOutOfDate({ engineVersion, inputHash, input: assessment.input.$ }, input))
    throw problem(409, "This assessment is out of date. Run it again, and ask for a review of that one.");
  const known = await em.findOne(SheetRevision, { assessment: assessment.id, state: { $ne: "returned" } });
  if (known)
    throw problem(409, `This assessment is ${known.state} already. Assess the flow again before asking once more.`);
  const other = await em.findOne(SheetRevision, { sheet: { flow: assessment.flow.id }, state: "in review" });
  if (other)
    throw problem(409, "Another assessment of this flow is in review. It has to be returned or released first.");
}

/** Whether the flow has an assessment after this one. */
export async function hasNewer(em: EntityManager, { flow, number }: Pick<Found, "flow" | "number">): Promise<boolean> {
  const [newest] = await em.execute<{ number: number }[]>(
    "select max(number) as number from assessment where flow_id = ? and lot is null",
    [flow.id],
  );
  return (newest?.number ?? 0) > number;
}

async function newSheet(em: EntityManager, scope: ActorScope, { program, flow }: Found): Promise<Sheet> {
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
