import { PlaneTable } from "#app/components/drawings/PlaneTable.tsx";
import { OUTCOME_SIGNS } from "#app/components/drawings/severity.ts";
import type { WindowDrawing, WindowInput } from "#app/schemas/process-window.ts";

interface Props {
  drawing: WindowDrawing;
  x: WindowInput;
  y: WindowInput;
}

const figure = (value: number) => `${value < 0 ? "−" : ""}${Number(Math.abs(value).toPrecision(4))}`;

/** Every few places of a process window in words. */
export function WindowTable({ drawing: { table, tableX }, x, y }: Props) {
  return (
    <PlaneTable
      summary="Verdicts as a table"
      caption={`Verdict by ${y.label}, down, and ${x.label}, across`}
      columns={tableX.map((value) => `${figure(value)}\u00A0${x.unit}`)}
      rows={table.map((row) => ({
        head: `${figure(row.y)}\u00A0${y.unit}`,
        cells: row.cells.map(({ outcome, margin }) => (
          <>
            {OUTCOME_SIGNS[outcome].word}
            {margin === null ? null : (
              <span className="block text-label text-quiet">
                {margin < 0 ? "−" : ""}
                {Math.abs(Math.round(margin * 100))}&nbsp;%
              </span>
            )}
          </>
        )),
      }))}
    />
  );
}
