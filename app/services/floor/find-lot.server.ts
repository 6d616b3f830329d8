import type { EntityManager } from "@mikro-orm/postgresql";
import { recordNumberSql } from "#app/lib/record-number.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import type { FoundLot, FoundLots } from "#app/schemas/floor-view.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { escapeLike, wordPatterns } from "../like.server.ts";
import { requireInSomeProgram } from "../permission.server.ts";

const MOST = 20;
const LAST = 6;

/** The address of a lot, as a code on its box may hold it. */
const ADDRESS = /\/lots\/([0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12})\b/i;

/**
 * Lots by what was typed or scanned: a name, a part of one, or the address of a lot.
 * @throws 403 for who works on the floor of no program
 */
export async function findLots(scope: ActorScope, typed: string): Promise<FoundLots> {
  requireInSomeProgram(scope, "work on the floor");
  // NUL is no character to the database.
  const query = typed.replaceAll("\0", "").trim().slice(0, 200);
  const programs = programsWhere(scope.actor, "work on the floor").map(({ programId }) => programId);
  return inScope(scope, async (em) => {
    const mine = await lotsWhere(
      em,
      programs,
      `l.id in (select lot_id from floor_entry where created_by_id = ?)`,
      [scope.actor.id],
      `(select max(received_at) from floor_entry where lot_id = l.id and created_by_id = ?) desc limit ${LAST}`,
      [scope.actor.id],
    );
    const addressed = ADDRESS.exec(query)?.[1];
    if (addressed) {
      const rows = await lotsWhere(em, programs, "l.id = ?", [addressed.toLowerCase()]);
      return { query, exact: rows[0]?.id ?? null, rows, mine };
    }
    if (query === "") return { query, exact: null, rows: [], mine };
    const named = await lotsWhere(em, programs, "l.name ilike ?", [escapeLike(query)]);
    if (named.length === 1) return { query, exact: named[0]?.id ?? null, rows: named, mine };
    const patterns = wordPatterns(query);
    const rows = await lotsWhere(em, programs, patterns.map(() => "l.name ilike ?").join(" and ") || "true", patterns);
    return { query, exact: null, rows, mine };
  });
}

function lotsWhere(
  em: EntityManager,
  programs: readonly string[],
  condition: string,
  values: readonly unknown[],
  order = `l.created_at desc, l.id limit ${MOST}`,
  orderValues: readonly unknown[] = [],
): Promise<FoundLot[]> {
  return em.execute<FoundLot[]>(
    `select l.id, l.name, p.name as program,
            (select ${recordNumberSql("sheet", "s.number")}
               from lot_sheet x join sheet_revision r on r.id = x.revision_id join sheet s on s.id = r.sheet_id
              where x.lot_id = l.id order by x.created_at desc, x.id desc limit 1) as sheet
       from lot l join program p on p.id = l.program_id
      where l.program_id in (${programs.map(() => "?").join(", ")}) and ${condition} order by ${order}`,
    [...programs, ...values, ...orderValues],
  );
}
