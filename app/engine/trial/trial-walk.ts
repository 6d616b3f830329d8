import type { FlowInput } from "../flow/model.ts";
import { initialState } from "../flow/state.ts";
import { inStep, stepField, takeStep } from "../flow/step.ts";
import { describeStep, walkFlow, type StepState } from "../flow/walk.ts";
import type { Finding, Rule, RuleContext } from "../rules/finding.ts";
import { judgeStep } from "../rules/judge-step.ts";
import type { SiteLimits } from "../rules/limits.ts";
import { RULES } from "../rules/rules.ts";

/** A flow with its walk, which variants of it begin from. */
export interface WalkedFlow {
  flow: FlowInput;
  steps: StepState[];
}

/** Walks a flow as a beginning for trials. @throws EngineInputError as `walkFlow` does */
export function walked(flow: FlowInput, limits: SiteLimits): WalkedFlow {
  return { flow, steps: walkFlow(flow, limits).steps };
}

/** How many steps at its beginning a variant shares with a flow: same wafer, and the very same step objects. */
export function sharedSteps(base: FlowInput, variant: FlowInput): number {
  if (base.wafer !== variant.wafer) return 0;
  const first = variant.steps.findIndex((step, index) => step !== base.steps[index]);
  return first < 0 ? variant.steps.length : first;
}

/**
 * The steps of a variant that differ from its base or come after one that does, one by one: who has seen enough stops asking. What
 * both share is not walked again.
 * @throws EngineInputError when a step cannot be computed
 */
export function* walkOn(base: WalkedFlow, variant: FlowInput, limits: SiteLimits): Generator<StepState, void> {
  const from = sharedSteps(base.flow, variant);
  let state = base.steps[from - 1]?.after ?? initialState(variant);
  for (const [index, step] of variant.steps.entries()) {
    if (index < from) continue;
    const before = state;
    yield inStep(index, () => {
      const taken = takeStep(variant.wafer, before, step, { field: stepField(index), metalHistory: true });
      state = taken.after;
      return describeStep(variant, limits, { number: index + 1, step, before }, taken);
    });
  }
}

/** A variant walked to its end. @throws EngineInputError when a step cannot be computed */
export function walkVariant(base: WalkedFlow, variant: FlowInput, limits: SiteLimits): WalkedFlow {
  const kept = base.steps.slice(0, sharedSteps(base.flow, variant));
  return { flow: variant, steps: [...kept, ...walkOn(base, variant, limits)] };
}

/** What rules are given in a trial: nominal values, without uncertainties and workings. Outcomes are those of the assessment. */
export function trialContext({ flow, steps }: WalkedFlow, limits: SiteLimits): RuleContext {
  return { flow, limits, steps, uncertainty: [], workings: null };
}

/** What some rules find at all steps of a walked flow, in the order of an assessment. */
export function judged(walk: WalkedFlow, limits: SiteLimits, rules: readonly Rule[] = RULES): Finding[] {
  const context = trialContext(walk, limits);
  return walk.steps.flatMap((state) => judgeStep(context, state, rules));
}
