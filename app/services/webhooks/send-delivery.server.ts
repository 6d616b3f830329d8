import { randomUUID } from "node:crypto";
import { LockMode } from "@mikro-orm/core";
import type { EntityManager } from "@mikro-orm/postgresql";
import { z } from "zod";
import { WebhookDelivery } from "#app/db/entities/webhook-delivery.ts";
import { Webhook } from "#app/db/entities/webhook.ts";
import { LONGEST_REQUEST, type Answer } from "#app/integrations/webhook/send-request.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import { WEBHOOK_EVENTS } from "#app/schemas/webhook.ts";
import { log } from "#app/server/log.server.ts";
import { inScope, type Scope } from "#app/server/scope.server.ts";
import { actorById } from "../actor.server.ts";
import { backOff, MOST_ATTEMPTS } from "../mail/back-off.ts";
import { queueDelivery } from "./queue-delivery.server.ts";
import { readSecret } from "./secret.server.ts";
import { deliveryHeaders } from "./sign.server.ts";
import { switchOffWhatFails } from "./switch-off.server.ts";

const payloadSchema = z.object({ id: z.uuid() });

/** Longer than an attempt can last, so that two processes are never at the same delivery, milliseconds. */
const LEASE = LONGEST_REQUEST + 10_000;

/** Posts one delivery; what it is given is signed already. */
export type Post = (posted: { address: string; headers: Record<string, string>; body: string }) => Promise<Answer>;

/**
 * Sends one delivery and notes what was answered. 'sending' is committed before the receiver is spoken to; what a process that dies
 * leaves behind is sent again once its lease is over. A receiver may so get the same twice, and knows it by its id.
 */
export async function sendDelivery(payload: unknown, post: Post): Promise<void> {
  const { id } = payloadSchema.parse(payload);
  const work: Scope = { personId: null, atWork: true, requestId: randomUUID() };
  const attempt = await takeUp(work, id);
  if (attempt === null) return;
  const began = Date.now();
  const headers = deliveryHeaders(id, attempt.body, attempt.secret, began);
  const answer = await post({ address: attempt.address, headers, body: attempt.body });
  await inScope(work, (em) => note(em, { id, attemptId: attempt.id, began, answer }));
}

/** Marks a delivery as being sent; null when there is nothing to send now. */
async function takeUp(work: Scope, id: string) {
  const open = { id, state: { $in: ["waiting", "sending"] as const } };
  const known = await inScope(work, (em) => em.findOne(WebhookDelivery, open, { populate: ["webhook"] }));
  if (!known) return null;
  const maker = await actorById(known.webhook.createdBy.id, work.requestId);
  return inScope(work, async (em) => {
    const row = await em.findOne(WebhookDelivery, open, { lockMode: LockMode.PESSIMISTIC_PARTIAL_WRITE });
    // Another worker has it under its hands.
    if (!row) return null;
    const { event, body, attempts } = row;
    const webhook = await em.findOneOrFail(Webhook, row.webhook.id);
    const from = row.state === "sending" ? row.leaseUntil : row.nextTryAt;
    if (from && from.getTime() > Date.now()) {
      await queueDelivery(em, id, webhook.id, from);
      return null;
    }
    const permission = event === "test" ? "keep webhooks" : WEBHOOK_EVENTS[event].readers;
    const mayHear = maker !== null && mayInProgram(maker, permission, row.program.id);
    const secret = secretOf(webhook);
    if (webhook.state === "off") await park(em, id, "The webhook is switched off.");
    else if (!mayHear)
      await park(em, id, "Whoever made the webhook may not see in the program what it tells any more.");
    else if (secret === null)
      await park(em, id, "Its secret cannot be read: SECRET_KEY is not what it was. Renew the secret.");
    else {
      const attemptId = randomUUID();
      await em.nativeUpdate(
        WebhookDelivery,
        { id },
        { state: "sending", attemptId, leaseUntil: new Date(Date.now() + LEASE), attempts: attempts + 1 },
      );
      return { id: attemptId, body, secret, address: webhook.address };
    }
    return null;
  });
}

function secretOf({ id, sealedSecret }: Webhook): string | null {
  try {
    return readSecret(id, sealedSecret);
  } catch (error) {
    log.error({ webhook: id, error: String(error) }, "the secret of a webhook cannot be read");
    return null;
  }
}

interface Ended {
  id: string;
  attemptId: string;
  began: number;
  answer: Answer;
}

/** What the trail of deeds need not know is written beside the unit of work: how a delivery went stands in its own log. */
async function note(em: EntityManager, { id, attemptId, began, answer }: Ended): Promise<void> {
  // Only the attempt that is under way has a say in how it ended.
  const row = await em.findOne(WebhookDelivery, { id, attemptId, state: "sending" }, { populate: ["webhook"] });
  if (!row) return;
  const now = new Date();
  const tried = {
    at: new Date(began).toISOString(),
    milliseconds: now.getTime() - began,
    status: answer.status,
    said: answer.failure ?? answer.body,
  };
  const ended = { attemptId: null, leaseUntil: null, tries: [...row.tries, tried] };
  const { webhook } = row;
  if (answer.status !== null && answer.status >= 200 && answer.status < 300) {
    await em.nativeUpdate(WebhookDelivery, { id }, { ...ended, state: "sent", reason: "", sentAt: now });
    await em.nativeUpdate(Webhook, { id: webhook.id }, { failures: 0, failingSince: null, lastSentAt: now });
    return;
  }
  const failed = reasonOf(answer);
  const whole = `${failed.charAt(0).toUpperCase()}${failed.slice(1)}.`;
  // Whoever sends a test looks at how it ends.
  const most = row.event === "test" ? 1 : MOST_ATTEMPTS;
  if (row.attempts >= most) {
    const reason = most === 1 ? whole : `Not taken in ${row.attempts} attempts. Lastly ${failed}.`;
    await em.nativeUpdate(WebhookDelivery, { id }, { ...ended, state: "parked", reason });
  } else {
    const nextTryAt = new Date(now.getTime() + backOff(row.attempts, Math.random()));
    await em.nativeUpdate(WebhookDelivery, { id }, { ...ended, state: "waiting", nextTryAt, reason: whole });
    await queueDelivery(em, id, webhook.id, nextTryAt);
  }
  await switchOffWhatFails(em, webhook.id, now);
}

function reasonOf({ status, failure }: Answer): string {
  if (status === null) return failure;
  if (status >= 300 && status < 400) return `it answered ${status}, a redirect, which is not followed`;
  return `it answered ${status}`;
}

const park = (em: EntityManager, id: string, reason: string) =>
  em.nativeUpdate(WebhookDelivery, { id }, { state: "parked", reason, attemptId: null, leaseUntil: null });
