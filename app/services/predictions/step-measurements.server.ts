import { randomUUID } from "node:crypto";
import { UniqueConstraintViolationException, type EntityManager, type Loaded } from "@mikro-orm/postgresql";
import { StepMeasurement } from "#app/db/entities/step-measurement.ts";
import { WaferMeasurement } from "#app/db/entities/wafer-measurement.ts";
import { measurableSteps, predictedBow } from "#app/lib/predicted-bow.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { StepMeasurementValues } from "#app/schemas/step-measurement-form.ts";
import type { StepMeasurementRow, StepMeasurements } from "#app/schemas/step-measurement.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { findAssessment } from "../assessments/assessments.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";
import { measuredBows, summaryChoices, type MeasuredBow } from "./measured-bows.server.ts";
import { standardUncertaintyOf } from "./stated-uncertainty.ts";

/** What was measured after the steps of an assessment, and what can be recorded; refused to whom the program's work is not open. */
export async function stepMeasurements(scope: ActorScope, assessmentId: string | undefined): Promise<StepMeasurements> {
  return inScope(scope, async (em) => {
    const assessment = await findAssessment(em, scope, assessmentId);
    const { program, flow, result } = assessment;
    const rows = await em.find(
      StepMeasurement,
      { assessment },
      { populate: ["createdBy", "setAsideBy"], orderBy: { measuredAt: "asc", id: "asc" } },
    );
    return {
      assessment: { id: assessment.id, number: assessment.number, lot: assessment.lot?.name ?? null },
      flow: { id: flow.id, name: assessment.flowName },
      program: program.name,
      steps: measurableSteps(result).map(({ step, title }) => {
        const predicted = predictedBow(result, step, null);
        return { step, title, predicted: typeof predicted === "string" ? null : predicted };
      }),
      summaries: await summaryChoices(em, program.id),
      rows: rows.map(rowOf).toSorted(byPlace),
      mayRecord: mayInProgram(scope.actor, "upload scans", program.id),
      maySetAside: mayInProgram(scope.actor, "run assessments", program.id),
    };
  });
}

/** By step, lot and wafer; slot 10 comes after slot 9. */
const byPlace = (a: StepMeasurementRow, b: StepMeasurementRow) =>
  a.step - b.step || a.lot.localeCompare(b.lot) || a.wafer.localeCompare(b.wafer, "en", { numeric: true });

function rowOf(row: Loaded<StepMeasurement, "createdBy" | "setAsideBy">): StepMeasurementRow {
  const { id, step, stepTitle, lot, wafer, bow, standardUncertainty, stated, predicted, predictedUncertainty } = row;
  return {
    id,
    step,
    title: stepTitle,
    lot,
    wafer,
    bow,
    standardUncertainty,
    stated,
    predicted,
    predictedUncertainty,
    instrument: row.instrument,
    measuredAt: row.measuredAt.toISOString(),
    createdAt: row.createdAt.toISOString(),
    createdBy: row.createdBy.name,
    setAside: row.setAsideAt
      ? { reason: row.setAsideReason ?? "", at: row.setAsideAt.toISOString(), by: row.setAsideBy?.name ?? "somebody" }
      : null,
  };
}

export type Recorded =
  | { outcome: "stored"; count: number }
  | { outcome: "refused"; field: "step" | "summary" | "wafers" | "gravity" | "sideUp"; reasons: string[] };

const SAID = 6;

/**
 * Records bows beside an assessment, all of them or none: like is compared with like, so bows with the weight of the wafer in them and
 * wafers without a bow of their own at that step are refused with what they are.
 * @throws 403 for a role that may not, 404 for what is not the person's own
 */
export async function recordBows(
  scope: ActorScope,
  assessmentId: string | undefined,
  values: StepMeasurementValues,
): Promise<Recorded> {
  try {
    return await record(scope, assessmentId, values);
  } catch (error) {
    if (error instanceof UniqueConstraintViolationException)
      return { outcome: "refused", field: "summary", reasons: ["Somebody recorded this summary at the same moment."] };
    throw error;
  }
}

function record(scope: ActorScope, assessmentId: string | undefined, values: StepMeasurementValues): Promise<Recorded> {
  return inScope(scope, async (em): Promise<Recorded> => {
    const assessment = await findAssessment(em, scope, assessmentId);
    const { program, result } = assessment;
    requireInProgram(scope, "upload scans", program.id, "assessment");
    const measured = await measuredBows(em, program.id, values);
    if ("outcome" in measured) return measured;
    const reasons: string[] = [];
    for (const bow of measured.bows) {
      const predicted = predictedBow(result, values.step, bow.slot);
      const before = await already(em, assessment.id, values.step, bow);
      if (typeof predicted === "string") reasons.push(`${bow.wafer}: ${predicted}.`);
      else if (before) reasons.push(`${bow.wafer} is recorded after this step already.`);
      else
        em.create(StepMeasurement, {
          id: randomUUID(),
          program: program.id,
          assessment,
          step: values.step,
          stepTitle: predicted.title,
          lot: bow.lot,
          wafer: bow.wafer,
          measurement: bow.measurement ? em.getReference(WaferMeasurement, bow.measurement) : null,
          bow: bow.bow,
          ...standardUncertaintyOf(values.uncertainty),
          predicted: predicted.bow,
          predictedUncertainty: predicted.standardUncertainty,
          instrument: values.instrument,
          measuredAt: bow.measuredAt,
          setAsideReason: null,
          setAsideAt: null,
          setAsideBy: null,
          createdAt: new Date(),
          createdBy: scope.actor.id,
        });
    }
    if (reasons.length > 0) {
      em.clear();
      return { outcome: "refused", field: values.summary ? "summary" : "wafers", reasons: reasons.slice(0, SAID) };
    }
    await em.flush();
    return { outcome: "stored", count: measured.bows.length };
  });
}

/** Whether the same row of a summary, or the same wafer of the same lot and day, stands after this step. */
async function already(em: EntityManager, assessment: string, step: number, bow: MeasuredBow): Promise<boolean> {
  const same = bow.measurement
    ? { measurement: bow.measurement }
    : { lot: bow.lot, wafer: bow.wafer, measuredAt: bow.measuredAt };
  return (await em.count(StepMeasurement, { assessment, step, ...same })) > 0;
}

/**
 * Takes a bow out of the comparison with a reason, or (`reason` null) lets it count again. It stays where it is. A sentence says why
 * nothing was done.
 * @throws 403 for a role that may not, 404 for what is not the person's own
 */
export async function setBowAside(
  scope: ActorScope,
  assessmentId: string | undefined,
  { id, reason }: { id: string | undefined; reason: string | null },
): Promise<string | null> {
  return inScope(scope, async (em) => {
    const assessment = await findAssessment(em, scope, assessmentId);
    requireInProgram(scope, "run assessments", assessment.program.id, "assessment");
    const row = await em.findOne(
      StepMeasurement,
      { id: idFrom(id, "measured bow"), assessment },
      { populate: ["setAsideBy"] },
    );
    if (!row) throw notFound("measured bow");
    if (reason === null && !row.setAsideAt) return "It counts already: somebody has put it back.";
    if (reason !== null && row.setAsideAt) return `It is set aside already: ${row.setAsideReason ?? ""}`;
    Object.assign(
      row,
      reason === null
        ? { setAsideAt: null, setAsideBy: null }
        : { setAsideReason: reason, setAsideAt: new Date(), setAsideBy: scope.actor.id },
    );
    await em.flush();
    return null;
  });
}
