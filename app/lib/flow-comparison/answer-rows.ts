import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import type { Outcome } from "#app/engine/vocabulary.ts";
import type { AssessmentResult, ShapeResult } from "#app/schemas/assessment-result.ts";
import type { ComparedGroup, ComparedRow } from "#app/schemas/comparison.ts";
import { celsius, figureText, micrometres } from "../assessment-figure.ts";
import { findingNote } from "../assessment-finding.ts";
import { comparedRow, type RowCell } from "../comparison/compared-row.ts";
import { isRolled } from "../lying-as.ts";
import { stepNumbers } from "../step-numbers.ts";
import type { ComparedFlow, FlowFigures } from "./figures.ts";
import type { DecidingWarp } from "./tightest.ts";

const NOT_WALKED: RowCell = { text: "cannot be walked", same: null };
const NO_LIMIT: RowCell = { text: "no tool with a limit", same: null };

/** A row of what was worked out of each flow; one that cannot be walked says so. */
export function walkedRow(
  flows: readonly ComparedFlow[],
  key: string,
  label: string,
  cellOf: (figures: FlowFigures) => RowCell,
): ComparedRow {
  return comparedRow(key, label, flows, ({ figures }) => (figures ? cellOf(figures) : NOT_WALKED));
}

/** What an assessment of each flow as it stands now would say, as rows. */
export function answerGroup(flows: readonly ComparedFlow[]): ComparedGroup {
  const row = (key: string, label: string, cellOf: (figures: FlowFigures) => RowCell) =>
    walkedRow(flows, key, label, cellOf);
  const judged =
    (cellOf: (deciding: DecidingWarp & { limit: object }, result: AssessmentResult) => RowCell) =>
    ({ deciding, result }: FlowFigures) =>
      deciding?.limit ? cellOf({ ...deciding, limit: deciding.limit }, result) : NO_LIMIT;
  const stepsWith =
    (outcome: Outcome) =>
    ({ result }: FlowFigures) =>
      stepsCell(result, outcome);
  return {
    key: "answer",
    title: "What each flow comes to as it stands now",
    rows: [
      row("verdict", "Verdict", ({ result }) => verdictCell(result)),
      row(
        "tightest",
        "Tightest step",
        judged(({ judgedAt }, result) => placeCell(result, judgedAt)),
      ),
      row("warp", "Warp there", judged(warpCell)),
      row("share", "Share of its limit", judged(shareCell)),
      row("support", "Less support planned than needed", stepsWith("needs support")),
      row("run", "Do not run", stepsWith("do not run")),
      row("judge", "Cannot be judged", stepsWith("cannot judge")),
      row("caution", "Cautions", stepsWith("caution")),
      row("rolls", "If nothing held it", ({ result }) => rollsCell(result)),
    ],
  };
}

const titleAt = ({ steps }: AssessmentResult, number: number) => steps.find((step) => step.number === number)?.title;

/** A step by its number and title; two flows count as alike by what is done there, whatever its number. */
function placeCell(result: AssessmentResult, number: number): RowCell {
  const title = titleAt(result, number) ?? "";
  return { text: `step ${number}, ${title}`, same: title };
}

function verdictCell(result: AssessmentResult): RowCell {
  const { outcome, step, rule } = result.verdict;
  if (step === null) return { text: outcome };
  const cause = result.findings.find(
    (finding) => finding.step === step && finding.rule === rule && finding.outcome === outcome,
  );
  const title = titleAt(result, step) ?? "";
  return {
    text: `${outcome}, first at step ${step}, ${title}`,
    note: cause ? findingNote(cause) : null,
    same: [outcome, title, rule],
  };
}

/** The shape of the moment that decides. */
const decidingShape = ({ step, moment }: DecidingWarp): ShapeResult | null => step[moment];

function warpCell(deciding: DecidingWarp): RowCell {
  const shape = decidingShape(deciding);
  const text = micrometres(deciding.warp, shape?.standardUncertainty ?? null);
  const hot = shape && shape.temperature !== ROOM_TEMPERATURE ? ` at ${celsius(shape.temperature)}` : "";
  if (shape && isRolled(shape))
    return { text: `rolls up, edges lift ${micrometres(deciding.warp)}`, note: hot.trim() || null };
  return { text: `${shape?.edgesUp ? "edges up" : "edges down"} ${text}`, note: hot.trim() || null };
}

function shareCell({ warp, limit }: DecidingWarp): RowCell {
  if (!limit) return NO_LIMIT;
  const left = limit.value - warp;
  const margin = left >= 0 ? `${micrometres(left)} left` : `${micrometres(-left)} beyond`;
  return {
    text: `${Math.round((100 * warp) / limit.value)}\u00A0%, ${margin}`,
    note: `${limit.label}: ${figureText({ value: limit.value, unit: "m" })}`,
  };
}

function stepsCell({ steps, findings }: AssessmentResult, outcome: Outcome): RowCell {
  const numbers = [...new Set(findings.filter((finding) => finding.outcome === outcome).map(({ step }) => step))].sort(
    (a, b) => a - b,
  );
  const titles = steps.filter(({ number }) => numbers.includes(number)).map(({ title }) => title);
  if (numbers.length === 0) return { text: "at no step", same: [] };
  return {
    text: `${numbers.length === 1 ? "1 step" : `${numbers.length} steps`}`,
    note: `${numbers.length === 1 ? "step" : "steps"} ${stepNumbers(numbers)}`,
    same: titles,
  };
}

/** From which step on the wafer would roll about one axis, were it let go. */
function rollsCell({ steps }: AssessmentResult): RowCell {
  const first = steps.find(({ released, skipped }) => !skipped && released.regime === "curled");
  if (!first) return { text: "it would roll at no step" };
  return {
    text: `it would roll from step ${first.number} on`,
    note: `${first.title}, ${micrometres(first.silicon)}`,
    same: first.title,
  };
}
