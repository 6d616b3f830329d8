import { randomUUID } from "node:crypto";
import { CarrierUnit } from "#app/db/entities/carrier-unit.ts";
import { copyStep, MOST_STEPS, moveStep, putStep, removeStep, type PlanEdit } from "#app/lib/plan-edits.ts";
import { stepDifferences } from "#app/lib/step-differences.ts";
import type { FlowPlan } from "#app/schemas/flow-plan.ts";
import type { StepValues } from "#app/schemas/flow.ts";
import { notFound, problem } from "#app/server/problem.server.ts";
import { inScope, type ActorScope } from "#app/server/scope.server.ts";
import { changePlan, type FlowPlace, type FlowSaved } from "./change-flow.server.ts";
import { removedStep, stepInHistory } from "./revisions.server.ts";
import { stepChoices } from "./step-choices.server.ts";

function requireRoom({ steps }: FlowPlan, more: number): void {
  if (steps.length + more > MOST_STEPS)
    throw problem(400, `A flow holds at most ${MOST_STEPS} steps. Split it into two flows.`);
}

/** Why a step was not saved: what can keep any change of a flow from being saved, or a piece of another carrier. */
export type StepSaved = FlowSaved | { outcome: "other piece" };

/**
 * Adds a step before `position` (from 0), or changes the one named. One that somebody has removed in the meantime is put back where
 * it was, once the person has been told of it.
 */
export async function saveStep(
  scope: ActorScope,
  place: FlowPlace & { stepId: string | null; position: number },
  values: StepValues,
): Promise<StepSaved> {
  if (!(await isPieceOf(scope, values))) return { outcome: "other piece" };
  const saved = await changePlan(scope, place, async ({ em, plan }) => {
    const known = plan.steps.some(({ id }) => id === place.stepId);
    if (known && place.stepId !== null) return putStep(plan, place.stepId, values, 0);
    requireRoom(plan, 1);
    if (place.stepId === null) return putStep(plan, randomUUID(), values, place.position);
    const removed = await removedStep(em, place.flowId, place.stepId);
    if (!removed) throw notFound("step");
    return putStep(plan, place.stepId, values, removed.position);
  });
  if (saved.outcome !== "conflict" || place.stepId === null) return saved;
  const theirs = saved.now.steps.find(({ id }) => id === place.stepId);
  const step = theirs ? stepDifferences(values, theirs, await stepChoices(scope)) : "removed";
  return { ...saved, conflict: { ...saved.conflict, step } };
}

/** Whether the piece that a step names, if any, is one of the carrier that it names. */
async function isPieceOf(scope: ActorScope, { carrier, handling: { carrierPiece: id } }: StepValues): Promise<boolean> {
  if (id === null) return true;
  return carrier !== null && (await inScope(scope, (em) => em.count(CarrierUnit, { id, carrier }))) > 0;
}

/** What can be done to a step by one press. `to` puts it at a place, from 1. */
export type StepMove = { kind: "up" | "down" | "remove" | "copy" } | { kind: "to"; number: number };

/** Moves, copies or removes a step; the answer names the step that is there to be looked at, of a copy the copy. */
export async function changeStep(
  scope: ActorScope,
  place: FlowPlace & { stepId: string },
  move: StepMove,
): Promise<FlowSaved> {
  const { stepId } = place;
  const saved = await changePlan(scope, place, async ({ plan }) => {
    if (move.kind === "copy") requireRoom(plan, 1);
    const edit = editFor(plan, stepId, move);
    if (edit === undefined) throw notFound("step");
    return edit;
  });
  return saved.outcome === "saved" ? { outcome: "saved", id: saved.id ?? stepId } : saved;
}

function editFor(plan: FlowPlan, stepId: string, move: StepMove): PlanEdit | null | undefined {
  const at = plan.steps.findIndex(({ id }) => id === stepId);
  switch (move.kind) {
    case "remove":
      return removeStep(plan, stepId);
    case "copy":
      return copyStep(plan, stepId, randomUUID());
    case "to":
      return moveStep(plan, stepId, move.number - 1);
    case "up":
      return moveStep(plan, stepId, at - 1);
    case "down":
      return moveStep(plan, stepId, at + 1);
  }
}

/** Takes the newest change of a flow back, or does again what was last taken back. */
export async function walkHistory(scope: ActorScope, place: FlowPlace, direction: "undo" | "redo"): Promise<FlowSaved> {
  return changePlan(scope, place, async ({ em }) => {
    const step = await stepInHistory(em, place.flowId, direction);
    if (!step) return null;
    return { ...step, kind: direction, shown: null };
  });
}
