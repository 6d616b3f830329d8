import { HandOver } from "#app/db/entities/hand-over.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import type { LotAtPlace } from "#app/schemas/hand-over.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInSomeProgram } from "../permission.server.ts";

/** Lots of which nothing was heard for longer are not on the floor any more. */
const DAYS = 30;
const MOST = 100;

interface Row {
  id: string;
  name: string;
  program: string;
  slug: string;
  sheet: number | null;
  number: number | null;
}

/**
 * The lots that a person may hand over: of the programs on whose floor they work, those of which something was entered or that were put
 * on a sheet of late, or that are held; the newest first. And the places that were handed over before.
 */
export async function lotsToHandOver(scope: ActorScope): Promise<{ lots: LotAtPlace[]; places: string[] }> {
  requireInSomeProgram(scope, "work on the floor");
  const programs = programsWhere(scope.actor, "work on the floor").map(({ programId }) => programId);
  return inScope(scope, async (em) => {
    const rows = await em.execute<Row[]>(
      `select lot.id, lot.name, p.name as program, p.slug, s.number as sheet, r.number
         from lot
         join program p on p.id = lot.program_id
         left join lateral (
           select revision_id, created_at from lot_sheet where lot_sheet.lot_id = lot.id order by created_at desc, id desc limit 1
         ) pin on true
         left join sheet_revision r on r.id = pin.revision_id
         left join sheet s on s.id = r.sheet_id
         left join lateral (select max(received_at) as at from floor_entry where floor_entry.lot_id = lot.id) heard on true
        where lot.program_id in (?)
          and (greatest(pin.created_at, heard.at) > now() - make_interval(days => ${DAYS})
               or exists (select 1 from lot_hold h where h.lot_id = lot.id and h.cleared_at is null))
        order by greatest(pin.created_at, heard.at) desc nulls last, lot.name, lot.id limit ${MOST}`,
      [programs],
    );
    const before = await em.find(
      HandOver,
      { program: { $in: programs } },
      { fields: ["place", "lots"], orderBy: { givenAt: "desc" }, limit: 200 },
    );
    const lots = rows.map(({ id, name, program, slug, sheet, number }) => {
      const last = before.find((each) => each.lots.some((lot) => lot.id === id));
      return {
        id,
        name,
        program,
        sheet: sheet === null ? null : `${recordNumber("sheet", slug, sheet)} ${revisionLetters(number ?? 1)}`,
        on: last?.lots.find((lot) => lot.id === id)?.on ?? "",
        place: last?.place ?? "",
      };
    });
    return { lots, places: [...new Set(before.map(({ place }) => place))].toSorted() };
  });
}
