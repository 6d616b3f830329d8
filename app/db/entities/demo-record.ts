import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { DemoTable } from "#app/lib/demo-tables.ts";

/** That a record came with the demo: what is not listed here somebody has made, and what leaves with the demo is told by it. */
export const DemoRecord = defineEntity({
  name: "DemoRecord",
  tableName: "demo_record",
  properties: {
    /** of the record itself */
    id: p.uuid().primary(),
    kind: p.text().$type<DemoTable>(),
    at: p.datetime(),
  },
});
export type DemoRecord = InferEntity<typeof DemoRecord>;
