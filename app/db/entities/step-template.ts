import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { StepKind } from "#app/engine/flow/model.ts";
import type { StepValues } from "#app/schemas/flow.ts";
import { recordProperties } from "./record.ts";

/** A step that the site does again and again, kept to be put into flows. */
export const StepTemplate = defineEntity({
  name: "StepTemplate",
  tableName: "step_template",
  properties: {
    id: p.uuid().primary(),
    /** what is done, as in the step */
    name: p.text().unique(),
    /** kept beside the step for the list */
    kind: p.text().$type<StepKind>(),
    step: p.json<StepValues>(),
    ...recordProperties,
  },
});
export type StepTemplate = InferEntity<typeof StepTemplate>;
