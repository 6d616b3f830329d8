import { EngineInputError } from "../errors.ts";
import type { FlowInput } from "../flow/model.ts";
import { worstOutcome } from "../flow/judge.ts";
import type { Finding } from "../rules/finding.ts";
import { judgeStep } from "../rules/judge-step.ts";
import type { SiteLimits } from "../rules/limits.ts";
import { RULES } from "../rules/rules.ts";
import type { Catalogue } from "../trial/catalogue.ts";
import { applyChange, originsOf, type FlowChange } from "../trial/change.ts";
import { relativeMargin } from "../trial/margin.ts";
import { judged, trialContext, walkOn, walkVariant, type WalkedFlow } from "../trial/trial-walk.ts";
import { outcomeRank, type Outcome } from "../vocabulary.ts";

/** How one rule judges one step: worst outcome, and the smallest share of a limit that is left where there is one. */
export interface Standing {
  outcome: Outcome;
  margin: number | null;
}

/** What rule and step a search is about, in the numbering of the flow as it is planned. */
export interface Place {
  rule: number;
  step: number;
}

/** A flow as it is planned, with all that a trial needs. */
export interface Trials {
  base: WalkedFlow;
  limits: SiteLimits;
  catalogue: Catalogue;
  /** findings of the flow as it is planned, in the manner of a trial */
  findings: Finding[];
  /** called for every trial */
  count: () => void;
}

export const standingOf = (findings: readonly Finding[]): Standing => {
  const margins = findings.flatMap((finding) => relativeMargin(finding) ?? []);
  return { outcome: worstOutcome([...findings]), margin: margins.length > 0 ? Math.min(...margins) : null };
};

/** Whether one standing is better than another: first by outcome, then by what is left of the limit. */
export function better(a: Standing, b: Standing): boolean {
  const [left, right] = [outcomeRank(a.outcome), outcomeRank(b.outcome)];
  return left < right || (left === right && (a.margin ?? -Infinity) > (b.margin ?? -Infinity));
}

/** The flow with some changes, and where its steps were before them. */
export function changedBy(
  flow: FlowInput,
  changes: readonly FlowChange[],
  catalogue: Catalogue,
): { flow: FlowInput; origins: (number | null)[] } {
  let origins: (number | null)[] = flow.steps.map((_, index) => index + 1);
  let changed = flow;
  for (const change of changes) {
    const before = origins;
    origins = originsOf(before.length, change).map((number) => (number === null ? null : (before[number - 1] ?? null)));
    changed = applyChange(changed, change, catalogue);
  }
  return { flow: changed, origins };
}

/** How a rule judges a step once the flow is changed; null when that cannot be computed or the step is gone. */
export function standingAfter(trials: Trials, { rule, step }: Place, changes: readonly FlowChange[]): Standing | null {
  const { base, limits, catalogue, count } = trials;
  const { flow, origins } = changedBy(base.flow, changes, catalogue);
  const number = origins.indexOf(step) + 1;
  if (number === 0 || flow === base.flow) return null;
  count();
  try {
    // Rules look ahead at what later steps do, which stands in the flow, so these need no walk of their own.
    const steps = flow.steps.map((own, index) => ({
      ...(base.steps[index] ?? LAST(base)),
      step: own,
      number: index + 1,
    }));
    for (const [index, state] of base.steps.entries()) if (flow.steps[index] === state.step) steps[index] = state;
    for (const state of walkOn(base, flow, limits)) {
      steps[state.number - 1] = state;
      if (state.number >= number && rule !== 10) break;
    }
    const context = trialContext({ flow, steps }, limits);
    const state = steps[number - 1];
    const asked = RULES.filter((each) => each.number === rule);
    return standingOf(state ? judgeStep(context, state, asked) : []);
  } catch (error) {
    if (error instanceof EngineInputError) return null;
    throw error;
  }
}

const LAST = ({ steps }: WalkedFlow) => {
  const last = steps.at(-1);
  if (!last) throw new Error("a flow that has findings has steps");
  return last;
};

/** A finding after a change, with the number of its step before it; null for a step that the change has put in. */
export interface FindingAfter {
  finding: Finding;
  origin: number | null;
}

/** All findings of the flow once it is changed; null when it cannot be computed. */
export function findingsAfter(trials: Trials, changes: readonly FlowChange[]): FindingAfter[] | null {
  const { base, limits, catalogue, count } = trials;
  const { flow, origins } = changedBy(base.flow, changes, catalogue);
  count();
  try {
    const findings = judged(walkVariant(base, flow, limits), limits);
    return findings.map((finding) => ({ finding, origin: origins[finding.step - 1] ?? null }));
  } catch (error) {
    if (error instanceof EngineInputError) return null;
    throw error;
  }
}
