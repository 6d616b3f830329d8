import Papa from "papaparse";
import type { FileReading, SkippedRow } from "#app/schemas/scan-result.ts";
import { excerpt } from "./excerpt.ts";
import { checkHeading } from "./profile-heading.ts";
import { ProfileFileError, profileText } from "./profile-text.ts";
import type { DecimalMark, LengthUnit } from "./scan-file.ts";

/** A profile as read: positions and heights in metres, and how the file was understood. */
export interface ReadProfile {
  points: { x: number; z: number }[];
  reading: FileReading;
}

export interface ProfileFormat {
  positionUnit: LengthUnit;
  heightUnit: LengthUnit;
  decimalMark: DecimalMark;
}

/** How many of a unit make a metre: dividing by a whole number rounds once. */
const PER_METRE: Record<LengthUnit, number> = { m: 1, mm: 1e3, µm: 1e6, nm: 1e9 };
const LEAST_POINTS = 7;
const SHOWN_ROWS = 20;
/** Ten times what an instrument writes along a wafer; more would keep everybody else waiting. */
const MOST_LINES = 50_000;
/** Lines from which the delimiter is told. */
const SAMPLE_LINES = 400;
const LONGEST_CELL = 40;

/** What may stand between columns. Under a decimal comma a comma never does; a blank stands for any run of them. */
const DELIMITERS: Record<DecimalMark, readonly string[]> = {
  point: [",", ";", "\t", "|", " "],
  comma: [";", "\t", "|", " "],
};

const NUMBER: Record<DecimalMark, RegExp> = {
  point: /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/,
  comma: /^[+-]?(\d+,?\d*|,\d+)([eE][+-]?\d+)?$/,
};

/** A number in a cell under a decimal mark that the person has stated; null when it is anything else. */
function cellNumber(cell: string | undefined, decimalMark: DecimalMark): number | null {
  const text = (cell ?? "").trim().replace("\u2212", "-");
  if (!NUMBER[decimalMark].test(text)) return null;
  const value = Number(text.replace(",", "."));
  return Number.isFinite(value) ? value : null;
}

interface Table {
  rows: string[][];
  delimiter: string;
  /** whether the first line only named the delimiter */
  named: boolean;
}

const isPair = (cells: string[], mark: DecimalMark) =>
  cellNumber(cells[0], mark) !== null && cellNumber(cells[1], mark) !== null;

/** Rows of cells under a delimiter; runs of blanks count as one. Row n is line n of the file. */
function split(text: string, delimiter: string): string[][] {
  const even = delimiter === " " ? text.replace(/[ \t]+/g, " ").replace(/^ | $/gm, "") : text;
  return Papa.parse<string[]>(even, { delimiter, newline: "\n", skipEmptyLines: false }).data;
}

/** Splits the text at the delimiter that the first line names ('sep=;'), or that gives most pairs of numbers. */
function tableOf(text: string, mark: DecimalMark): Table {
  const named = /^sep=(.)\n/i.exec(text)?.[1];
  if (named !== undefined) return { rows: split(text, named), delimiter: named, named: true };
  const sample = text.split("\n", SAMPLE_LINES).join("\n");
  const counted = DELIMITERS[mark].map((delimiter) => ({
    delimiter,
    pairs: split(sample, delimiter).filter((cells) => isPair(cells, mark)).length,
  }));
  const best = counted.reduce((most, next) => (next.pairs > most.pairs ? next : most));
  return { rows: split(text, best.delimiter), delimiter: best.delimiter, named: false };
}

