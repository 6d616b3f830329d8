import Papa from "papaparse";
import { findUnit } from "#app/engine/units/dimensions.ts";
import { excerpt } from "../excerpt.ts";
import { headOf, MEASURED_COLUMNS, PLAIN_COLUMNS, type MeasuredColumns, type Part } from "./columns.ts";

/** A line of a table of films: what each column says, by the head that a written table would have. */
export interface FilmLine {
  /** row of the table, its heads being row 1 */
  row: number;
  name: string;
  cells: ReadonlyMap<string, string>;
}

export interface FilmTable {
  lines: FilmLine[];
  /** heads that name nothing of a film, as they stand in the table */
  unread: string[];
}

/** Most films of a table; a library has a few hundred. */
const MOST = 2000;

/**
 * Reads a table of films. Columns may be left out and stand in any order; numbers without a unit are in that of their column's head.
 * @returns a sentence in place of the table when nothing of it can be read
 */
export function readFilmTable(text: string): FilmTable | string {
  if (text.includes("\uFFFD")) return "The file is no UTF-8 text. Save it as CSV in UTF-8 and choose it again.";
  const plain = text.replace(/^\uFEFF/, "").replace(/\r\n?/g, "\n");
  const first = plain.slice(0, plain.indexOf("\n") >>> 0);
  const delimiter = [";", "\t"].find((mark) => first.includes(mark)) ?? ",";
  const { data } = Papa.parse<string[]>(plain, { delimiter, newline: "\n", skipEmptyLines: false });
  const heads = (data[0] ?? []).map((head) => ({ head: head.trim(), column: columnOf(head.trim()) }));
  if (!heads.some(({ column }) => column?.head === "name"))
    return "The first row names no column ‘name’. Begin with a table that was downloaded from the list of films.";
  const twice = heads.find(
    ({ column }, n) => column && heads.findIndex((other) => other.column?.head === column.head) !== n,
  );
  if (twice) return `The column ‘${excerpt(twice.head, 40)}’ stands there twice. Take one of them out.`;
  const lines = data.slice(1).flatMap((cells, n) => lineOf(cells, heads, n + 2) ?? []);
  if (lines.length === 0) return "There is no row below the heads.";
  if (lines.length > MOST) return `There are ${lines.length} rows; up to ${MOST} are read at once.`;
  return { lines, unread: heads.flatMap(({ head, column }) => (column || head === "" ? [] : excerpt(head, 40))) };
}

interface Column {
  head: string;
  /** to be put behind a number that stands alone */
  unit: string;
}

function lineOf(cells: string[], heads: { column: Column | null }[], row: number): FilmLine | null {
  if (cells.every((cell) => cell.trim() === "")) return null;
  const said = heads.flatMap(({ column }, n) => {
    const cell = undefused((cells[n] ?? "").trim());
    return column ? [[column.head, isBareNumber(cell) ? `${cell} ${column.unit}`.trim() : cell] as const] : [];
  });
  const line = new Map(said);
  return { row, name: line.get("name") ?? "", cells: line };
}

const isBareNumber = (cell: string) => /^[-+−]?\d[\d.,]*(?:e[-+]?\d+)?$/i.test(cell);

/** Takes back the sign that keeps a spreadsheet from running a text as a formula. */
const undefused = (cell: string) => (/^'[=+\-@\t\r]/.test(cell) ? cell.slice(1) : cell);

/** The column that a head names, with the unit that it spells; null for one that names nothing of a film. */
function columnOf(head: string): Column | null {
  const plain = PLAIN_COLUMNS.find((column) => column.head === head);
  if (plain) return { head, unit: plain.unit ?? "" };
  for (const columns of MEASURED_COLUMNS) {
    if (head !== columns.head && !head.startsWith(`${columns.head}_`)) continue;
    const found = partOf(columns, head.slice(columns.head.length + 1));
    if (found) return { head: headOf(columns, found.part), unit: found.unit };
  }
  return null;
}

function partOf(columns: MeasuredColumns, rest: string): { part: Part; unit: string } | null {
  if (rest === "source" || rest === "note" || rest === "date") return { part: rest, unit: "" };
  const isTolerance = rest === "tolerance" || rest.startsWith("tolerance_");
  const { dimension, unit } = isTolerance ? (columns.tolerance ?? columns) : columns;
  const spelt = isTolerance ? rest.slice("tolerance_".length) : rest;
  const part = isTolerance ? "tolerance" : "value";
  if (spelt === "") return { part, unit: dimension === "number" ? unit : "" };
  const symbol = spelt.replace("_per_", "/").replace(/^([CF])$/, "°$1");
  return findUnit(dimension, symbol) ? { part, unit: symbol } : null;
}
