import { Link } from "react-router";
import { ChangedNotice } from "#app/components/changes/ChangedNotice.tsx";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { minuteOf } from "#app/lib/minute-of.ts";
import { stepPath } from "#app/lib/step-path.ts";
import type { ReviewView } from "#app/schemas/review-view.ts";
import { AskReview } from "./AskReview.tsx";
import { BlockingFindings } from "./BlockingFindings.tsx";
import { Decision } from "./Decision.tsx";
import { ReviewComments } from "./ReviewComments.tsx";
import type { ReviewAnswer } from "./ReviewForm.tsx";
import { HungSection } from "#app/components/ui/HungSection.tsx";
import { SinceReleaseView } from "./SinceReleaseView.tsx";

interface Props {
  view: ReviewView;
  answer: ReviewAnswer;
}

/** The review of an assessment: what a reviewer goes through, in that order, and the decision at its foot. */
export function ReviewPage({ view, answer }: Props) {
  const { assessment, revision, sheet, blocking, assumed, inputs } = view;
  const inReview = revision?.state === "in review";
  return (
    <>
      <PageHead
        title={`Review of ${assessment.name}`}
        remark={[sheet, assessment.program, revision ? stateWord(revision) : "no review asked for"]
          .filter(Boolean)
          .join(", ")}
        crumbs={[{ name: `${assessment.number} ${assessment.letter}`, path: `/assessments/${assessment.id}` }]}
        actions={
          <Link to={`/sheets/${assessment.id}`} className="btn">
            See the draft
          </Link>
        }
      />
      {view.sheetId && (
        <ChangedNotice
          of={`sheet:${view.sheetId}`}
          since={`${revision?.id ?? ""} ${revision?.state ?? ""}`}
          title="Somebody has moved this review on since you opened it."
        >
          What you have typed is not lost until you leave the page.
        </ChangedNotice>
      )}
      <div>
        <ReviewState view={view} />
        {!inReview && <AskReview view={view} answer={answer} />}
        <HungSection title="What blocks it" remark={countOf(blocking.length, "finding")}>
          <BlockingFindings view={view} answer={answer} />
        </HungSection>
        <HungSection title="What changed" remark={view.since ? `since ${view.since.letter}` : "first of its sheet"}>
          <SinceReleaseView since={view.since} />
        </HungSection>
        <HungSection title="Assumed" remark={`${assumed.length} of ${inputs} inputs`}>
          {assumed.length === 0 ? (
            <p>Every input that the answer rests on was measured or is of the site’s own records.</p>
          ) : (
            <>
              <p className="mb-2">
                {countOf(assumed.length, "input")} assumed, not measured. Each is a reason to measure before the lot
                runs.
              </p>
              <AllAssumed view={view} />
            </>
          )}
        </HungSection>
        {revision && (
          <HungSection title="Comments" remark={countOf(revision.comments.length, "comment")}>
            <ReviewComments view={view} revision={revision} answer={answer} />
          </HungSection>
        )}
        {revision && inReview && <Decision view={view} revision={revision} answer={answer} />}
      </div>
    </>
  );
}

const countOf = (count: number, word: string) => `${count} ${word}${count === 1 ? "" : "s"}`;

type Revision = NonNullable<ReviewView["revision"]>;

const stateWord = ({ state, letter }: Revision) => (letter === null ? state : `${state} as ${letter}`);

/** All of them: a reviewer goes through each, so none is folded away. */
function AllAssumed({ view: { assessment, assumed } }: { view: ReviewView }) {
  return (
    <ul>
      {assumed.map(({ step, what }) => (
        <li key={what} className="flex gap-3 border-t border-line py-1.5 first:border-t-0">
          <span className="flex-1">{noBreak(what)}</span>
          <Link to={`/assessments/${assessment.id}${stepPath(step)}`} className="link whitespace-nowrap">
            step {step}
          </Link>
        </li>
      ))}
    </ul>
  );
}

/** Who asked, what became of it, and why. */
function ReviewState({ view: { revision } }: { view: ReviewView }) {
  if (!revision) return null;
  const { askedBy, askedAt, note, decidedBy, decidedAt, reason, state, letter } = revision;
  return (
    <section aria-label="How it stands" className="border-t border-ink pt-3 pb-6">
      <p>
        {askedBy} asked for a review at {minuteOf(askedAt)}.{note && ` “${note}”`}
      </p>
      {decidedAt !== null && (
        <p className="mt-1">
          {decidedBy} {state === "returned" ? "returned it" : `released it as ${letter}`} at {minuteOf(decidedAt)}.
          {reason && ` “${reason}”`}
        </p>
      )}
      {letter !== null && (
        <p className="mt-2">
          <Link to={`/sheets/revisions/${revision.id}`} className="link">
            Open the sheet
          </Link>
        </p>
      )}
    </section>
  );
}
