import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { Person } from "./person.ts";

/** Search, filters and order of a list that somebody has kept under a name. */
export const SavedFilter = defineEntity({
  name: "SavedFilter",
  tableName: "saved_filter",
  uniques: [{ properties: ["person", "list", "name"] }],
  properties: {
    id: p.uuid().primary(),
    person: () => p.manyToOne(Person),
    /** path of the list */
    list: p.text(),
    name: p.text(),
    /** the part of its address after the question mark */
    query: p.text(),
    at: p.datetime(),
  },
});
export type SavedFilter = InferEntity<typeof SavedFilter>;
