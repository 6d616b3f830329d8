import { Link } from "react-router";
import type { Column } from "#app/components/ui/DataTable.tsx";
import type { InstrumentRow } from "#app/schemas/instrument.ts";
import { repeatabilityText } from "./repeatability-text.ts";

/** Columns of the list of instruments. */
export const INSTRUMENT_COLUMNS: Column<InstrumentRow>[] = [
  {
    key: "name",
    head: "Instrument",
    sortable: true,
    cell: ({ id, name }) => (
      <Link to={`/instruments/${id}`} className="link wrap-anywhere">
        {name}
      </Link>
    ),
  },
  {
    key: "repeatability",
    head: "A curvature repeats within",
    unit: "k = 2",
    numeric: true,
    cell: ({ study }) =>
      study ? repeatabilityText(study.forTwo) : <span className="font-semibold text-caution">not known</span>,
  },
  {
    key: "repeats",
    head: "Repeats",
    numeric: true,
    wide: true,
    cell: ({ study }) => study?.repeats ?? "–",
  },
  {
    key: "studied",
    head: "Studied",
    wide: true,
    cell: ({ study }) => study?.createdAt.slice(0, 10) ?? "–",
  },
  {
    key: "checked",
    head: "Reference wafer read",
    cell: ({ checkedOn }) => checkedOn ?? <span className="text-quiet">never</span>,
  },
];
