import { isMissing, looksNumeric } from "./numbers.ts";
import { DELIMITERS, type DecimalMark } from "./reading.ts";
import { ScanFileError } from "./refusal.ts";
import { rowsOf } from "./row-source.ts";

/** Lines from which the layout is told. */
const SAMPLE_LINES = 2000;
/** Columns beyond which a row is not looked at. */
const MOST_LOOKED_AT = 512;

/** A sample of a file under one delimiter. */
export interface Split {
  delimiter: string;
  /** whether the sample has a quotation mark, so that a cell may hold the delimiter */
  quoted: boolean;
  rows: string[][];
  /** whether a cell could be a number, by row and column */
  numeric: boolean[][];
  /** cells of a usual row of data, and which of its columns hold numbers */
  cells: number;
  dataColumns: number[];
  /** place in `rows` of the first row of data; −1 when there is none */
  first: number;
  score: number;
}

export const isBlank = (cells: readonly string[]) => cells.every((cell) => cell.trim() === "");
export const isComment = (cells: readonly string[]) => /^\s*(?:#(?!\s*$)|%|\/\/)/.test(cells[0] ?? "");
/** Letters that are neither a number nor a word for a missing value. */
export const isWords = (cell: string | undefined) =>
  /\p{L}/u.test(cell ?? "") && !isMissing(cell ?? "") && !looksNumeric(cell ?? "", null, true);

/**
 * A sample split at the delimiter under which most of its cells are numbers in rows of one form.
 * @param stated a delimiter that is given; null to find it
 */
export function bestSplit(name: string, sample: string, stated: string | null, mark: DecimalMark | null): Split {
  const text = sample.split("\n", SAMPLE_LINES).join("\n");
  // Under a decimal comma a comma stands between columns only where the numbers are quoted.
  const possible = mark === "comma" && !text.includes('"') ? DELIMITERS.filter((sign) => sign !== ",") : DELIMITERS;
  const candidates = stated === null ? possible : [stated];
  const best = bestOf(name, text, candidates, mark, [";", "\t", "|"]);
  // Between commas '5 200' is rather two columns parted by a blank, unless that leaves no table.
  return best.dataColumns.length > 1 ? best : bestOf(name, text, candidates, mark, [";", "\t", "|", ","]);
}

/** @param groupedByBlanks delimiters between which a blank may group thousands */
function bestOf(
  name: string,
  text: string,
  candidates: readonly string[],
  mark: DecimalMark | null,
  groupedByBlanks: readonly string[],
): Split {
  let refusal: unknown = null;
  const [first, ...others] = candidates.flatMap((delimiter) => {
    try {
      return splitAt(name, text, delimiter, mark, groupedByBlanks.includes(delimiter));
    } catch (error) {
      // A quotation mark that closes before a comma never does where blanks are tried.
      if (!(error instanceof ScanFileError)) throw error;
      refusal ??= error;
      return [];
    }
  });
  if (!first) throw refusal ?? new Error("there is always a delimiter to try");
  const tabs = [first, ...others].some(({ delimiter, score }) => delimiter === "\t" && score > 0);
  const best = others
    .filter(({ delimiter }) => !(tabs && delimiter === " "))
    .reduce((found, next) => (next.score > found.score * (1 + 1e-9) ? next : found), first);
  if (best.score === 0 && refusal !== null) throw refusal;
  return best;
}

function splitAt(name: string, text: string, delimiter: string, mark: DecimalMark | null, blanksGroup: boolean): Split {
  const rows = rowsOf(name, text, delimiter);
  const quoted = text.includes('"');
  const numeric = rows.map((cells) =>
    cells.slice(0, MOST_LOOKED_AT).map((cell) => looksNumeric(cell, mark, blanksGroup)),
  );
  const forms = new Map<string, { count: number; row: number; numbers: number; filled: number }>();
  rows.forEach((cells, row) => {
    const marks = numeric[row] ?? [];
    if (!marks.includes(true) || isComment(cells)) return;
    const form = `${cells.length}:${cells.map((cell, n) => (marks[n] || (isMissing(cell) && cell.trim() !== "") ? "1" : "0")).join("")}`;
    const known = forms.get(form);
    if (known) known.count += 1;
    else
      forms.set(form, {
        count: 1,
        row,
        numbers: [...form].filter((sign) => sign === "1").length,
        filled: cells.filter((cell) => cell.trim() !== "").length,
      });
  });
  const weigh = ({ count, numbers, filled }: { count: number; numbers: number; filled: number }) =>
    count * numbers * (Math.min(numbers, filled) / filled) ** 2;
  let usual: { row: number; score: number; form: string } | null = null;
  for (const [form, found] of forms) {
    const score = weigh(found);
    if (usual === null || score > usual.score)
      usual = { row: found.row, score, form: form.slice(form.indexOf(":") + 1) };
  }
  if (usual === null) return { delimiter, quoted, rows, numeric, cells: 0, dataColumns: [], first: -1, score: 0 };
  const dataColumns = [...usual.form].flatMap((sign, n) => (sign === "1" ? [n] : []));
  const split: Split = {
    delimiter,
    quoted,
    rows,
    numeric,
    cells: rows[usual.row]?.length ?? 0,
    dataColumns,
    first: usual.row,
    score: isSplitBy(delimiter, rows[usual.row] ?? []) ? usual.score : 0,
  };
  return { ...split, first: firstDataRow(split) };
}

/** A row of one cell is not split by a delimiter, and one whose cells still hold numbers with another between them is split wrongly. */
const isSplitBy = (delimiter: string, cells: readonly string[]) =>
  cells.length > 1 && (!", ".includes(delimiter) || !cells.some((cell) => /\d\s*[;\t|]\s*[-+]?[\d.,]/.test(cell)));

/** The usual rows of data may begin with some that lack a value. */
function firstDataRow({ rows, numeric, cells, dataColumns, first }: Split): number {
  let at = first;
  while (at > 0) {
    const above = rows[at - 1] ?? [];
    const marks = numeric[at - 1] ?? [];
    const data = dataColumns.every((n) => marks[n] || isMissing(above[n] ?? ""));
    const any = dataColumns.some((n) => marks[n] || (above[n] ?? "").trim() !== "");
    if (above.length !== cells || !data || !any || isComment(above)) break;
    at -= 1;
  }
  return at;
}
