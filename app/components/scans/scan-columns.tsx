import { Link } from "react-router";
import type { Column } from "#app/components/ui/DataTable.tsx";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { formatMeasured } from "#app/lib/format-measured.ts";
import { COVERAGE } from "#app/lib/scan-answer.ts";
import type { ScanRow } from "#app/schemas/scan-view.ts";

/** A figure with its expanded uncertainty; the unit stands in the head of the column. */
const bare = (value: number, uncertainty: number, dimension: Dimension, unit: string) =>
  formatMeasured({ value, tolerance: COVERAGE * uncertainty, source: "measured here" }, dimension, {
    unit,
    sign: true,
    bare: true,
  });

/** Columns of the list of scans, by the names of their sorts. */
export const SCAN_COLUMNS: Column<ScanRow>[] = [
  {
    key: "label",
    head: "Wafer",
    sortable: true,
    cell: ({ id, label, film }) => (
      <>
        <Link to={`/scans/${id}`} className="link wrap-anywhere">
          {label}
        </Link>
        <span className="block text-label text-quiet tablet:hidden">{film ?? "no film named"}</span>
      </>
    ),
  },
  {
    key: "film",
    head: "Film",
    sortable: true,
    wide: true,
    cell: ({ film }) => film ?? <span className="text-quiet">not named</span>,
  },
  {
    key: "stress",
    head: "Stress",
    unit: "MPa, k = 2",
    numeric: true,
    sortable: true,
    cell: ({ curled, stress, stressUncertainty }) =>
      curled ? "none" : bare(stress, stressUncertainty, "stress", "MPa"),
  },
  {
    key: "bow",
    head: "Bow change",
    unit: "µm, k = 2",
    numeric: true,
    sortable: true,
    cell: ({ curled, bowChange, bowUncertainty }) =>
      curled ? "rolls up" : bare(bowChange, bowUncertainty, "length", "µm"),
  },
  { key: "program", head: "Program", sortable: true, wide: true, cell: ({ program }) => program },
  {
    key: "uploaded",
    head: "Uploaded",
    sortable: true,
    wide: true,
    cell: ({ createdAt }) => <time dateTime={createdAt}>{createdAt.slice(0, 10)}</time>,
  },
  { key: "person", head: "By", sortable: true, wide: true, cell: ({ createdBy }) => createdBy },
];
