import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { SheetFormat, SheetPages } from "#app/schemas/sheet-revision.ts";
import { Program } from "./program.ts";
import type { Paper } from "#app/lib/paper-size.ts";
import { SheetRevision } from "./sheet-revision.ts";

/** A sheet as it was set once: a reprint sends these bytes. Only added. */
export const SheetFile = defineEntity({
  name: "SheetFile",
  tableName: "sheet_file",
  uniques: [{ properties: ["revision", "leg", "format", "paper", "pages", "mark"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    revision: () => p.manyToOne(SheetRevision),
    leg: p.integer(),
    format: p.text().$type<SheetFormat>(),
    paper: p.text().$type<Paper>(),
    pages: p.text().$type<SheetPages>(),
    /** the words across it, such as 'superseded by C'; empty on what was released */
    mark: p.text(),
    sha256: p.text(),
    bytes: p.blob().lazy(),
    createdAt: p.datetime(),
  },
});
export type SheetFile = InferEntity<typeof SheetFile>;
