import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { LotSheet } from "#app/db/entities/lot-sheet.ts";
import { SheetRevision } from "#app/db/entities/sheet-revision.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import type { AssignForm } from "#app/schemas/lot-sheet-form.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { lockedRevision } from "../sheets/revision.server.ts";
import { findFloorLot, pinsOf } from "./lot-sheet.server.ts";
import { sheetParts } from "./sheet-steps.server.ts";

/** What became of an assignment; `field` is the one that was wrong. */
export type Assigned = { outcome: "stored" } | { outcome: "refused"; field: keyof AssignForm; sentence: string };

/**
 * Puts a lot on a released revision of its program's sheets, or moves it to another one, which takes a reason. It stays there until
 * somebody moves it, whatever is released since.
 * @throws 404 for a lot or revision that is not there or of another program, 403 for a role that may not
 */
export async function assignSheet(
  scope: ActorScope,
  lotId: string | undefined,
  { revision: revisionId, fromStep, reason }: Omit<AssignForm, "intent">,
): Promise<Assigned> {
  return inScope(scope, async (em): Promise<Assigned> => {
    const lot = await findFloorLot(em, scope, lotId, "assign sheets to lots", true);
    const revision = await lockedRevision(em, scope, revisionId);
    const refused = (field: keyof AssignForm, sentence: string): Assigned => ({ outcome: "refused", field, sentence });
    if (revision.program.id !== lot.program.id)
      return refused("revision", "That sheet is of another program. Choose one of the lot’s own.");
    if (revision.state !== "released")
      return refused("revision", `That revision is ${revision.state}. Choose one that is released.`);
    const { parts, steps } = await sheetParts(em, revision);
    const last = Math.max(...parts.flatMap(({ leg }) => steps(leg).map(({ number }) => number)));
    if (fromStep > last)
      return refused("fromStep", `Its last step is ${last}. Type the step at which the lot goes on.`);
    const [current] = await pinsOf(em, lot.id);
    if (current?.revision.id === revision.id)
      return refused("revision", "The lot is on this revision already. Choose another one.");
    if (current && reason === "")
      return refused("reason", "Say why the lot is moved: its record keeps both revisions.");
    em.create(LotSheet, {
      id: randomUUID(),
      program: lot.program.id,
      lot: lot.id,
      revision: revision.id,
      fromStep,
      reason,
      createdAt: new Date(),
      createdBy: scope.actor.id,
    });
    await em.flush();
    return { outcome: "stored" };
  });
}

/** A revision that a lot can be put on. */
export interface SheetChoice {
  id: string;
  /** 'TERN-H001 B, Tern T-2, to 100 µm' */
  name: string;
}

/** The released revisions of a program. */
export async function sheetChoices(em: EntityManager, program: { id: string; slug: string }): Promise<SheetChoice[]> {
  const revisions = await em.find(
    SheetRevision,
    { program: program.id, state: "released" },
    { populate: ["sheet"], orderBy: { sheet: { number: "asc" } } },
  );
  return revisions.map(({ id, sheet, number, title }) => ({
    id,
    name: `${recordNumber("sheet", program.slug, sheet.number)} ${revisionLetters(number ?? 1)}, ${title}`,
  }));
}
