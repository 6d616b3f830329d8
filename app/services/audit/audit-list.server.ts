import type { EntityManager } from "@mikro-orm/postgresql";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import { AUDIT_ACTIONS, type AuditRow } from "#app/schemas/audit.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { escapeLike } from "../like.server.ts";
import { requireOnSite } from "../permission.server.ts";
import { isUuid } from "../uuid.server.ts";

export const AUDIT_SORTS = ["at"] as const;
export const AUDIT_FILTERS = ["program", "subject", "action", "since", "until"] as const;

const SEE = "see the audit trail";
/** The choice of a program for what belongs to none. */
export const OF_THE_SITE = "site";
/** Most rows of a table that is saved. */
const MOST_SAVED = 50_000;

/** A page of the audit trail, newest first unless asked otherwise. Searched by person, kind, field, and whole ids of object or request. */
export async function listAudit(scope: ActorScope, params: ListParams): Promise<ListPage<AuditRow>> {
  requireOnSite(scope, SEE);
  return inScope(scope, async (em) => {
    const [row] = await em.execute<{ total: number }[]>(
      `select count(*)::int as total ${FROM} ${whereOf(params).sql}`,
      [...whereOf(params).values],
    );
    const rows = await rowsOf(em, params, PAGE_SIZE, (params.page - 1) * PAGE_SIZE);
    return { rows, total: row?.total ?? 0, params };
  });
}

/** All that the same list holds, for a table. */
export async function allAudit(scope: ActorScope, params: ListParams): Promise<AuditRow[]> {
  requireOnSite(scope, SEE);
  return inScope(scope, (em) => rowsOf(em, params, MOST_SAVED, 0));
}

/** What the filters offer: programs, and the kinds of record that the trail speaks of. */
export async function auditChoices(scope: ActorScope) {
  requireOnSite(scope, SEE);
  return inScope(scope, async (em) => {
    const programs = await em.execute<{ slug: string; name: string }[]>("select slug, name from program order by name");
    const subjects = await em.execute<{ subject: string }[]>(
      // Jumps from one kind to the next in the index: a plain "distinct" reads the whole trail.
      `with recursive kinds as (
         (select subject from audit_event order by subject limit 1)
         union all
         select (select e.subject from audit_event e where e.subject > kinds.subject order by e.subject limit 1)
           from kinds where kinds.subject is not null
       ) select subject from kinds where subject is not null`,
    );
    return {
      programs: [
        { value: OF_THE_SITE, label: "Of the site" },
        ...programs.map(({ slug, name }) => ({ value: slug, label: name })),
      ],
      subjects: subjects.map(({ subject }) => subject),
    };
  });
}

const FROM = `from audit_event e left join person on person.id = e.actor_id left join program on program.id = e.program_id`;
const DAY = /^\d{4}-\d{2}-\d{2}$/;
const isDay = (text: string | undefined): text is string =>
  text !== undefined && DAY.test(text) && !Number.isNaN(Date.parse(text));

function whereOf({ query, filters }: ListParams): { sql: string; values: unknown[] } {
  const { program, subject, action, since, until } = filters;
  const parts: [sql: string, ...values: unknown[]][] = [];
  if (program === OF_THE_SITE) parts.push(["e.program_id is null"]);
  else if (program) parts.push(["program.slug = ?", program]);
  if (subject) parts.push(["e.subject = ?", subject]);
  if (AUDIT_ACTIONS.some((word) => word === action)) parts.push(["e.action = ?", action]);
  if (isDay(since)) parts.push(["e.at >= ?::timestamptz", `${since}T00:00:00Z`]);
  if (isDay(until)) parts.push(["e.at < ?::timestamptz + interval '1 day'", `${until}T00:00:00Z`]);
  if (isUuid(query)) parts.push(["(e.subject_id = ? or e.request_id = ? or e.id = ?)", query, query, query]);
  else if (query !== "") {
    const like = `%${escapeLike(query)}%`;
    parts.push(["(person.name ilike ? or e.subject ilike ? or e.field ilike ?)", like, like, like]);
  }
  return {
    sql: parts.length === 0 ? "" : `where ${parts.map(([sql]) => sql).join(" and ")}`,
    values: parts.flatMap(([, ...values]) => values),
  };
}

async function rowsOf(em: EntityManager, params: ListParams, limit: number, offset: number): Promise<AuditRow[]> {
  const { sql, values } = whereOf(params);
  const direction = params.descending ? "desc" : "asc";
  const rows = await em.execute<(Omit<AuditRow, "at"> & { at: Date | string })[]>(
    `select e.id, e.at, person.name as actor, program.name as program, e.action, e.subject, e.subject_id as "subjectId", e.field,
            e."from"::text as "from", e."to"::text as "to", e.request_id as "requestId"
       ${FROM} ${sql} order by e.at ${direction}, e.id limit ? offset ?`,
    [...values, limit, offset],
  );
  return rows.map((row) => ({ ...row, at: new Date(row.at).toISOString() }));
}
