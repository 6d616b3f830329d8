import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { Outcome } from "#app/engine/vocabulary.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import { Flow } from "./flow.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/** What was asked and what came out, whole. Never changed or deleted: the database refuses both. */
export const Assessment = defineEntity({
  name: "Assessment",
  tableName: "assessment",
  uniques: [{ properties: ["flow", "number"] }, { properties: ["program", "documentNumber"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    flow: () => p.manyToOne(Flow),
    /** counts up within a flow, from 1 */
    number: p.integer(),
    /** counts up within a program, from 1: no two documents of a program have the same */
    documentNumber: p.integer(),
    flowName: p.text(),
    engineVersion: p.text(),
    /** SHA-256 of the inputs as stored */
    inputHash: p.text(),
    input: p.json<AssessmentInput>().lazy(),
    result: p.json<AssessmentResult>(),
    outcome: p.text().$type<Outcome>(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type Assessment = InferEntity<typeof Assessment>;
