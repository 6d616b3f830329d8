import { Link } from "react-router";
import type { Column } from "#app/components/ui/DataTable.tsx";
import { formatMeasured } from "#app/lib/format-measured.ts";
import { COVERAGE } from "#app/lib/scan-answer.ts";
import type { ScanRow } from "#app/schemas/scan-view.ts";

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
    cell: ({ stress, stressUncertainty }) =>
      formatMeasured({ value: stress, tolerance: COVERAGE * stressUncertainty, source: "measured here" }, "stress", {
        unit: "MPa",
        sign: true,
        bare: true,
      }),
  },
  {
    key: "bow",
    head: "Bow change",
    unit: "µm, k = 2",
    numeric: true,
    sortable: true,
    cell: ({ bowChange, bowUncertainty }) =>
      bowChange === null
        ? "rolls up"
        : formatMeasured(
            { value: bowChange, tolerance: COVERAGE * bowUncertainty, source: "measured here" },
            "length",
            { unit: "µm", sign: true, bare: true },
          ),
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
