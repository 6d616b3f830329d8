import type { SubmissionResult } from "@conform-to/react";
import { Link } from "react-router";
import { ChangedNotice } from "#app/components/changes/ChangedNotice.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { HungSection } from "#app/components/ui/HungSection.tsx";
import { Notice } from "#app/components/ui/Notice.tsx";
import { minuteOf } from "#app/lib/minute-of.ts";
import type { Paper } from "#app/lib/paper-size.ts";
import { readPath } from "#app/lib/sheet-path.ts";
import type { RevisionView } from "#app/schemas/sheet-view.ts";
import { PrintForm } from "./PrintForm.tsx";
import { REVISION_CLASSES, revisionState } from "./revision-state.ts";
import { WithdrawForm } from "./WithdrawForm.tsx";

interface Props {
  view: RevisionView;
  /** what the site prints on */
  paper: Paper;
  answer: SubmissionResult<string[]> | null | undefined;
}

/** A released revision: whether it is in force, its papers, who took them out, and its other revisions. */
export function RevisionPage({ view, paper, answer }: Props) {
  const { id, sheet, letter, state, title, program, releasedAt, releasedBy, remark, changes, papers, staff } = view;
  return (
    <>
      <PageHead
        title={`${sheet} ${letter}`}
        remark={`${title}, program ${program}`}
        crumbs={[{ name: "Sheets", path: "/sheets" }]}
        actions={
          staff && (
            <Link to={`/assessments/${staff.assessmentId}`} className="btn">
              Its assessment
            </Link>
          )
        }
      />
      {staff && (
        <ChangedNotice of={`sheet:${staff.sheetId}`} since={`${id} ${state}`} title="This sheet has just changed.">
          Another revision was asked for, released, returned or withdrawn.
        </ChangedNotice>
      )}
      <div>
        <Standing view={view} />
        <HungSection title="Read">
          <ul className="space-y-1">
            {papers.map(({ leg, name }) => (
              <li key={leg}>
                <a href={readPath(id, leg === 0 ? "" : `?leg=${leg}`)} className="link">
                  {papers.length === 1 ? "The sheet as it was released" : `The sheet for ${name}`}
                </a>
              </li>
            ))}
          </ul>
        </HungSection>
        <HungSection title="Print" remark="the stored PDF, the same each time">
          <PrintForm view={view} paper={paper} />
        </HungSection>
        <HungSection title="Release">
          <p>
            Released{releasedBy !== null && ` by ${releasedBy}`} at {minuteOf(releasedAt)}.{remark && ` “${remark}”`}
          </p>
          {changes.length > 0 && (
            <ul className="mt-2 list-disc pl-5">
              {changes.map((line) => (
                <li key={line}>{noBreak(line)}</li>
              ))}
            </ul>
          )}
          {staff && (
            <p className="mt-2">
              <Link to={`/assessments/${staff.assessmentId}/review`} className="link">
                See its review
              </Link>
            </p>
          )}
        </HungSection>
        {staff && staff.revisions.length > 0 && (
          <HungSection title="Other revisions">
            <ul>
              {staff.revisions.map((each) => (
                <li key={each.id} className="border-t border-line py-1.5 first:border-t-0 first:pt-0">
                  <Link to={`/sheets/revisions/${each.id}`} className="link">
                    {sheet} {each.letter}
                  </Link>{" "}
                  <span className={REVISION_CLASSES[each.state]}>{revisionState(each.state, null)}</span>
                  <span className="text-quiet">, released {each.at.slice(0, 10)}</span>
                </li>
              ))}
            </ul>
          </HungSection>
        )}
        {staff && (
          <HungSection title="Taken out" remark="who, when, for which place">
            <Prints prints={staff.prints} />
          </HungSection>
        )}
        {staff?.mayWithdraw && state === "released" && (
          <HungSection title="Withdraw">
            <WithdrawForm answer={answer} />
          </HungSection>
        )}
      </div>
    </>
  );
}

/** First of all whether it may be worked from. */
function Standing({ view: { state, supersededBy, endedAt, endedBy, endReason, deviations } }: { view: RevisionView }) {
  const ended = endedAt === null ? "" : minuteOf(endedAt);
  if (state === "superseded")
    return (
      <Notice kind="error" title={`Superseded at ${ended}. Do not work from its paper.`}>
        {supersededBy && (
          <Link to={`/sheets/revisions/${supersededBy.id}`} className="link">
            Revision {supersededBy.letter} took its place
          </Link>
        )}
      </Notice>
    );
  if (state === "withdrawn")
    return (
      <Notice kind="error" title={`Withdrawn at ${ended}. Do not work from its paper.`}>
        {endedBy} withdrew it: {endReason}
      </Notice>
    );
  const over = deviations.find((each) => each.over);
  if (over)
    return (
      <Notice kind="error" title={`Its deviation ended at ${minuteOf(over.until)}. Do not work from its paper.`}>
        It was only for {over.scope}. Ask for a new revision.
      </Notice>
    );
  return (
    <Notice kind="done" title="Current: this is the revision in force.">
      {deviations.map(({ scope, until }) => (
        <p key={`${scope} ${until}`}>
          With a deviation until {minuteOf(until)}, only for {scope}.
        </p>
      ))}
    </Notice>
  );
}

function Prints({ prints }: { prints: NonNullable<RevisionView["staff"]>["prints"] }) {
  if (prints.length === 0) return <p>Nobody has taken it out yet.</p>;
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label="Papers taken out">
      <table className="table">
        <caption className="sr-only">Papers taken out</caption>
        <thead>
          <tr>
            <th scope="col">By</th>
            <th scope="col">At</th>
            <th scope="col">For</th>
            <th scope="col">Paper</th>
          </tr>
        </thead>
        <tbody>
          {prints.map(({ by, at, place, paper, pages }) => (
            <tr key={`${by} ${at}`}>
              <th scope="row" className="font-normal">
                {by}
              </th>
              <td className="whitespace-nowrap">{minuteOf(at)}</td>
              <td className="wrap-anywhere">{place || <span className="text-quiet">not said</span>}</td>
              <td>
                {paper === "a4" ? "A4" : "Letter"}, {pages === "hands" ? "page for hands" : "all pages"}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}
