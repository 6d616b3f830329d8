import { Link } from "react-router";
import type { Column } from "#app/components/ui/DataTable.tsx";
import { ageWords } from "#app/lib/age-words.ts";
import type { WaitingRow } from "#app/schemas/waiting.ts";

/** Columns of the queue, by the names of their sorts. */
export const waitingColumns = (now: Date): Column<WaitingRow>[] => [
  {
    key: "wafer",
    head: "Wafer and line",
    sortable: true,
    cell: ({ id, label, file, side }) => (
      <>
        <Link to={`/scans/waiting/${id}`} className="link wrap-anywhere">
          {label}
        </Link>
        <span className="block text-label wrap-anywhere text-quiet tablet:hidden">
          {side} the film, {file.name}
        </span>
      </>
    ),
  },
  {
    key: "side",
    head: "Side of the film",
    sortable: true,
    wide: true,
    cell: ({ side }) => `${side}, waits for ${side === "before" ? "after" : "before"}`,
  },
  {
    key: "file",
    head: "File",
    sortable: true,
    wide: true,
    cell: ({ file }) => <span className="wrap-anywhere">{file.name}</span>,
  },
  {
    key: "since",
    head: "Waits since",
    sortable: true,
    cell: ({ createdAt }) => (
      <>
        <time dateTime={createdAt}>{createdAt.slice(0, 10)}</time>
        <span className="block text-label text-quiet">{ageWords(createdAt, now)}</span>
      </>
    ),
  },
  { key: "program", head: "Program", sortable: true, wide: true, cell: ({ program }) => program.name },
  {
    key: "instrument",
    head: "Instrument",
    wide: true,
    cell: ({ instrumentName }) => instrumentName || <span className="text-quiet">not named</span>,
  },
  { key: "person", head: "By", sortable: true, wide: true, cell: ({ createdBy }) => createdBy },
];
