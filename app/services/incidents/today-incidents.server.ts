import type { EntityManager } from "@mikro-orm/postgresql";
import { Incident } from "#app/db/entities/incident.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { SHOWN } from "#app/lib/today-groups.ts";
import { programsWhere } from "#app/policies/permissions.ts";
import type { TodayGroup, TodayIncident } from "#app/schemas/today.ts";
import type { ActorScope } from "#app/server/scope.server.ts";

/** Incidents that nobody follows up yet, oldest first, for who may. */
export async function incidentsOfToday(em: EntityManager, { actor }: ActorScope): Promise<TodayGroup<TodayIncident>> {
  const programs = programsWhere(actor, "follow up incidents").map(({ programId }) => programId);
  const [incidents, total] = await em.findAndCount(
    Incident,
    { program: { $in: programs }, state: "open" },
    { populate: ["program", "lot"], orderBy: { occurredAt: "asc", id: "asc" }, limit: SHOWN },
  );
  return {
    total,
    rows: incidents.map(({ id, program, number, kind, severity, lot, step, stepTitle, words, occurredAt }) => ({
      id,
      title: `${recordNumber("incident", program.slug, number)}, ${kind} at step ${step}, ${stepTitle}`,
      severity,
      words,
      lot: lot.name,
      program: program.name,
      at: occurredAt.toISOString(),
    })),
  };
}
