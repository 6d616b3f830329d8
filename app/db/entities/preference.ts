import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { Preferences } from "#app/lib/preferences.ts";
import { Person } from "./person.ts";

/** How somebody wants the program to look and to answer their keys; without a row it is as delivered. */
export const Preference = defineEntity({
  name: "Preference",
  tableName: "preference",
  properties: {
    id: p.uuid().primary(),
    person: () => p.manyToOne(Person).unique(),
    value: p.json<Preferences>(),
    at: p.datetime(),
  },
});
export type Preference = InferEntity<typeof Preference>;
