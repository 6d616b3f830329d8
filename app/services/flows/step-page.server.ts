import type { EntityManager } from "@mikro-orm/postgresql";
import type { StepChoices } from "#app/lib/flow-step-choices.ts";
import { readListParams } from "#app/lib/list-params.ts";
import type { StepTemplateDetail } from "#app/schemas/template-view.ts";
import { waferBefore, type WaferBefore } from "#app/lib/flow-wafer-before.ts";
import { mayOnSite } from "#app/policies/permissions.ts";
import type { FlowDetail, StepDetail } from "#app/schemas/flow-view.ts";
import { notFound } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { idFrom } from "../uuid.server.ts";
import { flowInputOf } from "./flow-inputs.ts";
import { getFlow } from "./flows.server.ts";
import { readFlow } from "./read-flow.server.ts";
import { removedStep } from "./revisions.server.ts";
import { getStepTemplate, listStepTemplates } from "./step-library.server.ts";
import { stepChoices } from "./step-choices.server.ts";
import { stepDetails } from "./step-details.server.ts";
import { stepNumber } from "./step-number.ts";

/** What stands around a step's form. */
export interface StepSurroundings {
  flow: { id: string; name: string; version: number };
  /** number of steps in the flow */
  of: number;
  before: WaferBefore | null;
}

const surroundings = (flow: FlowDetail, index: number): StepSurroundings => ({
  flow: { id: flow.id, name: flow.name, version: flow.stamp.version },
  of: flow.steps.length,
  before: waferBefore(flowInputOf(flow), index),
});

export interface StepPage extends StepSurroundings {
  step: StepDetail;
  /** it is no longer in the flow; saving puts it back */
  removed: boolean;
  /** from 1 */
  number: number;
  previous: string | null;
  next: string | null;
  mayEdit: boolean;
  /** in the library of the site */
  mayKeep: boolean;
  /** null for those who may only read */
  choices: StepChoices | null;
}

/** One step of a flow; with what can be chosen when the person may change it. */
export async function stepPage(
  scope: ActorScope,
  { flowId, stepId }: { flowId: string | undefined; stepId: string | undefined },
): Promise<StepPage> {
  const id = idFrom(stepId, "step");
  const { flow, removed } = await inScope(scope, async (em) => {
    const found = await readFlow(em, scope, idFrom(flowId, "flow"));
    const there = found.steps.some((each) => each.id === id);
    return { flow: found, removed: there ? null : await lostStep(em, found, id) };
  });
  const index = removed?.position ?? flow.steps.findIndex((each) => each.id === id);
  const step = removed?.step ?? flow.steps[index];
  if (!step) throw notFound("step");
  return {
    ...surroundings(flow, index),
    step,
    removed: removed !== null,
    number: index + 1,
    previous: flow.steps[index - 1]?.id ?? null,
    next: flow.steps[removed ? index : index + 1]?.id ?? null,
    mayEdit: flow.mayEdit,
    mayKeep: removed === null && flow.mayEdit && mayOnSite(scope.actor, "edit the step library"),
    choices: flow.mayEdit ? await stepChoices(scope) : null,
  };
}

/** A step that has been removed, as it last was, for those who may put it back. */
async function lostStep(em: EntityManager, flow: FlowDetail, id: string) {
  const lost = flow.mayEdit ? await removedStep(em, flow.id, id) : null;
  const [step] = lost ? await stepDetails(em, [lost.step]) : [];
  return lost && step ? { step, position: Math.min(lost.position, flow.steps.length) } : null;
}

export interface NewStepPage extends StepSurroundings {
  /** from 1: the number that the new step gets */
  number: number;
  /** what holds the wafer at the step before */
  planned: StepDetail["planned"];
  choices: StepChoices;
  library: {
    query: string;
    total: number;
    offered: { id: string; name: string; kind: StepDetail["kind"] }[];
    chosen: StepTemplateDetail | null;
  };
}

/** A place for a new step: before the one that has number `at` now, at the end by default. */
export async function newStepPage(
  scope: ActorScope,
  { flowId, search }: { flowId: string | undefined; search: URLSearchParams },
): Promise<NewStepPage> {
  const flow = await getFlow(scope, flowId);
  requireInProgram(scope, "edit stacks and flows", flow.program.id, "flow");
  const number = stepNumber(search.get("at"), flow.steps.length);
  return {
    ...surroundings(flow, number - 1),
    number,
    planned: flow.steps[number - 2]?.planned ?? "bare",
    choices: await stepChoices(scope),
    library: await fromLibrary(scope, search),
  };
}

const OFFERED = 8;

/** Steps of the library that fit what is searched, and the one that the form is to begin with. */
async function fromLibrary(scope: ActorScope, search: URLSearchParams): Promise<NewStepPage["library"]> {
  const from = search.get("from");
  const params = readListParams(search, { sorts: ["name"] });
  const { rows, total } = await listStepTemplates(scope, { ...params, page: 1 });
  return {
    query: params.query,
    total,
    offered: rows.slice(0, OFFERED).map(({ id, name, kind }) => ({ id, name, kind })),
    chosen: from ? await getStepTemplate(scope, from) : null,
  };
}
