import { chooseExaggeration } from "#app/components/drawings/choose-exaggeration.ts";
import { KeptSections } from "#app/components/kept/KeptSections.tsx";
import { headline } from "#app/lib/today-groups.ts";
import { lyingAs } from "#app/lib/lying-as.ts";
import type { ScanRow } from "#app/schemas/scan-view.ts";
import type { TodayAssessed, TodayFlow, TodayView } from "#app/schemas/today.ts";
import { LoadDemo } from "#app/components/demo/LoadDemo.tsx";
import { FirstSteps } from "./FirstSteps.tsx";
import { TodayAssessedRow } from "./TodayAssessedRow.tsx";
import { DemoTold, TodayDemo } from "./TodayDemo.tsx";
import { TodayIncidents } from "./TodayIncidents.tsx";
import { LotsThatWait } from "./TodayLots.tsx";
import { TodayHead } from "./TodayHead.tsx";
import { TodayPrograms } from "./TodayPrograms.tsx";
import { TodayRow } from "./TodayRow.tsx";
import { TodayScans } from "./TodayScans.tsx";
import { TodaySection } from "./TodaySection.tsx";
import { SheetsOfLate, SheetsThatWait } from "./TodaySheets.tsx";

interface Props {
  view: TodayView;
  /** what the address says has happened to the demo */
  told: string | null;
}

/** Today for somebody who sees the work of a program: what waits, newest scans, programs. */
export function TodayPage({ view, told }: Props) {
  const { decisions, outOfDate, notAssessed, programs, mayAssess, demo } = view;
  const flows = programs.reduce((sum, program) => sum + program.flows, 0);
  const stacks = programs.reduce((sum, program) => sum + program.stacks, 0);
  const exaggeration = exaggerationOf([...decisions.rows, ...outOfDate.rows], view.scans);
  const scans = <TodayScans scans={view.scans} mayUpload={view.mayUpload} exaggeration={exaggeration} />;
  return (
    <>
      <TodayHead sentence={flows === 0 ? "Nothing has been assessed yet." : headline(view)} now={view.now} />
      {demo && <DemoTold told={told} here={demo.here} />}
      <div className="grid gap-x-12 gap-y-6 wide:grid-cols-[minmax(0,1fr)_384px]">
        <div className="min-w-0">
          <LotsThatWait lots={view.lots} />
          {!mayAssess && scans}
          {flows === 0 && (
            <div className="mb-6 space-y-6">
              <FirstSteps stacks={stacks} scans={view.scans.length} mayAssess={mayAssess} mayUpload={view.mayUpload} />
              {demo?.here === false && <LoadDemo />}
            </div>
          )}
          <TodayIncidents incidents={view.incidents} />
          <SheetsThatWait sheets={view.sheets} now={view.now} />
          {decisions.total > 0 && (
            <TodaySection title="Needs a decision" remark="oldest first" more={moreOf(decisions)}>
              <ul>
                {decisions.rows.map((row) => (
                  <TodayAssessedRow
                    key={row.id}
                    row={row}
                    exaggeration={exaggeration}
                    action={{ words: "See why", to: `/assessments/${row.newest.id}` }}
                  />
                ))}
              </ul>
            </TodaySection>
          )}
          {outOfDate.total > 0 && (
            <TodaySection title="Out of date" remark="inputs changed after it was assessed" more={moreOf(outOfDate)}>
              <ul>
                {outOfDate.rows.map((row) => (
                  <TodayAssessedRow
                    key={row.id}
                    row={row}
                    exaggeration={exaggeration}
                    stale
                    action={{ words: row.mayAssess ? "Run again" : "See the flow", to: `/flows/${row.id}` }}
                  />
                ))}
              </ul>
            </TodaySection>
          )}
          {notAssessed.total > 0 && (
            <TodaySection title="Not assessed yet" remark="oldest first" more={moreOf(notAssessed)}>
              <ul>
                {notAssessed.rows.map((flow) => (
                  <NotAssessed key={flow.id} flow={flow} />
                ))}
              </ul>
            </TodaySection>
          )}
          <SheetsOfLate sheets={view.sheets} />
          {mayAssess && scans}
          {decisions.total + outOfDate.total + view.scans.length > 0 && (
            <p className="text-label text-quiet">Bow lines on this page ×{exaggeration}; rolled wafers ×1.</p>
          )}
        </div>
        <div className="space-y-6">
          <KeptSections groups={view.kept} />
          <TodayPrograms programs={programs} works />
          {demo && demo.programs.length > 0 && <TodayDemo programs={demo.programs} />}
        </div>
      </div>
    </>
  );
}

function NotAssessed({ flow }: { flow: TodayFlow }) {
  const { id, name, program, updatedAt, mayAssess } = flow;
  return (
    <TodayRow
      title={name}
      state={<span className="text-quiet">not run</span>}
      action={{ words: mayAssess ? "Assess it" : "See the flow", to: `/flows/${id}` }}
    >
      <span className="text-quiet">{`${program}, last changed ${updatedAt.slice(0, 10)}`}</span>
    </TodayRow>
  );
}

const moreOf = ({ rows, total }: { rows: unknown[]; total: number }) => ({ count: total - rows.length, to: "/flows" });

/** One exaggeration for the page, by the wafer that bends most for its size; rolled ones are drawn as they are. */
function exaggerationOf(rows: TodayAssessed[], scans: ScanRow[]): number {
  const lying = rows.flatMap(({ wafer, diameter }) => {
    const shape = wafer ? lyingAs(wafer.shape) : null;
    return shape?.kind === "bowed" && diameter > 0 ? [shape.bow / diameter] : [];
  });
  const scanned = scans.map(({ curled, bowChange, diameter }) => (curled ? 0 : bowChange / diameter));
  return chooseExaggeration([...lying, ...scanned], 1);
}
