import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { TokenPurpose } from "#app/lib/account-mail.ts";
import { Person } from "./person.ts";

/**
 * What a link in a mail to one person opens, once. The secret of the link is made by the worker when it writes the mail and stands in the
 * mail alone: here are the SHA-256 of all that were sent, because a mail that is sent again has a new one.
 */
export const PersonToken = defineEntity({
  name: "PersonToken",
  tableName: "person_token",
  properties: {
    id: p.uuid().primary(),
    person: () => p.manyToOne(Person).index(),
    purpose: p.text().$type<TokenPurpose>(),
    /** where its mail goes; of a change of address the new one */
    address: p.text(),
    secretHashes: p.array().hidden(),
    createdAt: p.datetime(),
    expiresAt: p.datetime(),
    /** when it was used, or put out of use by another */
    endedAt: p.datetime().nullable(),
  },
});
export type PersonToken = InferEntity<typeof PersonToken>;
