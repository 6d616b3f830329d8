import { Link } from "react-router";
import type { Column } from "#app/components/ui/DataTable.tsx";
import { formatNumber } from "#app/engine/units/format-number.ts";
import { bareWithExpanded } from "#app/lib/prediction-words.ts";
import { offBy } from "#app/lib/predictions.ts";
import type { Predicted, PredictionPoint } from "#app/schemas/prediction.ts";

/** Columns of the points, by the names of their sorts. */
export function predictionColumns(of: Predicted): Column<PredictionPoint>[] {
  const unit = of === "bow" ? "µm, k = 2" : "MPa, k = 2";
  return [
    {
      key: "name",
      head: of === "bow" ? "Lot, wafer" : "Wafer",
      sortable: true,
      cell: ({ name, path, group }) => (
        <>
          <Link to={path} className="link wrap-anywhere">
            {name}
          </Link>
          <span className="block text-label text-quiet tablet:hidden">{group}</span>
        </>
      ),
    },
    { key: "group", head: of === "bow" ? "Step" : "Film", sortable: true, wide: true, cell: ({ group }) => group },
    {
      key: "predicted",
      head: "Predicted",
      unit,
      numeric: true,
      sortable: true,
      cell: ({ predicted, predictedUncertainty }) => bareWithExpanded(of, predicted, predictedUncertainty),
    },
    {
      key: "value",
      head: "Measured",
      unit,
      numeric: true,
      sortable: true,
      cell: ({ measured, measuredUncertainty, stated }) => (
        <>
          {bareWithExpanded(of, measured, measuredUncertainty)}
          {!stated && <span className="block text-label text-quiet">± not stated</span>}
        </>
      ),
    },
    {
      key: "off",
      head: "Off by",
      unit: "its ±, k = 2",
      numeric: true,
      sortable: true,
      cell: (point) => formatNumber(offBy(point) / 2, { decimals: 1, sign: true }),
    },
    { key: "program", head: "Program", sortable: true, wide: true, cell: ({ program }) => program },
    {
      key: "measured",
      head: "Measured on",
      sortable: true,
      wide: true,
      cell: ({ measuredAt, instrument }) => (
        <>
          <time dateTime={measuredAt}>{measuredAt.slice(0, 10)}</time>
          {instrument && <span className="block text-label text-quiet">{instrument}</span>}
        </>
      ),
    },
  ];
}
