import type { CSSProperties } from "react";
import { Link } from "react-router";
import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { TitleBlock } from "#app/components/drawings/TitleBlock.tsx";
import { PrintButton } from "#app/components/sheet/PrintButton.tsx";
import type { CustomerChange, CustomerFlow } from "#app/lib/customer-change.ts";
import { PAPERS, type Paper } from "#app/lib/paper-size.ts";

interface Props {
  change: CustomerChange;
  /** address of the question */
  back: string;
  paper: Paper;
}

/** One page for a customer: what changes, and what becomes of their flows. No limit of the site and no other customer on it. */
export function ChangeRequestPaper({ change, back, paper }: Props) {
  const { width, height, page } = PAPERS[paper];
  const { question, flows, more, titleBlock, cautions } = change;
  return (
    <>
      <div className="screen-only flex items-center justify-between gap-4 px-4 py-3 tablet:px-6">
        <Link to={back} className="link">
          Back to the question
        </Link>
        <PrintButton />
      </div>
      <main id="main" className="bg-wash py-6 print:bg-transparent print:py-0">
        <div
          className={`paper relative mx-auto box-border flex flex-col p-3 text-[11pt]/[14pt] tablet:min-h-(--height) tablet:w-(--width) tablet:py-[10mm] tablet:pr-[10mm] tablet:pl-[20mm] print:min-h-(--height) print:w-(--width) print:py-[10mm] print:pr-[10mm] print:pl-[20mm] ${page}`}
          style={{ "--width": `${width}mm`, "--height": `${height}mm` } as CSSProperties}
        >
          <div className="flex flex-1 flex-col border-[0.5mm] border-ink">
            <div className="border-b-[0.35mm] border-ink px-[3mm] py-[2mm]">
              <p>Change request, before and after. Computed, not released: for discussion</p>
              <h1 className="mt-[1mm] text-[16pt]/[20.5pt] font-semibold text-balance">{noBreak(question)}</h1>
            </div>
            {flows.map((flow) => (
              <Flow key={flow.id} flow={flow} />
            ))}
            {flows.length === 0 ? <p className="px-[3mm] py-[2mm]">No flow of this program is touched.</p> : null}
            {more > 0 ? <p className="px-[3mm] py-[2mm]">{more} more of this program’s flows are touched.</p> : null}
            <p className="px-[3mm] py-[2mm] text-[9pt]/[11pt]">{cautions}</p>
            <div className="mt-auto border-t-[0.35mm] border-ink tablet:grid tablet:grid-cols-[minmax(0,1fr)_112mm]">
              <p className="px-[3mm] py-[2mm] text-[9pt]/[11pt]">
                <strong>Uncontrolled when printed.</strong> Share: of what the step’s tool takes.
              </p>
              <div className="border-ink max-tablet:border-t tablet:border-l-[0.35mm] [&_.title-block]:bg-transparent">
                <TitleBlock fields={titleBlock} variant="paper" />
              </div>
            </div>
          </div>
        </div>
      </main>
    </>
  );
}

function Flow({ flow }: { flow: CustomerFlow }) {
  const { name, inputs, reason, before, after, steps, moreSteps } = flow;
  return (
    <section className="keep-whole border-b-[0.25mm] border-ink px-[3mm] py-[2mm]" aria-labelledby={`flow-${flow.id}`}>
      <h2 id={`flow-${flow.id}`} className="font-semibold">
        {noBreak(name)}
      </h2>
      {reason === null ? (
        <table className="table mt-[1mm] text-[10pt]/[12pt]">
          <caption className="sr-only">{name}, before and after</caption>
          <thead>
            <tr>
              <th scope="col">What</th>
              <th scope="col">Before</th>
              <th scope="col">After</th>
            </tr>
          </thead>
          <tbody>
            {inputs.map(({ key, what, before: was, after: is }) => (
              <tr key={key}>
                <th scope="row" className="font-normal">
                  {noBreak(what)}
                </th>
                <td>{noBreak(was)}</td>
                <td>{noBreak(is)}</td>
              </tr>
            ))}
            <tr>
              <th scope="row" className="font-normal">
                Verdict
              </th>
              <td>{before && <FindingTag outcome={before.outcome}>{before.where}</FindingTag>}</td>
              <td>{after && <FindingTag outcome={after.outcome}>{after.where}</FindingTag>}</td>
            </tr>
            <tr>
              <th scope="row" className="font-normal">
                Tightest step
              </th>
              <td>{noBreak(before?.tightest ?? "no limit is known")}</td>
              <td>{noBreak(after?.tightest ?? "no limit is known")}</td>
            </tr>
            {steps.map(({ key, step, before: was, after: is }) => (
              <tr key={key}>
                <th scope="row" className="font-normal">
                  {noBreak(step)}
                </th>
                <td>{was ? <FindingTag outcome={was.outcome}>{was.support}</FindingTag> : "no such step"}</td>
                <td>{is ? <FindingTag outcome={is.outcome}>{is.support}</FindingTag> : "no such step"}</td>
              </tr>
            ))}
          </tbody>
        </table>
      ) : (
        <p>{noBreak(reason)}</p>
      )}
      {moreSteps > 0 ? <p className="text-[9pt]/[11pt]">And {moreSteps} more steps.</p> : null}
    </section>
  );
}
