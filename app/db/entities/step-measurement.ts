import { defineEntity, p, type InferEntity } from "@mikro-orm/core";
import { Assessment } from "./assessment.ts";
import { Person } from "./person.ts";
import { Program } from "./program.ts";
import { WaferMeasurement } from "./wafer-measurement.ts";

/** A bow that was measured of a wafer after one step of an assessed flow, beside what the assessment says of it. SI, standard bow. */
export const StepMeasurement = defineEntity({
  name: "StepMeasurement",
  tableName: "step_measurement",
  uniques: [{ properties: ["assessment", "step", "measurement"] }],
  properties: {
    id: p.uuid().primary(),
    program: () => p.manyToOne(Program).index(),
    assessment: () => p.manyToOne(Assessment).index(),
    /** counts from 1, as the assessment does */
    step: p.integer(),
    stepTitle: p.text(),
    /** lot and wafer as whoever recorded it calls them */
    lot: p.text(),
    wafer: p.text(),
    /** the row of a summary that it was taken from, which then stays; null for one that was typed */
    measurement: () => p.manyToOne(WaferMeasurement).nullable().deleteRule("restrict"),
    bow: p.double().$type<number>(),
    /** of the bow; `stated` is false where nobody said and the usual one was taken */
    standardUncertainty: p.double().$type<number>(),
    stated: p.boolean(),
    /** what the assessment says of that step at 25 °C, for the leg that the wafer goes */
    predicted: p.double().$type<number>(),
    predictedUncertainty: p.double().$type<number>(),
    instrument: p.text(),
    measuredAt: p.datetime(),
    setAsideReason: p.text().nullable(),
    setAsideAt: p.datetime().nullable(),
    setAsideBy: () => p.manyToOne(Person).nullable(),
    createdAt: p.datetime(),
    createdBy: () => p.manyToOne(Person),
  },
});
export type StepMeasurement = InferEntity<typeof StepMeasurement>;
