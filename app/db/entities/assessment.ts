import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { Outcome } from "#app/engine/vocabulary.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import type { LotRecord } from "#app/schemas/lot.ts";
import { Flow } from "./flow.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";

/** What was asked and what came out, whole. Never changed or deleted: the database refuses both. */
export const Assessment = defineEntity({
  name: "Assessment",
  tableName: "assessment",
  uniques: [{ properties: ["flow", "number", "lotNumber"] }, { properties: ["program", "documentNumber"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    flow: () => p.manyToOne(Flow),
    /** counts up within a flow, from 1; that of a lot is the number of the assessment that it is of */
    number: p.integer(),
    /** 0 for an assessment of the flow itself; lots count up within the flow, from 1 */
    lotNumber: p.integer().default(0),
    /** counts up within a program, from 1: no two documents of a program have the same */
    documentNumber: p.integer(),
    flowName: p.text(),
    engineVersion: p.text(),
    /** SHA-256 of the inputs as stored */
    inputHash: p.text(),
    input: p.json<AssessmentInput>().lazy(),
    result: p.json<AssessmentResult>(),
    /** the lot that it is of; null for an assessment of the flow itself, which alone is a revision */
    lot: p.json<LotRecord>().nullable(),
    outcome: p.text().$type<Outcome>(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type Assessment = InferEntity<typeof Assessment>;
