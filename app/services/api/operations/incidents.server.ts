import { z } from "zod";
import { Incident } from "#app/db/entities/incident.ts";
import { SUPPORT_CLASSES } from "#app/engine/vocabulary.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { INCIDENT_KINDS, INCIDENT_STATES, SEVERITIES } from "#app/schemas/incident.ts";
import { incidentSchema } from "#app/schemas/incident-form.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { findIncident, type FoundIncident } from "../../incidents/find-incident.server.ts";
import { reportIncident } from "../../incidents/report-incident.server.ts";
import { requireInSomeProgram } from "../../permission.server.ts";
import { programFilter } from "../../program-filter.server.ts";
import { operation } from "../operation.server.ts";
import { keysetPage, pageOf, pageQuery } from "../paging.server.ts";
import { ApiRefused } from "../refused.server.ts";
import { id, idParam, moment, named, programQuery, programSlug } from "../shapes.ts";

const place = z.object({
  radius: z.number().describe("Share of the wafer’s radius, 0 to 1."),
  azimuth_rad: z.number().describe("From the notch, counter-clockwise with the device side towards the reader."),
});
const incident = z.object({
  id,
  number: z.string().describe("As paper has it, such as TERN-I001."),
  program: programSlug,
  assessment_id: id,
  leg: z.int(),
  step: z.int(),
  step_title: z.string(),
  lot: named,
  wafer: named.nullable(),
  kind: z.enum(INCIDENT_KINDS),
  severity: z.enum(SEVERITIES),
  state: z.enum(INCIDENT_STATES),
  place: place.nullable(),
  wafers_affected: z.int(),
  wafers_broken: z.int(),
  wafers_through: z.int().nullable(),
  words: z.string(),
  occurred_at: moment,
  reported_at: moment,
  assessed: z
    .object({
      silicon_m: z.number(),
      planned: z.enum(SUPPORT_CLASSES),
      required: z.enum(SUPPORT_CLASSES),
      warp_m: z.number().nullable(),
      warp_standard_uncertainty_m: z.number().nullable(),
    })
    .describe("What the assessment said of the step."),
});

const incidentJson = (found: Pick<FoundIncident, keyof Incident & keyof FoundIncident>): z.input<typeof incident> => ({
  id: found.id,
  number: recordNumber("incident", found.program.slug, found.number),
  program: found.program.slug,
  assessment_id: found.assessment.id,
  leg: found.leg,
  step: found.step,
  step_title: found.stepTitle,
  lot: { id: found.lot.id, name: found.lot.name },
  wafer: found.wafer ? { id: found.wafer.id, name: found.wafer.name } : null,
  kind: found.kind,
  severity: found.severity,
  state: found.state,
  place:
    typeof found.radius === "number" && typeof found.azimuth === "number"
      ? { radius: found.radius, azimuth_rad: found.azimuth }
      : null,
  wafers_affected: found.affected,
  wafers_broken: found.broken,
  wafers_through: found.through ?? null,
  words: found.words,
  occurred_at: found.occurredAt.toISOString(),
  reported_at: found.createdAt.toISOString(),
  assessed: {
    silicon_m: found.silicon,
    planned: found.planned,
    required: found.required,
    warp_m: found.warp ?? null,
    warp_standard_uncertainty_m: found.warpUncertainty ?? null,
  },
});

const incidentBody = z.strictObject({
  assessment_id: id,
  leg: z.int().min(0).max(25).optional(),
  step: z.int().min(1).max(200),
  lot: z.string().trim().min(1).max(80),
  wafer: z.string().trim().max(80).optional(),
  kind: z.enum(INCIDENT_KINDS),
  severity: z.enum(SEVERITIES),
  place: z
    .strictObject({
      radius: z.number().min(0).max(1),
      azimuth_rad: z
        .number()
        .min(0)
        .max(2 * Math.PI),
    })
    .optional(),
  wafers_affected: z.int().min(1).max(9999),
  wafers_broken: z.int().min(0).max(9999),
  wafers_through: z.int().min(1).max(9999).optional(),
  words: z.string().trim().min(1).max(4000),
  occurred_at: moment,
});
type IncidentBody = z.output<typeof incidentBody>;

