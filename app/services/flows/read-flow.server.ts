import type { EntityManager } from "@mikro-orm/postgresql";
import { Flow } from "#app/db/entities/flow.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { FlowDetail, StepDetail } from "#app/schemas/flow-view.ts";
import { notFound } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { stampOf } from "../record.server.ts";
import { incomingShape, readPlans } from "./plan.server.ts";
import { stepDetails } from "./step-details.server.ts";

type FlowContent = Omit<FlowDetail, "mayEdit" | "mayAssess">;

/** The flow that an id names, if the person may see it. */
export async function findFlow(em: EntityManager, scope: ActorScope, id: string): Promise<Flow> {
  const flow = await em.findOne(Flow, { id }, { populate: ["program", "silicon", "updatedBy"] });
  if (!flow) throw notFound("flow");
  requireInProgram(scope, "see the work", flow.program.id, "flow");
  return flow;
}

/** A flow with its steps, in order. */
export async function readFlow(em: EntityManager, scope: ActorScope, id: string): Promise<FlowDetail> {
  const [flow] = await flowDetails(em, scope, [await findFlow(em, scope, id)]);
  if (!flow) throw notFound("flow");
  return flow;
}

/** Flows with their steps, in order; as many queries for many as for one. Whether the person may see them is the caller's. */
export async function flowDetails(em: EntityManager, scope: ActorScope, flows: Flow[]): Promise<FlowDetail[]> {
  const contents = await flowContents(em, flows);
  return contents.map((flow) => ({
    ...flow,
    mayEdit: mayInProgram(scope.actor, "edit stacks and flows", flow.program.id),
    mayAssess: mayInProgram(scope.actor, "run assessments", flow.program.id),
  }));
}

/** What flows are, whoever asks: heads, with program, silicon and last editor loaded, and steps in order. */
export async function flowContents(em: EntityManager, flows: Flow[]): Promise<FlowContent[]> {
  const plans = await readPlans(em, flows);
  const details = await stepDetails(
    em,
    plans.flatMap(({ plan }) => plan.steps),
  );
  let from = 0;
  return flows.map((flow, index) => {
    const count = plans[index]?.plan.steps.length ?? 0;
    const steps = details.slice(from, from + count);
    from += count;
    return flowContent(flow, steps);
  });
}

function flowContent(flow: Flow, steps: StepDetail[]): FlowContent {
  const { program, silicon } = flow;
  return {
    id: flow.id,
    name: flow.name,
    note: flow.note,
    program: { id: program.id, name: program.name, slug: program.slug },
    silicon: {
      id: silicon.id,
      name: silicon.name,
      diameter: silicon.diameter,
      orientation: silicon.orientation,
    },
    incomingThickness: flow.incomingThickness,
    ...incomingShape(flow),
    waferKind: flow.waferKind,
    gateBow: flow.gateBow ?? null,
    gateWarp: flow.gateWarp ?? null,
    steps,
    stamp: stampOf(flow),
  };
}
