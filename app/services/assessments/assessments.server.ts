import { createHash, randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Assessment } from "#app/db/entities/assessment.ts";
import { EngineInputError } from "#app/engine/errors.ts";
import { assessFlow } from "#app/engine/flow/assess.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import type { Outcome } from "#app/engine/vocabulary.ts";
import { PAGE_SIZE, type ListPage, type ListParams } from "#app/lib/list-params.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { flowInputOf } from "../flows/flow-detail.ts";
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
      result = resultOf(input.flow, assessFlow(input.flow, input.limits));
    } catch (error) {
      if (error instanceof EngineInputError) return notComputable(error);
      throw error;
    }
    const newest = await em.findOne(Assessment, { flow: flow.id }, { orderBy: { number: "desc" }, fields: ["number"] });
    const created = em.create(Assessment, {
      id: randomUUID(),
      program: flow.program.id,
      flow: flow.id,
      number: (newest?.number ?? 0) + 1,
      flowName: flow.name,
      engineVersion: ENGINE_VERSION,
      inputHash: createHash("sha256").update(JSON.stringify(input)).digest("hex"),
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
  number: number;
  flow: { id: string; name: string };
  program: { id: string; name: string; slug: string };
  engineVersion: string;
  inputHash: string;
  createdAt: string;
  createdBy: string;
  result: AssessmentResult;
  /** the flow has been changed since: what stands here is of then */
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
    return {
      id: assessment.id,
      number: assessment.number,
      flow: { id: flow.id, name: assessment.flowName },
      program: { id: program.id, name: program.name, slug: program.slug },
      engineVersion: assessment.engineVersion,
      inputHash: assessment.inputHash,
      createdAt: assessment.createdAt.toISOString(),
      createdBy: assessment.createdBy.name,
      result: assessment.result,
      outOfDate: flow.updatedAt > assessment.createdAt,
      mayAssess: mayInProgram(scope.actor, "run assessments", program.id),
    };
  });
}

export const ASSESSMENT_SORTS = ["run", "flow", "outcome"] as const;

export interface AssessmentRow {
  id: string;
  number: number;
  flow: string;
  program: string;
  outcome: Outcome;
  sentence: string;
  createdAt: string;
  createdBy: string;
  outOfDate: boolean;
}

/** A page of the assessments that the person may see, newest first unless asked otherwise. */
export async function listAssessments(
  scope: ActorScope,
  params: ListParams,
  flowId?: string,
): Promise<ListPage<AssessmentRow>> {
  return inScope(scope, async (em) => {
    const direction = params.descending ? "desc" : "asc";
    const [assessments, total] = await em.findAndCount(
      Assessment,
      {
        program: programFilter(scope.actor, "see the work", params.filters["program"]),
        ...(flowId ? { flow: flowId } : {}),
        ...(params.query ? { flowName: { $ilike: `%${escapeLike(params.query)}%` } } : {}),
      },
      {
        populate: ["program", "createdBy", "flow"],
        orderBy: [
          params.sort === "flow"
            ? { flowName: direction }
            : params.sort === "outcome"
              ? { outcome: direction }
              : { createdAt: params.descending ? "asc" : "desc" },
          { id: "asc" },
        ],
        limit: PAGE_SIZE,
        offset: (params.page - 1) * PAGE_SIZE,
      },
    );
    const rows = assessments.map((assessment): AssessmentRow => ({
      id: assessment.id,
      number: assessment.number,
      flow: assessment.flowName,
      program: assessment.program.name,
      outcome: assessment.outcome,
      sentence: assessment.result.sentences.join(" "),
      createdAt: assessment.createdAt.toISOString(),
      createdBy: assessment.createdBy.name,
      outOfDate: assessment.flow.updatedAt > assessment.createdAt,
    }));
    return { rows, total, params };
  });
}
