import { z } from "zod";
import { ScanReading } from "#app/db/entities/scan-reading.ts";
import { Scan } from "#app/db/entities/scan.ts";
import { jobJson } from "#app/lib/job-json.ts";
import { inScope } from "#app/server/scope.server.ts";
import { getJob } from "../../jobs/jobs.server.ts";
import { requireInSomeProgram } from "../../permission.server.ts";
import { programFilter } from "../../program-filter.server.ts";
import { getReading } from "../../scan-readings/get-reading.server.ts";
import { operation } from "../operation.server.ts";
import { keysetPage, pageOf, pageQuery } from "../paging.server.ts";
import { scanAnswer } from "../scan-answer.server.ts";
import { id, idParam, moment, named, programQuery, programSlug } from "../shapes.ts";
import { uploadScan } from "../upload-scan.server.ts";

const readingRow = z.object({
  id,
  program: programSlug,
  file: z.object({ id, name: z.string(), size_bytes: z.int(), sha256: z.string() }),
  read_at: moment,
  engine_version: z.string(),
});
const reading = z
  .looseObject({ ...readingRow.shape, read_by: z.string(), edge_exclusion_m: z.number(), kind: z.string() })
  .describe("What the file says: profiles with curvature and points in SI, or a table.");
const job = z.looseObject({
  id,
  state: z.string(),
  done: z.number(),
  total: z.number(),
  unit: z.string(),
  sentence: z.string(),
  created_at: moment,
  started_at: moment.nullable(),
  ended_at: moment.nullable(),
  files: z.array(z.looseObject({ name: z.string(), outcome: z.string() })),
});
const stress = z.object({
  id,
  program: programSlug,
  label: z.string(),
  film: named.nullable(),
  wafer_id: id.nullable(),
  stress_Pa: z.number().describe("Tension positive."),
  stress_standard_uncertainty_Pa: z.number(),
  bow_change_m: z.number(),
  bow_standard_uncertainty_m: z.number(),
  curled: z.boolean(),
  engine_version: z.string(),
  created_at: moment,
});
const form = z.object({
  file: z.string().describe("The file of the instrument, as it is."),
  program: programSlug,
  edge_exclusion_m: z.string().optional(),
  import_profile: z.string().optional().describe("How the file is read, as JSON."),
  import_profile_id: id.optional(),
});

export const scanOperations = [
  operation({
    id: "listScans",
    method: "GET",
    path: "/scans",
    scope: "scans:read",
    group: "Scans",
    summary: "Files that were read, the newest first",
    query: z.strictObject({ ...pageQuery, ...programQuery }),
    answer: pageOf(readingRow),
    handle: async ({ scope, query }) => {
      requireInSomeProgram(scope, "see the work");
      const program = programFilter(scope.actor, "see the work", query.program);
      const { rows, next_cursor } = await inScope(scope, (em) =>
        keysetPage(em, ScanReading, { program }, "createdAt", query, { populate: ["file", "program"] }),
      );
      const data = rows.map((row) => ({
        id: row.id,
        program: row.program.slug,
        file: { id: row.file.id, name: row.file.name, size_bytes: row.file.size, sha256: row.file.hash },
        read_at: row.createdAt.toISOString(),
        engine_version: row.engineVersion,
      }));
      return { answer: { data, next_cursor } };
    },
  }),
  operation({
    id: "uploadScan",
    method: "POST",
    path: "/scans",
    scope: "scans:write",
    group: "Scans",
    summary: "Take a file of an instrument in. A large one is read by a job",
    form,
    answer: reading,
    status: 201,
    otherAnswers: { 202: job },
    handle: ({ scope, request }) => uploadScan(scope, request),
  }),
  operation({
    id: "getScan",
    method: "GET",
    path: "/scans/{reading_id}",
    scope: "scans:read",
    group: "Scans",
    summary: "What a file says, as JSON or, of profiles, as CSV",
    params: idParam("reading_id"),
    answer: reading,
    handle: async ({ scope, params, request }) => scanAnswer(request, await getReading(scope, params.reading_id), 200),
  }),
  operation({
    id: "getJob",
    method: "GET",
    path: "/jobs/{job_id}",
    scope: "scans:read",
    group: "Scans",
    summary: "How a job stands",
    params: idParam("job_id"),
    answer: job,
    handle: async ({ scope, params }) => ({ answer: jobJson(await getJob(scope, params.job_id)) }),
  }),
  operation({
    id: "listStresses",
    method: "GET",
    path: "/stresses",
    scope: "scans:read",
    group: "Scans",
    summary: "Stresses of films from scans before and after them, the newest first",
    query: z.strictObject({ ...pageQuery, ...programQuery, film_id: id.optional() }),
    answer: pageOf(stress),
    handle: async ({ scope, query }) => {
      requireInSomeProgram(scope, "see the work");
      const where = {
        program: programFilter(scope.actor, "see the work", query.program),
        ...(query.film_id !== undefined && { film: query.film_id }),
      };
      const { rows, next_cursor } = await inScope(scope, (em) =>
        keysetPage(em, Scan, where, "createdAt", query, { populate: ["film", "program"] }),
      );
      const data = rows.map((row) => ({
        id: row.id,
        program: row.program.slug,
        label: row.label,
        film: row.film ? { id: row.film.id, name: row.film.name } : null,
        wafer_id: row.wafer?.id ?? null,
        stress_Pa: row.stress,
        stress_standard_uncertainty_Pa: row.stressUncertainty,
        bow_change_m: row.bowChange,
        bow_standard_uncertainty_m: row.bowUncertainty,
        curled: row.curled,
        engine_version: row.engineVersion,
        created_at: row.createdAt.toISOString(),
      }));
      return { answer: { data, next_cursor } };
    },
  }),
];
