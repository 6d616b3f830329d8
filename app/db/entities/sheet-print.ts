import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { Person } from "./person.ts";
import { Program } from "./program.ts";
import { SheetFile } from "./sheet-file.ts";
import { SheetRevision } from "./sheet-revision.ts";

/** A sheet that somebody took out to print: who, when, for which place. Only added. */
export const SheetPrint = defineEntity({
  name: "SheetPrint",
  tableName: "sheet_print",
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    revision: () => p.manyToOne(SheetRevision).index(),
    file: () => p.manyToOne(SheetFile),
    /** where the paper will hang or lie; empty when nobody said */
    place: p.text(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type SheetPrint = InferEntity<typeof SheetPrint>;
