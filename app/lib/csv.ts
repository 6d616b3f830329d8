import type { Preferences } from "./preferences.ts";

/** Decimal mark of a table; with a comma, semicolons part its columns. */
export type CsvMark = Preferences["decimalMark"];

export type CsvCell = string | number;

const SEPARATORS: Record<CsvMark, string> = { point: ",", comma: ";" };

/**
 * Rows as CSV: numbers in full with the given decimal mark, text quoted where it must be. Text that a spreadsheet would run as a formula
 * is defused; a number never is one, whatever sign it begins with.
 */
export function csvOf(rows: readonly (readonly CsvCell[])[], mark: CsvMark = "point"): string {
  const separator = SEPARATORS[mark];
  return rows.map((cells) => `${cells.map((cell) => csvCell(cell, mark)).join(separator)}\r\n`).join("");
}

function csvCell(value: CsvCell, mark: CsvMark): string {
  if (typeof value === "number") return csvNumber(value, mark);
  const safe = /^[=+\-@\t\r]/.test(value) ? `'${value}` : value;
  const special = mark === "comma" ? /[";\r\n]/ : /[",\r\n]/;
  return special.test(safe) ? `"${safe.replaceAll('"', '""')}"` : safe;
}

/**
 * A number as it stands in a table. Three decimals behind a comma could be thousands as well: they get a zero, so that 1,2340 is read back
 * as nothing else.
 */
export function csvNumber(value: number, mark: CsvMark): string {
  const text = String(value);
  if (mark === "point") return text;
  return text.replace(/^(-?[1-9]\d{0,2}\.\d{3})(?=e|$)/, "$10").replace(".", ",");
}
