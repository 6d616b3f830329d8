import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { WaferStatus } from "#app/lib/wafer-status.ts";
import { Lot } from "./lot.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/** One wafer, of a lot or on its own. Its name is told apart within its lot without regard to capitals. */
export const Wafer = defineEntity({
  name: "Wafer",
  tableName: "wafer",
  indexes: [
    {
      name: "wafer_program_id_lot_id_name_unique",
      expression: `create unique index "wafer_program_id_lot_id_name_unique" on "wafer" ("program_id", "lot_id", lower("name")) nulls not distinct`,
    },
  ],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program),
    lot: () => p.manyToOne(Lot).nullable().deleteRule("restrict").index(),
    /** place in the cassette, as the tool counts; null where nobody has said */
    slot: p.integer().nullable(),
    name: p.text(),
    status: p.text().$type<WaferStatus>().default("in line"),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type Wafer = InferEntity<typeof Wafer>;
