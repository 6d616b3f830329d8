import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { Lot } from "./lot.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";
import { SheetRevision } from "./sheet-revision.ts";

/** That a lot is worked by one revision of a sheet. Only added: the newest counts, and the ones before say how it came there. */
export const LotSheet = defineEntity({
  name: "LotSheet",
  tableName: "lot_sheet",
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    lot: () => p.manyToOne(Lot).index(),
    revision: () => p.manyToOne(SheetRevision).index(),
    /** number of the step at which the lot goes on; what lies before it is done elsewhere */
    fromStep: p.integer(),
    /** why it was moved to this one; empty for the first */
    reason: p.text(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type LotSheet = InferEntity<typeof LotSheet>;
