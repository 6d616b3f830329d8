import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { FloorContent, FloorKind } from "#app/schemas/floor-entry.ts";
import { Lot } from "./lot.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";
import { SheetRevision } from "./sheet-revision.ts";

/** What somebody on the floor says of a lot. Its id is made where it is written, so that it counts once however often it is sent. Only added. */
export const FloorEntry = defineEntity({
  name: "FloorEntry",
  tableName: "floor_entry",
  indexes: [
    {
      name: "floor_entry_acknowledged_once",
      expression: `create unique index "floor_entry_acknowledged_once" on "floor_entry" ("revision_id", "created_by_id") where kind = 'acknowledged'`,
    },
  ],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    lot: () => p.manyToOne(Lot).index(),
    revision: () => p.manyToOne(SheetRevision).index(),
    /** of a flow that parts by slot, from 1; 0 where it does not */
    leg: p.integer(),
    /** null for what is said of the whole sheet */
    step: p.integer().nullable(),
    kind: p.text().$type<FloorKind>(),
    content: p.json<FloorContent>(),
    /** by the clock of the device that it was written on */
    at: p.datetime(),
    receivedAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type FloorEntry = InferEntity<typeof FloorEntry>;
