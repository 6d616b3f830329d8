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
  },
});
export type Person = InferEntity<typeof Person>;
