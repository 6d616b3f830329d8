import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import type { StepKind } from "#app/engine/flow/model.ts";
import type { SupportClass } from "#app/engine/vocabulary.ts";
import type { IncidentKind, IncidentState, Severity } from "#app/schemas/incident.ts";
import { Assessment } from "./assessment.ts";
import { Lot } from "./lot.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";
import { Wafer } from "./wafer.ts";

/**
 * What happened to wafers at a step of an assessed flow, beside what the assessment said of that step. SI. Nothing of it changes but
 * its state, which follows its newest note: the database holds both.
 */
export const Incident = defineEntity({
  name: "Incident",
  tableName: "incident",
  uniques: [{ properties: ["program", "number"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program),
    /** counts up within a program, from 1 */
    number: p.integer(),
    assessment: () => p.manyToOne(Assessment).index(),
    /** leg of a flow that parts by slot, from 1; 0 where it does not */
    leg: p.integer(),
    /** counts from 1, as the assessment does */
    step: p.integer(),
    stepKind: p.text().$type<StepKind>(),
    stepTitle: p.text(),
    silicon: p.double().$type<number>(),
    planned: p.text().$type<SupportClass>(),
    required: p.text().$type<SupportClass>(),
    /** as it is held at 25 °C, and its standard uncertainty; null where it is held flat */
    warp: p.double().$type<number>().nullable(),
    warpUncertainty: p.double().$type<number>().nullable(),
    /** the films on the wafer once the step has been done, by name */
    films: p.text(),
    lot: () => p.manyToOne(Lot).deleteRule("restrict").index(),
    wafer: () => p.manyToOne(Wafer).nullable().deleteRule("restrict").index(),
    kind: p.text().$type<IncidentKind>(),
    severity: p.text().$type<Severity>(),
    /** where on the wafer: share of the radius, and rad from the notch, counter-clockwise with the device side towards the reader */
    radius: p.double().$type<number>().nullable(),
    azimuth: p.double().$type<number>().nullable(),
    /** wafers that it happened to, and those of them that broke or had to be scrapped */
    affected: p.integer(),
    broken: p.integer(),
    /** wafers of the lot that went through the step, these among them; null where nobody knows */
    through: p.integer().nullable(),
    words: p.text(),
    occurredAt: p.datetime(),
    state: p.text().$type<IncidentState>(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type Incident = InferEntity<typeof Incident>;
