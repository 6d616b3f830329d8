import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { Person } from "./person.ts";
import { Program } from "./program.ts";
import { SheetRevision } from "./sheet-revision.ts";

/** What somebody says in a review, at a step or of the whole. Only added. */
export const SheetComment = defineEntity({
  name: "SheetComment",
  tableName: "sheet_comment",
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    revision: () => p.manyToOne(SheetRevision).index(),
    /** counts from 1; null for a comment on the whole */
    step: p.integer().nullable(),
    text: p.text(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type SheetComment = InferEntity<typeof SheetComment>;
