import { Link } from "react-router";
import type { Column } from "#app/components/ui/DataTable.tsx";
import type { LotRow } from "#app/schemas/lot-view.ts";

/** Columns of the list of lots, by the names of their sorts. */
export const LOT_COLUMNS: Column<LotRow>[] = [
  {
    key: "name",
    head: "Lot",
    sortable: true,
    cell: ({ id, name, program }) => (
      <>
        <Link to={`/lots/${id}`} className="link wrap-anywhere">
          {name}
        </Link>
        <span className="block text-label text-quiet tablet:hidden">{program}</span>
      </>
    ),
  },
  { key: "wafers", head: "Wafers", numeric: true, cell: ({ wafers }) => wafers },
  {
    key: "last",
    head: "Last measured figures",
    cell: ({ lastAt }) =>
      lastAt === null ? <span className="text-quiet">none</span> : <time dateTime={lastAt}>{lastAt.slice(0, 10)}</time>,
  },
  { key: "program", head: "Program", sortable: true, wide: true, cell: ({ program }) => program },
  {
    key: "created",
    head: "First seen",
    sortable: true,
    wide: true,
    cell: ({ createdAt }) => <time dateTime={createdAt}>{createdAt.slice(0, 10)}</time>,
  },
  { key: "person", head: "By", sortable: true, wide: true, cell: ({ createdBy }) => createdBy },
];
