import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { Person } from "./person.ts";

/** What a POST with an Idempotency-Key was answered, for a day: sent again, it is answered the same and does nothing. */
export const ApiAnswer = defineEntity({
  name: "ApiAnswer",
  tableName: "api_answer",
  uniques: [{ properties: ["caller", "key"] }],
  properties: {
    id: p.uuid().primary(),
    person: () => p.manyToOne(Person).index(),
    /** the token that asked, or the person where a session did */
    caller: p.uuid(),
    key: p.text(),
    /** SHA-256 of operation, address and body */
    requestHash: p.text(),
    /** null while the first one is at work */
    status: p.integer().nullable(),
    headers: p.json<Record<string, string>>(),
    body: p.text(),
    at: p.datetime().index(),
  },
});
export type ApiAnswer = InferEntity<typeof ApiAnswer>;
