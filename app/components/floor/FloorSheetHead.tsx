import type { FloorLot, FloorSheet } from "#app/schemas/floor-view.ts";
import { FloorHead } from "./FloorHead.tsx";

/** The head of a screen of one lot: its sheet, and since when that is known to be in force. */
export function FloorSheetHead({ lot, sheet }: { lot: FloorLot; sheet: FloorSheet | null }) {
  const { wafers, name, person, personId, checkedAt } = lot;
  const at = `${checkedAt.slice(11, 16)} UTC`;
  return (
    <FloorHead person={person} personId={personId}>
      {sheet && (
        <>
          <a href={`/sheets/revisions/${sheet.pin.revision}`} className="text-ink">
            Sheet{" "}
            <b>
              {sheet.pin.number} {sheet.pin.letter}
            </b>
          </a>
          {sheet.pin.state === "released" ? (
            <>
              <span className="fresh-only font-semibold text-clear">✓ Current at {at}</span>
              <span className="kept-only font-semibold text-stop">Kept, not checked since {at}</span>
            </>
          ) : (
            <span className="font-semibold text-stop">
              ✕ {sheet.pin.state}, seen {at}
            </span>
          )}
        </>
      )}
      <span>
        Lot <b className="wrap-anywhere">{name}</b>
        {wafers.total > 0 && `, ${wafers.inLine} of ${wafers.total} wafers in line`}
      </span>
    </FloorHead>
  );
}
