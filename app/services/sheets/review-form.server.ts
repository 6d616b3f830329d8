import { reviewFormSchema, type ReviewForm } from "#app/schemas/review-form.ts";
import { readForm } from "#app/server/form.server.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { findAssessment } from "../assessments/assessments.server.ts";
import { proveAgain } from "../people/recent-proof.server.ts";
import { askReview } from "./ask-review.server.ts";
import { releaseRevision } from "./release.server.ts";
import { commentInReview, recordDeviation, returnRevision, signDeviation } from "./review-deeds.server.ts";
import { newestRevisionOf } from "./revision.server.ts";

/** Fields that are never sent back. */
const PROOF = ["proof", "proofCode"] as const;

/**
 * Takes a form of the page of a review.
 * @returns the form to be shown again where something in it is wrong; null when it was done
 */
export async function takeReviewForm(
  request: Request,
  scope: ActorScope,
  assessmentId: string | undefined,
  origin: string,
) {
  const { formData, submission } = await readForm(request, reviewFormSchema);
  const intent = formData.get("intent");
  if (submission.status !== "success")
    return {
      intent: typeof intent === "string" ? intent : "",
      lastResult: submission.reply({ hideFields: [...PROOF] }),
    };
  const form = submission.value;
  const proven = form.intent === "release" ? await proveAgain(scope, form) : { fault: null, scope };
  if (proven.fault !== null)
    return {
      intent: form.intent,
      lastResult: submission.reply({
        hideFields: [...PROOF],
        fieldErrors: { [proven.fault.field]: [proven.fault.sentence] },
      }),
    };
  await take(proven.scope, assessmentId, form, origin);
  return null;
}

async function take(scope: ActorScope, assessmentId: string | undefined, form: ReviewForm, origin: string) {
  if (form.intent === "ask") return askReview(scope, assessmentId, form.note);
  const revision = await inScope(scope, async (em) => {
    const { id } = await findAssessment(em, scope, assessmentId);
    return newestRevisionOf(em, id);
  });
  if (revision === null) throw notFound("review");
  switch (form.intent) {
    case "comment":
      return commentInReview(scope, revision, form);
    case "deviate":
      return recordDeviation(scope, revision, form);
    case "sign":
      return signDeviation(scope, revision, form);
    case "return":
      return returnRevision(scope, revision, form);
    case "release":
      return releaseRevision(scope, revision, form.remark, origin);
  }
}
