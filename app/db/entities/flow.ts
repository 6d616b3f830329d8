import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { Measured } from "#app/engine/measured.ts";
import { Program } from "./program.ts";
import { recordProperties } from "./record.ts";
import { Silicon } from "./silicon.ts";

/** The ordered steps that a wafer goes through. */
export const Flow = defineEntity({
  name: "Flow",
  tableName: "flow",
  uniques: [{ properties: ["program", "name"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program),
    name: p.text(),
    note: p.text(),
    silicon: () => p.manyToOne(Silicon),
    /** silicon as it comes in, m */
    incomingThickness: p.json<Measured>(),
    ...recordProperties,
  },
});
export type Flow = InferEntity<typeof Flow>;
