import { raw, type EntityManager, type FilterQuery, type QueryOrderMap } from "@mikro-orm/postgresql";
import { Incident } from "#app/db/entities/incident.ts";
import { readRecordNumber, recordNumber } from "#app/lib/record-number.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import { INCIDENT_KINDS, INCIDENT_STATES, SEVERITIES, type IncidentRow } from "#app/schemas/incident.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { everyWord } from "../like.server.ts";
import { requireInSomeProgram } from "../permission.server.ts";
import { programFilter } from "../program-filter.server.ts";

export const INCIDENT_SORTS = ["happened", "number", "what", "severity", "state", "lot", "step"] as const;
export const INCIDENT_FILTERS = ["program", "what", "severity", "state"] as const;

/** Most rows of a table that is saved. */
const MOST_SAVED = 20_000;

/** A page of the incidents of the person's programs. Searched by words, lot, wafer, step, reporter and number. */
export async function listIncidents(scope: ActorScope, params: ListParams): Promise<ListPage<IncidentRow>> {
  requireInSomeProgram(scope, "see the work");
  return inScope(scope, async (em) => {
    const where = whereOf(scope, params);
    const total = await em.count(Incident, where);
    return { rows: await rowsOf(em, where, params, PAGE_SIZE, (params.page - 1) * PAGE_SIZE), total, params };
  });
}

/** All that the same list holds, for a table. */
export async function allIncidents(scope: ActorScope, params: ListParams): Promise<IncidentRow[]> {
  requireInSomeProgram(scope, "see the work");
  return inScope(scope, (em) => rowsOf(em, whereOf(scope, params), params, MOST_SAVED, 0));
}

function whereOf({ actor }: ActorScope, { query, filters }: ListParams): FilterQuery<Incident> {
  const kind = INCIDENT_KINDS.find((word) => word === filters["what"]);
  const severity = SEVERITIES.find((word) => word === filters["severity"]);
  const state = INCIDENT_STATES.find((word) => word === filters["state"]);
  const numbered = readRecordNumber("incident", query);
  return {
    program: programFilter(actor, "see the work", filters["program"]),
    ...(kind ? { kind } : {}),
    ...(severity ? { severity } : {}),
    ...(state ? { state } : {}),
    $and: numbered
      ? [{ number: numbered.number, program: { slug: numbered.slug } }]
      : everyWord(query, (like) => ({
          $or: [
            { words: like },
            { stepTitle: like },
            { lot: { name: like } },
            { wafer: { name: like } },
            { createdBy: { name: like } },
          ],
        })).$and,
  } as FilterQuery<Incident>;
}

async function rowsOf(
  em: EntityManager,
  where: FilterQuery<Incident>,
  params: ListParams,
  limit: number,
  offset: number,
): Promise<IncidentRow[]> {
  const incidents = await em.find(Incident, where, {
    populate: ["program", "lot", "wafer", "createdBy"],
    orderBy: [orderOf(params), { occurredAt: "desc" }, { id: "asc" }],
    limit,
    offset,
  });
  return incidents.map(({ program, lot, wafer, ...incident }) => ({
    id: incident.id,
    number: recordNumber("incident", program.slug, incident.number),
    program: program.name,
    kind: incident.kind,
    severity: incident.severity,
    state: incident.state,
    lot: lot.name,
    wafer: wafer?.name ?? null,
    step: incident.step,
    stepTitle: incident.stepTitle,
    support: incident.planned,
    silicon: incident.silicon,
    films: incident.films,
    affected: incident.affected,
    broken: incident.broken,
    through: incident.through ?? null,
    occurredAt: incident.occurredAt.toISOString(),
    reportedBy: incident.createdBy.name,
    words: incident.words,
  }));
}

/** Newest first; severities by how bad they are, states by how much is left to do. */
function orderOf({ sort, descending }: ListParams): QueryOrderMap<Incident> {
  const direction = descending ? "desc" : "asc";
  const ranked = (column: string, words: readonly string[]) => {
    const list = words.map((word) => `'${word}'`).join(", ");
    return { [raw((alias) => `array_position(array[${list}]::text[], ${alias}.${column})`)]: direction };
  };
  if (sort === "number") return { program: { slug: direction }, number: direction };
  if (sort === "what") return { kind: direction };
  if (sort === "lot") return { lot: { name: direction } };
  if (sort === "step") return { step: direction };
  if (sort === "severity") return ranked("severity", SEVERITIES);
  if (sort === "state") return ranked("state", INCIDENT_STATES);
  return { occurredAt: descending ? "asc" : "desc" };
}
