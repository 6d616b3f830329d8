import Papa from "papaparse";
import { ScanFileError } from "./refusal.ts";

/** Longest line, characters; more in one line is no table of points. */
export const LONGEST_LINE = 1_000_000;

interface Tokens {
  data: string[][];
  errors: { code: string; row: number }[];
  meta: { cursor: number };
}

/** Takes rows of cells in order; `first` is the number of the first one, counted from 1. */
export type RowSink = (rows: string[][], first: number) => void;

export interface RowSource {
  push(text: string): void;
  end(): void;
}

/**
 * Splits text that comes in pieces into rows of cells. Rows are given on as soon as they are whole, so only one unfinished row
 * is kept. Row n is line n of the file as long as no quoted cell runs over a line end.
 * @throws ScanFileError for a line without end and for a quote that is never closed
 */
export function rowSource(name: string, delimiter: string, sink: RowSink): RowSource {
  const parser = new Papa.Parser({ delimiter, newline: "\n" });
  let rest = "";
  let heldReturn = false;
  let next = 1;

  /** Line ends of every system become line feeds; a return at the end of a piece waits for what follows it. */
  const unified = (text: string): string => {
    let all = heldReturn ? `\r${text}` : text;
    heldReturn = all.endsWith("\r");
    if (heldReturn) all = all.slice(0, -1);
    return all.includes("\r") ? all.replaceAll("\r\n", "\n").replaceAll("\r", "\n") : all;
  };

  const give = (rows: string[][]) => {
    if (rows.length > 0) sink(rows, next);
    next += rows.length;
  };

  const refuseTooLong = () => {
    if (rest.length <= LONGEST_LINE) return;
    throw new ScanFileError(rest.includes('"') ? unclosedSentence(name, next) : endlessSentence(name, next));
  };

  return {
    push(text) {
      const all = rest + unified(text);
      const whole = all.lastIndexOf("\n") + 1;
      if (whole === 0) rest = all;
      else {
        const lines = evened(all.slice(0, whole), delimiter);
        const { data, meta }: Tokens = parser.parse(lines, 0, true);
        give(data);
        rest = lines.slice(meta.cursor) + all.slice(whole);
      }
      refuseTooLong();
    },
    end() {
      const last = evened(rest, delimiter);
      if (last === "") return;
      const { data, errors }: Tokens = parser.parse(last, 0, false);
      const open = errors.find(({ code }) => code === "MissingQuotes");
      if (open) throw new ScanFileError(unclosedSentence(name, next + open.row));
      give(data);
    },
  };
}

/** What is said of a line that is none of a table. */
export const endlessSentence = (name: string, row: number) =>
  `${name}: row ${row} has more than ${LONGEST_LINE} characters and no line end. A table of points has one point in a row.`;

const unclosedSentence = (name: string, row: number) =>
  `${name}, row ${row}: a quotation mark is opened and never closed. Close it, or export without quotation marks.`;

/** Runs of blanks count as one delimiter, none at the ends of a line. */
function evened(text: string, delimiter: string): string {
  return delimiter === " " ? text.replace(/[ \t]+/g, " ").replace(/^ | $/gm, "") : text;
}

/** Rows of a text that is at hand, a last line without its end included. */
export function rowsOf(name: string, text: string, delimiter: string): string[][] {
  const rows: string[][] = [];
  const source = rowSource(name, delimiter, (more) => {
    for (const row of more) rows.push(row);
  });
  source.push(text);
  source.end();
  return rows;
}
