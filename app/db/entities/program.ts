import { defineEntity, p, type InferEntity } from "@mikro-orm/core";

/** A customer's device program: the boundary of who may see what. */
export const Program = defineEntity({
  name: "Program",
  tableName: "program",
  properties: {
    id: p.uuid().primary(),
    name: p.text().unique(),
    slug: p.text().unique(),
    /** wafer diameter, m */
    diameter: p.double().$type<number>(),
    purpose: p.text(),
    /** who printed its sheets is kept so long; null: for good */
    printsKeptYears: p.integer().nullable(),
    createdAt: p.datetime(),
  },
});
export type Program = InferEntity<typeof Program>;
