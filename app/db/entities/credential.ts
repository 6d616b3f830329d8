import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { Person } from "./person.ts";

/** A person's password, apart from the person so that no reading of people can carry it along. */
export const Credential = defineEntity({
  name: "Credential",
  tableName: "credential",
  properties: {
    id: p.uuid().primary(),
    person: () => p.oneToOne(Person).owner().unique(),
    /** argon2id, encoded with its parameters */
    passwordHash: p.text().hidden(),
    changedAt: p.datetime(),
  },
});
export type Credential = InferEntity<typeof Credential>;
