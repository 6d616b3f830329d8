import { Link } from "react-router";
import { KeptSections } from "#app/components/kept/KeptSections.tsx";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { headlineForGuest } from "#app/lib/today-groups.ts";
import type { TodayView } from "#app/schemas/today.ts";
import { TodayHead } from "./TodayHead.tsx";
import { TodayPrograms } from "./TodayPrograms.tsx";
import { ReleasedLately } from "./TodaySheets.tsx";

/** Today for a guest: their programs, and the sheets that were released to them. */
export function TodayForGuest({ view }: { view: TodayView }) {
  const { programs, sheets, now } = view;
  if (programs.length === 0)
    return (
      <>
        <TodayHead sentence="You do not belong to a program yet." now={now} />
        <EmptyState title="No program">Ask your administrator to add you to the program that you work for.</EmptyState>
      </>
    );
  return (
    <>
      <TodayHead sentence={headlineForGuest(sheets.inForce)} now={now} />
      <div className="grid gap-x-12 gap-y-6 wide:grid-cols-[minmax(0,1fr)_384px]">
        <div className="min-w-0">
          <ReleasedLately sheets={sheets} />
          <EmptyState
            title="Handling-risk sheets"
            actions={
              <Link to="/sheets" className="btn btn-primary">
                Go to the sheets
              </Link>
            }
          >
            A sheet says at which steps a wafer of your program needs support, and what must not happen to it. It stands
            under Sheets as soon as the process owner has released it, and only as long as it is in force.
          </EmptyState>
        </div>
        <div className="space-y-6">
          <KeptSections groups={view.kept} />
          <TodayPrograms programs={programs} works={false} />
        </div>
      </div>
    </>
  );
}
