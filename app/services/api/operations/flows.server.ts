import { z } from "zod";
import { Assessment } from "#app/db/entities/assessment.ts";
import { Flow } from "#app/db/entities/flow.ts";
import { OUTCOMES, SUPPORT_CLASSES } from "#app/engine/vocabulary.ts";
import type { ShapeResult } from "#app/schemas/assessment-result.ts";
import type { FlowDetail } from "#app/schemas/flow-view.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { inScope } from "#app/server/scope.server.ts";
import { getAssessment, type AssessmentDetail } from "../../assessments/assessments.server.ts";
import { flowDetails } from "../../flows/read-flow.server.ts";
import { getFlow } from "../../flows/flows.server.ts";
import { requireInSomeProgram } from "../../permission.server.ts";
import { programFilter } from "../../program-filter.server.ts";
import { operation } from "../operation.server.ts";
import { keysetPage, pageOf, pageQuery } from "../paging.server.ts";
import {
  id,
  idParam,
  moment,
  named,
  programQuery,
  programSlug,
  siliconJson,
  siliconUsed,
  stated,
  statedIn,
  statedOrNull,
} from "../shapes.ts";

const step = z.object({
  number: z.int(),
  kind: z.string(),
  title: z.string(),
  peak_temperature_K: z.number(),
  hold_time_s: z.number().nullable(),
  planned: z.string(),
  silicon_after_m: statedIn("m").nullable(),
  carrier: named.nullable(),
  bonding_material: named.nullable(),
  films: z.array(
    z.object({
      change: z.enum(["adds", "removes"]),
      side: z.enum(["front", "back"]),
      film: named,
      thickness_m: statedIn("m").nullable(),
      stress_Pa: statedIn("Pa"),
      coverage: z.number(),
    }),
  ),
});
const flow = z.object({
  id,
  name: z.string(),
  note: z.string(),
  program: programSlug,
  silicon: siliconUsed,
  incoming_thickness_m: statedIn("m"),
  steps: z.array(step),
  version: z.int(),
  updated_at: moment,
});

const flowJson = (detail: FlowDetail): z.input<typeof flow> => ({
  id: detail.id,
  name: detail.name,
  note: detail.note,
  program: detail.program.slug,
  silicon: siliconJson(detail.silicon),
  incoming_thickness_m: stated(detail.incomingThickness),
  steps: detail.steps.map((each, index) => ({
    number: index + 1,
    kind: each.kind,
    title: each.title,
    peak_temperature_K: each.peakTemperature,
    hold_time_s: each.holdTime,
    planned: each.planned,
    silicon_after_m: statedOrNull(each.siliconAfter),
    carrier: each.carrier && { id: each.carrier.id, name: each.carrier.name },
    bonding_material: each.bondingMaterial && { id: each.bondingMaterial.id, name: each.bondingMaterial.name },
    films: each.films.map(({ change, side, film, thickness, stress, coverage }) => ({
      change,
      side,
      film: { id: film.id, name: film.name },
      thickness_m: statedOrNull(thickness),
      stress_Pa: stated(stress),
      coverage,
    })),
  })),
  version: detail.stamp.version,
  updated_at: detail.stamp.updatedAt,
});

const outcome = z.enum(OUTCOMES);
const shape = z.object({
  temperature_K: z.number(),
  bow_m: z.number(),
  warp_m: z.number(),
  regime: z.enum(["linear", "nonlinear", "curled"]),
  roll_radius_m: z.number().nullable(),
  standard_uncertainty_m: z.number().nullable(),
});
const shapeJson = (found: ShapeResult): z.input<typeof shape> => ({
  temperature_K: found.temperature,
  bow_m: found.bow,
  warp_m: found.warp,
  regime: found.regime,
  roll_radius_m: found.rollRadius,
  standard_uncertainty_m: found.standardUncertainty,
});
const figure = z.object({
  label: z.string(),
  value: z.number(),
  unit: z.string().describe("SI; 1 for a pure number."),
});
const assessmentRow = z.object({
  id,
  number: z.string().describe("As paper has it, such as TERN-A003."),
  program: programSlug,
  flow: named,
  lot: z.string().nullable(),
  outcome,
  engine_version: z.string(),
  input_sha256: z.string(),
  created_at: moment,
});
const assessment = assessmentRow.extend({
  out_of_date: z.boolean().describe("Whether the flow, or something that it uses, has been changed since."),
  sentences: z.array(z.string()),
  steps: z.array(
    z.object({
      number: z.int(),
      kind: z.string(),
      title: z.string(),
      outcome,
      silicon_m: z.number(),
      planned: z.string(),
      required: z.enum(SUPPORT_CLASSES),
      at_room: shape.nullable().describe("As it is held at 25 °C; null where it is held flat."),
      at_peak: shape.nullable(),
      released: shape.describe("If nothing held it, at 25 °C."),
    }),
  ),
  findings: z.array(
    z.object({
      rule: z.int(),
      title: z.string(),
      step: z.int(),
      outcome,
      reason: z.string(),
      remedy: z.string().nullable(),
      figures: z.array(figure),
      limit: figure.extend({ source: z.string() }).nullable(),
    }),
  ),
});

