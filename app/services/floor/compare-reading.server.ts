import type { EntityManager } from "@mikro-orm/postgresql";
import { StepMeasurement } from "#app/db/entities/step-measurement.ts";
import { legAnswer } from "#app/lib/assessment-leg.ts";
import { comparableReading } from "#app/lib/floor/comparable-reading.ts";
import { askedLeg } from "#app/lib/floor/floor-steps.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import type { FloorContent } from "#app/schemas/floor-entry.ts";
import { standardUncertaintyOf } from "../predictions/stated-uncertainty.ts";

interface Reading {
  /** of the entry, and of the row that is made of it: sent twice, it is compared once */
  id: string;
  program: string;
  lot: string;
  assessment: { id: string; result: AssessmentResult };
  leg: number;
  step: number;
  isDone: boolean;
  content: Extract<FloorContent, { kind: "measured" }>;
  at: Date;
  by: string;
}

/** Puts a bow that the floor has read beside what the assessment of its sheet predicts, where the two are alike. */
export function compareReading(em: EntityManager, reading: Reading): void {
  const { id, program, lot, assessment, leg, step, isDone, content, at, by } = reading;
  const { steps } = legAnswer(assessment.result, askedLeg(leg)).result;
  const found = comparableReading(
    content,
    steps.find(({ number, skipped }) => number === step && !skipped),
    isDone,
  );
  if (!found) return;
  em.create(StepMeasurement, {
    id,
    program,
    assessment: assessment.id,
    step,
    stepTitle: found.title,
    lot,
    wafer: content.wafer,
    measurement: null,
    bow: found.measured,
    ...standardUncertaintyOf(content.uncertainty),
    predicted: found.bow,
    predictedUncertainty: found.standardUncertainty,
    instrument: `floor, ${content.on}`,
    measuredAt: at,
    setAsideReason: null,
    setAsideAt: null,
    setAsideBy: null,
    createdAt: new Date(),
    createdBy: by,
  });
}
