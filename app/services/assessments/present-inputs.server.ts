import type { EntityManager } from "@mikro-orm/postgresql";
import { Flow } from "#app/db/entities/flow.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import type { FlowDetail } from "#app/schemas/flow-view.ts";
import type { ActorScope } from "#app/server/scope.server.ts";
import { flowInputOf } from "../flows/flow-inputs.ts";
import { flowDetails, readFlow } from "../flows/read-flow.server.ts";
import { readLimits } from "../limits.server.ts";

/** A flow with what an assessment of it would rest on, as everything is now. */
export interface PresentFlow {
  flow: FlowDetail;
  input: AssessmentInput;
}

/** One flow as it is now; refused to whom its program is a wall. */
export async function presentFlow(em: EntityManager, scope: ActorScope, flowId: string): Promise<PresentFlow> {
  const flow = await readFlow(em, scope, flowId);
  return { flow, input: { flow: flowInputOf(flow), limits: await readLimits(em) } };
}

/** Flows as they are now, by their ids; the same few queries however many. Whether the person may see them is the caller's. */
export async function presentFlows(
  em: EntityManager,
  scope: ActorScope,
  flowIds: readonly string[],
): Promise<Map<string, PresentFlow>> {
  if (flowIds.length === 0) return new Map();
  const limits = await readLimits(em);
  const found = await em.find(Flow, { id: { $in: [...flowIds] } }, { populate: ["program", "silicon", "updatedBy"] });
  const flows = await flowDetails(em, scope, found);
  return new Map(flows.map((flow) => [flow.id, { flow, input: { flow: flowInputOf(flow), limits } }]));
}
