import type { SubmissionResult } from "@conform-to/react";
import { Form, useNavigation } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import { micrometres } from "#app/lib/assessment-figure.ts";
import type { ExpectedShare } from "#app/lib/lot-expected.ts";
import { bowText, expectedSentences } from "#app/lib/lot-words.ts";
import type { AnswerSummary } from "#app/lib/result-comparison.ts";
import type { Movement } from "#app/schemas/assessment-changes.ts";
import type { LotInput, LotRecord } from "#app/schemas/lot.ts";
import { LotAnswer } from "./LotAnswer.tsx";
import { LotForm, type LotFormValues } from "./LotForm.tsx";

interface Props {
  page: {
    id: string;
    number: number;
    flow: { id: string; name: string };
    outOfDate: boolean;
    mayKeep: boolean;
    before: AnswerSummary;
    expected: ExpectedShare | null;
    assessedFor: { bow: number | null; thickness: number };
    asksWarp: boolean;
  };
  answer:
    | {
        sent: number;
        typed: Partial<LotFormValues>;
        lastResult: SubmissionResult<string[]> | null;
        trial: { lot: LotInput; summary: AnswerSummary; movement: Movement; answers: LotRecord["answers"] } | null;
        refused: { step: number | null; reason: string } | null;
      }
    | undefined;
}

/** Trying a lot on an assessment: its answer first, then what any lot is expected to come to, and the lot's own figures. */
export function LotTryPage({ page, answer }: Props) {
  const { id, number, flow, outOfDate, mayKeep, before, expected, assessedFor, asksWarp } = page;
  const trial = answer?.trial ?? null;
  return (
    <>
      <PageHead
        title={trial ? `Lot ${trial.lot.name}` : "This lot"}
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: flow.name, path: `/flows/${flow.id}` },
          { name: `Assessment ${revisionLetters(number)}`, path: `/assessments/${id}` },
        ]}
        actions={trial && mayKeep ? <KeepLot typed={answer?.typed ?? {}} /> : null}
      />
      {outOfDate ? (
        <Notice kind="caution" title="The flow, or something that it uses, has changed since it was assessed">
          A lot is tried on what was assessed. Run the assessment again first if the lot will see the flow as it is now.
        </Notice>
      ) : null}
      {answer?.refused ? (
        <Notice kind="error" title="Nothing could be computed with these figures, so there is no answer">
          {answer.refused.step === null ? "" : `Step ${answer.refused.step}: `}
          {answer.refused.reason}
        </Notice>
      ) : null}
      <article className="frame max-tablet:-mx-4 max-tablet:border-x-0">
        {trial ? <LotAnswer trial={trial} before={before} /> : <AsAssessed before={before} number={number} />}
        {expected ? (
          <section className="border-t border-ink p-4 tablet:px-6" aria-labelledby="any-lot">
            <h2 id="any-lot" className="font-semibold">
              Expected of any lot
            </h2>
            <p className="mt-1 max-w-[60em]">{noBreak(expectedSentences(expected).join(" "))}</p>
            <p className="mt-1 max-w-[60em] text-label text-quiet">
              Bow and thickness that a wafer comes in with are taken to differ from wafer to wafer, everything else to
              be common to a lot.
            </p>
          </section>
        ) : null}
        <div className="screen-only border-t border-ink">
          <LotForm
            typed={answer?.typed ?? {}}
            sent={answer?.sent ?? 0}
            lastResult={answer?.lastResult}
            assessed={{
              bow: assessedFor.bow === null ? null : bowText(assessedFor.bow),
              thickness: micrometres(assessedFor.thickness),
            }}
            asksWarp={asksWarp}
            back={`/assessments/${id}`}
          />
        </div>
      </article>
    </>
  );
}

function AsAssessed({ before: { outcome, where, sentences }, number }: { before: AnswerSummary; number: number }) {
  return (
    <section className="p-4 tablet:p-6" aria-label="As assessed">
      <p className="text-quiet">Assessment {revisionLetters(number)}, for what its flow expects to come in</p>
      <p className="mt-2">
        <FindingTag outcome={outcome}>{where}</FindingTag>
      </p>
      <p className="mt-1 max-w-[46em] text-lead font-medium text-pretty">{noBreak(sentences.join(" "))}</p>
    </section>
  );
}

/** Stores what was tried, exactly as it was sent: what has been typed since has no answer yet. */
function KeepLot({ typed }: { typed: Partial<LotFormValues> }) {
  const keeping = useNavigation().formData?.get("intent") === "keep";
  return (
    <Form method="post" encType="multipart/form-data">
      <input type="hidden" name="intent" value="keep" />
      {Object.entries(typed).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      <button type="submit" className="btn" disabled={keeping}>
        {keeping ? "Keeping…" : "Keep as this lot’s assessment"}
      </button>
    </Form>
  );
}
