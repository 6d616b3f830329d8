import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { HandOverLot } from "#app/schemas/hand-over.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/**
 * What one shift leaves to the next at a place: the lots of one program that are there, as they stood. It is taken over once, by somebody
 * else, and else never changes. What is given at once for several programs has one `given`.
 */
export const HandOver = defineEntity({
  name: "HandOver",
  tableName: "hand_over",
  indexes: [
    {
      name: "hand_over_given_once",
      expression: `create unique index "hand_over_given_once" on "hand_over" ("given", "program_id")`,
    },
  ],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    given: p.uuid(),
    /** tool, bench or cabinet, as the floor calls it */
    place: p.text(),
    remark: p.text(),
    lots: p.json<HandOverLot[]>(),
    givenAt: p.datetime(),
    givenBy: () => p.manyToOne(Person),
    takenAt: p.datetime().nullable(),
    takenBy: () => p.manyToOne(Person).nullable().deleteRule("restrict"),
    takenRemark: p.text().nullable(),
  },
});
export type HandOver = InferEntity<typeof HandOver>;
