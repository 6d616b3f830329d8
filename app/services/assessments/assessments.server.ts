import { createHash, randomUUID } from "node:crypto";
import { raw, type EntityManager, type FilterQuery, type QueryOrderMap } from "@mikro-orm/postgresql";
import { Assessment } from "#app/db/entities/assessment.ts";
import { EngineInputError } from "#app/engine/errors.ts";
import { assessFlow } from "#app/engine/flow/assess.ts";
import type { FlowInput } from "#app/engine/flow/model.ts";
import type { SiteLimits } from "#app/engine/rules/limits.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { OUTCOMES, type Outcome } from "#app/engine/vocabulary.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { flowInputOf, type FlowDetail } from "../flows/flow-detail.ts";
import { readFlow } from "../flows/read-flow.server.ts";
import { escapeLike } from "../like.server.ts";
import { readLimits } from "../limits.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { programFilter } from "../program-filter.server.ts";
import { idFrom } from "../uuid.server.ts";
import { resultOf } from "./result-of.ts";

/** What running an assessment came to: the stored one, or the sentence that says why nothing could be computed. */
export type Ran =
  { outcome: "stored"; id: string } | { outcome: "not computable"; step: number | null; reason: string };

/**
 * Assesses a flow as it is now and stores inputs, engine version and results together. What cannot be computed is stored
 * nowhere: it comes back as a reason, with the step that it concerns.
 */
export async function runAssessment(scope: ActorScope, flowId: string): Promise<Ran> {
  return inScope(scope, async (em): Promise<Ran> => {
    const flow = await readFlow(em, scope, flowId);
    requireInProgram(scope, "run assessments", flow.program.id, "flow");
    if (flow.steps.length === 0)
      return { outcome: "not computable", step: null, reason: "The flow has no steps yet. Add the first one." };
    const input = { flow: flowInputOf(flow), limits: await readLimits(em) };
    let result: AssessmentResult;
    try {
      result = resultOf(input.flow, input.limits, assessFlow(input.flow, input.limits));
    } catch (error) {
      if (error instanceof EngineInputError) return notComputable(error);
      throw error;
    }
    const created = em.create(Assessment, {
      id: randomUUID(),
      program: flow.program.id,
      flow: flow.id,
      ...(await nextNumbers(em, flow)),
      flowName: flow.name,
      engineVersion: ENGINE_VERSION,
      inputHash: hashOf(input),
      input,
      result,
      outcome: result.verdict.outcome,
      createdAt: new Date(),
      createdBy: scope.actor.id,
    });
    await em.flush();
    return { outcome: "stored", id: created.id };
  });
}

/** Runs an assessment's flow again, as the flow is now. */
export async function runAgain(scope: ActorScope, assessmentId: string | undefined): Promise<Ran> {
  const flowId = await inScope(scope, async (em) => (await findAssessment(em, scope, assessmentId)).flow.id);
  return runAssessment(scope, flowId);
}

/** Of everything that an assessment rests on: equal hashes, equal answer. */
const hashOf = (input: { flow: FlowInput; limits: SiteLimits }) =>
  createHash("sha256").update(JSON.stringify(input)).digest("hex");

/** The numbers after the newest ones of flow and program. Two people who run at once wait for each other until the end. */
async function nextNumbers(em: EntityManager, { id, program }: Pick<FlowDetail, "id" | "program">) {
  await em.execute("select pg_advisory_xact_lock(hashtextextended(?, 0))", [`assessment numbers of ${program.id}`]);
  const [newest] = await em.execute<{ number: number; document: number }[]>(
    `select coalesce(max(number) filter (where flow_id = ?), 0) as number, coalesce(max(document_number), 0) as document
       from assessment where program_id = ?`,
    [id, program.id],
  );
  return { number: (newest?.number ?? 0) + 1, documentNumber: (newest?.document ?? 0) + 1 };
}

/** `steps[3].siliconAfter` names step 4 to people. */
function notComputable({ field, reason, allowed }: EngineInputError): Ran {
  const index = /^steps\[(\d+)\]/.exec(field)?.[1];
  const what = field.replace(/^steps\[\d+\]\.?/, "");
  return {
    outcome: "not computable",
    step: index === undefined ? null : Number(index) + 1,
    reason: `${what ? `${what}: ` : ""}${reason}${allowed ? ` (allowed: ${allowed})` : ""}`,
  };
}

export interface AssessmentDetail {
  id: string;
  /** counts within the flow */
  number: number;
  /** counts within the program, for the document's number */
  documentNumber: number;
  flow: { id: string; name: string };
  program: { id: string; name: string; slug: string };
  engineVersion: string;
  inputHash: string;
  createdAt: string;
  createdBy: string;
  result: AssessmentResult;
  /** the flow, or something that it uses, has been changed since: what stands here is of then */
  outOfDate: boolean;
  mayAssess: boolean;
}

async function findAssessment(em: EntityManager, scope: ActorScope, id: string | undefined) {
  const assessment = await em.findOne(
    Assessment,
    { id: idFrom(id, "assessment") },
    { populate: ["program", "createdBy", "flow"] },
  );
  if (!assessment) throw notFound("assessment");
  requireInProgram(scope, "see the work", assessment.program.id, "assessment");
  return assessment;
}

