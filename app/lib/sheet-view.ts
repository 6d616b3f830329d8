import type { BowShape } from "#app/components/drawings/bow-shape.ts";
import type { TitleBlockFields } from "#app/components/drawings/TitleBlock.tsx";
import type { ReleaseMethod } from "#app/engine/flow/model.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import {
  outcomeRank,
  SUPPORT_CLASSES,
  supportClassOf,
  type Holding,
  type Outcome,
  type SupportClass,
  FLAT_WITHIN_UNCERTAINTY,
} from "#app/engine/vocabulary.ts";
import type { AssessmentResult, BondResult, ShapeResult, StepResult } from "#app/schemas/assessment-result.ts";
import { withPieceMark } from "./carrier-units.ts";
import { legAnswer, type LegsView } from "./assessment-leg.ts";
import { celsius } from "./assessment-figure.ts";
import { recordNumber } from "#app/lib/record-number.ts";
import { liesWord } from "./assessment-shape.ts";
import { revisionOf } from "./assessment-revision.ts";
import { isRolled, lyingAs } from "./lying-as.ts";
import { sentenceCase } from "./assessment-steps.ts";
import { faceToSay, titleBlock, type AssessmentHead } from "./assessment-view.ts";
import { BOTH_CARRIERS } from "./plan-along.ts";
import { formatBare } from "./format-measured.ts";
import { doNotLines } from "./sheet-do-not.ts";
import { holdWords, runWords } from "./run-words.ts";
import { sheetGroups, type SheetGroup } from "./sheet-groups.ts";
import { roundedRadius, roundedWarp } from "./sheet-round.ts";
import { stopLines } from "./sheet-stop.ts";
import { stepNumbers, stepsInWords } from "./step-numbers.ts";

/** One group of steps as the sheet shows it; every text is for hands: no uncertainty, no model, no stress. */
export interface SheetGroupView {
  steps: string;
  /** by name; null where the support class says it all */
  heldBy: string | null;
  support: SupportClass;
  sideUp: string;
  touch: string;
  silicon: string;
  hottest: string;
  /** which of several tools and by which recipe, one line each */
  runs: string[];
  /** one line for each direction that it lies in */
  shape: string[];
  bow: { shape: BowShape; deviceSideUp: boolean; holding: Holding };
  /** readings that mean stop, one line each; and how they are taken */
  stop: { lines: string[]; how: string };
  doNot: string[];
}

export interface SheetBondView {
  steps: string;
  /** 'device side bonded', where that has to be said */
  face: string | null;
  carrier: string;
  material: string;
  debond: string;
}

/** Page 1 of a handling-risk sheet. */
export interface SheetView {
  assessmentId: string;
  number: string;
  revision: string;
  /** the slots that it is for, of a flow that parts by slot, and the sheets of the others; null for all slots */
  legs: LegsView | null;
  /** the one lot that it is for; null for every lot of the flow */
  lot: string | null;
  program: string;
  flow: string;
  outcome: Outcome;
  where: string | null;
  answer: string;
  /** the sheet must not be worked from, whatever its status */
  blocked: boolean;
  support: {
    required: SupportClass[];
    planned: (string | null)[];
    outcomes: Outcome[];
    numbers: number[];
    label: string;
  };
  /** when it was assessed, if the flow or something that it uses has changed since; else null */
  changedSince: string | null;
  diameter: number;
  groups: SheetGroupView[];
  bonds: SheetBondView[];
  /** tapes, frames and rings of the flow, each once */
  tapes: string[];
  titleBlock: TitleBlockFields;
}

/**
 * An assessment as the page for hands.
 * @param askedLeg number of the leg that it is for, as the address gives it, of a flow that parts by slot
 */
