import { Link } from "react-router";
import { BowLine } from "#app/components/drawings/BowLine.tsx";
import { SupportTag } from "#app/components/drawings/SupportTag.tsx";
import type { Column } from "#app/components/ui/DataTable.tsx";
import { formatQuantity } from "#app/engine/units/format.ts";
import { formatBare } from "#app/lib/format-measured.ts";
import { shapeWords } from "#app/lib/stack-words.ts";
import type { StackRow } from "#app/schemas/stack-row.ts";
import { bowOf } from "./bow-of.ts";

/** Columns of the list of stacks. All bow lines share one exaggeration; rolled wafers are drawn at ×1, which their cell says. */
export function stackColumns(exaggeration: number, flatWithin: number): Column<StackRow>[] {
  return [
    {
      key: "name",
      head: "Stack",
      sortable: true,
      cell: ({ id, name, thickness }) => (
        <>
          <Link to={`/stacks/${id}`} className="link">
            {name}
          </Link>
          <span className="block text-label text-quiet tablet:hidden print:hidden">
            {formatQuantity(thickness, "length", { unit: "µm" })}
          </span>
        </>
      ),
    },
    { key: "program", head: "Program", sortable: true, wide: true, cell: ({ program }) => program },
    {
      key: "diameter",
      head: "Diameter",
      unit: "mm",
      numeric: true,
      wide: true,
      cell: ({ diameter }) => formatBare(diameter, "length", "mm"),
    },
    {
      key: "thickness",
      head: "Silicon",
      unit: "µm",
      numeric: true,
      sortable: true,
      wide: true,
      cell: ({ thickness }) => formatBare(thickness, "length", "µm"),
    },
    { key: "films", head: "Films", numeric: true, wide: true, cell: ({ films }) => films },
    {
      key: "bow",
      head: "Free at 25\u00A0°C",
      unit: `×${exaggeration}`,
      wide: true,
      cell: (row) => <RowBow row={row} exaggeration={exaggeration} width={84} height={36} />,
    },
    {
      key: "shape",
      head: "Shape",
      cell: (row) =>
        row.answer ? (
          <>
            <span className="tablet:hidden print:hidden">
              <RowBow row={row} exaggeration={exaggeration} width={72} height={26} alwaysScaled />
            </span>
            {shapeWords(row.answer.shape, flatWithin)}
          </>
        ) : (
          "cannot be estimated"
        ),
    },
    {
      key: "support",
      head: "Support to lift it",
      cell: ({ answer }) =>
        answer?.support.class ? (
          <SupportTag support={answer.support.class} />
        ) : (
          <span className="text-quiet">not known</span>
        ),
    },
    {
      key: "updated",
      head: "Last changed",
      sortable: true,
      wide: true,
      cell: ({ updatedAt, updatedBy }) => (
        <>
          <span className="whitespace-nowrap">{updatedAt.slice(0, 10)}</span>
          <span className="block text-label text-quiet">{updatedBy}</span>
        </>
      ),
    },
  ];
}

interface RowBowProps {
  row: StackRow;
  exaggeration: number;
  width: number;
  height: number;
  /** for where the head of the column does not say the scale */
  alwaysScaled?: boolean;
}

/** A row's bow line; the words stand beside it. */
function RowBow({ row: { answer, diameter }, exaggeration, width, height, alwaysScaled = false }: RowBowProps) {
  if (!answer) return null;
  const showScale = alwaysScaled || (answer.shape.regime === "curled" && exaggeration !== 1);
  return (
    <BowLine
      label=""
      diameter={diameter}
      shape={bowOf(answer.shape)}
      deviceSideUp
      holding="bare"
      exaggeration={exaggeration}
      width={showScale ? width + 22 : width}
      height={height}
      showScale={showScale}
    />
  );
}
