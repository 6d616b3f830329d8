import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { SheetDocument as Document } from "#app/schemas/sheet-document.ts";
import { Program } from "./program.ts";
import { SheetRevision } from "./sheet-revision.ts";

/** What a released revision says, whole, so that it can be drawn again with a mark; both pages, so it is not for guests. Only added. */
export const SheetDocument = defineEntity({
  name: "SheetDocument",
  tableName: "sheet_document",
  uniques: [{ properties: ["revision", "leg"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    revision: () => p.manyToOne(SheetRevision),
    /** of a flow that parts by slot, from 1; 0 where it does not */
    leg: p.integer(),
    document: p.json<Document>(),
  },
});
export type SheetDocument = InferEntity<typeof SheetDocument>;
