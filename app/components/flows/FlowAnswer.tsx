import { Link } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { revisionLetters } from "#app/lib/assessment-revision.ts";
import type { FlowAssessmentRow } from "#app/schemas/flow-view.ts";

/** What the newest assessment says of the flow, with the older ones beside it. The answer comes before the plan. */
export function FlowAnswer({ assessments, mayAssess }: { assessments: FlowAssessmentRow[]; mayAssess: boolean }) {
  const [newest, ...older] = assessments;
  return (
    <div className={older.length > 0 ? "grid wide:grid-cols-[minmax(0,1fr)_384px]" : undefined}>
      <section className="p-4 tablet:p-6" aria-label="Newest assessment">
        {newest ? (
          <>
            <FindingTag outcome={newest.outcome}>
              assessment {revisionLetters(newest.number)}, {newest.createdAt.slice(0, 10)}
            </FindingTag>
            <h2 className="mt-2 max-w-[46em] text-figure font-medium text-pretty">
              {newest.sentences.map((sentence) => (
                <span key={sentence} className="block">
                  {noBreak(sentence)}{" "}
                </span>
              ))}
            </h2>
            {newest.outOfDate && (
              <p className="mt-2 font-semibold text-caution">
                Out of date: the flow, or something that it uses, has been changed since.
                {mayAssess && " Assess it again."}
              </p>
            )}
            <p className="mt-3">
              <Link to={`/assessments/${newest.id}`} className="link">
                Open assessment {revisionLetters(newest.number)}
              </Link>
            </p>
          </>
        ) : (
          <>
            <h2 className="text-figure font-medium">Not assessed yet</h2>
            <p className="mt-2 text-quiet">
              {mayAssess
                ? "Assess the flow to see which steps need support, how far the wafer bows at each, and what stops it."
                : "An engineer or process owner of the program can assess it."}
            </p>
          </>
        )}
      </section>
      {older.length > 0 && <OlderAssessments older={older} />}
    </div>
  );
}

function OlderAssessments({ older }: { older: FlowAssessmentRow[] }) {
  return (
    <section className="border-line p-4 max-wide:border-t tablet:p-6 wide:border-l" aria-labelledby="assessments-head">
      <h2 id="assessments-head" className="font-semibold">
        Earlier assessments
      </h2>
      <ul className="mt-1 max-h-44 overflow-y-auto" tabIndex={0} aria-labelledby="assessments-head">
        {older.map(({ id, number, outcome, sentences, createdAt, createdBy }) => (
          <li key={id} className="border-t border-line py-2 first:border-0">
            <div className="flex flex-wrap items-center justify-between gap-x-3">
              <Link to={`/assessments/${id}`} className="link">
                Assessment {revisionLetters(number)}
              </Link>
              <FindingTag outcome={outcome} />
            </div>
            <p className="line-clamp-2 text-label text-quiet">{noBreak(sentences.join(" "))}</p>
            <p className="text-label text-quiet">
              {createdAt.slice(0, 10)}, {createdBy}
            </p>
          </li>
        ))}
      </ul>
    </section>
  );
}
