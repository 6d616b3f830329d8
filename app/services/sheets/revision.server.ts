import { createHash } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import type { Assessment } from "#app/db/entities/assessment.ts";
import { SheetRevision } from "#app/db/entities/sheet-revision.ts";
import { canonicalJson } from "#app/lib/canonical-json.ts";
import { mayInProgram, type ProgramPermission } from "#app/policies/permissions.ts";
import { notFound } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";

/**
 * The revision that an id names, with its sheet and, for its staff, the people of it.
 * @throws 404 for one that is not there or of a foreign program, 403 for a role that may not
 */
export async function findRevision(
  em: EntityManager,
  scope: ActorScope,
  id: string | undefined,
  permission: ProgramPermission = "see the work",
) {
  const revision = await em.findOne(
    SheetRevision,
    { id: idFrom(id, "revision of a sheet") },
    { populate: ["sheet", "program"] },
  );
  if (!revision) throw notFound("revision of a sheet");
  requireInProgram(scope, permission, revision.program.id, "revision of a sheet");
  // A guest may not see who the people are; asked for together with them, the revision itself would be missing.
  if (mayInProgram(scope.actor, "see the work", revision.program.id))
    await em.populate(revision, ["askedBy", "decidedBy", "endedBy"]);
  return revision;
}

export type FoundRevision = Awaited<ReturnType<typeof findRevision>>;

/** Id of the newest attempt to release an assessment; null when no review of it was asked for. */
export async function newestRevisionOf(em: EntityManager, assessmentId: string): Promise<string | null> {
  const [newest] = await em.find(
    SheetRevision,
    { assessment: assessmentId },
    { orderBy: { askedAt: "desc", id: "desc" }, limit: 1, fields: ["id"] },
  );
  return newest?.id ?? null;
}

/** Waits until nobody else moves a revision of this flow's sheet, for the rest of the transaction. */
export async function lockSheetOf(em: EntityManager, flowId: string): Promise<void> {
  await em.execute("select pg_advisory_xact_lock(hashtextextended(?, 0))", [`sheet of ${flowId}`]);
}

/** The same revision as it stands once nobody else can move it any more: every deed begins with this. */
export async function lockedRevision(
  em: EntityManager,
  scope: ActorScope,
  id: string | undefined,
  permission?: ProgramPermission,
): Promise<FoundRevision> {
  const [of] = await em.execute<{ flow_id: string }[]>(
    "select s.flow_id from sheet_revision r join sheet s on s.id = r.sheet_id where r.id = ?",
    [idFrom(id, "revision of a sheet")],
  );
  if (of) await lockSheetOf(em, of.flow_id);
  return findRevision(em, scope, id, permission);
}

const sha256 = (value: unknown) => createHash("sha256").update(canonicalJson(value)).digest("hex");

/** What a review is bound to: fingerprints of an assessment's inputs and results as they are stored. */
export function fingerprints(assessment: Pick<Assessment, "result"> & { input: { $: unknown } }) {
  return { inputHash: sha256(assessment.input.$), resultHash: sha256(assessment.result) };
}
