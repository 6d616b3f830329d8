import { revisionState } from "#app/components/sheet/released/revision-state.ts";
import type { TodaySheet, TodaySheets as Sheets } from "#app/schemas/today.ts";
import { TodaySheetSection } from "./TodaySheetSection.tsx";

const reviewOf = ({ assessmentId }: TodaySheet) => `/assessments/${assessmentId}/review`;
const pageOf = (sheet: TodaySheet) => (sheet.released ? `/sheets/revisions/${sheet.revisionId}` : reviewOf(sheet));
const since = ({ at }: TodaySheet) => `since ${at.slice(0, 10)}`;

/** What waits for the reader: to release, to sign, and what came back. */
export function SheetsThatWait({ sheets, now }: { sheets: Sheets; now: string }) {
  return (
    <>
      <TodaySheetSection
        title="For you to review"
        remark="oldest first"
        group={sheets.toRelease}
        more="/sheets?state=in+review"
        state={since}
        action={(sheet) => ({ words: "Review", to: reviewOf(sheet) })}
      />
      <TodaySheetSection
        title="For you to sign"
        remark="deviations that need a second signature"
        group={sheets.toSign}
        more="/sheets?state=in+review"
        state={({ at }) => `ends ${at.slice(0, 10)}`}
        action={(sheet) => ({ words: "Read and sign", to: reviewOf(sheet) })}
      />
      <TodaySheetSection
        title="Returned to you"
        remark="with what is to be changed"
        group={sheets.returned}
        more="/sheets?state=returned"
        state={since}
        action={(sheet) => ({ words: "See why", to: reviewOf(sheet) })}
      />
      <TodaySheetSection
        title="Deviations ending"
        remark="of sheets in force"
        group={sheets.lapsing}
        more="/sheets?state=released"
        state={({ at }) => `${at < now ? "over since" : "until"} ${at.slice(0, 10)}`}
        action={(sheet) => ({ words: "See the sheet", to: pageOf(sheet) })}
      />
    </>
  );
}

/** What the reader waits for, and what has changed for everybody. */
export function SheetsOfLate({ sheets }: { sheets: Sheets }) {
  return (
    <>
      <TodaySheetSection
        title="Asked by you"
        remark="waits for a process owner"
        group={sheets.asked}
        more="/sheets?state=in+review"
        state={since}
        action={(sheet) => ({ words: "See the review", to: reviewOf(sheet) })}
      />
      <ReleasedLately sheets={sheets} />
    </>
  );
}

/** Sheets that have come into force, or were withdrawn, lately. */
export function ReleasedLately({ sheets }: { sheets: Sheets }) {
  return (
    <TodaySheetSection
      title="Sheets of late"
      remark="the last 14 days, newest first"
      group={sheets.lately}
      more="/sheets"
      state={({ state, at }) => (
        <>
          {revisionState(state, null)}
          <span className="block text-label">{at.slice(0, 10)}</span>
        </>
      )}
      action={(sheet) => ({ words: "See the sheet", to: pageOf(sheet) })}
    />
  );
}
