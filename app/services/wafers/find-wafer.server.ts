import { randomUUID } from "node:crypto";
import { LockMode, type EntityManager } from "@mikro-orm/postgresql";
import { Lot } from "#app/db/entities/lot.ts";
import { Wafer } from "#app/db/entities/wafer.ts";
import { slotName } from "#app/lib/wafer-label.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { escapeLike } from "../like.server.ts";
import { ImportRefused } from "./import-refused.ts";

/** A wafer as a file or a person names it; nothing where it is not named. */
export interface NamedWafer {
  lot: string;
  wafer: string;
  slot: number | null;
}

type Wafered = Wafer & { lot?: { id: string; name: string } | null };

/** The same name without regard to capitals. */
const named = (name: string) => ({ $ilike: escapeLike(name) });

/**
 * The wafer that is named, made when it is new, and held until the transaction ends, so that two of its files do not pass each other
 * by. A wafer that was known by its slot alone takes the name that it is given later.
 * @throws ImportRefused when it is not named, or when its lot and slot say otherwise
 */
export async function findOrMakeWafer(
  em: EntityManager,
  scope: ActorScope,
  program: string,
  named: NamedWafer,
): Promise<Wafered> {
  if (named.wafer === "" && (named.lot === "" || named.slot === null))
    throw new ImportRefused("Name the wafer, or its lot and its slot.");
  const lot = named.lot === "" ? null : await findOrMakeLot(em, scope, program, named.lot);
  const found = (await findWafer(em, program, lot, named)) ?? newWafer(em, scope, program, lot, named);
  await em.flush();
  await em.lock(found, LockMode.PESSIMISTIC_WRITE);
  return found;
}

/** The lot of that name, made when it is new. */
export async function findOrMakeLot(em: EntityManager, scope: ActorScope, program: string, name: string): Promise<Lot> {
  const known = await em.findOne(Lot, { program, name: named(name) });
  return known ?? em.create(Lot, { id: randomUUID(), program, name, note: "", ...made(scope) });
}

async function findWafer(
  em: EntityManager,
  program: string,
  lot: Lot | null,
  { wafer, slot }: NamedWafer,
): Promise<Wafered | null> {
  const inSlot = lot && slot !== null ? await em.findOne(Wafer, { program, lot, slot }, { populate: ["lot"] }) : null;
  if (wafer === "") return inSlot;
  const known = await em.findOne(Wafer, { program, lot, name: named(wafer) }, { populate: ["lot"] });
  if (known) {
    if (slot !== null && known.slot !== null && known.slot !== slot)
      throw new ImportRefused(
        `Wafer ${known.name}${ofLot(lot)} is known in slot ${known.slot}, not ${slot}. Put the slot right, or leave it blank.`,
      );
    if (inSlot && inSlot.id !== known.id) throw slotTaken(inSlot, lot, wafer);
    if (slot !== null) known.slot = slot;
    return known;
  }
  if (!inSlot) return null;
  if (inSlot.name !== slotName(inSlot.slot ?? 0)) throw slotTaken(inSlot, lot, wafer);
  inSlot.name = wafer;
  return inSlot;
}

const slotTaken = (there: Wafer, lot: Lot | null, wafer: string) =>
  new ImportRefused(
    `Slot ${there.slot}${ofLot(lot)} holds wafer ${there.name}, not ${wafer}. Put the slot right, or leave it blank.`,
  );

const ofLot = (lot: Lot | null) => (lot ? ` of lot ${lot.name}` : "");

function newWafer(
  em: EntityManager,
  scope: ActorScope,
  program: string,
  lot: Lot | null,
  { wafer, slot }: NamedWafer,
): Wafered {
  const name = wafer === "" ? slotName(slot ?? 0) : wafer;
  return em.create(Wafer, { id: randomUUID(), program, lot, slot, name, ...made(scope) });
}

const made = ({ actor }: ActorScope) => ({ createdAt: new Date(), createdBy: actor.id });
