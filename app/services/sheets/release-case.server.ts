import type { EntityManager } from "@mikro-orm/postgresql";
import { Deviation } from "#app/db/entities/deviation.ts";
import { blockingFindings } from "#app/lib/blocking-findings.ts";
import type { ReleaseCase } from "#app/policies/release.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { findAssessment } from "../assessments/assessments.server.ts";
import { fingerprints, type FoundRevision } from "./revision.server.ts";
import { hasNewer, restsOnOldInputs } from "./still-newest.server.ts";

/** Whether a deviation counts now: signed by a second person and not expired. */
export const inForce = ({ signedAt, until }: Pick<Deviation, "signedAt" | "until">, now = new Date()): boolean =>
  signedAt !== null && signedAt !== undefined && until > now;

/** Keys of the blocking findings that deviations in force let run. */
export const coveredBy = (deviations: readonly Pick<Deviation, "signedAt" | "until" | "findings">[]): Set<string> =>
  new Set(deviations.filter((each) => inForce(each)).flatMap(({ findings }) => findings));

/** What decides a release, with everything that it was decided from. */
export async function releaseCaseOf(em: EntityManager, scope: ActorScope, revision: FoundRevision) {
  const assessment = await findAssessment(em, scope, revision.assessment.id);
  const deviations = await em.find(
    Deviation,
    { revision: revision.id },
    { populate: ["createdBy", "signedBy"], orderBy: { createdAt: "asc", id: "asc" } },
  );
  const covered = coveredBy(deviations);
  const blocking = blockingFindings(assessment.result);
  const { inputHash, resultHash } = fingerprints(assessment);
  const releaseCase: ReleaseCase = {
    state: revision.state,
    askedBy: revision.askedBy.id,
    assessedBy: assessment.createdBy.id,
    outOfDate: await restsOnOldInputs(em, scope, assessment),
    newer: await hasNewer(em, assessment),
    unchanged: inputHash === revision.inputHash && resultHash === revision.resultHash,
    open: blocking.filter(({ key }) => !covered.has(key)).length,
  };
  return { releaseCase, assessment, deviations, blocking };
}
