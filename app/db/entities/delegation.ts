import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/** A process owner lets somebody of the program stand in for them, from a day to a day. It never changes but for its early end. */
export const Delegation = defineEntity({
  name: "Delegation",
  tableName: "delegation",
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    /** the process owner who is stood in for */
    owner: () => p.manyToOne(Person),
    /** who stands in */
    delegate: () => p.manyToOne(Person).index(),
    beginsAt: p.datetime(),
    endsAt: p.datetime(),
    /** why, such as a leave */
    reason: p.text(),
    createdAt: p.datetime(),
    /** when and by whom it was ended before its time */
    endedAt: p.datetime().nullable(),
    endedBy: () => p.manyToOne(Person).nullable().deleteRule("restrict"),
  },
});
export type Delegation = InferEntity<typeof Delegation>;
