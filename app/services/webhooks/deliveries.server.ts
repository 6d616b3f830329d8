import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { WebhookDelivery } from "#app/db/entities/webhook-delivery.ts";
import type { Webhook } from "#app/db/entities/webhook.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import { DELIVERY_STATES, WEBHOOK_EVENT_NAMES, type DeliveryRow, type DeliveryView } from "#app/schemas/webhook.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { escapeLike } from "../like.server.ts";
import { idFrom } from "../uuid.server.ts";
import { eventBody } from "./event-body.ts";
import { queueDelivery } from "./queue-delivery.server.ts";
import { findWebhook } from "./webhooks.server.ts";

export const DELIVERY_SORTS = ["written"] as const;
export const DELIVERY_FILTERS = ["state", "event"] as const;

/** What a webhook was told in the last thirty days, the newest first. */
export async function listDeliveries(
  scope: ActorScope,
  webhookId: string | undefined,
  params: ListParams,
): Promise<ListPage<DeliveryRow>> {
  const { query, filters, descending, page } = params;
  const state = DELIVERY_STATES.find((known) => known === filters["state"]);
  const event = ([...WEBHOOK_EVENT_NAMES, "test"] as const).find((known) => known === filters["event"]);
  return inScope(scope, async (em) => {
    const webhook = await findWebhook(em, scope, webhookId);
    const [rows, total] = await em.findAndCount(
      WebhookDelivery,
      {
        webhook: webhook.id,
        ...(state && { state }),
        ...(event && { event }),
        ...(query && { about: { $ilike: `%${escapeLike(query)}%` } }),
      },
      {
        orderBy: [{ createdAt: descending ? "desc" : "asc" }, { id: "asc" }],
        limit: PAGE_SIZE,
        offset: (page - 1) * PAGE_SIZE,
      },
    );
    return { rows: rows.map(rowOf), total, params };
  });
}

function rowOf(delivery: WebhookDelivery): DeliveryRow {
  const { id, event, about, state, attempts, reason } = delivery;
  return {
    id,
    event,
    about,
    state,
    attempts,
    reason,
    createdAt: delivery.createdAt.toISOString(),
    nextTryAt: delivery.nextTryAt.toISOString(),
    sentAt: delivery.sentAt?.toISOString() ?? null,
  };
}

async function find(em: EntityManager, scope: ActorScope, webhookId: string | undefined, id: string | undefined) {
  const webhook = await findWebhook(em, scope, webhookId);
  const delivery = await em.findOne(WebhookDelivery, { id: idFrom(id, "delivery"), webhook: webhook.id });
  if (!delivery) throw notFound("delivery");
  return { webhook, delivery };
}

/** One delivery with what was sent and what was answered. */
export async function deliveryView(
  scope: ActorScope,
  webhookId: string | undefined,
  id: string | undefined,
): Promise<DeliveryView> {
  return inScope(scope, async (em) => {
    const { webhook, delivery } = await find(em, scope, webhookId, id);
    const { eventId, body, tries, byHand, createdBy } = delivery;
    const [person] = byHand
      ? await em.execute<{ name: string }[]>("select name from person where id = ?", [createdBy?.id])
      : [];
    return {
      ...rowOf(delivery),
      webhook: { id: webhook.id, name: webhook.name, program: webhook.program.name, address: webhook.address },
      eventId,
      body,
      tries,
      byHand: byHand ? (person?.name ?? "somebody of the program") : null,
      mayReplay: webhook.state === "on",
    };
  });
}

/**
 * Sends once more what was sent or given up, as a delivery of its own with the same body: its receiver knows the event by its id.
 * @returns the id of the new delivery
 */
export async function sendAgain(
  scope: ActorScope,
  webhookId: string | undefined,
  id: string | undefined,
): Promise<string> {
  return inScope(scope, async (em) => {
    const { webhook, delivery } = await find(em, scope, webhookId, id);
    if (delivery.state === "waiting" || delivery.state === "sending")
      throw problem(409, "It is on its way. Wait until it was sent or is parked, then send it again.");
    const { event, eventId, about, body, key } = delivery;
    const [, first = key] = /^(.*) again [\da-f-]{36}$/.exec(key) ?? [];
    return writeByHand(em, scope, webhook, { event, eventId, about, body, key: `${first} again ${randomUUID()}` });
  });
}

/** Tries whether deliveries arrive. @returns the id of the delivery */
export async function sendTest(scope: ActorScope, webhookId: string | undefined): Promise<string> {
  return inScope(scope, async (em) => {
    const webhook = await findWebhook(em, scope, webhookId);
    const { id, slug, name } = webhook.program;
    const eventId = randomUUID();
    const body = eventBody({
      id: eventId,
      event: "test",
      at: new Date().toISOString(),
      program: { id, slug, name },
      data: { webhook_id: webhook.id, webhook: webhook.name },
    });
    return writeByHand(em, scope, webhook, { event: "test", eventId, about: "By hand", body, key: eventId });
  });
}

type Written = Pick<WebhookDelivery, "event" | "eventId" | "about" | "body" | "key">;

/** So many at a time that were sent by hand: nobody has a receiver asked much more often than it answers. */
const MOST_BY_HAND = 10;

async function writeByHand(em: EntityManager, scope: ActorScope, webhook: Webhook, written: Written): Promise<string> {
  if (webhook.state === "off") throw problem(409, "The webhook is switched off. Switch it on first.");
  await em.execute("select pg_advisory_xact_lock(hashtextextended(?, 0))", [`by hand to ${webhook.id}`]);
  const underWay = await em.count(WebhookDelivery, {
    webhook: webhook.id,
    byHand: true,
    state: { $in: ["waiting", "sending"] },
  });
  if (underWay >= MOST_BY_HAND)
    throw problem(
      409,
      `${MOST_BY_HAND} deliveries that were sent by hand are still on their way. Wait until they have ended.`,
    );
  const id = randomUUID();
  const now = new Date();
  em.create(WebhookDelivery, {
    id,
    program: webhook.program.id,
    webhook: webhook.id,
    ...written,
    state: "waiting",
    attempts: 0,
    tries: [],
    attemptId: null,
    leaseUntil: null,
    nextTryAt: now,
    reason: "",
    createdAt: now,
    createdBy: scope.actor.id,
    byHand: true,
    sentAt: null,
  });
  await em.flush();
  await queueDelivery(em, id, webhook.id, now);
  return id;
}
