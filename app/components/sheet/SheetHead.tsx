import { FindingTag } from "#app/components/drawings/FindingTag.tsx";
import { noBreak } from "#app/components/drawings/no-break.ts";
import { SupportBar } from "#app/components/drawings/SupportBar.tsx";
import type { SheetView } from "#app/lib/sheet-view.ts";
import { WriteIn } from "./WriteIn.tsx";

/** What this paper is and for which wafers; on every page of it. */
export function SheetIdentity({ sheet }: { sheet: SheetView }) {
  return (
    <div className="flex flex-wrap justify-between gap-x-[4mm] gap-y-[1mm] px-[3mm] pt-[1.4mm]">
      <p>
        <strong>Draft, not released: not for the floor</strong>
        <br />
        Handling-risk sheet <strong className="whitespace-nowrap">{sheet.number}</strong>,{" "}
        {sheet.lot === null ? `revision ${sheet.revision}` : `for lot ${sheet.lot} alone`}, program {sheet.program}
        {sheet.legs === null ? null : (
          <>
            <br />
            <strong>For {sheet.legs.chosen.slots} alone:</strong> the other slots have sheets of their own
          </>
        )}
        {sheet.changedSince === null ? null : (
          <>
            <br />
            <strong>Inputs have changed since {sheet.changedSince}: assess again</strong>
          </>
        )}
      </p>
      <p className="flex flex-col gap-[0.5mm] tablet:items-end">
        {sheet.lot === null ? (
          <WriteIn label="Lot" width="38mm" />
        ) : (
          <span>
            Lot <strong>{sheet.lot}</strong>
          </span>
        )}
        <WriteIn label="Wafers" width="38mm" />
      </p>
    </div>
  );
}

/** The answer in one sentence, and the support over all steps. */
export function SheetAnswer({ sheet }: { sheet: SheetView }) {
  const { outcome, where, answer, blocked, support } = sheet;
  return (
    <>
      <div className="border-b-[0.25mm] border-ink px-[3mm] pb-[2.5mm]">
        {blocked ? (
          <p className="mt-[1.5mm] text-[14pt]/[17pt]">
            <FindingTag outcome={outcome}>{where}</FindingTag>
          </p>
        ) : null}
        <h1 className="mt-[1mm] text-[16pt]/[20.5pt] font-semibold text-balance">{noBreak(answer)}</h1>
      </div>
      <div className="border-b-[0.25mm] border-ink px-0">
        <SupportBar {...support} variant="paper" />
      </div>
    </>
  );
}
