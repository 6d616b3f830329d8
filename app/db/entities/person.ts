import { defineEntity, p, type InferEntity } from "@mikro-orm/core";

/** Somebody who works here or is a customer's guest. What they may do in a program stands in `membership`. */
export const Person = defineEntity({
  name: "Person",
  tableName: "person",
  properties: {
    id: p.uuid().primary(),
    email: p.text().unique(),
    name: p.text(),
    /** roles held for the whole site; null for none */
    siteRole: p.text().$type<"administrator" | "shift lead">().nullable(),
    active: p.boolean(),
    createdAt: p.datetime(),
    /** since when an invitation waits for its answer; null once a password is set. Nobody invited is active: no mail of a program goes out */
    invitedAt: p.datetime().nullable(),
    lastSignInAt: p.datetime().nullable(),
  },
});
export type Person = InferEntity<typeof Person>;
