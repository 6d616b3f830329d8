import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { KeptKind } from "#app/lib/kept-kinds.ts";
import { Person } from "./person.ts";

/** When somebody last opened the page of a record. What it is called is looked up, so that nothing is kept of what is gone. */
export const RecentVisit = defineEntity({
  name: "RecentVisit",
  tableName: "recent_visit",
  uniques: [{ properties: ["person", "kind", "recordId"] }],
  properties: {
    id: p.uuid().primary(),
    person: () => p.manyToOne(Person),
    kind: p.text().$type<KeptKind>(),
    recordId: p.uuid(),
    at: p.datetime(),
  },
});
export type RecentVisit = InferEntity<typeof RecentVisit>;
