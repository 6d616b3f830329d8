import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { AccountMail } from "#app/lib/account-mail.ts";
import type { Announcement, AnnouncementKind } from "#app/schemas/announcement.ts";
import type { MailState } from "#app/schemas/outbox.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/**
 * One mail to one person, written in the transaction of what it tells. A digest has no program and no announcement: it is made, when
 * it is sent, of those that point to it.
 */
export const MailOutbox = defineEntity({
  name: "MailOutbox",
  tableName: "mail_outbox",
  uniques: [{ properties: ["kind", "key", "person"] }],
  indexes: [{ properties: ["program", "createdAt"] }, { properties: ["state", "nextTryAt"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).nullable().deleteRule("no action"),
    person: () => p.manyToOne(Person).index(),
    kind: p.text().$type<AnnouncementKind | AccountMail | "digest">(),
    /** what of its kind it tells, such as the id of a revision: one person hears of it once */
    key: p.text(),
    announcement: p.json<Announcement>().nullable(),
    state: p.text().$type<MailState>(),
    /** where it goes, if not to the address that the person has by then */
    address: p.text().nullable(),
    /** the same at every attempt, so that whoever gets it twice can tell */
    messageId: p.text().unique(),
    attempts: p.integer(),
    /** the attempt under way, and until when nobody else begins one */
    attemptId: p.uuid().nullable(),
    leaseUntil: p.datetime().nullable(),
    nextTryAt: p.datetime(),
    /** why it was not sent, or is parked or dropped; empty where there is nothing to say */
    reason: p.text(),
    /** the digest that it went with */
    digest: () => p.manyToOne(MailOutbox).nullable().index().deleteRule("no action"),
    createdAt: p.datetime(),
    /** who did what it tells; null for Planeward itself */
    createdBy: () => p.manyToOne(Person).nullable().deleteRule("no action"),
    sentAt: p.datetime().nullable(),
  },
});
export type MailOutbox = InferEntity<typeof MailOutbox>;
