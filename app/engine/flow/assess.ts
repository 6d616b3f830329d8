import type { Finding, RuleContext } from "../rules/finding.ts";
import type { SiteLimits } from "../rules/limits.ts";
import { requiredAt } from "../rules/rule-01-thickness.ts";
import { RULES } from "../rules/rules.ts";
import { outcomeRank, type Outcome, type SupportClass } from "../vocabulary.ts";
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

export interface AssumedInput {
  step: number;
  what: string;
}

export interface FlowAssessment {
  steps: AssessedStep[];
  findings: Finding[];
  verdict: Verdict;
  /** inputs that nobody measured or looked up */
  assumed: AssumedInput[];
}

/** The worst of some findings; clear when there are none. */
export function worstOutcome(findings: Finding[]): Outcome {
  return findings.reduce<Outcome>(
    (worst, { outcome }) => (outcomeRank(outcome) > outcomeRank(worst) ? outcome : worst),
    "clear",
  );
}

/**
 * Walks a flow, judges every rule at every step and gives the verdict.
 * @throws EngineInputError when an input cannot be computed with; nothing that could not be computed counts as passed
 */
export function assessFlow(flow: FlowInput, limits: SiteLimits): FlowAssessment {
  const { steps } = walkFlow(flow, limits);
  const uncertainty = flowUncertainty(flow, limits);
  const context: RuleContext = { flow, limits, steps, uncertainty };
  const findings = steps.flatMap((state) => RULES.flatMap((rule) => rule.judge(context, state)));
  const outcome = worstOutcome(findings);
  const first = findings.find((finding) => finding.outcome === outcome);
  return {
    steps: steps.map((state, index) => ({
      state,
      required: requiredAt(context, state)?.support ?? null,
      outcome: worstOutcome(findings.filter(({ step }) => step === state.number)),
      uncertainty: { atRoom: uncertainty[index]?.atRoom ?? null, atPeak: uncertainty[index]?.atPeak ?? null },
      budget: uncertainty[index]?.budget ?? [],
    })),
    findings,
    verdict: {
      outcome,
      step: outcome === "clear" ? null : (first?.step ?? null),
      rule: outcome === "clear" ? null : (first?.rule ?? null),
    },
    assumed: assumedInputs(flow),
  };
}

/** Everything in a flow whose source is `assumed`, with the first step that uses it. */
function assumedInputs(flow: FlowInput): AssumedInput[] {
  const found = new Map<string, AssumedInput>();
  const note = (step: number, what: string, measured: { source: string } | null | undefined) => {
    if (measured?.source === "assumed" && !found.has(what)) found.set(what, { step, what });
  };
  note(1, "Incoming silicon thickness", flow.wafer.thickness);
  flow.steps.forEach((step, index) => {
    const number = index + 1;
    note(number, `Silicon after step ${number}`, step.siliconAfter);
    note(number, `Ground face force at step ${number}`, step.groundFaceForce);
    for (const { film, thickness, stress } of step.adds) {
      note(number, `${film.name}: stress`, stress);
      note(number, `${film.name}: thickness`, thickness);
      note(number, `${film.name}: modulus`, film.youngsModulus);
      note(number, `${film.name}: expansion`, film.expansion);
      note(number, `${film.name}: yield stress`, film.yieldStress);
    }
    if (!step.bond) return;
    note(number, `${step.bond.carrier.name}: expansion`, step.bond.carrier.expansion);
    note(number, `${step.bond.material.name}: locked-in modulus`, step.bond.material.effectiveModulus);
    note(number, `${step.bond.material.name}: thickness`, step.bond.thickness);
  });
  return [...found.values()];
}
