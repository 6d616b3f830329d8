import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { ProgramRole, SiteRole } from "#app/policies/roles.ts";
import { WEBHOOK_EVENTS, type WebhookEventName } from "#app/schemas/webhook.ts";
import { eventBody, type EventData, type EventProgram } from "./event-body.ts";
import { writeDelivery } from "./write-delivery.server.ts";

interface Raised<Event extends WebhookEventName> {
  program: EventProgram;
  event: Event;
  /** what of its kind it tells, such as the id of a revision: nothing is told twice, however often this is called */
  key: string;
  /** the same in a few words, for the log of deliveries */
  about: string;
  /** who did it; null for Planeward itself */
  by: string | null;
  data: EventData[Event];
}

interface Listener {
  webhook_id: string;
  person_id: string;
  role: ProgramRole;
  site_role: SiteRole | null;
}

/**
 * Writes what happened for each webhook of its program that asks for it, within the caller's transaction: the event and its deliveries are
 * there together or not at all. A webhook hears what whoever made it may read, as their role stands now.
 */
export async function raiseEvent<Event extends WebhookEventName>(
  em: EntityManager,
  raised: Raised<Event>,
): Promise<void> {
  const { program, event, key, about, by, data } = raised;
  // What waits in the unit of work comes first: the event is about it.
  await em.flush();
  const listeners = await em.execute<Listener[]>("select * from webhook_listeners(?, ?)", [program.id, event]);
  const hearing = listeners.filter((listener) => mayHear(listener, event, program.id));
  if (hearing.length === 0) return;
  const eventId = randomUUID();
  const body = eventBody({ id: eventId, event, at: new Date().toISOString(), program, data });
  for (const { webhook_id: webhook } of hearing)
    await writeDelivery(em, { program: program.id, webhook, event, key, eventId, about, body, by });
}

function mayHear({ person_id, role, site_role }: Listener, event: WebhookEventName, program: string): boolean {
  const actor = {
    id: person_id,
    name: "",
    email: "",
    siteRole: site_role,
    memberships: [{ programId: program, programName: "", programSlug: "", role }],
  };
  return mayInProgram(actor, WEBHOOK_EVENTS[event].readers, program);
}
