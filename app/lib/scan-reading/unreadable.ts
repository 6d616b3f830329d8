import { excerpt } from "#app/lib/excerpt.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import { isFormula, isMissing, looksNumeric } from "./numbers.ts";
import type { DecimalMark } from "./reading.ts";
import { ScanFileError } from "./refusal.ts";
import { bestSplit, type Split } from "./splits.ts";

export const MOST_COLUMNS = 512;
const LONGEST_CELL = 40;
const SIGNS: Record<DecimalMark, string> = { point: ".", comma: "," };

/** @throws ScanFileError for a row that no table of points has */
export function refuseTooWide(name: string, { rows }: Split): void {
  const at = rows.findIndex((cells) => cells.length > MOST_COLUMNS);
  const cells = rows[at];
  if (cells) throw new ScanFileError(tooWideSentence(name, at + 1, cells.length));
}

export const tooWideSentence = (name: string, row: number, columns: number) =>
  `${name}, row ${row} has ${columns} columns; up to ${MOST_COLUMNS} are read. Export one point in a row.`;

/**
 * Says why the beginning of a file holds no table of numbers, and what to do about it.
 * @throws ScanFileError always
 */
export function refuseNoTable(name: string, sample: string, profile: ImportProfile, split: Split): never {
  const mark = profile.decimalMark ?? null;
  refuseFormulas(name, split);
  refuseOneColumn(name, sample, mark);
  if (mark !== null) refuseOtherMark(name, sample, mark, split);
  refuseNoValues(name, sample);
  if (profile.delimiter !== undefined)
    throw new ScanFileError(
      `${name} has no row of numbers when it is split at “${profile.delimiter}”; its first line is “${firstLine(sample)}”.`,
    );
  throw new ScanFileError(
    `${name} has no row of numbers. It needs two columns, position and height; its first line is “${firstLine(sample)}”.`,
  );
}

function refuseNoValues(name: string, sample: string): void {
  const lines = sample.split("\n").filter((line) => line.trim() !== "");
  const empty = lines.filter((line) => line.split(/[;,|\s]+/).every(isMissing));
  const [shown] = empty;
  if (shown === undefined || empty.length < lines.length / 2) return;
  throw new ScanFileError(
    `${name} has no row of numbers: ${empty.length} of its first ${lines.length} rows hold words for missing values only, such as “${excerpt(shown, LONGEST_CELL)}”.`,
  );
}

const firstLine = (sample: string) => excerpt(sample.trimStart().split("\n", 1)[0] ?? "", LONGEST_CELL);

function refuseFormulas(name: string, { rows }: Split): void {
  for (const [row, cells] of rows.entries())
    for (const [column, cell] of cells.entries())
      if (isFormula(cell)) throw new ScanFileError(formulaSentence(name, row + 1, column, cell));
}

export const formulaSentence = (name: string, row: number, column: number, cell: string) =>
  `${name}, row ${row}, column ${column + 1} holds “${excerpt(cell, LONGEST_CELL)}”, a formula. Export the values.`;

/** Says so when the rows hold a single number each. */
function refuseOneColumn(name: string, sample: string, mark: DecimalMark | null): void {
  const lines = sample.split("\n").map((line) => line.replace(/[;|\s]+$/, "").replace(/^\s+/, ""));
  const single = lines.map((line) => looksNumeric(line, mark, false));
  const numbers = single.filter(Boolean).length;
  if (numbers === 0 || numbers < lines.filter((line) => line !== "").length / 2) return;
  const row = single.indexOf(true);
  const line = lines[row] ?? "";
  const hint = line.includes(",") ? " Where the comma stands between two columns, choose a decimal point." : "";
  const under = mark === null ? "" : `Read with a decimal ${mark}, `;
  throw new ScanFileError(
    `${under}${name} has one column only: row ${row + 1} holds “${excerpt(line, LONGEST_CELL)}”. It needs two, position and height.${hint}`,
  );
}

/** Says so when the file reads well under the other decimal mark. */
export function refuseOtherMark(name: string, sample: string, mark: DecimalMark, split: Split): void {
  const other: DecimalMark = mark === "point" ? "comma" : "point";
  const found = bestSplit(name, sample, null, other);
  if (found.dataColumns.length < 2 || found.score <= split.score) return;
  const at = found.rows.findIndex(
    (cells, n) => n >= found.first && found.dataColumns.some((column) => cells[column]?.includes(SIGNS[other])),
  );
  const shown = at < 0 ? "" : `: row ${at + 1} holds “${excerpt(sample.split("\n", at + 1)[at] ?? "", LONGEST_CELL)}”`;
  throw new ScanFileError(
    `${name} has two columns of numbers only with a decimal ${other}${shown}. A decimal ${mark} is chosen; choose ${other} if that is how it was written.`,
  );
}
