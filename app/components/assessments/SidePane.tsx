import { Link } from "react-router";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { SourceMark } from "#app/components/drawings/SourceMark.tsx";
import { TitleBlock } from "#app/components/drawings/TitleBlock.tsx";
import type { SelectedStep } from "#app/lib/assessment-selected.ts";
import { legQuery } from "#app/lib/leg-query.ts";
import type { AssessmentView } from "#app/lib/assessment-view.ts";
import { AssumedList } from "./AssumedList.tsx";
import { BondList } from "./BondList.tsx";
import { PaneSection } from "./PaneSection.tsx";
import { RemedyList } from "./RemedyList.tsx";
import { SmallestChanges } from "./SmallestChanges.tsx";
import { OwnFigure, OwnHead } from "#app/components/units/OwnFigure.tsx";

/** What follows from the answer: what clears it, which inputs matter, what was assumed, which bonds; and the title block. */
export function SidePane({ view }: { view: AssessmentView }) {
  const { remedies, selected, assumed, inputs, bonds, titleBlock } = view;
  const leg = view.legs?.chosen.number ?? null;
  return (
    <div className="flex flex-col max-wide:border-t max-wide:border-ink wide:border-l wide:border-ink">
      <div className="divide-y divide-line max-wide:tablet:grid max-wide:tablet:grid-cols-2 max-wide:tablet:divide-y-0">
        <PaneSection title="What clears it">
          {remedies.length > 0 ? (
            <SmallestChanges assessmentId={view.head.id} leg={leg} mayAssess={view.head.mayAssess} />
          ) : null}
          <RemedyList remedies={remedies} />
        </PaneSection>
        {selected ? <Budget step={selected} /> : null}
        {selected ? (
          <p className="screen-only border-t border-line p-4 tablet:px-6">
            <Link
              to={`/incidents/new?assessment=${view.head.id}&step=${selected.number}${legQuery("&", leg)}`}
              className="link"
            >
              Report an incident at step {selected.number}
            </Link>
          </p>
        ) : null}
        <PaneSection title="Inputs assumed" id="assumed">
          {assumed.length === 0 ? (
            <p className="text-quiet">None of {inputs}: each was measured, looked up or given by its supplier.</p>
          ) : (
            <>
              <p className="text-quiet">
                {assumed.length} of {inputs}. Nobody measured or looked these up.
              </p>
              <AssumedList assumed={assumed} />
            </>
          )}
        </PaneSection>
        {bonds.length > 0 ? (
          <PaneSection title={bonds.length === 1 ? "The bond" : "The bonds"}>
            <BondList bonds={bonds} />
            <p className="screen-only mt-2">
              <Link to={`/assessments/${view.head.id}/carriers${legQuery("?", leg)}`} className="link">
                Carriers and bonds that fit
              </Link>
            </p>
          </PaneSection>
        ) : null}
      </div>
      <div className="mt-auto border-t border-ink max-wide:tablet:ml-auto max-wide:tablet:w-105 max-wide:tablet:border-l">
        <TitleBlock fields={titleBlock} />
      </div>
    </div>
  );
}

function Budget({ step }: { step: SelectedStep }) {
  return (
    <PaneSection title={`Inputs that matter most at step ${step.number}`}>
      {step.budgetNote === null ? (
        <table className="mt-1 w-full text-left">
          <caption className="mb-1 text-left text-quiet">
            How far each moves the bow at 25&nbsp;°C by its standard uncertainty
          </caption>
          <thead className="text-label text-quiet">
            <tr className="border-b border-ink">
              <th scope="col" className="py-1 font-normal">
                Input
              </th>
              <th scope="col" className="py-1 font-normal">
                Source
              </th>
              <th scope="col" className="num py-1 font-normal">
                <OwnHead unit="µm" />
              </th>
            </tr>
          </thead>
          <tbody>
            {step.budget.map(({ input, source, text }) => (
              <tr key={input} className="border-t border-line first:border-t-0">
                <th scope="row" className="py-1.5 pr-3 font-normal">
                  {noBreak(input)}
                </th>
                <td className="py-1.5 pr-3">
                  <SourceMark kind={source} />
                </td>
                <td className="num py-1.5">
                  <OwnFigure unit="µm">{text}</OwnFigure>
                </td>
              </tr>
            ))}
          </tbody>
        </table>
      ) : (
        <p className="text-quiet">{step.budgetNote}</p>
      )}
    </PaneSection>
  );
}
