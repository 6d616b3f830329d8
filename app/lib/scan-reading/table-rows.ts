import { causeOf, FaultList } from "./faults.ts";
import { isFormula, isMissing, numberReader } from "./numbers.ts";
import type { ColumnRole, Fault, ReadColumn, Reading } from "./reading.ts";
import { ScanFileError } from "./refusal.ts";
import { isBlank, isComment } from "./splits.ts";
import { inSi } from "./units.ts";
import { formulaSentence, MOST_COLUMNS, tooWideSentence } from "./unreadable.ts";

/** Wafers or sites that one file may list. */
const MOST_ROWS = 5000;

/** A row of a table that is small enough to be kept. */
export interface TableRow {
  row: number;
  cells: string[];
}

/** Names, which are kept as they stand; all else that is read is a number. */
const NAMES: readonly (ColumnRole | null)[] = ["lot", "wafer", "date"];
/** What stands in place of a slot below the wafers. */
const STATISTIC =
  /^(?:mean|avg|average|median|std|stdev|std ?dev|sigma|3 ?sigma|min|max|minimum|maximum|range|total|count|sum|n)\b/i;

/** Takes the rows of a table of wafers or sites. */
export class TableRows {
  readonly name: string;
  readonly reading: Reading;
  readonly faults = new FaultList();
  readonly rows: TableRow[] = [];
  /** rows of statistics and remarks below the table */
  footerLines = 0;
  readonly #read;

  constructor(name: string, reading: Reading) {
    this.name = name;
    this.reading = reading;
    this.#read = numberReader(reading.decimalMark, reading.thousands);
  }

  take(rows: string[][], first: number): void {
    rows.forEach((cells, n) => {
      const row = first + n;
      if (row < this.reading.firstRow || isBlank(cells) || isComment(cells)) return;
      if (cells.length > MOST_COLUMNS) throw new ScanFileError(tooWideSentence(this.name, row, cells.length));
      if (this.#isFooter(cells)) {
        this.footerLines += 1;
        return;
      }
      if (this.rows.length === MOST_ROWS)
        throw new ScanFileError(`${this.name} lists more than ${MOST_ROWS} rows. Export one lot or one map a file.`);
      // A cell is a part of the piece of text that it came in; a copy lets go of that.
      this.rows.push({ row, cells: cells.map((cell) => cell.trim().slice(0, 200)) });
    });
  }

  /** A statistic, or a line with nothing in any column of numbers. */
  #isFooter(cells: readonly string[]): boolean {
    const [first = ""] = cells.map((cell) => cell.trim()).filter((cell) => cell !== "");
    if (STATISTIC.test(first)) return true;
    return this.reading.columns.every(
      ({ role, index }) => role === "not read" || NAMES.includes(role) || (cells[index] ?? "").trim() === "",
    );
  }

  columnsOf(role: ColumnRole): ReadColumn[] {
    return this.reading.columns.filter((column) => column.role === role);
  }

  /** What a name's column holds; null where it is blank or there is none. */
  text({ row, cells }: TableRow, column: ReadColumn | undefined): string | null {
    const cell = column ? (cells[column.index] ?? "") : "";
    if (column && isFormula(cell)) throw new ScanFileError(formulaSentence(this.name, row, column.index, cell));
    return cell === "" ? null : cell;
  }

  /** A number in SI; null where there is none, which is a fault unless the cell says so itself. */
  number({ row, cells }: TableRow, column: ReadColumn | undefined): number | null {
    if (!column) return null;
    const cell = cells[column.index];
    const value = this.#read(cell ?? "");
    if (value === value) return column.unit === null ? value : inSi(value, column.unit);
    if (cell !== undefined && isFormula(cell))
      throw new ScanFileError(formulaSentence(this.name, row, column.index, cell));
    if (cell === undefined || !isMissing(cell))
      this.faults.add(causeOf(cell, this.reading.decimalMark), row, column.index, cell ?? "");
    return null;
  }

  list(): Fault[] {
    return this.faults.list();
  }
}
