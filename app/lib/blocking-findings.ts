import { slotsInWords } from "#app/engine/flow/legs.ts";
import { outcomeRank, type Outcome } from "#app/engine/vocabulary.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";

/** A finding that no sheet is released over, unless a deviation covers it. */
export interface BlockingFinding {
  /** what a deviation names it by: step, rule and, of a flow that parts by slot, the leg */
  key: string;
  step: number;
  stepTitle: string;
  rule: number;
  title: string;
  outcome: Outcome;
  /** the sentence of the worst, where the rule says several at that step */
  reason: string;
  remedy: string | null;
  /** 'slots 1 to 12'; null where the flow does not part by slot */
  slots: string | null;
}

/** A wafer that is held by less than it needs, what must not run, and what cannot be judged: none of them is for the floor. */
const blocks = (outcome: Outcome) => outcomeRank(outcome) >= outcomeRank("needs support");

/** Everything in an assessment that blocks a release, all legs, in the order of the steps; one for each rule at each step. */
export function blockingFindings(whole: AssessmentResult): BlockingFinding[] {
  const legs = whole.legs ?? [];
  if (legs.length === 0) return ofLeg(whole, null);
  return legs.flatMap(({ slots, result }, index) =>
    ofLeg(result ?? whole, { number: index + 1, slots: slotsInWords(slots) }),
  );
}

function ofLeg(result: AssessmentResult, leg: { number: number; slots: string } | null): BlockingFinding[] {
  const titles = new Map(result.steps.map(({ number, title }) => [number, title]));
  const found = new Map<string, BlockingFinding>();
  for (const { step, rule, title, outcome, reason, remedy } of result.findings) {
    if (!blocks(outcome)) continue;
    const key = `${step}:${rule}${leg ? `:${leg.number}` : ""}`;
    const known = found.get(key);
    if (known && outcomeRank(known.outcome) >= outcomeRank(outcome)) continue;
    const stepTitle = titles.get(step) ?? "";
    found.set(key, { key, step, stepTitle, rule, title, outcome, reason, remedy, slots: leg?.slots ?? null });
  }
  return [...found.values()].sort((a, b) => a.step - b.step || a.rule - b.rule);
}
