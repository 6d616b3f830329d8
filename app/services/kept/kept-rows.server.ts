import type { EntityManager } from "@mikro-orm/postgresql";
import { KEPT_KINDS, type KeptKind } from "#app/lib/kept-kinds.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import type { FoundGroup, FoundRow } from "#app/schemas/search.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { FINDABLE, type Findable } from "../search/findable.server.ts";

/** Rows that the palette and Today show of either group. */
const SHOWN = 10;

type KeptTable = "recent_visit" | "favourite";

/** A record that was opened or marked, as it is called now. */
export interface KeptRow extends FoundRow {
  kind: KeptKind;
  id: string;
}

type Row = Omit<KeptRow, "key"> & { total: number };

/**
 * What a person has opened or marked, the newest first. What is gone, lies in a program that they have left, or is of a kind that
 * their role does not open is left out and not counted.
 */
export async function keptRows(
  em: EntityManager,
  { actor }: ActorScope,
  table: KeptTable,
  limit: number,
): Promise<{ rows: KeptRow[]; total: number }> {
  const programs = programsWhere(actor, "see the work").map(({ programId }) => programId);
  const kinds = KEPT_KINDS.filter((kind) => FINDABLE[kind].open(actor));
  if (kinds.length === 0) return { rows: [], total: 0 };
  const rows = await em.execute<Row[]>(
    `with mine as (select kind, record_id, at from "${table}" where person_id = ?),
          asked as (select ${programs.length > 0 ? "array[?]" : "array[]"}::uuid[] as programs)
     select kind, id, name, about, path, count(*) over ()::int as total
       from (${kinds.map(selectOf).join("\n union all ")}) kept
      order by at desc, id limit ${limit}`,
    programs.length > 0 ? [actor.id, programs] : [actor.id],
  );
  return {
    rows: rows.map(({ kind, id, name, about, path }) => ({
      key: `${table} ${id}`,
      kind,
      id,
      name,
      about: [kind, about].filter(Boolean).join(", "),
      path,
    })),
    total: rows[0]?.total ?? 0,
  };
}

function selectOf(kind: KeptKind): string {
  const { rows, walled }: Findable = FINDABLE[kind];
  return `select mine.kind, mine.at, found.id, found.name, found.about, found.path
            from mine join (${rows}) found on found.id = mine.record_id${walled ? ", asked" : ""}
           where mine.kind = '${kind}'${walled ? " and found.program_id = any (asked.programs)" : ""}`;
}

/** Whether there is such a record that the person may open. */
export async function mayOpen(em: EntityManager, { actor }: ActorScope, kind: KeptKind, id: string): Promise<boolean> {
  const { rows, walled, open }: Findable = FINDABLE[kind];
  if (!open(actor)) return false;
  const found = await em.execute<{ program_id: string | null }[]>(
    `select ${walled ? "program_id" : "null as program_id"} from (${rows}) found where id = ?`,
    [id],
  );
  const programs = programsWhere(actor, "see the work").map(({ programId }) => programId);
  return found.some(({ program_id }) => !walled || (program_id !== null && programs.includes(program_id)));
}

/** What a person marked and what they opened last, as the palette shows them before anything is typed. */
export async function keptGroups(em: EntityManager, scope: ActorScope): Promise<FoundGroup[]> {
  const marked = await keptRows(em, scope, "favourite", SHOWN);
  const opened = await keptRows(em, scope, "recent_visit", SHOWN);
  const group = (kind: string, title: string, { rows, total }: typeof marked, list: string | null): FoundGroup => ({
    kind,
    title,
    rows: rows.map(({ key, name, about, path }) => ({ key, name, about, path })),
    total: list ? total : rows.length,
    list: list && total > rows.length ? list : null,
  });
  return [
    group("favourite", "Favourites", marked, "/favourites"),
    group("recent", "Recently opened", opened, null),
  ].filter(({ rows }) => rows.length > 0);
}
