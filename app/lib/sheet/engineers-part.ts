import { chooseExaggeration } from "#app/components/drawings/choose-exaggeration.ts";
import { supportClassOf } from "#app/engine/vocabulary.ts";
import type { AssessmentResult, StepResult } from "#app/schemas/assessment-result.ts";
import type { SheetEngineers, SheetStepRow } from "#app/schemas/sheet-document.ts";
import { legAnswer } from "../assessment-leg.ts";
import { stepRows, type StepRow } from "../assessment-steps.ts";
import { holdWords } from "../run-words.ts";
import type { SheetView } from "../sheet-view.ts";
import { stepsInWords } from "../step-numbers.ts";
import type { SheetSource } from "./sheet-document-of.ts";
import type { SheetFacts } from "./sheet-facts.ts";
import { warpByThickness } from "./warp-by-thickness.ts";

/** More than these are not read on paper; the rest stands under the assessment. */
const MOST_ASSUMPTIONS = 14;

/** What engineers read of a sheet: the step table, warp against thickness, what the figures rest on, and what changed. */
export function engineersPart(
  source: SheetSource,
  { legs, changedSince }: SheetView,
  facts: SheetFacts,
): SheetEngineers {
  const { result: walked } = legAnswer(source.result, source.leg === null ? null : String(source.leg));
  const result = { ...walked, steps: walked.steps.filter(({ skipped }) => !skipped) };
  const rows = stepRows(result);
  const bows = rows.flatMap(({ bow }) => (bow.shape.kind === "bowed" ? [bow.shape.bow] : []));
  const plot = warpByThickness(source.input, walked.slots ?? slotsOf(source, legs?.chosen.number ?? null));
  return {
    exaggeration: chooseExaggeration(bows, result.wafer.diameter),
    steps: result.steps.flatMap((step, index) => {
      const row = rows[index];
      return row ? [sheetRow(step, row, result.steps[index - 1])] : [];
    }),
    plot,
    noPlot: plot ? null : "The free wafer stays as good as flat at every thickness of this flow.",
    assumptions: assumptions(result),
    meaning: "± is the expanded uncertainty, k = 2. Warp at 25 °C after the step as it lies, gravity left out.",
    remarks: remarks(source, result, changedSince),
    signs:
      "Drawn as it lies; the thin second line is the device side. Open band: carrier. Dashes: tape. Squares: frame or ring. Brackets: gripper. Rolled up: ×1.",
    changes: (facts.release?.changes ?? []).slice(0, 3),
  };
}

const slotsOf = ({ result }: SheetSource, leg: number | null) =>
  leg === null ? null : (result.legs?.[leg - 1]?.slots ?? null);

function sheetRow(step: StepResult, row: StepRow, before: StepResult | undefined): SheetStepRow {
  const { planned, plannedName } = step;
  const minutes = (step.holdTime ?? 0) > 0 ? holdWords(step, "min") : null;
  return {
    number: row.number,
    title: row.title,
    silicon: row.silicon.text,
    hottest: minutes ? `${row.temperature.text}, ${minutes}` : row.temperature.text,
    heldBy: row.heldBy,
    support: supportClassOf(planned),
    newSupport: before !== undefined && (before.planned !== planned || before.plannedName !== plannedName),
    bow: row.bow,
    warp: row.warpText,
    lies: row.liesAs,
    limit: row.limitText,
    outcome: row.outcome,
    finding: row.note === null ? null : `${row.note}${row.more > 0 ? `, ${row.more} more` : ""}`,
  };
}

/** What nobody measured or looked up, each once with the steps that use it. */
function assumptions({ assumed }: AssessmentResult): string[] {
  const found = new Map<string, number[]>();
  for (const { what, step } of assumed) found.set(what, [...new Set([...(found.get(what) ?? []), step])]);
  const lines = [...found].map(([what, steps]) => `${what}, ${stepsInWords(steps.sort((a, b) => a - b))}`);
  if (lines.length <= MOST_ASSUMPTIONS) return lines;
  const shown = lines.slice(0, MOST_ASSUMPTIONS - 1);
  return [...shown, `and ${lines.length - shown.length} more, which stand under the assessment`];
}

function remarks({ head, input }: SheetSource, result: AssessmentResult, changedSince: string | null): string[] {
  return [
    `${result.assumed.length} of ${result.inputs} inputs are assumed, not measured. Silicon ${input.flow.wafer.orientation === "100" ? "(001)" : "(111)"}.`,
    `Engine ${head.engineVersion}, inputs ${head.inputHash.slice(0, 12)}, assessed ${head.createdAt.slice(0, 10)}${changedSince === null ? "" : "; inputs have changed since"}.`,
  ];
}
