import { Link } from "react-router";
import { EmptyState } from "#app/components/ui/EmptyState.tsx";
import { ListHead } from "#app/components/ui/ListHead.tsx";
import type { LotDetail } from "#app/schemas/lot-view.ts";
import { LotMaps } from "./LotMaps.tsx";
import { LotNote } from "./LotNote.tsx";
import { LotTables } from "./LotTables.tsx";
import { WaferStatus } from "./WaferStatus.tsx";
import type { LotAnswer } from "./lot-answer.ts";
import { LotWafers } from "./LotWafers.tsx";

/** A lot: its wafers by slot with the newest figures, the maps of those that have one, and the tables that all of it came from. */
export function LotView({ lot, query, answer }: { lot: LotDetail; query: string; answer: LotAnswer }) {
  const { wafers, maps, tables, program } = lot;
  const wanted = query.toLowerCase();
  const shown = wafers.filter(
    ({ name, slot }) => wanted === "" || name.toLowerCase().includes(wanted) || String(slot) === wanted,
  );
  const waiting = wafers.reduce((sum, wafer) => sum + wafer.waiting, 0);
  return (
    <>
      <LotNote lot={lot} />
      <ListHead what="wafers and slots" />
      {shown.length > 0 ? (
        <>
          <LotWafers wafers={shown} />
          {lot.mayUpload && <WaferStatus wafers={shown} answer={answer} />}
        </>
      ) : (
        <EmptyState title={query === "" ? "No wafer of this lot is known" : "No wafer fits"}>
          {query === ""
            ? "Import a summary, a map or a scan that names this lot."
            : "Change the search: it looks for names of wafers and for slots."}
        </EmptyState>
      )}
      {waiting > 0 && (
        <p className="mt-3">
          <Link to={`/scans/waiting?q=${encodeURIComponent(lot.name)}`} className="link">
            {waiting === 1 ? "1 file of this lot waits" : `${waiting} files of this lot wait`} for a partner
          </Link>
        </p>
      )}
      {maps.length > 0 && <LotMaps maps={maps} diameter={program.diameter} />}
      {tables.length > 0 && <LotTables tables={tables} mayUndo={lot.mayUpload} />}
    </>
  );
}
