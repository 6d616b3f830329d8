import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { BlockCause } from "#app/lib/floor/block-causes.ts";
import { Lot } from "./lot.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/** That one lot goes nowhere until somebody who may clear the cause has done so. It is cleared once and else never changes. */
export const LotHold = defineEntity({
  name: "LotHold",
  tableName: "lot_hold",
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    lot: () => p.manyToOne(Lot).index(),
    cause: p.text().$type<BlockCause>(),
    reason: p.text(),
    openedAt: p.datetime(),
    openedBy: () => p.manyToOne(Person),
    clearedAt: p.datetime().nullable(),
    clearedBy: () => p.manyToOne(Person).nullable().deleteRule("restrict"),
    clearedWords: p.text().nullable(),
  },
});
export type LotHold = InferEntity<typeof LotHold>;
