import { Link } from "react-router";
import type { Column } from "#app/components/ui/DataTable.tsx";
import { formatBare } from "#app/lib/format-measured.ts";
import { COVERAGE } from "#app/lib/scan-answer.ts";
import { formatMeasured } from "#app/lib/format-measured.ts";
import { UNNAMED } from "#app/lib/stress-values.ts";
import type { StressOrigin, StressValueRow } from "#app/schemas/film-stress.ts";
import { ValueActions } from "./ValueActions.tsx";

const day = (iso: string) => iso.slice(0, 10);

function Origin({ origin }: { origin: StressOrigin }) {
  switch (origin.kind) {
    case "scan":
      return (
        <>
          <Link to={`/scans/${origin.id}`} className="link wrap-anywhere">
            {origin.label}
          </Link>
          <span className="block text-label text-quiet">{origin.program}</span>
        </>
      );
    case "another program":
      return <span className="text-quiet">a scan of another program</span>;
    case "typed":
      return (
        <>
          typed
          <span className="block text-label text-quiet">{origin.source}</span>
        </>
      );
  }
}

function State({ row: { state, setAside, putBack, reason } }: { row: StressValueRow }) {
  return (
    <>
      <span className={state === "set aside" ? "font-semibold text-caution" : undefined}>
        {state === "set aside" ? "set aside" : "counts"}
      </span>
      {setAside && state === "set aside" && (
        <span className="block text-label text-quiet">
          {setAside.reason} ({day(setAside.at)}, {setAside.by})
        </span>
      )}
      {putBack && state === "accepted" && (
        <span className="block text-label text-quiet">
          put back {day(putBack.at)}, {putBack.by}; was set aside: {setAside?.reason}
        </span>
      )}
      {reason !== null && state === "accepted" && <span className="block text-label text-quiet">{reason}</span>}
    </>
  );
}

/** Columns of a film's history; `version` of the film where the reader may change it, else null. */
export function stressColumns(version: number | null): Column<StressValueRow>[] {
  const columns: Column<StressValueRow>[] = [
    { key: "number", head: "No.", unit: "in its chart", numeric: true, wide: true, cell: ({ number }) => number },
    {
      key: "measured",
      head: "Measured",
      sortable: true,
      cell: ({ measuredAt }) => <time dateTime={measuredAt}>{day(measuredAt)}</time>,
    },
    {
      key: "value",
      head: "Stress",
      unit: "MPa, k = 2",
      numeric: true,
      sortable: true,
      cell: ({ value, standardUncertainty }) =>
        formatMeasured({ value, tolerance: COVERAGE * standardUncertainty, source: "measured here" }, "stress", {
          unit: "MPa",
          sign: true,
          bare: true,
        }),
    },
    {
      key: "thickness",
      head: "Film",
      unit: "µm",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ filmThickness }) => (filmThickness === null ? "not given" : formatBare(filmThickness, "length", "µm")),
    },
    {
      key: "instrument",
      head: "Instrument",
      sortable: true,
      wide: true,
      cell: ({ instrument }) => instrument || <span className="text-quiet">{UNNAMED}</span>,
    },
    { key: "from", head: "From", cell: ({ origin }) => <Origin origin={origin} /> },
    { key: "state", head: "State", sortable: true, cell: (row) => <State row={row} /> },
    {
      key: "accepted",
      head: "Accepted",
      sortable: true,
      wide: true,
      cell: ({ acceptedAt, acceptedBy }) => `${day(acceptedAt)}, ${acceptedBy}`,
    },
  ];
  if (version === null) return columns;
  return [...columns, { key: "do", head: "Change", cell: (row) => <ValueActions row={row} version={version} /> }];
}
