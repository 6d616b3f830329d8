import type { StepKind } from "#app/engine/flow/model.ts";
import { supportClassOf, type Holding, type Outcome, type SupportClass } from "#app/engine/vocabulary.ts";
import { tieUnits } from "#app/components/drawings/no-break.ts";
import type { AssessmentResult, StepResult } from "#app/schemas/assessment-result.ts";
import { legAnswer } from "../assessment-leg.ts";
import { celsius } from "../assessment-figure.ts";
import { blockingFindings } from "../blocking-findings.ts";
import { groupView, type SheetGroupView } from "../sheet-view.ts";
import { floorCommand, type FloorCommand } from "./floor-command.ts";

/** One step of a sheet as a screen of the floor shows it: words for hands, no model and no stress. */
export interface FloorStep extends FloorCommand, Omit<SheetGroupView, "steps" | "support" | "heldBy"> {
  number: number;
  title: string;
  kind: StepKind;
  tool: string | null;
  /** what the step needs, and what is planned to hold it */
  required: SupportClass;
  planned: SupportClass;
  holding: Holding;
  heldBy: string;
  outcome: Outcome;
  /** the assessment stops it and no deviation in force lets it run */
  stopped: boolean;
  /** by name, and the temperature that it stands; null where nothing is bonded */
  bond: { carrier: string; material: string; limit: string; flows: string | null } | null;
  /** red line of the tape in use where it has one of its own, s */
  tapeTime: number | null;
}

/** What a flow's part is of: the number of its leg, 0 where the flow does not part by slot. */
export const askedLeg = (leg: number): string | null => (leg === 0 ? null : String(leg));

/**
 * The steps of one part of an assessed flow, without those that its slots skip.
 * @param covered keys of blocking findings that a deviation in force lets run
 */
export function floorSteps(whole: AssessmentResult, leg: number, covered: ReadonlySet<string>): FloorStep[] {
  const walked = legAnswer(whole, askedLeg(leg)).result;
  const steps = walked.steps.filter(({ skipped }) => !skipped);
  const result = { ...walked, steps };
  const open = blockingFindings(whole).filter(({ key }) => !covered.has(key) && legOf(key) === leg);
  return steps.map((step, index) => {
    const before = steps[index - 1] ?? null;
    const stopped = open.some((finding) => finding.step === step.number);
    return tied(floorStep(step, before, stopped, result));
  });
}

/** The leg in the key of a blocking finding. */
const legOf = (key: string) => Number(key.split(":")[2] ?? 0);

function floorStep(step: StepResult, before: StepResult | null, stopped: boolean, result: AssessmentResult): FloorStep {
  const { number, title, kind, equipment, required, planned, plannedName, outcome } = step;
  const {
    steps: _,
    support: __,
    heldBy: ___,
    ...view
  } = groupView({ holding: planned, heldBy: plannedName, steps: [step] }, before, result);
  const bond = result.bonds.find(({ fromStep, toStep }) => fromStep <= number && number <= toStep);
  return {
    ...view,
    // That it is at this step is plain from where it stands.
    hottest: view.hottest.replace(/, steps? \d+$/, ""),
    ...floorCommand(step, before, stopped),
    number,
    title,
    kind,
    tool: equipment?.name ?? null,
    required,
    planned: supportClassOf(planned),
    holding: planned,
    heldBy: plannedName,
    outcome,
    stopped,
    bond: bond
      ? {
          carrier: bond.carrier,
          material: bond.material,
          limit: celsius(bond.temperatureLimit),
          flows: bond.flowsFrom === null ? null : celsius(bond.flowsFrom),
        }
      : null,
    tapeTime: tapeTime(step, result),
  };
}

/** How the rule on clocks names the red line of a tape that has one of its own. */
const OWN_TIME = /, longest time on it$/;

/** The red line that rule 17 judged this tape by, at the last step on it, where that is the tape's own. */
function tapeTime({ number, planned }: StepResult, { findings, steps }: AssessmentResult): number | null {
  if (planned !== "grinding tape" && planned !== "film frame") return null;
  const own = findings.find(
    ({ rule, step, limit }) =>
      rule === 17 &&
      limit !== null &&
      OWN_TIME.test(limit.label) &&
      step >= number &&
      steps.every((each) => each.number < number || each.number > step || each.planned === planned),
  );
  return own?.limit?.value ?? null;
}

/** Names and words that carry figures are tied to their units. */
function tied(step: FloorStep): FloorStep {
  return { ...step, title: tieUnits(step.title), heldBy: tieUnits(step.heldBy), doNot: step.doNot.map(tieUnits) };
}
