import { excerpt } from "#app/lib/excerpt.ts";
import { causeOf, FaultList } from "./faults.ts";
import { NumberColumn } from "./number-column.ts";
import { isFormula, isMissing, numberReader } from "./numbers.ts";
import type { ColumnPair, Fault, Place, Reading } from "./reading.ts";
import { ScanFileError } from "./refusal.ts";
import { roleOfHead } from "./roles.ts";
import { isBlank, isComment, isWords } from "./splits.ts";
import { factorsOf } from "./units.ts";
import { formulaSentence, MOST_COLUMNS, tooWideSentence } from "./unreadable.ts";

/** Rows of data that one file may have. */
export const MOST_ROWS = 2_000_000;
/** Points that all profiles of one file may have together: what is kept of them is bounded by it. */
const MOST_POINTS = 8_000_000;
const FEWEST_POINTS = 7;
/** Beyond it no wafer reaches, m. */
const FARTHEST = 10;

/** One profile, SI, in the order of the file. */
export interface FileProfile extends ColumnPair {
  x: Float64Array;
  z: Float64Array;
  /** least and greatest position, m */
  from: number;
  to: number;
}

export interface ProfileFile {
  profiles: FileProfile[];
  /** rows of data, whether they could be used or not */
  rows: number;
  /** rows of which at least one value could not be used */
  faulty: number;
  faults: Fault[];
  /** lines of words below the data: how many, and where the first one stands */
  footer: { lines: number; first: Place } | null;
}

interface PairReader {
  pair: ColumnPair;
  x: NumberColumn;
  z: NumberColumn;
  xTimes: number;
  xOver: number;
  zTimes: number;
  zOver: number;
}

/** Takes the rows of a file of profiles as they come. Positions and heights become SI at once; no row is kept. */
export class ProfileRows {
  readonly #name: string;
  readonly #reading: Reading;
  readonly #pairs: PairReader[];
  readonly #read;
  readonly #faults = new FaultList();
  #rows = 0;
  /** lines of words that are a footer unless more data follow */
  #words: Place[] = [];
  #wordLines = 0;

