import type { EntityManager } from "@mikro-orm/postgresql";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { FloorBlock, LotDesk } from "#app/schemas/floor-view.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { sheetChoices } from "./assign-sheet.server.ts";
import { blocksOf, holdsOf } from "./blocks.server.ts";
import { progressOf } from "./entries.server.ts";
import { findFloorLot, pinsOf, pinView, type Pin } from "./lot-sheet.server.ts";
import { sheetParts } from "./sheet-steps.server.ts";

/**
 * What the desk sees of a lot on the floor: the revision that it is on and was on, where it is, and what holds it.
 * @throws 404 for a lot that is not there or of another program, 403 for a role that may not
 */
export async function lotDesk(scope: ActorScope, lotId: string | undefined): Promise<LotDesk> {
  return inScope(scope, async (em) => {
    const lot = await findFloorLot(em, scope, lotId, "see the work");
    const { program } = lot;
    const mayAssign = mayInProgram(scope.actor, "assign sheets to lots", program.id);
    const [pin, ...before] = await pinsOf(em, lot.id);
    const desk = pin ? await onSheet(em, scope, lot, pin) : null;
    return {
      pin: desk?.pin ?? null,
      parts: desk?.parts ?? [],
      blocks: desk?.blocks ?? (await holdsOf(em, scope, lot, program.id)),
      before: await Promise.all(before.map((each) => pinView(em, each, program.slug))),
      choices: mayAssign ? (await sheetChoices(em, program)).filter(({ id }) => id !== pin?.revision.id) : [],
      mayAssign,
      mayHold: mayInProgram(scope.actor, "hold lots and clear what the shift can", program.id),
    };
  });
}

async function onSheet(
  em: EntityManager,
  scope: ActorScope,
  lot: Awaited<ReturnType<typeof findFloorLot>>,
  pin: Pin,
): Promise<Pick<LotDesk, "parts" | "blocks"> & { pin: NonNullable<LotDesk["pin"]> }> {
  const view = await pinView(em, pin, lot.program.slug);
  const { parts, steps: stepsOf } = await sheetParts(em, pin.revision);
  const blocks = new Map<string, FloorBlock>();
  const places: LotDesk["parts"] = [];
  for (const { leg, name } of parts) {
    const steps = stepsOf(leg);
    const { here, underWay, done, missing } = await progressOf(em, lot.id, pin, leg, steps);
    const step = steps.find(({ number }) => number === here);
    places.push({
      leg,
      name,
      here: step ? { number: step.number, title: step.title, underWay: underWay === step.number } : null,
      done: done.length,
      total: steps.length,
      missing,
    });
    const asked = { lot, program: lot.program.id, sheet: pin.revision.sheet.id, pin: view, steps };
    // A hold, and a stop of a step that several parts go through, stands once.
    for (const block of await blocksOf(em, scope, asked)) blocks.set(`${block.id ?? block.kind} ${block.step}`, block);
  }
  return { pin: view, parts: places, blocks: [...blocks.values()] };
}
