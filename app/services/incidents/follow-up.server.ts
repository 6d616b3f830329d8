import { randomUUID } from "node:crypto";
import { LockMode } from "@mikro-orm/core";
import { IncidentNote } from "#app/db/entities/incident-note.ts";
import { nextStates } from "#app/lib/incident-states.ts";
import type { FollowUpValues } from "#app/schemas/incident-form.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { findIncident } from "./find-incident.server.ts";

/**
 * Adds a note to an incident, which has the note's state from then on. A sentence says why it was not added.
 * @throws 403 for a role that may not, 404 for an incident that is not the person's own
 */
export async function followUp(
  scope: ActorScope,
  incidentId: string | undefined,
  { state, text }: FollowUpValues,
): Promise<string | null> {
  return inScope(scope, async (em) => {
    const incident = await findIncident(em, scope, incidentId);
    requireInProgram(scope, "follow up incidents", incident.program.id, "incident");
    await em.refresh(incident, { lockMode: LockMode.PESSIMISTIC_WRITE });
    if (!nextStates(incident.state).includes(state))
      return `This incident is ${incident.state} by now, and does not become ${state} from there. Open the page again to see what was noted.`;
    em.create(IncidentNote, {
      id: randomUUID(),
      program: incident.program.id,
      incident,
      state,
      text,
      createdAt: new Date(),
      createdBy: scope.actor.id,
    });
    await em.flush();
    incident.state = state;
    await em.flush();
    return null;
  });
}
