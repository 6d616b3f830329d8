import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { Measured } from "#app/engine/measured.ts";
import { Program } from "./program.ts";
import { recordProperties } from "./record.ts";
import { Silicon } from "./silicon.ts";

/** Films on both sides of silicon of a given remaining thickness. */
export const Stack = defineEntity({
  name: "Stack",
  tableName: "stack",
  uniques: [{ properties: ["program", "name"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program),
    name: p.text(),
    note: p.text(),
    silicon: () => p.manyToOne(Silicon),
    /** remaining silicon, m */
    siliconThickness: p.json<Measured>(),
    ...recordProperties,
  },
});
export type Stack = InferEntity<typeof Stack>;
