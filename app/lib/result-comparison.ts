import { tightestStep } from "#app/engine/flow/answer.ts";
import { slotsInWords } from "#app/engine/flow/legs.ts";
import { supportClassOf, supportRank, type Outcome, type SupportClass } from "#app/engine/vocabulary.ts";
import type { Movement } from "#app/schemas/assessment-changes.ts";
import type { AssessmentResult, ShapeResult, StepResult } from "#app/schemas/assessment-result.ts";
import { alignSteps, type Pair } from "./align.ts";
import { figureText, micrometres } from "./assessment-figure.ts";
import { stepRows, type StepRow } from "./assessment-steps.ts";
import { isRolled } from "./lying-as.ts";

/** What a result comes to, for one half of a comparison. */
export interface AnswerSummary {
  outcome: Outcome;
  /** 'first at step 9'; null when it is clear */
  where: string | null;
  sentences: string[];
  /** the step nearest to its tool's limit, 'step 15, Sputter seed'; null when no step has a limit */
  tightest: { step: number; title: string; warp: string; limit: string; share: string } | null;
}

/** A step of one of the two results. */
export type ComparedStep = Pick<
  StepRow,
  "number" | "title" | "heldBy" | "required" | "outcome" | "note" | "warpText" | "liesAs"
> & {
  silicon: string;
  /** what it needs, where what is planned is less */
  needs: SupportClass | null;
};

/** A step of both, or of one of the two. */
export interface ComparisonRow {
  before: ComparedStep | null;
  after: ComparedStep | null;
  /** how far its warp at 25 °C moves, µm with sign and without unit; null where one of them has none */
  difference: string | null;
  /** finding, support or silicon differ, or one of the two has no such step */
  differs: boolean;
}

export interface ResultComparison {
  /** said where the flow of one of the two parts by slot: which slots are held against which */
  slots: string | null;
  before: AnswerSummary;
  after: AnswerSummary;
  rows: ComparisonRow[];
}

/**
 * Two results side by side, steps aligned. Of a flow that parts by slot it is the later one's worst leg, beside the earlier one's leg
 * of the same slots; where that one has no such leg, beside its worst.
 */
export function compareResults(earlier: AssessmentResult, after: AssessmentResult): ResultComparison {
  const before = sameSlots(earlier, after);
  const [rowsBefore, rowsAfter] = [rowsByNumber(before), rowsByNumber(after)];
  return {
    slots: slotsCompared(before, after),
    before: answerSummary(before),
    after: answerSummary(after),
    rows: alignSteps(before.steps, after.steps).map((pair) => comparisonRow(pair, rowsBefore, rowsAfter)),
  };
}

const keyOf = (slots: readonly number[] | undefined) => (slots ?? []).join(" ");

/** The leg of a result that is of the same slots as another result; the result itself where it has none. */
export function sameSlots(result: AssessmentResult, other: AssessmentResult): AssessmentResult {
  const leg = result.legs?.find(({ slots }) => keyOf(slots) === keyOf(other.slots));
  return leg?.result ?? result;
}

function slotsCompared(before: AssessmentResult, after: AssessmentResult): string | null {
  const words = ({ slots }: AssessmentResult) => (slots ? slotsInWords(slots) : "all slots");
  if (!before.slots && !after.slots) return null;
  if (keyOf(before.slots) === keyOf(after.slots))
    return `Compared for ${words(after)}, the worst leg of the later one.`;
  return `Different slots are compared: ${words(before)} of the earlier one with ${words(after)} of the later one.`;
}

/** How an answer moves from a stored result to what would be computed now. */
export function movementOf(before: AssessmentResult, after: AssessmentResult): Movement {
  const { rows, ...answers } = compareResults(before, after);
  return { outcome: "computed", ...answers, moved: rows.filter(({ differs }) => differs) };
}

/** Verdict and tightest step of a result. */
export function answerSummary(result: AssessmentResult): AnswerSummary {
  const { verdict, sentences } = result;
  return {
    outcome: verdict.outcome,
    where: verdict.step === null ? null : `first at step ${verdict.step}`,
    sentences,
    tightest: tightestSummary(result),
  };
}

function tightestSummary(result: AssessmentResult): AnswerSummary["tightest"] {
  const tightest = tightestStep(result);
  const figure = tightest?.figures[0];
  if (!tightest?.limit || !figure) return null;
  return {
    step: tightest.step,
    title: result.steps.find(({ number }) => number === tightest.step)?.title ?? "",
    warp: figureText(figure),
    limit: figureText(tightest.limit),
    share: `${Math.round((100 * figure.value) / tightest.limit.value)}\u00A0%`,
  };
}

function rowsByNumber(result: AssessmentResult): Map<number, StepRow> {
  return new Map(stepRows(result).map((row) => [row.number, row]));
}

function comparisonRow(
  pair: Pair<StepResult>,
  rowsBefore: Map<number, StepRow>,
  rowsAfter: Map<number, StepRow>,
): ComparisonRow {
  const before = comparedStep(pair.before && rowsBefore.get(pair.before.number));
  const after = comparedStep(pair.after && rowsAfter.get(pair.after.number));
  const same =
    before !== null &&
    after !== null &&
    before.outcome === after.outcome &&
    before.required === after.required &&
    before.heldBy === after.heldBy &&
    before.silicon === after.silicon;
  return {
    before,
    after,
    difference: warpDifference(pair.before?.atRoom ?? null, pair.after?.atRoom ?? null),
    differs: !same,
  };
}

function comparedStep(row: StepRow | null | undefined): ComparedStep | null {
  if (!row) return null;
  const { number, title, heldBy, required, outcome, note, warpText, liesAs, silicon, bow } = row;
  const short = supportRank(required) > supportRank(supportClassOf(bow.holding));
  return {
    number,
    title,
    heldBy,
    required,
    outcome,
    note,
    warpText,
    liesAs,
    silicon: silicon.text,
    needs: short ? required : null,
  };
}

/** '+12', '−3.4', '0', µm. A wafer that has rolled up has an edge lift and no warp to compare. */
function warpDifference(before: ShapeResult | null, after: ShapeResult | null): string | null {
  if (!before || !after || isRolled(before) || isRolled(after)) return null;
  const difference = after.warp - before.warp;
  const text = micrometres(Math.abs(difference)).replace(/\u00A0µm$/, "");
  if (Number(text) === 0) return "0";
  return `${difference > 0 ? "+" : "−"}${text}`;
}
