import type { EntityManager } from "@mikro-orm/postgresql";
import { LotHold } from "#app/db/entities/lot-hold.ts";
import { StepStop } from "#app/db/entities/step-stop.ts";
import { whoClears } from "#app/lib/floor/block-causes.ts";
import type { ClearForm, HoldForm, StopForm } from "#app/schemas/block-form.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { lockedRevision } from "../sheets/revision.server.ts";
import { mayClear } from "./blocks.server.ts";
import { findFloorLot, pinsOf } from "./lot-sheet.server.ts";
import { sheetParts } from "./sheet-steps.server.ts";
import { tellOfHold, tellOfStop } from "./tell.server.ts";

/**
 * Holds a lot: nothing of it begins until somebody who may has cleared it. Sent again, it counts once.
 * @throws 404 for a lot that is not there or of another program, 403 for a role that may not
 */
export async function holdLot(
  scope: ActorScope,
  lotId: string | undefined,
  { id, cause, reason }: Omit<HoldForm, "intent">,
): Promise<void> {
  await inScope(scope, async (em) => {
    const lot = await findFloorLot(em, scope, lotId, "hold lots and clear what the shift can", true);
    const { program } = lot;
    if (await em.findOne(LotHold, { id, lot: lot.id })) return;
    em.create(LotHold, { id, program: program.id, lot: lot.id, cause, reason, ...opened(scope) });
    await em.flush();
    await tellOfHold(em, scope, { id, lot, program, reason });
  });
}

/**
 * Stops a step of the sheet that a lot is or was on, for every lot, until somebody who may has cleared it. Sent again, it counts once.
 * @throws 404 for a lot or step that is not there, 409 for a sheet that the lot was never on
 */
export async function stopStep(
  scope: ActorScope,
  lotId: string | undefined,
  { id, revision: revisionId, leg, step: number, cause, reason }: Omit<StopForm, "intent">,
): Promise<void> {
  await inScope(scope, async (em) => {
    const lot = await findFloorLot(em, scope, lotId);
    const { program } = lot;
    const pin = (await pinsOf(em, lot.id)).find(({ revision }) => revision.id === revisionId);
    if (!pin) throw problem(409, "This lot is not on that sheet. Open the lot again, and stop the step there.");
    // Whoever begins the step at the same moment waits, and is then refused.
    const revision = await lockedRevision(em, scope, pin.revision.id);
    if (await em.findOne(StepStop, { id, lot: lot.id })) return;
    const step = (await sheetParts(em, revision)).steps(leg).find((each) => each.number === number);
    if (!step) throw notFound("step");
    em.create(StepStop, {
      id,
      program: program.id,
      sheet: revision.sheet.id,
      revision: revision.id,
      lot: lot.id,
      step: number,
      title: step.title,
      cause,
      reason,
      ...opened(scope),
    });
    await em.flush();
    await tellOfStop(em, scope, {
      id,
      lot,
      program,
      reason,
      flow: revision.title,
      step: { number, title: step.title },
    });
  });
}

const opened = ({ actor }: ActorScope) => ({
  openedAt: new Date(),
  openedBy: actor.id,
  clearedAt: null,
  clearedBy: null,
  clearedWords: null,
});

/**
 * Clears a hold of a lot, or a stop that was seen at it or at another lot of its program.
 * @throws 404 for what is not there, 403 where the cause is not this person's to clear, 409 when it is cleared already
 */
export async function clearBlock(
  scope: ActorScope,
  lotId: string | undefined,
  { block, kind, words }: Omit<ClearForm, "intent">,
): Promise<void> {
  await inScope(scope, async (em) => {
    const lot = await findFloorLot(em, scope, lotId, undefined, true);
    const found = await openBlock(em, kind, block, lot);
    if (!found) throw notFound(kind);
    if (!mayClear(scope.actor, lot.program.id, found.cause))
      throw problem(403, `This ${kind} is for the ${whoClears(found.cause)} to clear. Call them.`);
    if (found.clearedAt) throw problem(409, `This ${kind} is cleared already: ${found.clearedWords ?? ""}`);
    Object.assign(found, { clearedAt: new Date(), clearedBy: scope.actor.id, clearedWords: words });
    await em.flush();
  });
}

function openBlock(
  em: EntityManager,
  kind: ClearForm["kind"],
  id: string,
  lot: { id: string; program: { id: string } },
): Promise<LotHold | StepStop | null> {
  return kind === "hold"
    ? em.findOne(LotHold, { id, lot: lot.id })
    : em.findOne(StepStop, { id, program: lot.program.id });
}
