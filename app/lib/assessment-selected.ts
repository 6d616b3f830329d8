import { tightestStep } from "#app/engine/flow/answer.ts";
import { slotsInWords } from "#app/engine/flow/legs.ts";
import type { TemperatureProfile } from "#app/engine/flow/temperature-profile.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { outcomeRank, type Outcome, type SourceKind } from "#app/engine/vocabulary.ts";
import type { AssessmentResult, ShapeResult, StepResult } from "#app/schemas/assessment-result.ts";
import { celsius, micrometres } from "./assessment-figure.ts";
import { legQuery } from "./leg-query.ts";
import { bySeverity, findingView, type FindingView, type ResultPlace } from "./assessment-finding.ts";
import { heldFlat, releasedText, shapeText, standardBowText } from "./assessment-shape.ts";
import { sentenceCase } from "./assessment-steps.ts";
import { runWords } from "./run-words.ts";
import { profileWords } from "./temperature-profile.ts";
import { withoutUnit } from "./format-measured.ts";

/** The shapes of a step that have a working of their own. */
export const STEP_SHAPES = ["loaded", "peak", "released"] as const;
export type StepShape = (typeof STEP_SHAPES)[number];

/** A sentence about a shape, with the address of its working. */
export interface ShapeLine {
  text: string;
  working: string | null;
}

/** The step that is looked at: what it is, why, what would clear it, and what the wafer would do if let go. */
export interface SelectedStep {
  number: number;
  title: string;
  outcome: Outcome;
  lies: ShapeLine;
  peak: ShapeLine | null;
  /** null where nothing holds it: it lies then as it does */
  released: ShapeLine | null;
  /** which of several tools and by which recipe; null when neither is said */
  run: string | null;
  /** how it gets hot, to draw and in words; null when only the peak is known */
  profile: { points: TemperatureProfile; words: string } | null;
  /** what its figures rest on that nobody stated */
  remarks: string[];
  /** what is not clear, worst first */
  open: FindingView[];
  clear: FindingView[];
  /** inputs that move its bow most, µm each */
  budget: { input: string; source: SourceKind; text: string }[];
  /** why there is no budget */
  budgetNote: string | null;
}

/** The step to look at first: the one that stops the flow, else the one nearest its tool's limit. */
export function firstStep(result: AssessmentResult): number {
  const { verdict } = result;
  if (verdict.step !== null && outcomeRank(verdict.outcome) >= outcomeRank("needs support")) return verdict.step;
  return tightestStep(result)?.step ?? result.steps[0]?.number ?? 1;
}

/** The step that an address asks for, or the one to look at first when it asks for none that there is. */
export function stepAskedFor(result: AssessmentResult, asked: string | null): number {
  const found = asked !== null && /^\d{1,4}$/.test(asked) ? Number(asked) : null;
  return result.steps.some(({ number }) => number === found) && found !== null ? found : firstStep(result);
}

/** Everything about one step; null when the result has no such step. */
export function selectedStep(place: ResultPlace, result: AssessmentResult, number: number): SelectedStep | null {
  const step = result.steps.find((each) => each.number === number);
  if (!step) return null;
  const findings = result.findings.flatMap((finding, index) =>
    finding.step === number ? [findingView(place, finding, index)] : [],
  );
  const path = (shape: StepShape) =>
    `/assessments/${place.assessmentId}/working?step=${number}&shape=${shape}${legQuery("&", place.leg)}`;
  const line = (shape: StepShape, found: ShapeResult, text: string): ShapeLine => ({
    text,
    working: found.working ? path(shape) : null,
  });
  return {
    number,
    title: step.title,
    outcome: step.outcome,
    lies: step.atRoom
      ? line("loaded", step.atRoom, asLoaded(step, step.atRoom))
      : { text: `${sentenceCase(heldFlat(step.planned))}, ${step.faceUp} up.`, working: null },
    peak: step.atPeak && line("peak", step.atPeak, atPeak(step.atPeak)),
    released: step.planned === "bare" ? null : line("released", step.released, `${ifLetGo(step)}.`),
    run: runWords(step),
    profile: step.profile ? { points: step.profile, words: profileWords(step.profile) } : null,
    remarks: [...slotRemarks(step), ...(step.remarks ?? [])],
    open: findings.filter(({ outcome }) => outcome !== "clear").sort(bySeverity),
    clear: findings.filter(({ outcome }) => outcome === "clear"),
    budget: step.budget.map(({ input, source, contribution }) => ({
      input,
      source,
      text: withoutUnit(formatQuantity(contribution, "length", { unit: "µm", significant: 2 })),
    })),
    budgetNote: step.atRoom
      ? step.budget.length === 0
        ? "No input that bends it has a tolerance."
        : null
      : `${sentenceCase(heldFlat(step.planned))}: it has no bow of its own here.`,
  };
}

/** That a step is for some slots only, and whether the wafers that are looked at are in one of them. */
function slotRemarks({ slots, skipped }: StepResult): string[] {
  if (!slots) return [];
  const words = slotsInWords(slots);
  return [skipped ? `Only ${words} take this step: here the wafer is left as it is.` : `Only ${words} take this step.`];
}

function asLoaded(step: StepResult, shape: ShapeResult): string {
  const lies = `${sentenceCase(shapeText(shape, step.lies))} at 25\u00A0°C, ${step.faceUp} up.`;
  const bow = standardBowText(shape);
  if (bow === null) return lies;
  return `${lies} ${sentenceCase(bow)}${step.faceUp === "device side" ? "" : ", device side up"}.`;
}

function atPeak(shape: ShapeResult): string {
  return `${sentenceCase(shapeText(shape))} at ${celsius(shape.temperature)}, if the tool leaves it free.`;
}

function ifLetGo(step: StepResult): string {
  return `At ${micrometres(step.silicon)} it ${letGo(releasedText(step.released))}`;
}

const letGo = (words: string) => (words.startsWith("rolls") ? words : `lies ${words}`);
