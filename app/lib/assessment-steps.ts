import type { BowShape } from "#app/components/drawings/bow-shape.ts";
import { slotsInWords } from "#app/engine/flow/legs.ts";
import type { Finding } from "#app/engine/rules/finding.ts";
import type { FaceUp, Holding, Outcome, SupportClass } from "#app/engine/vocabulary.ts";
import type { AssessmentResult, BondResult, StepResult } from "#app/schemas/assessment-result.ts";
import { celsius, micrometres } from "./assessment-figure.ts";
import { bySeverity, findingNote } from "./assessment-finding.ts";
import { liesWord, shapeText } from "./assessment-shape.ts";
import { formatBare, withoutUnit } from "./format-measured.ts";
import { BOTH_CARRIERS } from "./plan-along.ts";
import { isRolled, lyingAs } from "./lying-as.ts";
import { SHORT_STEP_NAMES } from "./step-names.ts";

/** One step of an assessment for strip, table and list: numbers that are drawn in SI, numbers that are read as text. */
export interface StepRow {
  number: number;
  title: string;
  shortName: string;
  silicon: { thickness: number; text: string };
  temperature: { peak: number; text: string };
  bow: { shape: BowShape; deviceSideUp: boolean; holding: Holding };
  /** warp over the tool's own limit with its expanded uncertainty, at the moment that comes nearest; null when held flat */
  warp: { fraction: number; uncertainty: number } | null;
  /** warp at 25 °C after the step, µm without the unit */
  warpText: string;
  liesAs: string;
  /** the tool's limit for the side that it lies on, µm without the unit */
  limitText: string;
  heldBy: string;
  /** what is planned, in full, for the dimension lines of the strip; null where it is bare */
  planned: string | null;
  required: SupportClass;
  outcome: Outcome;
  /** the worst finding in a few words; null when all are clear and the step is taken */
  note: string | null;
  /** how many more findings of the step are not clear */
  more: number;
}

const NONE = "–";

/** All steps of a result, in order. */
export function stepRows(result: AssessmentResult): StepRow[] {
  return result.steps.map((step) =>
    stepRow(
      step,
      result.findings.filter((finding) => finding.step === step.number),
      result.bonds.filter(({ fromStep, toStep }) => fromStep <= step.number && step.number <= toStep),
    ),
  );
}

function stepRow(step: StepResult, findings: Finding[], bonds: BondResult[]): StepRow {
  const { atRoom, faceUp, planned } = step;
  const [worst, ...others] = findings.filter(({ outcome }) => outcome !== "clear").sort(bySeverity);
  return {
    number: step.number,
    title: titleWithSlots(step),
    shortName: SHORT_STEP_NAMES[step.kind],
    silicon: { thickness: step.silicon, text: formatBare(step.silicon, "length", "µm") },
    temperature: { peak: step.peakTemperature, text: withoutUnit(celsius(step.peakTemperature)) },
    bow: { shape: lyingAs(atRoom), deviceSideUp: isUp(faceUp), holding: planned },
    warp: warpShare(findings),
    warpText: atRoom && !isRolled(atRoom) ? withoutUnit(micrometres(atRoom.warp, atRoom.standardUncertainty)) : NONE,
    liesAs: atRoom && isRolled(atRoom) ? shapeText(atRoom) : liesWord(step),
    limitText: limitText(step),
    heldBy: sentenceCase(planned),
    planned: planned === "bare" ? null : plannedInFull(step, bonds),
    required: step.required,
    outcome: step.outcome,
    note: worst ? findingNote(worst) : step.skipped ? "skipped" : null,
    more: others.length,
  };
}

/** What is done, and for which slots where it is not for all. */
export function titleWithSlots({ title, slots }: Pick<StepResult, "title" | "slots">): string {
  return slots ? `${title}, ${slotsInWords(slots)}` : title;
}

const isUp = (faceUp: FaceUp) => faceUp === "device side";

/** First letter large, the rest as it was. */
export function sentenceCase(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}

/** How near the step comes to its tool's limit, from the finding that judged it. */
function warpShare(findings: Finding[]): StepRow["warp"] {
  const judged = findings.find(({ rule, limit }) => rule === 2 && limit);
  const [figure] = judged?.figures ?? [];
  if (!judged?.limit || !figure) return null;
  return {
    fraction: figure.value / judged.limit.value,
    uncertainty: (2 * (figure.standardUncertainty ?? 0)) / judged.limit.value,
  };
}

function limitText({ atRoom, equipment }: StepResult): string {
  const limit = atRoom && equipment && (atRoom.edgesUp ? equipment.edgesUp : equipment.edgesDown);
  return limit === null ? NONE : formatBare(limit, "length", "µm");
}

function plannedInFull(step: StepResult, bonds: BondResult[]): string {
  const [bond, other] = bonds;
  if (step.planned !== "carrier" || !bond) return sentenceCase(step.plannedName);
  return other ? sentenceCase(BOTH_CARRIERS) : `${bond.carrier}, ${bond.material}`;
}
