import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { WebhookEventName } from "#app/schemas/webhook.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/** Where events of one program are sent, in the name of whoever made it. What it is of never changes, but for its secret and its state. */
export const Webhook = defineEntity({
  name: "Webhook",
  tableName: "webhook",
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    name: p.text(),
    address: p.text(),
    events: p.json<WebhookEventName[]>(),
    /** what deliveries are signed with, sealed */
    sealedSecret: p.text().hidden(),
    secretMadeAt: p.datetime(),
    state: p.text().$type<"on" | "off">(),
    /** why it was switched off by itself; empty otherwise */
    offReason: p.text(),
    /** attempts in a row that have failed, and when the first of them was */
    failures: p.integer(),
    failingSince: p.datetime().nullable(),
    lastSentAt: p.datetime().nullable(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person).index(),
  },
});
export type Webhook = InferEntity<typeof Webhook>;
