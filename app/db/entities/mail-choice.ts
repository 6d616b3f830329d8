import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { MailChoices } from "#app/lib/mail/mail-choices.ts";
import { Person } from "./person.ts";

/** Of what somebody wants to be told by mail, and the token with which they can say so from a mail, signed out. */
export const MailChoice = defineEntity({
  name: "MailChoice",
  tableName: "mail_choice",
  properties: {
    id: p.uuid().primary(),
    person: () => p.manyToOne(Person).unique(),
    value: p.json<MailChoices>(),
    /** opaque; opens nothing but the choices of this person */
    unsubscribeToken: p.text().unique(),
    at: p.datetime(),
  },
});
export type MailChoice = InferEntity<typeof MailChoice>;
