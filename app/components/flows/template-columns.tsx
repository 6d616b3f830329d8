import { Link } from "react-router";
import type { Column } from "#app/components/ui/DataTable.tsx";
import { formatBare } from "#app/lib/format-measured.ts";
import type { FlowTemplateRow, StepTemplateRow } from "#app/schemas/template-view.ts";

const link = (path: string, name: string) => (
  <Link to={path} className="link">
    {name}
  </Link>
);

/** Columns of the list of flow templates. */
export const flowTemplateColumns: Column<FlowTemplateRow>[] = [
  { key: "name", head: "Template", sortable: true, cell: ({ id, name }) => link(`/flows/library/flows/${id}`, name) },
  {
    key: "diameter",
    head: "Diameter",
    unit: "mm",
    numeric: true,
    sortable: true,
    cell: ({ diameter }) => formatBare(diameter, "length", "mm"),
  },
  { key: "steps", head: "Steps", numeric: true, cell: ({ steps }) => steps },
  { key: "updated", head: "Last changed", sortable: true, wide: true, cell: ({ updatedAt }) => updatedAt.slice(0, 10) },
];

/** Columns of the step library. */
export const stepTemplateColumns: Column<StepTemplateRow>[] = [
  { key: "name", head: "Step", sortable: true, cell: ({ id, name }) => link(`/flows/library/steps/${id}`, name) },
  { key: "kind", head: "Kind", sortable: true, cell: ({ kind }) => kind },
  {
    key: "peak",
    head: "Peak",
    unit: "°C",
    numeric: true,
    wide: true,
    cell: ({ peakTemperature }) => formatBare(peakTemperature, "temperature", "°C"),
  },
  { key: "planned", head: "Held by", wide: true, cell: ({ planned }) => planned },
  { key: "updated", head: "Last changed", sortable: true, wide: true, cell: ({ updatedAt }) => updatedAt.slice(0, 10) },
];
