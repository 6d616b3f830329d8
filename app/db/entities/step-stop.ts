import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { BlockCause } from "#app/lib/floor/block-causes.ts";
import { Lot } from "./lot.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";
import { SheetRevision } from "./sheet-revision.ts";
import { Sheet } from "./sheet.ts";

/** That no lot of a sheet begins one of its steps until somebody who may clear the cause has done so. It is cleared once and else never changes. */
export const StepStop = defineEntity({
  name: "StepStop",
  tableName: "step_stop",
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    sheet: () => p.manyToOne(Sheet).index(),
    /** by which the step has its number */
    revision: () => p.manyToOne(SheetRevision).index(),
    /** at which it was seen */
    lot: () => p.manyToOne(Lot).index(),
    step: p.integer(),
    /** what the step is called, by which it is known again in a later revision */
    title: p.text(),
    cause: p.text().$type<BlockCause>(),
    reason: p.text(),
    openedAt: p.datetime(),
    openedBy: () => p.manyToOne(Person),
    clearedAt: p.datetime().nullable(),
    clearedBy: () => p.manyToOne(Person).nullable().deleteRule("restrict"),
    clearedWords: p.text().nullable(),
  },
});
export type StepStop = InferEntity<typeof StepStop>;
