import { Wafer } from "#app/db/entities/wafer.ts";
import type { ListParams } from "#app/lib/list-params.ts";
import type { LooseWafers } from "#app/schemas/lot-view.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { everyWord } from "../like.server.ts";
import { programFilter } from "../program-filter.server.ts";
import { scanPrograms } from "../scans.server.ts";

/** Wafers that stand below the lots; a search finds the others. */
const SHOWN = 25;

/** The newest wafers that belong to no lot, such as monitors, by the same search as the lots. */
export async function looseWafers(scope: ActorScope, { query, filters }: ListParams): Promise<LooseWafers> {
  scanPrograms(scope, "see the work");
  return inScope(scope, async (em) => {
    const [wafers, total] = await em.findAndCount(
      Wafer,
      {
        lot: null,
        program: programFilter(scope.actor, "see the work", filters["program"]),
        ...(query ? everyWord(query, (name) => ({ name })) : {}),
      },
      { populate: ["program"], orderBy: [{ createdAt: "desc" }, { id: "asc" }], limit: SHOWN },
    );
    const rows = wafers.map(({ id, name, program, createdAt }) => ({
      id,
      name,
      program: program.name,
      createdAt: createdAt.toISOString(),
    }));
    return { rows, total };
  });
}
