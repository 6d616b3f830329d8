import Papa from "papaparse";
import { SLOTS } from "./cassette.ts";
import { excerpt } from "./excerpt.ts";

/** A lot as it is typed or comes as a table. */
export interface NewLot {
  name: string;
  wafers: { slot: number | null; name: string }[];
}

export interface LotTable {
  lots: NewLot[];
  /** one sentence each, with its row */
  faults: string[];
}

/** Most lots of one table. */
const MOST = 200;
const LONGEST = 80;

/**
 * Lots with their wafers: one wafer to a line, under the heads lot, slot and wafer in any order. Without heads a line is slot and wafer of
 * the one lot that is named beside it. Columns are set apart by semicolon, tab or comma; what a line leaves out is not known.
 * @param named the lot of lines that name none; '' where the table has to
 */
export function readLotTable(text: string, named: string): LotTable {
  const plain = text.replace(/^\uFEFF/, "").replace(/\r\n?/g, "\n");
  const delimiter = [";", "\t"].find((mark) => plain.includes(mark)) ?? ",";
  const { data } = Papa.parse<string[]>(plain, { delimiter, newline: "\n", skipEmptyLines: false });
  const rows = data
    .map((cells, index) => ({ cells: cells.map((cell) => cell.trim()), row: index + 1 }))
    .filter(({ cells }) => cells.some((cell) => cell !== ""));
  const heads = rows[0]?.cells.map((cell) => cell.toLowerCase()) ?? [];
  const headed = heads.some((head) => head === "lot" || head === "slot" || head === "wafer");
  if (headed) rows.shift();
  const column = (name: string, without: number) => (headed ? heads.indexOf(name) : without);
  const columns = { lot: column("lot", -1), slot: column("slot", 0), wafer: column("wafer", 1) };
  const lots = new Map<string, NewLot>();
  const faults: string[] = [];
  if (named !== "") lots.set(named.toLowerCase(), { name: named, wafers: [] });
  for (const { cells, row } of rows) {
    const cell = (at: number) => (at < 0 ? "" : (cells[at] ?? ""));
    const name = cell(columns.lot) || named;
    const slot = cell(columns.slot);
    const wafer = cell(columns.wafer);
    const fault = faultOf(name, slot, wafer);
    if (fault !== null) {
      faults.push(`Row ${row}: ${fault}`);
      continue;
    }
    const lot = lots.get(name.toLowerCase()) ?? { name, wafers: [] };
    lots.set(name.toLowerCase(), lot);
    const twice = lot.wafers.some((each) => each.slot !== null && String(each.slot) === slot);
    const named2 = lot.wafers.some((each) => each.name.toLowerCase() === nameOf(slot, wafer).toLowerCase());
    if (twice || named2) faults.push(`Row ${row}: ${twice ? `slot ${slot}` : `wafer ${wafer}`} stands there twice.`);
    else if (slot !== "" || wafer !== "")
      lot.wafers.push({ slot: slot === "" ? null : Number(slot), name: nameOf(slot, wafer) });
  }
  if (lots.size === 0 && faults.length === 0) faults.push("Name the lot, or give a table with the head lot.");
  if (lots.size > MOST) faults.push(`There are ${lots.size} lots; up to ${MOST} are taken at once.`);
  return { lots: [...lots.values()], faults };
}

/** A wafer that is known by its slot alone is called by it. */
const nameOf = (slot: string, wafer: string) => (wafer === "" ? `slot ${slot}` : wafer);

function faultOf(lot: string, slot: string, wafer: string): string | null {
  if (lot === "") return "it names no lot.";
  if (lot.length > LONGEST) return `the name ‘${excerpt(lot, 20)}’ is longer than ${LONGEST} characters.`;
  if (wafer.length > LONGEST) return `the wafer ‘${excerpt(wafer, 20)}’ has a name longer than ${LONGEST} characters.`;
  if (slot !== "" && !(/^\d{1,2}$/.test(slot) && Number(slot) >= 1 && Number(slot) <= SLOTS))
    return `‘${excerpt(slot, 20)}’ is no slot from 1 to ${SLOTS}.`;
  return null;
}
