import type { TitleBlockFields } from "#app/components/drawings/TitleBlock.tsx";
import { tightestStep } from "#app/engine/flow/answer.ts";
import type { AssumedInput } from "#app/engine/flow/assess.ts";
import type { ReleaseMethod } from "#app/engine/flow/model.ts";
import type { Finding } from "#app/engine/rules/finding.ts";
import { formatWithUncertainty } from "#app/engine/units/format.ts";
import { SIDE_NAMES, type FaceUp, type Outcome } from "#app/engine/vocabulary.ts";
import type { AssessmentResult, BondResult, StepResult } from "#app/schemas/assessment-result.ts";
import type { LotRecord } from "#app/schemas/lot.ts";
import { withPieceMark } from "./carrier-units.ts";
import { celsius, figureText, micrometres } from "./assessment-figure.ts";
import { legAnswer, type LegsView } from "./assessment-leg.ts";
import { bySeverity, figureWorkingPath, type ResultPlace } from "./assessment-finding.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { revisionOf } from "./assessment-revision.ts";
import { selectedStep, stepAskedFor, type SelectedStep } from "./assessment-selected.ts";
import { isRolled } from "./lying-as.ts";
import { stepRows, type StepRow } from "./assessment-steps.ts";
import { SITE_NAME } from "./site.ts";
import { warpCourse, type CourseStep } from "./warp-course.ts";

/** What a stored assessment says of itself, beside its result. */
export interface AssessmentHead {
  id: string;
  /** counts within the flow; that of a lot is the number of the assessment that it is of */
  number: number;
  /** counts within the program */
  documentNumber: number;
  flow: { id: string; name: string };
  program: { name: string; slug: string };
  engineVersion: string;
  inputHash: string;
  createdAt: string;
  createdBy: string;
  outOfDate: boolean;
  mayAssess: boolean;
  /** the lot that it is of; null for an assessment of the flow itself */
  lot: LotRecord | null;
}

/** A figure of the answer, with a link to where it comes from. */
export interface AnswerFigureView {
  label: string;
  value: string;
  /** to its working or a place on the page, or to the step that it is of */
  link: { text: string; to: string | { step: number } } | null;
}

/** What would clear some steps, said once. */
export interface RemedyView {
  outcome: Outcome;
  steps: number[];
  text: string;
}

export interface BondView {
  steps: string;
  /** the face that is bonded; null where every bond of the flow is by the device side, as is usual */
  face: FaceUp | null;
  carrier: string;
  material: string;
  thickness: string;
  limit: string;
  release: ReleaseMethod;
}

/** An assessment as its page shows it: everything formatted, workings left out. */
export interface AssessmentView {
  head: AssessmentHead;
  /** the legs of a flow that parts by slot, and the one that everything below is of; null where it does not */
  legs: LegsView | null;
  diameter: number;
  outcome: Outcome;
  /** where the verdict arises first; null when it is clear */
  where: string | null;
  sentences: string[];
  figures: AnswerFigureView[];
  steps: StepRow[];
  selected: SelectedStep | null;
  /** how it lies along the flow, for the chart */
  course: CourseStep[];
  remedies: RemedyView[];
  assumed: AssumedInput[];
  inputs: number;
  bonds: BondView[];
  titleBlock: TitleBlockFields;
}

/**
 * An assessment for its page.
 * @param asked number of the step to look at, as the address gives it
 * @param askedLeg the same of the leg, of a flow that parts by slot
 */
export function assessmentView(
  head: AssessmentHead,
  whole: AssessmentResult,
  asked: string | null,
  askedLeg: string | null = null,
): AssessmentView {
  const { result, legs } = legAnswer(whole, askedLeg);
  const { verdict } = result;
  const place = { assessmentId: head.id, leg: legs?.chosen.number ?? null };
  return {
    head,
    legs,
    diameter: result.wafer.diameter,
    outcome: verdict.outcome,
    where: verdict.step === null ? null : `first at step ${verdict.step}`,
    sentences: result.sentences,
    figures: answerFigures(place, result),
    steps: stepRows(result),
    selected: selectedStep(place, result, stepAskedFor(result, asked)),
    course: warpCourse(result),
    remedies: remedies(result.findings),
    assumed: result.assumed,
    inputs: result.inputs,
    bonds: result.bonds.map((bond) => bondView(bond, result.bonds)),
    titleBlock: titleBlock(head, "Assessment", "1 of 1"),
  };
}

