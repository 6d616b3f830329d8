import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { KeptKind } from "#app/lib/kept-kinds.ts";
import { Person } from "./person.ts";

/** A record that somebody has marked for themselves. */
export const Favourite = defineEntity({
  name: "Favourite",
  tableName: "favourite",
  uniques: [{ properties: ["person", "kind", "recordId"] }],
  properties: {
    id: p.uuid().primary(),
    person: () => p.manyToOne(Person),
    kind: p.text().$type<KeptKind>(),
    recordId: p.uuid(),
    at: p.datetime(),
  },
});
export type Favourite = InferEntity<typeof Favourite>;
