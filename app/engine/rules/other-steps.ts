import type { StepState } from "../flow/walk.ts";

/**
 * What a wafer goes through before and after a step. Steps that its slots skip are none of it: rules look at the other steps of a
 * flow through these only.
 */

const taken = ({ step }: StepState) => step.skipped !== true;

/** The steps before one, in order. */
export function earlierSteps(steps: readonly StepState[], { number }: StepState): StepState[] {
  return steps.slice(0, number - 1).filter(taken);
}

/** The steps up to one, itself included, in order. */
export function stepsUpTo(steps: readonly StepState[], { number }: StepState): StepState[] {
  return steps.slice(0, number).filter(taken);
}

/** The steps after one, in order. */
export function laterSteps(steps: readonly StepState[], { number }: StepState): StepState[] {
  return steps.slice(number).filter(taken);
}

/** The step that the wafer comes from; none at its first. */
export function previousStep(steps: readonly StepState[], { number }: StepState): StepState | undefined {
  let at = number - 2;
  while (steps[at]?.step.skipped) at -= 1;
  return steps[at];
}

/** The step that the wafer goes to; none after its last. */
export function nextStep(steps: readonly StepState[], { number }: StepState): StepState | undefined {
  let at = number;
  while (steps[at]?.step.skipped) at += 1;
  return steps[at];
}
