import type { Finding, RuleContext } from "../rules/finding.ts";
import type { SiteLimits } from "../rules/limits.ts";
import { requiredAt } from "../rules/rule-01-thickness.ts";
import { judgeStep } from "../rules/judge-step.ts";
import { outcomeRank, supportRank, type Outcome, type SupportClass } from "../vocabulary.ts";
import { legFlows } from "./legs.ts";
import type { FlowInput } from "./model.ts";
import { flowUncertainty, type Contribution } from "./uncertainty.ts";
import { walkFlow, type StepState } from "./walk.ts";

/** A step with what the walk and the rules say of it. */
export interface AssessedStep {
  state: StepState;
  /** null when the thickness rule does not know the wafer size */
  required: SupportClass | null;
  outcome: Outcome;
  uncertainty: { atRoom: number | null; atPeak: number | null };
  budget: Contribution[];
}

/** The worst finding and the first step that causes it. */
export interface Verdict {
  outcome: Outcome;
  step: number | null;
  rule: number | null;
}

/** What was found for wafers that take the same steps. */
interface Judged {
  steps: AssessedStep[];
  findings: Finding[];
  verdict: Verdict;
}

/** A leg of a flow that parts by slot, as a flow of its own, with what was found for its slots. */
export interface JudgedLeg extends Judged {
  flow: FlowInput;
  slots: number[];
}

/** What was found for a flow; for one that parts by slot, that of its worst leg. */
export interface JudgedFlow extends Judged {
  /** slots that steps, findings and verdict are of; missing: all of them */
  slots?: number[];
  /** all legs, by their first slot; missing: the flow does not part */
  legs?: JudgedLeg[];
}

/** The worst of some findings; clear when there are none. */
export function worstOutcome(findings: Finding[]): Outcome {
  return findings.reduce<Outcome>(
    (worst, { outcome }) => (outcomeRank(outcome) > outcomeRank(worst) ? outcome : worst),
    "clear",
  );
}

/**
 * Support that a step needs: by the thickness rule, raised by a sag, among its findings, that no free wafer may have. A step that
 * the wafer skips needs none.
 */
function supportNeeded(context: RuleContext, state: StepState, findings: Finding[]): SupportClass | null {
  if (state.step.skipped) return "bare";
  const required = requiredAt(context, state)?.support ?? null;
  const sags = findings.some(({ rule, outcome }) => rule === 5 && outcome === "needs support");
  if (!sags || required === null) return required;
  return supportRank(required) < supportRank("tape or ring") ? "tape or ring" : required;
}

function byStep(findings: Finding[]): Map<number, Finding[]> {
  const groups = new Map<number, Finding[]>();
  for (const finding of findings) {
    const group = groups.get(finding.step);
    if (group) group.push(finding);
    else groups.set(finding.step, [finding]);
  }
  return groups;
}

/**
 * Walks a flow, judges every rule at every step and gives the verdict; of a flow that parts by slot each leg, the worst of which
 * speaks for it, of equals the first. Figures have no workings unless the builders of these are handed in, so that a page which
 * shows none need not load them.
 * @throws EngineInputError when an input cannot be computed with; nothing that could not be computed counts as passed
 */
export function judgeFlow(flow: FlowInput, limits: SiteLimits, workings: RuleContext["workings"] = null): JudgedFlow {
  const [whole, ...others] = legFlows(flow);
  if (!whole || others.length === 0) return judgeLeg(whole ?? flow, limits, workings);
  const legs = [whole, ...others].map((leg): JudgedLeg => ({
    flow: leg,
    slots: leg.leg?.slots ?? [],
    ...judgeLeg(leg, limits, workings),
  }));
  const { slots, steps, findings, verdict } = worstLeg(legs);
  return { steps, findings, verdict, slots, legs };
}

function worstLeg(legs: JudgedLeg[]): JudgedLeg {
  return legs.reduce((worst, leg) =>
    outcomeRank(leg.verdict.outcome) > outcomeRank(worst.verdict.outcome) ? leg : worst,
  );
}

function judgeLeg(flow: FlowInput, limits: SiteLimits, workings: RuleContext["workings"]): Judged {
  const { steps } = walkFlow(flow, limits);
  const uncertainty = flowUncertainty(flow, limits);
  const context: RuleContext = { flow, limits, steps, uncertainty, workings };
  const findings = steps.flatMap((state) => judgeStep(context, state));
  const outcome = worstOutcome(findings);
  const first = findings.find((finding) => finding.outcome === outcome);
  const ofStep = byStep(findings);
  return {
    steps: steps.map((state, index) => ({
      state,
      required: supportNeeded(context, state, ofStep.get(state.number) ?? []),
      outcome: worstOutcome(ofStep.get(state.number) ?? []),
      uncertainty: { atRoom: uncertainty[index]?.atRoom ?? null, atPeak: uncertainty[index]?.atPeak ?? null },
      budget: uncertainty[index]?.budget ?? [],
    })),
    findings,
    verdict: {
      outcome,
      step: outcome === "clear" ? null : (first?.step ?? null),
      rule: outcome === "clear" ? null : (first?.rule ?? null),
    },
  };
}
