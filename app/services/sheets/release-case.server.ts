import type { EntityManager } from "@mikro-orm/postgresql";
import { Deviation } from "#app/db/entities/deviation.ts";
import { blockingFindings, type BlockingFinding } from "#app/lib/blocking-findings.ts";
import type { ReleaseCase } from "#app/policies/release.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { findAssessment } from "../assessments/assessments.server.ts";
import { isOutOfDate } from "../assessments/out-of-date.server.ts";
import { presentFlow } from "../assessments/present-inputs.server.ts";
import { hasNewer } from "./ask-review.server.ts";
import { fingerprints, type FoundRevision } from "./revision.server.ts";

/** Whether a deviation counts now: signed by a second person and not expired. */
export const inForce = ({ signedAt, until }: Pick<Deviation, "signedAt" | "until">, now = new Date()): boolean =>
  signedAt !== null && signedAt !== undefined && until > now;

/** What decides a release, with everything that it was decided from. */
export async function releaseCaseOf(em: EntityManager, scope: ActorScope, revision: FoundRevision) {
  const assessment = await findAssessment(em, scope, revision.assessment.id);
  const { input } = await presentFlow(em, scope, assessment.flow.id);
  const deviations = await em.find(
    Deviation,
    { revision: revision.id },
    { populate: ["createdBy", "signedBy"], orderBy: { createdAt: "asc", id: "asc" } },
  );
  const covered = new Set(deviations.filter((each) => inForce(each)).flatMap(({ findings }) => findings));
  const blocking = blockingFindings(assessment.result);
  const open: BlockingFinding[] = blocking.filter(({ key }) => !covered.has(key));
  const { inputHash, resultHash } = fingerprints(assessment);
  const releaseCase: ReleaseCase = {
    state: revision.state,
    askedBy: revision.askedBy.id,
    assessedBy: assessment.createdBy.id,
    outOfDate: isOutOfDate(
      { engineVersion: assessment.engineVersion, inputHash: assessment.inputHash, input: assessment.input.$ },
      input,
    ),
    newer: await hasNewer(em, assessment),
    unchanged: inputHash === revision.inputHash && resultHash === revision.resultHash,
    open: open.length,
  };
  return { releaseCase, assessment, deviations, blocking, open };
}