export function sheetView(head: AssessmentHead, whole: AssessmentResult, askedLeg: string | null = null): SheetView {
  const { result: walked, legs } = legAnswer(whole, askedLeg);
  // What the slots of this sheet skip is nothing that hands do.
  const result = { ...walked, steps: walked.steps.filter(({ skipped }) => !skipped) };
  const { steps, verdict, bonds } = result;
  const groups = sheetGroups(steps);
  return {
    assessmentId: head.id,
    number: recordNumber("assessment", head.program.slug, head.documentNumber),
    revision: revisionOf(head),
    legs,
    lot: head.lot?.name ?? null,
    program: head.program.name,
    flow: head.flow.name,
    outcome: verdict.outcome,
    where: verdict.step === null ? null : `first at step ${verdict.step}`,
    answer: result.sentences[0] ?? "",
    blocked: outcomeRank(verdict.outcome) >= outcomeRank("needs support"),
    support: {
      required: steps.map(({ required }) => required),
      planned: steps.map((step) => plannedInShort(step, bonds)),
      outcomes: steps.map(({ outcome }) => outcome),
      numbers: steps.map(({ number }) => number),
      label: supportInWords(steps),
    },
    changedSince: head.outOfDate ? head.createdAt.slice(0, 10) : null,
    diameter: result.wafer.diameter,
    groups: groups.map((group, index) => groupView(group, groups[index - 1]?.steps.at(-1) ?? null, result)),
    bonds: bonds.map((bond) => bondView(bond, bonds, steps)),
    tapes: [...new Set(groups.flatMap(({ holding }) => (isTape(holding) ? [sentenceCase(holding)] : [])))],
    titleBlock: ofSlots(titleBlock(head, "Handling-risk sheet", "1 of 1"), legs),
  };
}

/** The title of a sheet that is for some slots names them. */
function ofSlots(fields: TitleBlockFields, legs: LegsView | null): TitleBlockFields {
  return legs ? { ...fields, title: `${fields.title}, ${legs.chosen.slots}` } : fields;
}

/** What is planned to hold a step, for the support bar. */
function plannedInShort({ number, planned, plannedName }: StepResult, bonds: readonly BondResult[]): string | null {
  if (planned === "bare") return null;
  const on = bonds.filter(({ fromStep, toStep }) => fromStep <= number && number <= toStep);
  return sentenceCase(planned === "carrier" && on.length > 1 ? BOTH_CARRIERS : plannedName);
}

const isTape = (holding: Holding) => supportClassOf(holding) === "tape or ring";

/** 'Support needed: bare at steps 1 to 13, tape or ring at steps 14 to 19.' */
function supportInWords(steps: readonly StepResult[]): string {
  const parts = SUPPORT_CLASSES.flatMap((support) => {
    const numbers = steps.filter(({ required }) => required === support).map(({ number }) => number);
    return numbers.length === 0 ? [] : [`${support} at ${stepsInWords(numbers)}`];
  });
  return `Support needed: ${parts.join(", ")}.`;
}

/** A group of steps in words for hands; one step is a group of its own. */
export function groupView(group: SheetGroup, before: StepResult | null, result: AssessmentResult): SheetGroupView {
  const { steps, holding, heldBy } = group;
  const support = supportClassOf(holding);
  const { findings, bonds, tapeTemperature } = result;
  const worst = worstShape(steps);
  const faces = [...new Set(steps.map(({ faceUp }) => faceUp))];
  return {
    steps: stepNumbers(steps.map(({ number }) => number)),
    heldBy: heldBy === support ? null : sentenceCase(heldBy),
    support,
    sideUp: `${sentenceCase(faces.join(", then "))} up`,
    touch: TOUCH[holding],
    silicon: siliconText(steps),
    hottest: hottestText(steps),
    runs: runLines(steps),
    shape: shapeLines(steps),
    bow: {
      shape: lyingAs(worst?.atRoom ?? null),
      deviceSideUp: (worst ?? steps[0])?.faceUp === "device side",
      holding,
    },
    stop: stopView(group, before),
    doNot: doNotLines(group, { flow: result.steps, findings, bonds, tapeTemperature }),
  };
}

/** What may be touched while this holds the wafer. The device side never is. */
const TOUCH: Record<Holding, string> = {
  bare: "Touch back side and edge only",
  "thin-wafer gripper": "Touch by the gripper only",
  "grinding tape": "Touch tape and edge only",
  "film frame": "Touch the frame only",
  "edge ring": "Touch the ring only",
  carrier: "Touch the carrier only",
};

/** '725 µm', '725 to 100 µm'. Thickness is what was ordered, so it is not rounded. */
function siliconText(steps: readonly StepResult[]): string {
  const thicknesses = steps.map(({ silicon }) => silicon);
  const [most, least] = [Math.max(...thicknesses), Math.min(...thicknesses)];
  const end = formatQuantity(least, "length", { unit: "µm" });
  return most === least ? end : `${formatBare(most, "length", "µm")} to ${end}`;
}

/** Beyond this a step is warm, K. */
const WARM = 303.15;

