import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { FlowPlan, RevisionKind } from "#app/schemas/flow-plan.ts";
import { Flow } from "./flow.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/** A change of a flow: what was done, and the whole plan after it. Only ever added, so nothing that was saved is lost. */
export const FlowRevision = defineEntity({
  name: "FlowRevision",
  tableName: "flow_revision",
  uniques: [{ properties: ["flow", "number"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program),
    flow: () => p.manyToOne(Flow).deleteRule("cascade"),
    /** from 1, in the order in which the changes were made */
    number: p.integer(),
    kind: p.text().$type<RevisionKind>(),
    words: p.text(),
    /** version of the flow after the change */
    flowVersion: p.integer(),
    /** null where an earlier one was put back */
    plan: p.json<FlowPlan>().nullable(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person).nullable(),
  },
});
export type FlowRevision = InferEntity<typeof FlowRevision>;