/** The title block of a document made from an assessment that nobody has checked or released. */
export function titleBlock(head: AssessmentHead, documentType: string, page: string): TitleBlockFields {
  return {
    owner: SITE_NAME,
    documentType,
    title: head.lot ? `${head.flow.name}, lot ${head.lot.name}` : head.flow.name,
    prepared: head.createdBy,
    checked: "not yet",
    released: "not yet",
    number: recordNumber("assessment", head.program.slug, head.documentNumber),
    revision: revisionOf(head),
    status: "Draft",
    date: head.createdAt.slice(0, 10),
    language: "en",
    page,
  };
}

function answerFigures(place: ResultPlace, result: AssessmentResult): AnswerFigureView[] {
  const tightest = tightestStep(result);
  const thinnest = result.steps.reduce<StepResult | null>(
    (least, step) => (!least || step.silicon < least.silicon ? step : least),
    null,
  );
  const figures = tightest ? tightestFigures(place, result, tightest) : [];
  if (thinnest) figures.push(thinnestFigure(thinnest));
  figures.push({
    label: "Inputs assumed",
    value: `${result.assumed.length} of ${result.inputs}`,
    link: result.assumed.length > 0 ? { text: "Which", to: "#assumed" } : null,
  });
  return figures;
}

function tightestFigures(place: ResultPlace, result: AssessmentResult, tightest: Finding): AnswerFigureView[] {
  const [figure] = tightest.figures;
  if (!figure || !tightest.limit) return [];
  const step = result.steps.find(({ number }) => number === tightest.step);
  const rolled = step?.atRoom && isRolled(step.atRoom);
  return [
    {
      label: `Tightest, step ${tightest.step}${rolled ? ", edge lift" : ""}`,
      value: figureText(figure),
      link: figure.working
        ? { text: "Working", to: figureWorkingPath(place, result.findings.indexOf(tightest), 0) }
        : null,
    },
    {
      label: "Its tool takes",
      value: figureText(tightest.limit),
      link: { text: tightest.limit.label, to: { step: tightest.step } },
    },
  ];
}

function thinnestFigure({ number, silicon, siliconTolerance }: StepResult): AnswerFigureView {
  return {
    label: "Thinnest silicon",
    value: siliconTolerance
      ? formatWithUncertainty(silicon, siliconTolerance, "length", { unit: "µm" })
      : micrometres(silicon),
    link: { text: `From step ${number}`, to: { step: number } },
  };
}

/** What clears everything that is not clear, worst first; steps that the same thing clears stand together. */
function remedies(findings: Finding[]): RemedyView[] {
  const found = new Map<string, RemedyView>();
  for (const { remedy, step, outcome } of findings.toSorted(bySeverity)) {
    if (remedy === null) continue;
    const known = found.get(remedy);
    if (!known) found.set(remedy, { outcome, steps: [step], text: remedy });
    else if (!known.steps.includes(step)) known.steps.push(step);
  }
  return [...found.values()].map((each) => ({ ...each, steps: each.steps.sort((a, b) => a - b) }));
}

/** The face of a bond where that has to be said: as soon as one is by the back side. */
export function faceToSay({ face = "front" }: BondResult, bonds: readonly BondResult[]): FaceUp | null {
  return bonds.some((each) => each.face === "back") ? SIDE_NAMES[face] : null;
}

function bondView(bond: BondResult, bonds: readonly BondResult[]): BondView {
  return {
    face: faceToSay(bond, bonds),
    steps: bond.fromStep === bond.toStep ? `step ${bond.fromStep}` : `step ${bond.fromStep} to ${bond.toStep}`,
    carrier: withPieceMark(bond.carrier, bond.piece),
    material: bond.material,
    thickness: micrometres(bond.thickness),
    limit: celsius(bond.temperatureLimit),
    release: bond.release,
  };
}
