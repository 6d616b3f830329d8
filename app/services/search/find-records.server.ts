import type { EntityManager } from "@mikro-orm/postgresql";
import { escapeRegex, type MatchRank } from "#app/lib/match-rank.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import type { FoundGroup } from "#app/schemas/search.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { escapeLike, wordPatterns } from "../like.server.ts";
import { FINDABLE, findableBy, type Findable, type FindableKind } from "./findable.server.ts";

/** Rows that are shown of a kind; the list has the rest. */
export const SHOWN = 8;

/** A group with how well its best row fits, by which groups are put in order. */
export interface RankedGroup extends FoundGroup {
  best: MatchRank;
}

interface Row {
  kind: FindableKind;
  id: string;
  name: string;
  about: string;
  path: string;
  rank: MatchRank;
  total: number;
}

/** The records that a search finds, kind by kind, in one query; what the person may not open is not looked at. */
export async function findRecords(em: EntityManager, { actor }: ActorScope, query: string): Promise<RankedGroup[]> {
  const kinds = findableBy(actor);
  if (kinds.length === 0) return [];
  const programs = programsWhere(actor, "see the work").map(({ programId }) => programId);
  const rows = await em.execute<Row[]>(
    `with asked as (
       select ?::text as name, ?::text as beginning, ?::text as word, array[?]::text[] as patterns,
              ${programs.length > 0 ? "array[?]" : "array[]"}::uuid[] as programs)
     ${kinds.map(([kind, findable]) => `(${selectOf(kind, findable)})`).join("\n union all ")}`,
    [
      query.toLowerCase(),
      `${escapeLike(query)}%`,
      `\\m${escapeRegex(query)}`,
      wordPatterns(query),
      ...(programs.length > 0 ? [programs] : []),
    ],
  );
  return kinds.flatMap(([kind]) =>
    groupOf(
      kind,
      rows.filter((row) => row.kind === kind),
      query,
    ),
  );
}

function selectOf(kind: FindableKind, { rows, walled }: Findable): string {
  return `select '${kind}' as kind, id, name, about, path, rank, total from (
      select found.*, count(*) over ()::int as total,
             case when lower(found.name) = asked.name then 0
                  when found.name ilike asked.beginning then 1
                  when found.name ~* asked.word then 2
                  else 3 end as rank
        from (${rows}) found, asked
       where found.name || ' ' || found.also ilike all (asked.patterns)
             ${walled ? "and found.program_id = any (asked.programs)" : ""}) ranked
     order by rank, lower(name), about, id limit ${SHOWN}`;
}

function groupOf(kind: FindableKind, rows: Row[], query: string): RankedGroup[] {
  const [best] = rows;
  if (!best) return [];
  const { title, list }: Findable = FINDABLE[kind];
  return [
    {
      kind,
      title,
      rows: rows.map(({ id, name, about, path }) => ({ key: `${kind} ${id}`, name, about, path })),
      total: best.total,
      list: list && best.total > rows.length ? `${list}?${new URLSearchParams({ q: query }).toString()}` : null,
      best: best.rank,
    },
  ];
}
