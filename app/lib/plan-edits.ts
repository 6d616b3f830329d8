import type { FlowPlan, StepPlan } from "#app/schemas/flow-plan.ts";
import type { StepValues } from "#app/schemas/flow.ts";

/** More steps than any line runs; keeps one form from filling the database. */
export const MOST_STEPS = 300;

/** A flow after an edit, in words for its history, with the step to be looked at. */
export interface PlanEdit {
  plan: FlowPlan;
  words: string;
  /** id of the step that is there to be looked at; null when there is none */
  shown: string | null;
}

const withSteps = (plan: FlowPlan, steps: StepPlan[]): FlowPlan => ({ ...plan, steps });

const named = (index: number, { title }: Pick<StepPlan, "title">) => `step ${index + 1}, ${title}`;

/** Puts a step at a place (from 0, kept within the flow). Null when it is there already, undefined when there is no such step. */
export function moveStep(plan: FlowPlan, id: string, to: number): PlanEdit | null | undefined {
  const from = plan.steps.findIndex((step) => step.id === id);
  const step = plan.steps[from];
  if (!step) return undefined;
  const place = Math.min(Math.max(0, to), plan.steps.length - 1);
  if (place === from) return null;
  const others = plan.steps.toSpliced(from, 1);
  return {
    plan: withSteps(plan, others.toSpliced(place, 0, step)),
    words: `Moved ${named(from, step)}, to ${place + 1}`,
    shown: id,
  };
}

/** Takes a step out. */
export function removeStep(plan: FlowPlan, id: string): PlanEdit | undefined {
  const at = plan.steps.findIndex((step) => step.id === id);
  const step = plan.steps[at];
  if (!step) return undefined;
  const steps = plan.steps.toSpliced(at, 1);
  return {
    plan: withSteps(plan, steps),
    words: `Removed ${named(at, step)}`,
    shown: (steps[at] ?? steps.at(-1))?.id ?? null,
  };
}

/** Puts a copy right after the step. */
export function copyStep(plan: FlowPlan, id: string, copyId: string): PlanEdit | undefined {
  const at = plan.steps.findIndex((step) => step.id === id);
  const step = plan.steps[at];
  if (!step) return undefined;
  const copy = { ...step, id: copyId, title: `${step.title}, again`.slice(0, 120) };
  return {
    plan: withSteps(plan, plan.steps.toSpliced(at + 1, 0, copy)),
    words: `Copied ${named(at, step)}`,
    shown: copyId,
  };
}

/** Changes a step, or puts a new one in at `position` (from 0, kept within the flow). */
export function putStep(plan: FlowPlan, id: string, values: StepValues, position: number): PlanEdit {
  const at = plan.steps.findIndex((step) => step.id === id);
  const step: StepPlan = { ...values, id };
  if (at >= 0)
    return {
      plan: withSteps(plan, plan.steps.with(at, step)),
      words: `Changed ${named(at, step)}`,
      shown: id,
    };
  const place = Math.min(Math.max(0, position), plan.steps.length);
  return {
    plan: withSteps(plan, plan.steps.toSpliced(place, 0, step)),
    words: `Added ${named(place, step)}`,
    shown: id,
  };
}
