import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Deviation } from "#app/db/entities/deviation.ts";
import { SheetComment } from "#app/db/entities/sheet-comment.ts";
import { blockingFindings } from "#app/lib/blocking-findings.ts";
import { inPlaceOf, mayInProgram, type ProgramPermission } from "#app/policies/permissions.ts";
import type { ReviewForm } from "#app/schemas/review-form.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { findAssessment } from "../assessments/assessments.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { lockedRevision, type FoundRevision } from "./revision.server.ts";
import { tellReviewReturned } from "./tell.server.ts";

const RELEASE = "release, return and withdraw sheets";

type Values<Intent extends ReviewForm["intent"]> = Omit<Extract<ReviewForm, { intent: Intent }>, "intent">;

const OVER = "This review is over, and nothing is added to it. Ask for a review of a newer assessment.";

/** The revision of a review that is still open, and stays so until the end of the transaction. @throws 409 when it is over */
async function inReview(
  em: EntityManager,
  scope: ActorScope,
  revisionId: string,
  permission: ProgramPermission,
): Promise<FoundRevision> {
  const revision = await lockedRevision(em, scope, revisionId, permission);
  if (revision.state !== "in review") throw problem(409, OVER);
  return revision;
}

/** Says something in a review, at a step or of the whole. @throws 409 when the review is over, 404 for a step that is not there */
export async function commentInReview(scope: ActorScope, revisionId: string, { step, text }: Values<"comment">) {
  await inScope(scope, async (em) => {
    const revision = await inReview(em, scope, revisionId, "comment in a review");
    const { result } = await findAssessment(em, scope, revision.assessment.id);
    if (step !== null && !result.steps.some(({ number }) => number === step)) throw notFound("step");
    em.create(SheetComment, {
      id: randomUUID(),
      program: revision.program.id,
      revision: revision.id,
      step,
      text,
      createdAt: new Date(),
      createdBy: scope.actor.id,
    });
    await em.flush();
  });
}

/** Records a deviation for findings that block the release; it counts when a second person has signed. */
export async function recordDeviation(scope: ActorScope, revisionId: string, values: Values<"deviate">) {
  await inScope(scope, async (em) => {
    const revision = await inReview(em, scope, revisionId, "record deviations");
    const { result } = await findAssessment(em, scope, revision.assessment.id);
    const known = new Set(blockingFindings(result).map(({ key }) => key));
    if (values.findings.some((key) => !known.has(key)))
      throw problem(
        409,
        "One of these findings does not block the release. Open the page again and tick those that do.",
      );
    em.create(Deviation, {
      id: randomUUID(),
      program: revision.program.id,
      revision: revision.id,
      ...values,
      findings: [...new Set(values.findings)],
      createdAt: new Date(),
      createdBy: scope.actor.id,
    });
    await em.flush();
  });
}

/** The second signature under a deviation, of a process owner who did not record it. */
export async function signDeviation(scope: ActorScope, revisionId: string, { deviation: id }: Values<"sign">) {
  await inScope(scope, async (em) => {
    const revision = await inReview(em, scope, revisionId, RELEASE);
    const deviation = await em.findOne(Deviation, { id, revision: revision.id });
    if (!deviation) throw notFound("deviation");
    if (deviation.createdBy.id === scope.actor.id)
      throw problem(403, "You recorded this deviation: the second signature is another process owner's.");
    if (inPlaceOf(scope.actor, RELEASE, revision.program.id).some(({ id: owner }) => owner === deviation.createdBy.id))
      throw problem(403, "You act in the place of who recorded this deviation: the second signature is another's.");
    if (deviation.signedAt) throw problem(409, "This deviation has its second signature already.");
    if (deviation.until <= new Date())
      throw problem(409, "This deviation has expired. Record one that lasts, if its reason still holds.");
    Object.assign(deviation, { signedAt: new Date(), signedBy: scope.actor.id });
    await em.flush();
  });
}

/** Returns a revision with reasons. A process owner returns anybody's; whoever asked for the review may take it back. */
export async function returnRevision(scope: ActorScope, revisionId: string, { reason }: Values<"return">) {
  await inScope(scope, async (em) => {
    const revision = await lockedRevision(em, scope, revisionId);
    const own =
      revision.askedBy.id === scope.actor.id && mayInProgram(scope.actor, "ask for a review", revision.program.id);
    if (!own) requireInProgram(scope, RELEASE, revision.program.id, "revision of a sheet");
    if (revision.state !== "in review")
      throw problem(409, `This revision is ${revision.state} already. Open the page again to see by whom.`);
    Object.assign(revision, { state: "returned", decidedAt: new Date(), decidedBy: scope.actor.id, reason });
    await em.flush();
    await tellReviewReturned(em, scope, revision.id);
  });
}
