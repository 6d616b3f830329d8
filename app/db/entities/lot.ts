import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/** Wafers that go through a line together. Its name is told apart without regard to capitals. */
export const Lot = defineEntity({
  name: "Lot",
  tableName: "lot",
  indexes: [
    {
      name: "lot_program_id_name_unique",
      expression: `create unique index "lot_program_id_name_unique" on "lot" ("program_id", lower("name"))`,
    },
  ],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program),
    name: p.text(),
    note: p.text(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type Lot = InferEntity<typeof Lot>;
