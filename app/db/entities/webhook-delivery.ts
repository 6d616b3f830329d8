import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { DeliveredEvent, DeliveryAttempt, DeliveryState } from "#app/schemas/webhook.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";
import { Webhook } from "./webhook.ts";

/** One thing that a webhook is told, written in the transaction of what it tells. */
export const WebhookDelivery = defineEntity({
  name: "WebhookDelivery",
  tableName: "webhook_delivery",
  uniques: [{ properties: ["webhook", "event", "key"] }],
  indexes: [{ properties: ["webhook", "createdAt"] }, { properties: ["state", "nextTryAt"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    webhook: () => p.manyToOne(Webhook).deleteRule("cascade"),
    event: p.text().$type<DeliveredEvent>(),
    /** what of its kind it tells, such as the id of a revision: a webhook hears of it once, unless somebody has it sent again */
    key: p.text(),
    /** of what happened, the same however often and to whom it is told */
    eventId: p.uuid(),
    /** what it is of, as lists show it */
    about: p.text(),
    /** the very characters that are signed and sent */
    body: p.text(),
    state: p.text().$type<DeliveryState>(),
    attempts: p.integer(),
    tries: p.json<DeliveryAttempt[]>(),
    /** the attempt under way, and until when nobody else begins one */
    attemptId: p.uuid().nullable(),
    leaseUntil: p.datetime().nullable(),
    nextTryAt: p.datetime(),
    /** why it is parked, or was not taken at the last attempt; empty where there is nothing to say */
    reason: p.text(),
    createdAt: p.datetime(),
    /** who did what it tells, or had it sent; null for Planeward itself */
    createdBy: () => p.manyToOne(Person).nullable().deleteRule("no action"),
    /** whether somebody had it sent: a test, or once more */
    byHand: p.boolean(),
    sentAt: p.datetime().nullable(),
  },
});
export type WebhookDelivery = InferEntity<typeof WebhookDelivery>;