/** Where the fields of the form stand in what is sent here. */
const POINTERS: Record<string, string> = {
  assessment: "/assessment_id",
  affected: "/wafers_affected",
  broken: "/wafers_broken",
  through: "/wafers_through",
  occurredAt: "/occurred_at",
  radius: "/place/radius",
  azimuth: "/place/azimuth_rad",
  photos: "",
};
const pointerOf = (field: string) => POINTERS[field] ?? `/${field}`;

/** The report as the form’s own schema reads it, so that one schema has all the rules; the place is put in as it came. */
function valuesOf(body: IncidentBody) {
  const parsed = incidentSchema.safeParse({
    assessment: body.assessment_id,
    leg: body.leg ?? 0,
    step: body.step,
    lot: body.lot,
    wafer: body.wafer ?? "",
    kind: body.kind,
    severity: body.severity,
    affected: String(body.wafers_affected),
    broken: String(body.wafers_broken),
    through: body.wafers_through === undefined ? "" : String(body.wafers_through),
    words: body.words,
    occurredAt: new Date(body.occurred_at).toISOString().slice(0, 16),
  });
  if (!parsed.success)
    throw new ApiRefused(
      422,
      "The report was not taken.",
      parsed.error.issues.map(({ path, message }) => ({ pointer: pointerOf(String(path[0] ?? "")), detail: message })),
    );
  const spot = body.place ? { radius: body.place.radius, azimuth: body.place.azimuth_rad } : null;
  return { ...parsed.data, spot };
}

const read = (scope: ActorScope, incidentId: string) =>
  inScope(scope, async (em) => incidentJson(await findIncident(em, scope, incidentId)));

export const incidentOperations = [
  operation({
    id: "listIncidents",
    method: "GET",
    path: "/incidents",
    scope: "incidents:read",
    group: "Incidents",
    summary: "Incidents, the newest report first",
    query: z.strictObject({
      ...pageQuery,
      ...programQuery,
      state: z.enum(INCIDENT_STATES).optional(),
      kind: z.enum(INCIDENT_KINDS).optional(),
      severity: z.enum(SEVERITIES).optional(),
    }),
    answer: pageOf(incident),
    handle: async ({ scope, query }) => {
      requireInSomeProgram(scope, "see the work");
      const { state, kind, severity } = query;
      const where = {
        program: programFilter(scope.actor, "see the work", query.program),
        ...(state !== undefined && { state }),
        ...(kind !== undefined && { kind }),
        ...(severity !== undefined && { severity }),
      };
      const { rows, next_cursor } = await inScope(scope, (em) =>
        keysetPage(em, Incident, where, "createdAt", query, { populate: ["program", "assessment", "lot", "wafer"] }),
      );
      return { answer: { data: rows.map((found) => incidentJson(found as FoundIncident)), next_cursor } };
    },
  }),
  operation({
    id: "getIncident",
    method: "GET",
    path: "/incidents/{incident_id}",
    scope: "incidents:read",
    group: "Incidents",
    summary: "One incident",
    params: idParam("incident_id"),
    answer: incident,
    handle: async ({ scope, params }) => ({ answer: await read(scope, params.incident_id) }),
  }),
  operation({
    id: "reportIncident",
    method: "POST",
    path: "/incidents",
    scope: "incidents:write",
    group: "Incidents",
    summary: "Report an incident. Where people are in danger, act by the site’s procedures first",
    body: incidentBody,
    answer: incident,
    status: 201,
    handle: async ({ scope, body }) => {
      const reported = await reportIncident(scope, valuesOf(body), []);
      if (reported.outcome === "refused")
        throw new ApiRefused(
          422,
          "The report was not taken.",
          reported.reasons.map((detail) => ({ pointer: pointerOf(reported.field), detail })),
        );
      const answer = await read(scope, reported.id);
      return { answer, status: 201, headers: { Location: `/api/v1/incidents/${reported.id}` } };
    },
  }),
];