const isBlank = (cells: string[]) => cells.every((cell) => cell.trim() === "");
const isComment = (cells: string[]) => /^\s*(#|%|\/\/)/.test(cells[0] ?? "");
/** Words that instruments write for a value they do not have; a row with one is a row of data. */
const NO_VALUE = /^[+-]?(nan|inf|infinity|null|none|n\/?a|overflow|error)$/i;
const isWords = (cell: string | undefined) =>
  /\p{L}/u.test(cell ?? "") &&
  !NO_VALUE.test((cell ?? "").trim()) &&
  cellNumber(cell, "point") === null &&
  cellNumber(cell, "comma") === null;

/**
 * Reads the first two columns of a profilometer's CSV as position and height. Comments, what stands above the first pair of
 * numbers and blank lines are passed over; a row further down that is no pair of numbers is left out and reported.
 * @throws ProfileFileError with a sentence that says what is wrong, where, and what to do
 */
export function readProfile(bytes: Uint8Array, fileName: string, format: ProfileFormat): ReadProfile {
  const name = excerpt(fileName, 80);
  const text = profileText(bytes, name);
  refuseTooLong(text, name);
  const table = tableOf(text, format.decimalMark);
  const read = readRows(table, format);
  refuseUnusable(read, text, name, format.decimalMark);
  if (read.heading) checkHeading(headsOf(read.heading.cells, table.delimiter), read.heading.row, name, format);
  refuseSplitNumbers(table, read, name, format.decimalMark);
  const { points, skipped } = read;
  const positions = points.reduce(({ from, to }, { x }) => ({ from: Math.min(from, x), to: Math.max(to, x) }), {
    from: Infinity,
    to: -Infinity,
  });
  return {
    points,
    reading: {
      rows: read.rows,
      used: points.length,
      columns: read.columns,
      heading: read.heading && excerpt(read.heading.cells.slice(0, 2).join(", "), 80),
      delimiter: table.delimiter,
      ...positions,
      skipped: skipped.slice(0, SHOWN_ROWS),
      skippedInAll: skipped.length,
    },
  };
}

function refuseTooLong(text: string, name: string): void {
  let lines = 0;
  for (let at = text.indexOf("\n"); at >= 0; at = text.indexOf("\n", at + 1)) lines += 1;
  if (lines <= MOST_LINES) return;
  throw new ProfileFileError(
    `${name} has ${lines} lines; up to ${MOST_LINES} are read. Export one point in ${Math.ceil(lines / MOST_LINES)}.`,
  );
}

interface ReadRows {
  points: { x: number; z: number }[];
  /** rows of data, whether they could be used or not */
  rows: number;
  /** columns of the first row that could be used */
  columns: number;
  skipped: SkippedRow[];
  /** the last line of words above the data */
  heading: { cells: string[]; row: number } | null;
}

function readRows({ rows: lines, named }: Table, { positionUnit, heightUnit, decimalMark }: ProfileFormat): ReadRows {
  const read: ReadRows = { points: [], rows: 0, columns: 0, skipped: [], heading: null };
  lines.forEach((cells, index) => {
    if (isBlank(cells) || (named && index === 0)) return;
    if (read.points.length === 0 && (isComment(cells) || isWords(cells[0]))) {
      const heading = cells.map((cell, column) => (column === 0 ? cell.replace(/^\s*[#%/]+/, "") : cell));
      read.heading = { cells: heading, row: index + 1 };
      return;
    }
    if (isComment(cells)) return;
    read.rows += 1;
    const [x, z] = [cellNumber(cells[0], decimalMark), cellNumber(cells[1], decimalMark)];
    if (x !== null && z !== null) {
      if (read.points.length === 0) read.columns = cells.filter((cell) => cell.trim() !== "").length;
      read.points.push({ x: x / PER_METRE[positionUnit], z: z / PER_METRE[heightUnit] });
    } else
      read.skipped.push({
        row: index + 1,
        column: x === null ? "position" : "height",
        text: excerpt((x === null ? cells[0] : cells[1]) ?? "", LONGEST_CELL),
      });
  });
  return read;
}

/**
 * The heads of the two columns. A heading may be split in another way than the data below it; where that leaves a doubt, nothing
 * is taken from it.
 */
function headsOf(cells: string[], delimiter: string): string[] {
  const filled = cells.filter((cell) => cell.trim() !== "");
  if (delimiter === " ") {
    // 'x (mm) z (µm)': the unit belongs to the word before it.
    const heads = filled
      .join(" ")
      .replace(/ (?=[([])/g, "")
      .split(" ");
    return heads.length === 2 ? heads : [];
  }
  const [first = ""] = filled;
  return filled.length === 1 ? first.split(/[,;|\t]/) : filled;
}

const MARK_SIGNS: Record<DecimalMark, string> = { point: ".", comma: "," };

function refuseUnusable(read: ReadRows, text: string, name: string, mark: DecimalMark): void {
  const { points, rows, skipped } = read;
  if (rows > 0 && skipped.length <= rows / 2) {
    if (points.length < LEAST_POINTS)
      throw new ProfileFileError(
        `${name} has ${points.length} usable ${points.length === 1 ? "row" : "rows"}; a curvature needs at least ${LEAST_POINTS}.${exampleOf(skipped, mark)}`,
      );
    return;
  }
  refuseOneColumn(text, name, mark);
  refuseOtherMark(text, name, mark, points.length);
  if (rows === 0)
    throw new ProfileFileError(
      `${name} has no row of numbers. It needs two columns, position and height; its first line is “${excerpt(text.trimStart().split("\n", 1)[0] ?? "", LONGEST_CELL)}”.`,
    );
  throw new ProfileFileError(
    `${name}: ${skipped.length} of ${rows} rows are no pair of numbers.${exampleOf(skipped, mark)}`,
  );
}

function exampleOf([first]: SkippedRow[], mark: DecimalMark): string {
  if (!first) return "";
  if (first.text === "") return ` Row ${first.row}, ${first.column}: the cell is empty.`;
  return ` Row ${first.row}, ${first.column}: “${first.text}” is not a number with a decimal ${mark}.`;
}

/** Says so when the file reads well under the other decimal mark. */
function refuseOtherMark(text: string, name: string, mark: DecimalMark, usable: number): void {
  const other: DecimalMark = mark === "point" ? "comma" : "point";
  const { rows } = tableOf(text, other);
  const pairs = rows.filter((cells) => isPair(cells, other));
  if (pairs.length < LEAST_POINTS || pairs.length <= usable) return;
  const at = rows.findIndex(
    (cells) => isPair(cells, other) && cells.slice(0, 2).some((cell) => cell.includes(MARK_SIGNS[other])),
  );
  const shown = at < 0 ? "" : `: row ${at + 1} holds “${excerpt(text.split("\n", at + 1)[at] ?? "", LONGEST_CELL)}”`;
  throw new ProfileFileError(
    `${name} has two columns of numbers only with a decimal ${other}${shown}. A decimal ${mark} is chosen; choose ${other} if that is how it was written.`,
  );
}

/** Says so when the rows hold a single number each, read with the mark that was chosen. */
function refuseOneColumn(text: string, name: string, mark: DecimalMark): void {
  const lines = text.split("\n").map((line) => line.replace(/[;|\s]+$/, "").replace(/^\s+/, ""));
  const single = lines.map((line) => cellNumber(line, mark) !== null);
  const numbers = single.filter(Boolean).length;
  if (numbers === 0 || numbers < lines.filter((line) => line !== "").length / 2) return;
  const row = single.indexOf(true);
  const line = lines[row] ?? "";
  const hint = line.includes(",") ? " Where the comma stands between two columns, choose a decimal point." : "";
  throw new ProfileFileError(
    `Read with a decimal ${mark}, ${name} has one column only: row ${row + 1} holds “${excerpt(line, LONGEST_CELL)}”. It needs two, position and height.${hint}`,
  );
}

/** '-95,00,8,236' under a comma as delimiter reads as four whole numbers: nobody can tell which comma is which. */
function refuseSplitNumbers({ rows, delimiter }: Table, read: ReadRows, name: string, mark: DecimalMark): void {
  if (mark !== "point" || delimiter !== ",") return;
  if (read.heading && read.heading.cells.filter((cell) => cell.trim() !== "").length !== 2) return;
  const data = rows.filter((cells) => isPair(cells, mark));
  const whole = data.filter(
    (cells) =>
      cells.length === 4 && cells.every((cell, n) => (n % 2 === 0 ? /^\s*[+-]?\d+\s*$/ : /^\d+\s*$/).test(cell)),
  );
  const [first] = whole;
  if (!first || whole.length < data.length) return;
  throw new ProfileFileError(
    `${name}: every row holds four whole numbers, such as “${excerpt(first.join(","), LONGEST_CELL)}”. Commas for decimals and commas between columns cannot be told apart: export with semicolons between the columns.`,
  );
}
