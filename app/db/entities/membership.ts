import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { ProgramRole } from "#app/policies/roles.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/** What a person is in a program. */
export const Membership = defineEntity({
  name: "Membership",
  tableName: "membership",
  uniques: [{ properties: ["person", "program"] }],
  properties: {
    id: p.uuid().primary(),
    person: () => p.manyToOne(Person),
    program: () => p.manyToOne(Program).index(),
    role: p.text().$type<ProgramRole>(),
    createdAt: p.datetime(),
  },
});
export type Membership = InferEntity<typeof Membership>;