  constructor(name: string, reading: Reading) {
    this.#name = name;
    this.#reading = reading;
    this.#read = numberReader(reading.decimalMark, reading.thousands);
    this.#pairs = reading.pairs.map((pair) => {
      const [position, height] = [factors(reading, pair.position), factors(reading, pair.height)];
      return {
        pair,
        x: new NumberColumn(),
        z: new NumberColumn(),
        xTimes: position.times,
        xOver: position.over,
        zTimes: height.times,
        zOver: height.over,
      };
    });
  }

  /** Rows in order; `first` is the number of the first one. */
  take(rows: string[][], first: number): void {
    const read = this.#read;
    const skip = Math.max(0, this.#reading.firstRow - first);
    const [only] = this.#pairs;
    const single = this.#pairs.length === 1;
    for (let n = skip; n < rows.length; n += 1) {
      const cells = rows[n] ?? [];
      if (single && only && this.#wordLines === 0) {
        const [position, height] = [cells[only.pair.position], cells[only.pair.height]];
        if (position !== undefined && height !== undefined) {
          const x = read(position);
          const z = read(height);
          if (x === x && z === z) {
            only.x.push((x * only.xTimes) / only.xOver);
            only.z.push((z * only.zTimes) / only.zOver);
            this.#rows += 1;
            continue;
          }
        }
      }
      this.#takeRow(cells, first + n);
    }
    this.#refuseTooMany();
  }

  /**
   * All that was read.
   * @throws ScanFileError when it is too little, mostly faulty or of no wafer
   */
  end(): ProfileFile {
    const faults = this.#faults.list();
    this.#refuseUnusable(faults);
    const profiles = this.#pairs.map(({ pair, x, z }) => this.#checked(pair, x.values(), z.values()));
    const [first] = this.#words;
    return {
      profiles,
      rows: this.#rows,
      faulty: this.#faults.rows,
      faults,
      footer: first ? { lines: this.#wordLines, first } : null,
    };
  }

  #refuseTooMany(): void {
    const points = this.#pairs.reduce((sum, { x }) => sum + x.length, 0);
    if (this.#rows > MOST_ROWS)
      throw new ScanFileError(
        `${this.#name} has more than ${MOST_ROWS} rows of data; up to that many are read. Export one point in two, or fewer.`,
      );
    // Half of what may be read is faulty already: the rest cannot make up for it.
    if (this.#faults.rows > MOST_ROWS / 2) this.#refuseUnusable(this.#faults.list());
    if (points > MOST_POINTS)
      throw new ScanFileError(
        `${this.#name} has more than ${MOST_POINTS} points in its ${this.#pairs.length} profiles. Export fewer points or fewer profiles.`,
      );
  }

  #takeRow(cells: string[], row: number): void {
    if (cells.length > MOST_COLUMNS) throw new ScanFileError(tooWideSentence(this.#name, row, cells.length));
    if (isBlank(cells) || isComment(cells)) return;
    const read = this.#pairs.map(({ pair }) => [
      this.#read(cells[pair.position] ?? ""),
      this.#read(cells[pair.height] ?? ""),
    ]);
    const whole = read.some(([x = NaN, z = NaN]) => x === x && z === z);
    if (!whole && this.#isWordLine(cells)) {
      this.#noteWords(cells, row);
      return;
    }
    this.#wordsWereNoFooter();
    this.#rows += 1;
    let faulty = false;
    this.#pairs.forEach((reader, n) => {
      const [x = NaN, z = NaN] = read[n] ?? [];
      const { pair } = reader;
      if (x === x && z === z) {
        reader.x.push((x * reader.xTimes) / reader.xOver);
        reader.z.push((z * reader.zTimes) / reader.zOver);
      } else if (!this.#endedEarlier(cells, pair)) {
        faulty = true;
        const column = x === x ? pair.height : pair.position;
        this.#fault(cells[column], row, column);
      }
    });
    if (faulty) this.#faults.rows += 1;
  }

  /** Of several profiles side by side the shorter ones leave their cells blank. */
  #endedEarlier(cells: readonly string[], { position, height }: ColumnPair): boolean {
    return (
      this.#pairs.length > 1 &&
      (cells[height] ?? "").trim() === "" &&
      ((cells[position] ?? "").trim() === "" || this.#sharesPosition(position))
    );
  }

  #sharesPosition(position: number): boolean {
    return this.#pairs.filter(({ pair }) => pair.position === position).length > 1;
  }

  #fault(cell: string | undefined, row: number, column: number): void {
    if (cell !== undefined && isFormula(cell)) throw new ScanFileError(formulaSentence(this.#name, row, column, cell));
    this.#faults.add(causeOf(cell, this.#reading.decimalMark), row, column, cell ?? "");
  }

  #isWordLine(cells: readonly string[]): boolean {
    const [first] = cells.filter((cell) => cell.trim() !== "");
    return isWords(first) && !isMissing(first ?? "");
  }

  #noteWords(cells: readonly string[], row: number): void {
    this.#wordLines += 1;
    const column = cells.findIndex((cell) => cell.trim() !== "");
    if (this.#words.length < 5) this.#words.push({ row, column, text: excerpt(cells[column] ?? "", 40) });
    const roles = cells.map((cell) => roleOfHead(cell));
    if (this.#rows > 0 && roles.some((role) => role === "position" || role === "radius") && roles.includes("height"))
      throw new ScanFileError(
        `${this.#name}, row ${row}: a second table begins here. Export one table a file, its scans side by side.`,
      );
  }

  /** Data follow, so the lines of words before them were faults. */
  #wordsWereNoFooter(): void {
    if (this.#wordLines === 0) return;
    for (const { row, column, text } of this.#words) this.#faults.add("not a number", row, column, text);
    for (let n = this.#words.length; n < this.#wordLines; n += 1) this.#faults.add("not a number", 0, null, "");
    this.#rows += this.#wordLines;
    this.#faults.rows += this.#wordLines;
    this.#words = [];
    this.#wordLines = 0;
  }

  #refuseUnusable(faults: Fault[]): void {
    const [name, rows, faulty] = [this.#name, this.#rows, this.#faults.rows];
    const example = this.#example(faults);
    if (rows === 0) throw new ScanFileError(`${name} has no row of numbers below row ${this.#reading.firstRow}.`);
    if (faulty > rows / 2)
      throw new ScanFileError(`${name}: ${faulty} of ${rows} rows are no pair of numbers.${example}`, faults);
    for (const { pair, x } of this.#pairs) {
      if (x.length >= FEWEST_POINTS) continue;
      const which = this.#pairs.length > 1 ? `${name}, “${excerpt(pair.name, 40)}”,` : name;
      throw new ScanFileError(
        `${which} has ${x.length} usable ${x.length === 1 ? "row" : "rows"}; a curvature needs at least ${FEWEST_POINTS}.${example}`,
        faults,
      );
    }
  }

  #example([fault]: Fault[]): string {
    const place = fault?.places[0];
    if (!fault || !place) return "";
    const { pairs } = this.#reading;
    const column = pairs.some(({ position }) => position === place.column) ? "position" : "height";
    const stands =
      fault.cause === "empty cell"
        ? "the cell is empty"
        : fault.cause === "column missing"
          ? "the row ends before it"
          : fault.cause === "no value"
            ? `“${place.text}” stands for no value`
            : `“${place.text}” is not a number${this.#reading.decimalMark === null ? "" : ` with a decimal ${this.#reading.decimalMark}`}`;
    return ` Row ${place.row}, ${column}: ${stands}.`;
  }

  #checked(pair: ColumnPair, x: Float64Array, z: Float64Array): FileProfile {
    let [from, to, low, high] = [Infinity, -Infinity, Infinity, -Infinity];
    for (let n = 0; n < x.length; n += 1) {
      const position = x[n] ?? 0;
      const height = z[n] ?? 0;
      if (position < from) from = position;
      if (position > to) to = position;
      if (height < low) low = height;
      if (height > high) high = height;
    }
    const far = (what: string, least: number, most: number, column: number) => {
      if (Math.max(Math.abs(least), Math.abs(most)) <= FARTHEST) return;
      throw new ScanFileError(
        `${this.#name}: the ${what} run from ${least.toPrecision(3)} to ${most.toPrecision(3)} m in ${this.#reading.columns[column]?.unit ?? "this unit"}, farther than any wafer. Check the unit and the file.`,
      );
    };
    far("positions", from, to, pair.position);
    far("heights", low, high, pair.height);
    const along = pair.along === "radius" && from < 0 ? "position" : pair.along;
    return { ...pair, along, x, z, from, to };
  }
}

function factors({ columns }: Reading, column: number): { times: number; over: number } {
  const unit = columns[column]?.unit;
  if (!unit) throw new Error("a column is read only when its unit is known");
  return factorsOf(unit);
}