function assessmentJson(detail: AssessmentDetail): z.input<typeof assessment> {
  const { result, program } = detail;
  return {
    id: detail.id,
    number: recordNumber("assessment", program.slug, detail.documentNumber),
    program: program.slug,
    flow: detail.flow,
    lot: detail.lot?.name ?? null,
    outcome: result.verdict.outcome,
    engine_version: detail.engineVersion,
    input_sha256: detail.inputHash,
    created_at: detail.createdAt,
    out_of_date: detail.outOfDate,
    sentences: result.sentences,
    steps: result.steps.map((each) => ({
      number: each.number,
      kind: each.kind,
      title: each.title,
      outcome: each.outcome,
      silicon_m: each.silicon,
      planned: each.planned,
      required: each.required,
      at_room: each.atRoom && shapeJson(each.atRoom),
      at_peak: each.atPeak && shapeJson(each.atPeak),
      released: shapeJson(each.released),
    })),
    findings: result.findings.map(({ rule, title, step: at, outcome: found, reason, remedy, figures, limit }) => ({
      rule,
      title,
      step: at,
      outcome: found,
      reason,
      remedy,
      figures: figures.map(({ label, value, unit }) => ({ label, value, unit })),
      limit: limit && { label: limit.label, value: limit.value, unit: limit.unit, source: limit.source },
    })),
  };
}

export const flowOperations = [
  operation({
    id: "listFlows",
    method: "GET",
    path: "/flows",
    scope: "flows:read",
    group: "Flows",
    summary: "Flows with their steps, the newest first",
    query: z.strictObject({ ...pageQuery, ...programQuery }),
    answer: pageOf(flow),
    handle: async ({ scope, query }) => {
      requireInSomeProgram(scope, "see the work");
      const program = programFilter(scope.actor, "see the work", query.program);
      return inScope(scope, async (em) => {
        const { rows, next_cursor } = await keysetPage(em, Flow, { program }, "createdAt", query, {
          populate: ["program", "silicon", "updatedBy"],
        });
        const found = await flowDetails(em, scope, rows as Flow[]);
        return { answer: { data: found.map(flowJson), next_cursor } };
      });
    },
  }),
  operation({
    id: "getFlow",
    method: "GET",
    path: "/flows/{flow_id}",
    scope: "flows:read",
    group: "Flows",
    summary: "One flow with its steps",
    params: idParam("flow_id"),
    answer: flow,
    handle: async ({ scope, params }) => ({ answer: flowJson(await getFlow(scope, params.flow_id)) }),
  }),
  operation({
    id: "listAssessments",
    method: "GET",
    path: "/assessments",
    scope: "assessments:read",
    group: "Assessments",
    summary: "Assessments, the newest first",
    query: z.strictObject({ ...pageQuery, ...programQuery, flow_id: id.optional(), outcome: outcome.optional() }),
    answer: pageOf(assessmentRow),
    handle: async ({ scope, query }) => {
      requireInSomeProgram(scope, "see the work");
      const where = {
        program: programFilter(scope.actor, "see the work", query.program),
        ...(query.flow_id !== undefined && { flow: query.flow_id }),
        ...(query.outcome !== undefined && { outcome: query.outcome }),
      };
      const { rows, next_cursor } = await inScope(scope, (em) =>
        keysetPage(em, Assessment, where, "createdAt", query, { populate: ["program"] }),
      );
      const data = rows.map((row) => ({
        id: row.id,
        number: recordNumber("assessment", row.program.slug, row.documentNumber),
        program: row.program.slug,
        flow: { id: row.flow.id, name: row.flowName },
        lot: row.lot?.name ?? null,
        outcome: row.outcome,
        engine_version: row.engineVersion,
        input_sha256: row.inputHash,
        created_at: row.createdAt.toISOString(),
      }));
      return { answer: { data, next_cursor } };
    },
  }),
  operation({
    id: "getAssessment",
    method: "GET",
    path: "/assessments/{assessment_id}",
    scope: "assessments:read",
    group: "Assessments",
    summary: "One assessment with its figures and findings, as it was stored",
    params: idParam("assessment_id"),
    answer: assessment,
    handle: async ({ scope, params }) => ({
      answer: assessmentJson(await getAssessment(scope, params.assessment_id)),
    }),
  }),
];
