import type { EntityManager } from "@mikro-orm/postgresql";
import { Incident } from "#app/db/entities/incident.ts";
import { notFound } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";

/**
 * The incident that an id names.
 * @throws 404 for one that is not there or of a foreign program
 */
export async function findIncident(em: EntityManager, scope: ActorScope, id: string | undefined) {
  const incident = await em.findOne(
    Incident,
    { id: idFrom(id, "incident") },
    { populate: ["program", "assessment", "lot", "wafer", "createdBy"] },
  );
  if (!incident) throw notFound("incident");
  requireInProgram(scope, "see the work", incident.program.id, "incident");
  return incident;
}

export type FoundIncident = Awaited<ReturnType<typeof findIncident>>;
