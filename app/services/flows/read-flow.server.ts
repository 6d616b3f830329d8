import type { EntityManager } from "@mikro-orm/postgresql";
import { Flow } from "#app/db/entities/flow.ts";
import { mayInProgram } from "#app/policies/permissions.ts";
import type { FlowDetail } from "#app/schemas/flow-view.ts";
import { notFound } from "#app/server/problem.server.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { stampOf } from "../record.server.ts";
import { readPlan } from "./plan.server.ts";
import { stepDetails } from "./step-details.server.ts";

/** The flow that an id names, if the person may see it. */
export async function findFlow(em: EntityManager, scope: ActorScope, id: string): Promise<Flow> {
  const flow = await em.findOne(Flow, { id }, { populate: ["program", "silicon", "updatedBy"] });
  if (!flow) throw notFound("flow");
  requireInProgram(scope, "see the work", flow.program.id, "flow");
  return flow;
}

/** A flow with its steps, in order. */
export async function readFlow(em: EntityManager, scope: ActorScope, id: string): Promise<FlowDetail> {
  const flow = await findFlow(em, scope, id);
  const { plan } = await readPlan(em, flow);
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
    waferKind: flow.waferKind,
    gateBow: flow.gateBow ?? null,
    gateWarp: flow.gateWarp ?? null,
    steps: await stepDetails(em, plan.steps),
    stamp: stampOf(flow),
    mayEdit: mayInProgram(scope.actor, "edit stacks and flows", program.id),
    mayAssess: mayInProgram(scope.actor, "run assessments", program.id),
  };
}
