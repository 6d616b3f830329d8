import { randomUUID } from "node:crypto";
import type { EntityManager } from "@mikro-orm/postgresql";
import { Assessment } from "#app/db/entities/assessment.ts";
import { ENGINE_VERSION } from "#app/engine/version.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import type { FlowDetail } from "#app/schemas/flow-view.ts";
import type { LotRecord } from "#app/schemas/lot.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";
import { compute, type NotComputable } from "./compute.ts";
import { inputHash } from "./input-hash.server.ts";
import { isOutOfDate } from "./out-of-date.server.ts";
import { presentFlow } from "./present-inputs.server.ts";

/** What running an assessment came to: the stored one, or the sentence that says why nothing could be computed. */
export type Ran = { outcome: "stored"; id: string } | NotComputable;

/**
 * Assesses a flow as it is now and stores inputs, engine version and results together. What cannot be computed is stored
 * nowhere: it comes back as a reason, with the step that it concerns.
 */
export async function runAssessment(scope: ActorScope, flowId: string): Promise<Ran> {
  return inScope(scope, (em) => assessWithin(em, scope, flowId));
}

/** The same inside a running transaction. */
export async function assessWithin(em: EntityManager, scope: ActorScope, flowId: string): Promise<Ran> {
  const { flow, input } = await presentFlow(em, scope, flowId);
  requireInProgram(scope, "run assessments", flow.program.id, "flow");
  const computed = compute(input);
  if (computed.outcome === "not computable") return computed;
  const { result } = computed;
  const created = em.create(Assessment, {
    id: randomUUID(),
    program: flow.program.id,
    flow: flow.id,
    ...(await nextNumbers(em, flow)),
    flowName: flow.name,
    engineVersion: ENGINE_VERSION,
    inputHash: inputHash(input),
    input,
    result,
    outcome: result.verdict.outcome,
    createdAt: new Date(),
    createdBy: scope.actor.id,
  });
  await em.flush();
  return { outcome: "stored", id: created.id };
}

const LOT_AGAIN =
  "This assessment is of one lot, and its flow is not run again from here. Open the flow, assess it, and try the lot there.";

/** Runs an assessment's flow again, as the flow is now; refused for a lot's. */
export async function runAgain(scope: ActorScope, assessmentId: string | undefined): Promise<Ran> {
  const { flow, lot } = await inScope(scope, (em) => findAssessment(em, scope, assessmentId));
  if (lot) throw problem(409, LOT_AGAIN);
  return runAssessment(scope, flow.id);
}

/** The numbers after the newest ones of flow and program, lots left out of the first. Two people who run at once wait for each other until the end. */
export async function nextNumbers(em: EntityManager, { id, program }: Pick<FlowDetail, "id" | "program">) {
  await em.execute("select pg_advisory_xact_lock(hashtextextended(?, 0))", [`assessment numbers of ${program.id}`]);
  const [newest] = await em.execute<{ number: number; document: number }[]>(
    `select coalesce(max(number) filter (where flow_id = ?), 0) as number, coalesce(max(document_number), 0) as document
       from assessment where program_id = ?`,
    [id, program.id],
  );
  return { number: (newest?.number ?? 0) + 1, documentNumber: (newest?.document ?? 0) + 1 };
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
  /** the lot that it is of; null for an assessment of the flow itself */
  lot: LotRecord | null;
}

/** The assessment that an id names, if the person may see it. */
export async function findAssessment(em: EntityManager, scope: ActorScope, id: string | undefined) {
  const assessment = await em.findOne(
    Assessment,
    { id: idFrom(id, "assessment") },
    { populate: ["program", "createdBy", "flow", "input"] },
  );
  if (!assessment) throw notFound("assessment");
  requireInProgram(scope, "see the work", assessment.program.id, "assessment");
  return assessment;
}

/** One assessment, as it was stored. */
export async function getAssessment(scope: ActorScope, id: string | undefined): Promise<AssessmentDetail> {
  return inScope(scope, (em) => assessmentDetail(em, scope, id));
}

/** The same inside a running transaction. */
export async function assessmentDetail(
  em: EntityManager,
  scope: ActorScope,
  id: string | undefined,
): Promise<AssessmentDetail> {
  const assessment = await findAssessment(em, scope, id);
  const { program, flow, lot } = assessment;
  const { input } = await presentFlow(em, scope, flow.id);
  // A lot rests on its own figures and, for the rest, on what the assessment that it is of rests on.
  const of = lot ? await findAssessment(em, scope, lot.of.id) : assessment;
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
    outOfDate: isOutOfDate(
      { engineVersion: assessment.engineVersion, inputHash: of.inputHash, input: of.input.$ },
      input,
    ),
    mayAssess: mayInProgram(scope.actor, "run assessments", program.id),
    lot: lot ?? null,
  };
}
