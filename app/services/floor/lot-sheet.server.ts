import { LockMode, type EntityManager } from "@mikro-orm/postgresql";
import { Lot } from "#app/db/entities/lot.ts";
import { LotSheet } from "#app/db/entities/lot-sheet.ts";
import { SheetRevision } from "#app/db/entities/sheet-revision.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import type { ProgramPermission } from "#app/policies/permissions.ts";
import type { PinnedSheet } from "#app/schemas/floor-view.ts";
import { notFound } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";

/**
 * A lot that the floor works on.
 * @param locked whether nobody else may move it until the transaction ends
 * @throws 404 for a lot that is not there or of another program, 403 for a role that may not
 */
export async function findFloorLot(
  em: EntityManager,
  scope: ActorScope,
  lotId: string | undefined,
  permission: ProgramPermission = "work on the floor",
  locked = false,
) {
  const lot = await em.findOne(Lot, { id: idFrom(lotId, "lot") }, { populate: ["program"] });
  if (!lot) throw notFound("lot");
  requireInProgram(scope, permission, lot.program.id, "lot");
  if (locked) await em.lock(lot, LockMode.PESSIMISTIC_WRITE);
  return lot;
}

const ORDER = { orderBy: { createdAt: "desc" as const, id: "desc" as const } };

/** Every revision that a lot was ever put on, the one that counts first. */
export function pinsOf(em: EntityManager, lotId: string) {
  return em.find(LotSheet, { lot: lotId }, { populate: ["revision.sheet", "createdBy"], ...ORDER });
}

export type Pin = Awaited<ReturnType<typeof pinsOf>>[number];

/** The revision that a lot is on, in words. */
export async function pinView(em: EntityManager, { revision, ...pin }: Pin, programSlug: string): Promise<PinnedSheet> {
  const { id, number, title, state, sheet, assessment } = revision;
  const current = state === "released" ? null : await em.findOne(SheetRevision, { sheet: sheet.id, state: "released" });
  return {
    revision: id,
    assessment: assessment.id,
    number: recordNumber("sheet", programSlug, sheet.number),
    letter: revisionLetters(number ?? 1),
    title,
    state,
    successor: current && { id: current.id, letter: revisionLetters(current.number ?? 1) },
    since: pin.createdAt.toISOString(),
    by: pin.createdBy.name,
    reason: pin.reason,
    fromStep: pin.fromStep,
  };
}
