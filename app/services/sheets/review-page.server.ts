import type { EntityManager } from "@mikro-orm/postgresql";
import type { Deviation } from "#app/db/entities/deviation.ts";
import { SheetComment } from "#app/db/entities/sheet-comment.ts";
import { Sheet } from "#app/db/entities/sheet.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { blockingFindings } from "#app/lib/blocking-findings.ts";
import { sinceRelease } from "#app/lib/since-release.ts";
import { inPlaceOf, mayInProgram } from "#app/policies/permissions.ts";
import { releaseObstacles } from "#app/policies/release.ts";
import type { ReviewRevision, ReviewView } from "#app/schemas/review-view.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { findAssessment } from "../assessments/assessments.server.ts";
import { proofAsked } from "../people/recent-proof.server.ts";
import { whyNoReview } from "./ask-review.server.ts";
import { lastReleased } from "./last-released.server.ts";
import { inForce, releaseCaseOf } from "./release-case.server.ts";
import { findRevision, newestRevisionOf } from "./revision.server.ts";

const RELEASE = "release, return and withdraw sheets";

/** The review of an assessment, for the people of its program. @throws 404 for who may not see the work */
export async function reviewPage(scope: ActorScope, assessmentId: string | undefined): Promise<ReviewView> {
  return inScope(scope, async (em) => {
    const assessment = await findAssessment(em, scope, assessmentId);
    const { program, flow, result } = assessment;
    const sheet = await em.findOne(Sheet, { flow: flow.id });
    const last = sheet && (await lastReleased(em, scope, sheet.id, assessment));
    const newest = await newestRevisionOf(em, assessment.id);
    const revision = newest === null ? null : await revisionView(em, scope, newest);
    const may = (permission: Parameters<typeof mayInProgram>[1]) => mayInProgram(scope.actor, permission, program.id);
    const inReview = revision?.state === "in review";
    return {
      assessment: {
        id: assessment.id,
        name: assessment.flowName,
        number: recordNumber("assessment", program.slug, assessment.documentNumber),
        letter: revisionLetters(assessment.number),
        program: program.name,
      },
      sheet: sheet && recordNumber("sheet", program.slug, sheet.number),
      sheetId: sheet && sheet.id,
      revision: revision?.view ?? null,
      steps: result.steps.map(({ number, title }) => ({ number, title })),
      blocking: blockingFindings(result),
      assumed: result.assumed,
      inputs: result.inputs,
      since: last && sinceRelease(last.number, last.before, assessment, last.changes),
      notAsked: inReview ? null : await whyNoReview(em, scope, assessment),
      may: {
        ask: may("ask for a review"),
        comment: inReview && may("comment in a review"),
        deviate: inReview && may("record deviations"),
        return: inReview && (may(RELEASE) || revision.own),
        release: inReview && may(RELEASE),
      },
      proofAsked: proofAsked(scope),
    };
  });
}

async function revisionView(em: EntityManager, scope: ActorScope, id: string) {
  const revision = await findRevision(em, scope, id);
  const { releaseCase, deviations } = await releaseCaseOf(em, scope, revision);
  const comments = await em.find(
    SheetComment,
    { revision: revision.id },
    { populate: ["createdBy"], orderBy: { createdAt: "asc", id: "asc" } },
  );
  const view: ReviewRevision = {
    id: revision.id,
    state: revision.state,
    note: revision.note,
    askedAt: revision.askedAt.toISOString(),
    askedBy: revision.askedBy.name,
    decidedAt: revision.decidedAt?.toISOString() ?? null,
    decidedBy: revision.decidedBy?.name ?? null,
    reason: revision.reason ?? null,
    letter: revision.number ? revisionLetters(revision.number) : null,
    obstacles:
      revision.state === "in review"
        ? releaseObstacles(scope.actor.id, inPlaceOf(scope.actor, RELEASE, revision.program.id), releaseCase)
        : [],
    deviations: deviations.map((each) => deviationView(scope, revision, each)),
    comments: comments.map(({ id: comment, step, text, createdAt, createdBy }) => ({
      id: comment,
      step: step ?? null,
      text,
      at: createdAt.toISOString(),
      by: createdBy.name,
    })),
  };
  return { view, state: revision.state, own: revision.askedBy.id === scope.actor.id };
}

function deviationView(
  { actor }: ActorScope,
  { state, program }: { state: string; program: { id: string } },
  { id, findings, reason, scope, until, createdAt, createdBy, signedAt, signedBy }: Deviation,
) {
  const hands = [actor.id, ...inPlaceOf(actor, RELEASE, program.id).map(({ id: owner }) => owner)];
  return {
    id,
    findings,
    reason,
    scope,
    until: until.toISOString(),
    recordedAt: createdAt.toISOString(),
    recordedBy: createdBy.name,
    signedAt: signedAt?.toISOString() ?? null,
    signedBy: signedBy?.name ?? null,
    inForce: inForce({ signedAt, until }),
    maySign:
      state === "in review" &&
      !signedAt &&
      mayInProgram(actor, RELEASE, program.id) &&
      !hands.includes(createdBy.id) &&
      until > new Date(),
  };
}
