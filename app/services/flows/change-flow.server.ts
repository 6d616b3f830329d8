import { UniqueConstraintViolationException } from "@mikro-orm/core";
import type { EntityManager } from "@mikro-orm/postgresql";
import type { PlanEdit } from "#app/lib/plan-edits.ts";
import type { Flow } from "#app/db/entities/flow.ts";
import type { FlowConflict, FlowPlan, RevisionKind } from "#app/schemas/flow-plan.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { requireInProgram } from "../permission.server.ts";
import { conflictOf, touch } from "../record.server.ts";
import { readPlan, writePlan } from "./plan.server.ts";
import { findFlow } from "./read-flow.server.ts";
import { addRevision, changesSince } from "./revisions.server.ts";

/** The flow that is to be changed, as the person saw it. */
export interface FlowPlace {
  flowId: string;
  /** version of the flow that the person saw; a newer one is a conflict */
  version: number | null;
}

export type FlowSaved =
  | { outcome: "saved"; id: string | null }
  | { outcome: "conflict"; conflict: FlowConflict; now: FlowPlan }
  | { outcome: "name taken" };

/** What a change is given: the transaction, the flow, and its plan as it stands. */
export interface OpenFlow {
  em: EntityManager;
  flow: Flow;
  plan: FlowPlan;
}

/** Says the plan after the change, or null when it changes nothing. */
type Edit = (open: OpenFlow) => Promise<(PlanEdit & { kind?: RevisionKind }) | null>;

/**
 * Changes a flow: found, allowed, still as the person saw it, written, and noted with its words so that it can be taken back.
 * All of it is one transaction, and two people at once stand in line.
 */
export async function changePlan(scope: ActorScope, place: FlowPlace, edit: Edit): Promise<FlowSaved> {
  try {
    return await inScope(scope, (em) => changeIn(em, scope, place, edit));
  } catch (error) {
    if (error instanceof UniqueConstraintViolationException) return { outcome: "name taken" };
    throw error;
  }
}

async function changeIn(
  em: EntityManager,
  scope: ActorScope,
  { flowId, version }: FlowPlace,
  edit: Edit,
): Promise<FlowSaved> {
  await em.execute("select 1 from flow where id = ? for update", [flowId]);
  const flow = await findFlow(em, scope, flowId);
  requireInProgram(scope, "edit stacks and flows", flow.program.id, "flow");
  const stored = await readPlan(em, flow);
  const conflict = conflictOf(flow, version);
  if (conflict) {
    const changes = await changesSince(em, flow.id, version ?? flow.version);
    return { outcome: "conflict", conflict: { ...conflict, changes, step: null }, now: stored.plan };
  }
  const edited = await edit({ em, flow, plan: stored.plan });
  if (!edited) return { outcome: "saved", id: null };
  const { plan, words, shown, kind = "edit" } = edited;
  await addRevision(em, scope, flow, { kind, words, before: stored.plan, plan: kind === "edit" ? plan : null });
  await writePlan(em, flow, stored, plan);
  touch(flow, scope);
  await em.flush();
  return { outcome: "saved", id: shown };
}
