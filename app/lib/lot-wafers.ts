import Papa from "papaparse";
import { parseQuantity } from "#app/engine/units/parse-quantity.ts";
import type { LotWafer } from "#app/schemas/lot.ts";
import { SLOTS } from "./cassette.ts";
import { excerpt } from "./excerpt.ts";
import type { PhysicalRange } from "./read-quantity.ts";

export interface WaferList {
  wafers: LotWafer[];
  /** one sentence each, with its row */
  faults: string[];
}

/** Ranges of bow and thickness outside of which a value is a slip of the keyboard. */
export interface WaferRanges {
  bow: PhysicalRange;
  thickness: PhysicalRange;
}

const SHOWN = 40;

/**
 * Wafers typed, pasted or exported one to a line: slot, bow and thickness; the thickness may be left out of the whole list. Numbers
 * without a unit are µm. Columns are set apart by semicolon, tab or comma, the first of these that stands in the text; a comma sets
 * off decimals only where it does not set apart columns. A first line of words is a heading. Every row that cannot be read has
 * its sentence, and then the list as a whole is not taken.
 */
export function readWafers(text: string, ranges: WaferRanges): WaferList {
  const plain = text.replace(/^\uFEFF/, "").replace(/\r\n?/g, "\n");
  const delimiter = [";", "\t"].find((mark) => plain.includes(mark)) ?? ",";
  const { data } = Papa.parse<string[]>(plain, { delimiter, newline: "\n", skipEmptyLines: false });
  const rows = data
    .map((cells, index) => ({ cells: withoutTail(cells.map((cell) => cell.trim())), row: index + 1 }))
    .filter(({ cells }) => cells.length > 0);
  const [first] = rows;
  if (first && isHeading(first.cells)) rows.shift();
  if (rows.length === 0) return { wafers: [], faults: ["There is no row of figures: slot, bow, thickness."] };
  if (rows.length > SLOTS)
    return { wafers: [], faults: [`There are ${rows.length} rows; a lot has up to ${SLOTS} wafers.`] };
  const comma = delimiter !== ",";
  const wide = rows.some(({ cells }) => cells.length > 2);
  const list: WaferList = { wafers: [], faults: [] };
  const seen = new Map<number, number>();
  for (const { cells, row } of rows) {
    const read = readRow(cells, { ranges, comma, wide });
    if (typeof read === "string") {
      list.faults.push(`Row ${row}: ${read}`);
      continue;
    }
    const earlier = seen.get(read.slot);
    if (earlier !== undefined) list.faults.push(`Row ${row}: slot ${read.slot} stands in row ${earlier} already.`);
    else seen.set(read.slot, row);
    list.wafers.push(read);
  }
  return { ...list, wafers: list.wafers.toSorted((a, b) => a.slot - b.slot) };
}

/** Columns that a spreadsheet leaves empty at the end of a line. */
function withoutTail(cells: string[]): string[] {
  const last = cells.findLastIndex((cell) => cell !== "");
  return cells.slice(0, last + 1);
}

/** Words, and no cell that begins like a number. */
const isHeading = (cells: string[]) =>
  /^\p{L}/u.test(cells[0] ?? "") && cells.slice(1).every((cell) => !/^[+\-\u2212]?[.,]?\d/.test(cell));

interface Reading {
  ranges: WaferRanges;
  /** a comma sets off decimals */
  comma: boolean;
  /** the list has a column of thickness */
  wide: boolean;
}

function readRow(cells: string[], { ranges, comma, wide }: Reading): LotWafer | string {
  if (cells.length > 3)
    return comma
      ? `${cells.length} columns; slot, bow and thickness are three.`
      : `${cells.length} columns; slot, bow and thickness are three. With a decimal comma, set columns apart by semicolons.`;
  const [slotText = "", bowText = "", thicknessText = ""] = cells;
  const slot = Number(slotText);
  if (!/^\d{1,3}$/.test(slotText) || slot < 1 || slot > SLOTS)
    return `“${excerpt(slotText, SHOWN)}” is no slot from 1 to ${SLOTS}.`;
  const bow = readLength(bowText, "bow", ranges.bow, comma);
  if (typeof bow === "string") return bow;
  if (!wide) return { slot, bow, thickness: null };
  const thickness = readLength(thicknessText, "thickness", ranges.thickness, comma);
  return typeof thickness === "string" ? thickness : { slot, bow, thickness };
}

/** Metres, or what is wrong. */
function readLength(cell: string, what: string, range: PhysicalRange, comma: boolean): number | string {
  if (cell === "") return `the ${what} is missing; blank is missing, not zero.`;
  const decimalMark = comma && cell.includes(",") ? "comma" : "point";
  const bare = /^[+\-\u2212]?[\d.,]+$/.test(cell);
  const read = parseQuantity(bare ? `${cell} µm` : excerpt(cell, SHOWN), "length", { decimalMark });
  if (!read.ok) return `${what}: ${read.message}`;
  if (read.value < range.least || read.value > range.most)
    return `${what}: ${read.understood} is outside ${range.words}.`;
  return read.value;
}
