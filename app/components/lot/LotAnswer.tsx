import { ComparisonTable } from "#app/components/assessments/ComparisonTable.tsx";
import { AnswerLine } from "#app/components/drawings/AnswerLine.tsx";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { bowText, lotCounts } from "#app/lib/lot-words.ts";
import { micrometres } from "#app/lib/assessment-figure.ts";
import { movementSentence } from "#app/lib/out-of-date-words.ts";
import type { AnswerSummary } from "#app/lib/result-comparison.ts";
import type { Movement } from "#app/schemas/assessment-changes.ts";
import type { LotInput, LotRecord } from "#app/schemas/lot.ts";
import { LotSpread } from "./LotSpread.tsx";

interface Trial {
  lot: LotInput;
  summary: AnswerSummary;
  movement: Movement;
  answers: LotRecord["answers"];
}

/** What a lot's own figures come to, beside the answer of the assessment, with the steps that change and its wafers. */
export function LotAnswer({ trial, before }: { trial: Trial; before: AnswerSummary }) {
  const { lot, summary, movement, answers } = trial;
  const moved = movement.outcome === "computed" ? movement.moved : [];
  return (
    <>
      <AnswerLine
        level={2}
        outcome={summary.outcome}
        where={summary.where ?? undefined}
        sentences={summary.sentences}
        figures={lotFigures(lot, summary, answers)}
      />
      <section className="border-t border-ink p-4 tablet:px-6" aria-label="As assessed">
        <p>
          As assessed: <FindingTag outcome={before.outcome}>{before.where}</FindingTag>
        </p>
        <p className="mt-1 max-w-[60em] text-quiet">{noBreak(before.sentences.join(" "))}</p>
        <p className="mt-2 max-w-[60em] font-semibold">{noBreak(movementSentence(movement))}</p>
        {moved.length > 0 ? (
          <ComparisonTable
            rows={moved}
            before="As assessed"
            after={`Lot ${lot.name}`}
            caption="Steps whose finding or support changes"
          />
        ) : null}
      </section>
      <LotSpread lot={{ answers, thickness: lot.thickness }} />
    </>
  );
}

function lotFigures(lot: LotInput, { tightest }: AnswerSummary, answers: LotRecord["answers"]) {
  const { wafers, missed } = lotCounts(answers);
  return [
    { label: wafers > 0 ? "Mean bow in" : "Bow in", value: bowText(lot.bow) },
    { label: "Thickness in", value: lot.thickness === null ? "as assessed" : micrometres(lot.thickness) },
    tightest
      ? { label: `Tightest, step ${tightest.step}`, value: `${tightest.share} of limit` }
      : { label: "Tightest", value: "no limit" },
    wafers > 0
      ? { label: "Wafers that miss", value: `${missed} of ${wafers}` }
      : { label: "Wafers that miss", value: "not listed" },
  ];
}
