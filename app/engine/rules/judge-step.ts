import type { StepState } from "../flow/walk.ts";
import type { Finding, Rule, RuleContext } from "./finding.ts";
import { RULES } from "./rules.ts";

/** What rules find at a step, in their order; nothing at one that the wafer skips. */
export function judgeStep(context: RuleContext, state: StepState, rules: readonly Rule[] = RULES): Finding[] {
  return state.step.skipped ? [] : rules.flatMap((rule) => rule.judge(context, state));
}