/** '230 °C, 120 min, steps 3 and 8', or room temperature. */
function hottestText(steps: readonly StepResult[]): string {
  const peak = Math.max(...steps.map(({ peakTemperature }) => peakTemperature));
  if (peak <= WARM) return "room temperature";
  const hottest = steps.filter(({ peakTemperature }) => peakTemperature === peak);
  const longest = hottest.reduce((most, step) => ((step.holdTime ?? 0) > (most.holdTime ?? 0) ? step : most));
  const minutes = (longest.holdTime ?? 0) > 0 ? `, ${holdWords(longest, "min") ?? ""}` : "";
  return `${celsius(peak)}${minutes}, ${stepsInWords(hottest.map(({ number }) => number))}`;
}

/** 'Steps 3 and 8: oven 3, recipe PI-5': where it is said which of several tools runs a step, or by which recipe. */
function runLines(steps: readonly StepResult[]): string[] {
  const runs = new Map<string, number[]>();
  for (const step of steps) {
    const run = runWords(step);
    if (run) runs.set(run, [...(runs.get(run) ?? []), step.number]);
  }
  return [...runs].map(([run, numbers]) => `${sentenceCase(stepsInWords(numbers))}: ${run}`);
}

/** The step that lies least flat; null when it is held flat throughout. */
function worstShape(steps: readonly StepResult[]): StepResult | null {
  return steps.reduce<StepResult | null>(
    (worst, step) => (step.atRoom && (!worst?.atRoom || step.atRoom.warp > worst.atRoom.warp) ? step : worst),
    null,
  );
}

/** How it lies as loaded, the worst of each direction. */
function shapeLines(steps: readonly StepResult[]): string[] {
  const words = steps.map(liesWord);
  const isBent = (_: unknown, at: number) => words[at] !== "flat" && words[at] !== FLAT_WITHIN_UNCERTAINTY;
  const bent = steps.filter(isBent).flatMap(({ atRoom }) => (atRoom ? [atRoom] : []));
  if (bent.length === 0) {
    if (words.includes(FLAT_WITHIN_UNCERTAINTY)) return [FLAT_WITHIN_UNCERTAINTY];
    return [steps.some(({ atRoom }) => atRoom) ? "flat" : "held flat"];
  }
  const rolled = bent.filter(isRolled);
  if (rolled.length > 0) return [`rolls up, radius about ${roundedRadius(Math.min(...rolled.map(radius)))}`];
  return [
    ...largest(bent, true).map((warp) => `edges up ${roundedWarp(warp)}`),
    ...largest(bent, false).map((warp) => `edges down ${roundedWarp(warp)}`),
  ];
}

const radius = ({ rollRadius }: ShapeResult & { rollRadius: number }) => rollRadius;

function largest(shapes: readonly ShapeResult[], edgesUp: boolean): number[] {
  const warps = shapes.filter((shape) => shape.edgesUp === edgesUp).map(({ warp }) => warp);
  return warps.length === 0 ? [] : [Math.max(...warps)];
}

function stopView({ steps, holding }: SheetGroup, before: StepResult | null): SheetGroupView["stop"] {
  const lines = stopLines(steps, before);
  if (lines.length > 0) return { lines, how: "on the tool, as loaded" };
  if (isTape(holding)) return { lines: ["An edge off the tape, or a crack"], how: "by eye" };
  return { lines: ["No limit is known"], how: "ask before loading" };
}

const DEBOND_WORDS: Record<ReleaseMethod, string> = {
  "thermal slide": "slide off hot",
  "laser through glass": "laser through the glass",
  "mechanical peel": "peel",
  "laser through glass then peel": "laser through the glass, then peel",
  "solvent through perforated carrier": "solvent through the carrier",
};

function bondView(bond: BondResult, bonds: readonly BondResult[], steps: readonly StepResult[]): SheetBondView {
  const { fromStep, toStep, carrier, piece, material, release } = bond;
  const face = faceToSay(bond, bonds);
  const debond = steps.find(({ number }) => number === toStep + 1);
  return {
    steps: stepsInWords(Array.from({ length: toStep - fromStep + 1 }, (_, index) => fromStep + index)),
    face: face && `${face} bonded`,
    carrier: withPieceMark(carrier, piece),
    material,
    debond: debond ? `step ${debond.number}, ${DEBOND_WORDS[release]}` : "not in this flow",
  };
}
