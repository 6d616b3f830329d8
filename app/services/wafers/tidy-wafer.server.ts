import type { EntityManager } from "@mikro-orm/postgresql";
import { Lot } from "#app/db/entities/lot.ts";
import { Wafer } from "#app/db/entities/wafer.ts";
import { referencedBy } from "../referenced.server.ts";

/** Takes away wafers of which nothing is left, and then their lots, within a transaction that is open already. */
export async function tidyWafers(em: EntityManager, ids: Iterable<string>): Promise<void> {
  const lots = new Set<string>();
  for (const id of ids) {
    if ((await referencedBy(em, "wafer", id)).length > 0) continue;
    const wafer = await em.findOne(Wafer, { id });
    if (!wafer) continue;
    if (wafer.lot) lots.add(wafer.lot.id);
    em.remove(wafer);
    await em.flush();
  }
  for (const id of lots) {
    if ((await referencedBy(em, "lot", id)).length > 0) continue;
    const lot = await em.findOne(Lot, { id });
    // What somebody wrote of a lot is not thrown away.
    if (lot && lot.note === "") em.remove(lot);
    await em.flush();
  }
}
