import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { Flow } from "./flow.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/** The handling-risk sheet of a flow: what its revisions share. It begins when the first review is asked for. */
export const Sheet = defineEntity({
  name: "Sheet",
  tableName: "sheet",
  uniques: [{ properties: ["program", "number"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program),
    flow: () => p.manyToOne(Flow).unique(),
    /** counts up within a program, from 1 */
    number: p.integer(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type Sheet = InferEntity<typeof Sheet>;
