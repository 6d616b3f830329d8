import { Link } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { PageHead } from "#app/components/layout/PageHead.tsx";
import { WorkingView } from "#app/components/working/WorkingView.tsx";
import { trialHome } from "#app/lib/leg-query.ts";
import { triedPath } from "#app/lib/tried-path.ts";
import type { TriedPageData, TriedRow, TriedSide, TriedWorkings } from "#app/lib/tried-view.ts";
import { TrialBarred } from "./TrialBarred.tsx";
import { TrialLeg } from "./TrialLeg.tsx";
import { TryOnCopy } from "./TryOnCopy.tsx";

/** The figures behind a change that was tried, before and after, and the calculation of one of them on both sides. */
export function TriedPage({ page }: { page: TriedPageData }) {
  const { head, engineVersion, posted, changes, verdict, view } = page;
  return (
    <>
      <PageHead
        title="Working of a change"
        crumbs={[
          { name: "Flows", path: "/flows" },
          { name: head.flow.name, path: `/flows/${head.flow.id}` },
          { name: `Assessment ${head.revision}`, path: trialHome(head) },
        ]}
        actions={head.barred === null ? <TryOnCopy head={head} posted={posted} name={changes.join("; ")} /> : undefined}
      />
      <TrialBarred head={head} />
      <TrialLeg head={head} />
      <article className="frame max-tablet:-mx-4 max-tablet:border-x-0">
        <div className="border-b border-ink p-4 tablet:p-6">
          {changes.map((change) => (
            <p key={change} className="text-lead font-medium">
              {noBreak(change.charAt(0).toUpperCase() + change.slice(1))}
            </p>
          ))}
          <p className="mt-1 flex flex-wrap items-baseline gap-x-2">
            <span className="text-quiet">The flow before</span> <FindingTag outcome={verdict.before} />
            <span className="text-quiet">and with it</span> <FindingTag outcome={verdict.after} />
          </p>
          <p className="mt-1 text-label text-quiet">
            Both computed by engine {engineVersion} with all rules, on the inputs of the assessment. ± is the expanded
            uncertainty, k = 2.
          </p>
        </div>
        {view.rows.length > 0 ? (
          <Rows page={page} />
        ) : (
          <p className="p-4 text-quiet tablet:p-6">No rule judges any step otherwise with this change.</p>
        )}
        {view.shown ? <Workings shown={view.shown} /> : null}
      </article>
    </>
  );
}

function Rows({ page: { head, posted, view } }: { page: TriedPageData }) {
  const caption = "What is judged otherwise, before and after";
  return (
    <div className="overflow-x-auto" tabIndex={0} role="region" aria-label={caption}>
      <table className="table">
        <caption className="sr-only">{caption}</caption>
        <thead>
          <tr>
            <th scope="col">Step and rule</th>
            <th scope="col">Before</th>
            <th scope="col">With the change</th>
          </tr>
        </thead>
        <tbody>
          {view.rows.map((row) => (
            <tr key={`${row.step} ${row.rule}`} className="align-top">
              <th scope="row" className="font-normal">
                Step&nbsp;{row.step}, rule&nbsp;{row.rule}
                <span className="block text-label text-quiet">{row.title}</span>
                <Shown row={row} to={triedPath(head, posted, row)} shown={view.shown} />
              </th>
              <td>
                <Side side={row.before} />
              </td>
              <td>
                <Side side={row.after} />
              </td>
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function Shown({ row, to, shown }: { row: TriedRow; to: string; shown: TriedWorkings | null }) {
  if (shown?.step === row.step && shown.rule === row.rule)
    return <span className="block text-label text-quiet">Working below</span>;
  return (
    <Link to={to} className="link" preventScrollReset>
      Working
      <span className="sr-only">
        {" "}
        of step {row.step}, rule {row.rule}
      </span>
    </Link>
  );
}

function Side({ side }: { side: TriedSide | null }) {
  if (!side) return <span className="text-quiet">Nothing to judge</span>;
  return (
    <>
      <FindingTag outcome={side.outcome} />
      {side.figure ? <span className="block">{noBreak(side.figure)}</span> : null}
      {side.limit ? <span className="block text-quiet">{noBreak(side.limit)}</span> : null}
    </>
  );
}

function Workings({ shown }: { shown: TriedWorkings }) {
  const { step, rule, title, before, after } = shown;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] border-t border-ink wide:grid-cols-2 wide:divide-x wide:divide-line">
      {[
        { head: "Before", side: before },
        { head: "With the change", side: after },
      ].map(({ head, side }) => (
        <section key={head} className="p-4 max-wide:not-first:border-t max-wide:not-first:border-line tablet:px-6">
          <h2 className="text-lead font-medium">{head}</h2>
          <p className="text-label text-quiet">
            Step&nbsp;{step}, rule&nbsp;{rule}, {title.toLowerCase()}
          </p>
          <p className="mt-1 mb-3">{side ? noBreak(side.reason) : "The rule has nothing to judge here."}</p>
          {side?.working ? (
            <WorkingView working={side.working} />
          ) : side ? (
            <p className="text-quiet">It rests on what is stated, with no calculation behind it.</p>
          ) : null}
        </section>
      ))}
    </div>
  );
}