/** One assessment, as it was stored. */
export async function getAssessment(scope: ActorScope, id: string | undefined): Promise<AssessmentDetail> {
  return inScope(scope, async (em) => {
    const assessment = await findAssessment(em, scope, id);
    const { program, flow } = assessment;
    const now = { flow: flowInputOf(await readFlow(em, scope, flow.id)), limits: await readLimits(em) };
    return {
      id: assessment.id,
      number: assessment.number,
      documentNumber: assessment.documentNumber,
      flow: { id: flow.id, name: assessment.flowName },
      program: { id: program.id, name: program.name, slug: program.slug },
      engineVersion: assessment.engineVersion,
      inputHash: assessment.inputHash,
      createdAt: assessment.createdAt.toISOString(),
      createdBy: assessment.createdBy.name,
      result: assessment.result,
      outOfDate: hashOf(now) !== assessment.inputHash,
      mayAssess: mayInProgram(scope.actor, "run assessments", program.id),
    };
  });
}

export const ASSESSMENT_SORTS = ["run", "flow", "outcome"] as const;

export interface AssessmentRow {
  id: string;
  number: number;
  documentNumber: number;
  flow: string;
  program: string;
  programSlug: string;
  outcome: Outcome;
  sentence: string;
  createdAt: string;
  createdBy: string;
  /** the flow itself has been changed since */
  outOfDate: boolean;
}

/** A page of the assessments that the person may see, newest first unless asked otherwise. */
export async function listAssessments(
  scope: ActorScope,
  params: ListParams,
  flowId?: string,
): Promise<ListPage<AssessmentRow>> {
  return inScope(scope, (em) => pageOf(em, scope, params, flowId ? { flow: flowId } : {}));
}

/** A page of the newest assessment of each flow: those that a sheet would be printed from. */
export async function listNewestAssessments(scope: ActorScope, params: ListParams): Promise<ListPage<AssessmentRow>> {
  return inScope(scope, async (em) => {
    const newest = await em.execute<{ id: string }[]>(
      "select distinct on (flow_id) id from assessment order by flow_id, number desc",
    );
    return pageOf(em, scope, params, { id: { $in: newest.map(({ id }) => id) } });
  });
}

async function pageOf(
  em: EntityManager,
  { actor }: ActorScope,
  params: ListParams,
  among: FilterQuery<Assessment>,
): Promise<ListPage<AssessmentRow>> {
  const [assessments, total] = await em.findAndCount(
    Assessment,
    {
      $and: [
        among,
        { program: programFilter(actor, "see the work", params.filters["program"]) },
        params.filters["outcome"] ? { outcome: params.filters["outcome"] as Outcome } : {},
        params.query ? { flowName: { $ilike: `%${escapeLike(params.query)}%` } } : {},
      ],
    },
    {
      // Results are long and a list needs none of them but the sentences.
      fields: [...LISTED],
      orderBy: [orderOf(params), { id: "asc" }],
      limit: PAGE_SIZE,
      offset: (params.page - 1) * PAGE_SIZE,
    },
  );
  const sentences = await sentencesOf(
    em,
    assessments.map(({ id }) => id),
  );
  const rows = assessments.map((assessment): AssessmentRow => ({
    id: assessment.id,
    number: assessment.number,
    documentNumber: assessment.documentNumber,
    flow: assessment.flowName,
    program: assessment.program.name,
    programSlug: assessment.program.slug,
    outcome: assessment.outcome,
    sentence: (sentences.get(assessment.id) ?? []).join(" "),
    createdAt: assessment.createdAt.toISOString(),
    createdBy: assessment.createdBy.name,
    outOfDate: assessment.flow.updatedAt > assessment.createdAt,
  }));
  return { rows, total, params };
}

const LISTED = [
  "id",
  "number",
  "documentNumber",
  "flowName",
  "outcome",
  "createdAt",
  "program.name",
  "program.slug",
  "createdBy.name",
  "flow.updatedAt",
] as const;

/** Newest first; outcomes by how bad they are, not by their letters. */
function orderOf({ sort, descending }: ListParams): QueryOrderMap<Assessment> {
  const direction = descending ? "desc" : "asc";
  if (sort === "flow") return { flowName: direction };
  if (sort !== "outcome") return { createdAt: descending ? "asc" : "desc" };
  const words = OUTCOMES.map((outcome) => `'${outcome}'`).join(", ");
  return { [raw((alias) => `array_position(array[${words}]::text[], ${alias}.outcome)`)]: direction };
}

async function sentencesOf(em: EntityManager, ids: string[]): Promise<Map<string, string[]>> {
  const found = await em.execute<{ id: string; sentences: string[] }[]>(
    "select id, result->'sentences' as sentences from assessment where id = any(?::uuid[])",
    [`{${ids.join(",")}}`],
  );
  return new Map(found.map(({ id, sentences }) => [id, sentences]));
}
