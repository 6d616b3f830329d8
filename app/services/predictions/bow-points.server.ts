import type { EntityManager } from "@mikro-orm/postgresql";
import { StepMeasurement } from "#app/db/entities/step-measurement.ts";
import { USUAL_BOW_UNCERTAINTY } from "#app/lib/usual-bow.ts";
import type { StepResult } from "#app/schemas/assessment-result.ts";
import type { LotRecord } from "#app/schemas/lot.ts";
import type { PredictionPoint } from "#app/schemas/prediction.ts";

const groupOf = (flow: string, step: number, title: string) => `${flow}: step ${step}, ${title}`;

/**
 * Bows measured after a step, and bows that lots came in with, of these flows and beside what their assessments say. All that is held
 * against one assessment shares its error: more wafers do not make it known better.
 */
export async function bowPoints(
  em: EntityManager,
  programs: readonly string[],
  flows: ReadonlySet<string> | null,
): Promise<PredictionPoint[]> {
  const own = await recorded(em, programs, flows);
  return [...own, ...(await received(em, programs, flows))];
}

async function recorded(
  em: EntityManager,
  programs: readonly string[],
  flows: ReadonlySet<string> | null,
): Promise<PredictionPoint[]> {
  const rows = await em.find(
    StepMeasurement,
    {
      program: { $in: [...programs] },
      setAsideAt: null,
      ...(flows ? { assessment: { flow: { $in: [...flows] } } } : {}),
    },
    { populate: ["program"], orderBy: { measuredAt: "asc", id: "asc" } },
  );
  const names = await flowNames(em, [...new Set(rows.map(({ assessment }) => assessment.id))]);
  return rows.map((row) => ({
    id: row.id,
    group: groupOf(names.get(row.assessment.id) ?? "", row.step, row.stepTitle),
    flow: names.get(row.assessment.id) ?? "",
    name: [row.lot, row.wafer].filter(Boolean).join(", "),
    program: row.program.name,
    predicted: row.predicted,
    predictedUncertainty: row.predictedUncertainty,
    shared: row.assessment.id,
    measured: row.bow,
    measuredUncertainty: row.standardUncertainty,
    stated: row.stated,
    measuredAt: row.measuredAt.toISOString(),
    instrument: row.instrument,
    path: `/assessments/${row.assessment.id}/measured`,
  }));
}

/** Names of the flows of assessments, without their results. */
async function flowNames(em: EntityManager, ids: readonly string[]): Promise<Map<string, string>> {
  if (ids.length === 0) return new Map();
  const rows = await em.execute<{ id: string; flow_name: string }[]>(
    "select id, flow_name from assessment where id in (?)",
    [[...ids]],
  );
  return new Map(rows.map(({ id, flow_name }) => [id, flow_name]));
}

interface LotRow {
  id: string;
  of_id: string;
  flow_name: string;
  program: string;
  created_at: Date | string;
  lot: Pick<LotRecord, "name" | "bow" | "wafers">;
  first: StepResult | null;
}

/** Lots as they came in, beside the bow that the assessment which they are of took for granted. */
async function received(
  em: EntityManager,
  programs: readonly string[],
  flows: ReadonlySet<string> | null,
): Promise<PredictionPoint[]> {
  if (programs.length === 0 || flows?.size === 0) return [];
  const rows = await em.execute<LotRow[]>(
    `select a.id, of.id as of_id, a.flow_name, p.name as program, a.created_at, a.lot, of.result->'steps'->0 as first
       from assessment a
       join program p on p.id = a.program_id
       join assessment of on of.id = (a.lot->'of'->>'id')::uuid
      where a.lot is not null and a.program_id in (?) ${flows ? "and a.flow_id in (?)" : ""}
      order by a.created_at, a.id`,
    flows ? [[...programs], [...flows]] : [[...programs]],
  );
  return rows.flatMap(pointsOfLot);
}

function pointsOfLot({ id, of_id, flow_name, program, created_at, lot, first }: LotRow): PredictionPoint[] {
  const shape = first?.atRoom ?? first?.released;
  if (!first || !shape || shape.rollRadius !== null) return [];
  const measured = lot.wafers.length > 0 ? lot.wafers : [{ slot: null, bow: lot.bow }];
  return measured.map(({ slot, bow }) => ({
    id: `${id} ${slot ?? "mean"}`,
    group: groupOf(flow_name, first.number, first.title),
    flow: flow_name,
    name: `${lot.name}, ${slot === null ? "mean" : `slot ${slot}`}`,
    program,
    predicted: shape.bow,
    predictedUncertainty: shape.standardUncertainty ?? 0,
    shared: of_id,
    measured: bow,
    measuredUncertainty: USUAL_BOW_UNCERTAINTY,
    stated: false,
    measuredAt: new Date(created_at).toISOString(),
    instrument: "",
    path: `/assessments/${id}`,
  }));
}
