import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { Measured } from "#app/engine/measured.ts";
import type { StepValues } from "#app/schemas/flow.ts";
import { recordProperties } from "./record.ts";

/** An ordered list of steps that a new flow of any program can start from. */
export const FlowTemplate = defineEntity({
  name: "FlowTemplate",
  tableName: "flow_template",
  properties: {
    id: p.uuid().primary(),
    name: p.text().unique(),
    note: p.text(),
    /** wafer that it is made for, m */
    diameter: p.double().$type<number>(),
    /** silicon as it comes in, m */
    incomingThickness: p.json<Measured>(),
    steps: p.json<StepValues[]>(),
    ...recordProperties,
  },
});
export type FlowTemplate = InferEntity<typeof FlowTemplate>;
