import type { ReadColumn } from "./reading.ts";
import type { TableRow, TableRows } from "./table-rows.ts";

const MOST_SLOTS = 50;

/** The slot in a row: a whole number, or one behind letters as in 'S07'; what is none is a fault. */
export function slotOf(table: TableRows, row: TableRow, column: ReadColumn | undefined): number | null {
  const text = table.text(row, column);
  if (!column || text === null) return null;
  const slot = Number(/^(?:slot|s|#)?\s*0*(\d{1,2})(?:[.,]0+)?$/i.exec(text)?.[1]);
  if (Number.isInteger(slot) && slot >= 0 && slot <= MOST_SLOTS) return slot;
  table.faults.add("not a slot", row.row, column.index, text);
  return null;
}
