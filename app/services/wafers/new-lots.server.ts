import { randomUUID } from "node:crypto";
import { UniqueConstraintViolationException } from "@mikro-orm/core";
import { Lot } from "#app/db/entities/lot.ts";
import { Wafer } from "#app/db/entities/wafer.ts";
import { readLotTable } from "#app/lib/lot-table.ts";
import type { NewLotForm } from "#app/schemas/new-lot-form.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { escapeLike } from "../like.server.ts";
import { requireInProgram } from "../permission.server.ts";

/** What became of new lots: the id of the only one, or null of several; or what is wrong with them, a sentence each. */
export type MadeLots = { outcome: "stored"; only: string | null } | { outcome: "refused"; faults: string[] };

const SAID = 8;

/**
 * Makes the lots that are typed or that a table has, with their wafers: all of them or none.
 * @throws 403 for a role that may not, 404 for a program that is not the person's own
 */
export async function makeLots(scope: ActorScope, { program, name, wafers }: NewLotForm): Promise<MadeLots> {
  requireInProgram(scope, "upload scans", program, "program");
  const { lots, faults } = readLotTable(wafers, name);
  if (faults.length > 0) return { outcome: "refused", faults: faults.slice(0, SAID) };
  try {
    return await inScope(scope, async (em): Promise<MadeLots> => {
      const known: string[] = [];
      for (const { name: each } of lots)
        if ((await em.count(Lot, { program, name: { $ilike: escapeLike(each) } })) > 0) known.push(each);
      if (known.length > 0) return { outcome: "refused", faults: known.slice(0, SAID).map(isThere) };
      const made = { createdAt: new Date(), createdBy: scope.actor.id };
      const ids = lots.map((lot) => {
        const id = randomUUID();
        em.create(Lot, { id, program, name: lot.name, note: "", ...made });
        for (const wafer of lot.wafers) em.create(Wafer, { id: randomUUID(), program, lot: id, ...wafer, ...made });
        return id;
      });
      await em.flush();
      return { outcome: "stored", only: ids.length === 1 ? (ids[0] ?? null) : null };
    });
  } catch (error) {
    if (error instanceof UniqueConstraintViolationException)
      return { outcome: "refused", faults: ["Somebody made a lot of that name at the same moment. Look at the list."] };
    throw error;
  }
}

const isThere = (name: string) =>
  `There is already a lot ${name} in this program. Give it another name, or open that one.`;
