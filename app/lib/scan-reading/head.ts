import type { ImportProfile } from "#app/schemas/import-profile.ts";
import type { ReadUnit } from "./reading.ts";
import { roleOfHead } from "./roles.ts";
import { isBlank, isWords, type Split } from "./splits.ts";
import { unitInHead, unitOf } from "./units.ts";

type HeadUnit = ReadUnit | { notRead: string } | null;

/** What stands above the columns. Rows are places in the split's rows, null when there is none. */
export interface Head {
  headerRow: number | null;
  unitsRow: number | null;
  /** by column, nothing where there is none */
  headings: string[];
  units: HeadUnit[];
}

/** Roles that a line above the data may hold without being its head. */
const OF_ANY_LINE = ["date", "time", "index"];

/** The head and the row of units nearest above the first row of data. */
export function headAbove(split: Split, profile: ImportProfile): Head {
  let row = nonBlankAbove(split.rows, split.first);
  const unitsRow = row !== null && isUnitsRow(split.rows[row] ?? []) ? row : null;
  if (unitsRow !== null) row = nonBlankAbove(split.rows, unitsRow);
  const unitCells = unitsRow === null ? [] : headCells(split.rows[unitsRow] ?? [], split);
  if (profile.headerRow !== undefined) row = profile.headerRow === null ? null : profile.headerRow - 1;
  const found = row === null ? [] : headCells(split.rows[row] ?? [], split);
  const units = (headings: readonly string[]) =>
    Array.from({ length: Math.max(split.cells, headings.length) }, (_, n): HeadUnit => {
      const own = unitInHead(headings[n] ?? "");
      return own ?? unitOf(unitCells[n] ?? "");
    });
  const given = profile.columns?.some(({ heading }) => found.some((cell) => sameHead(cell, heading ?? ""))) ?? false;
  if (profile.headerRow === undefined && !given && !isHead(found))
    return { headerRow: null, unitsRow, headings: [], units: units([]) };
  return { headerRow: row, unitsRow, headings: found, units: units(found) };
}

export const sameHead = (one: string, other: string) => one.trim().toLowerCase() === other.trim().toLowerCase();

const isHead = (cells: readonly string[]) =>
  cells.some((cell) => {
    const role = roleOfHead(cell);
    return (role !== null && !OF_ANY_LINE.includes(role)) || (unitInHead(cell) !== null && isWords(cell));
  });

function nonBlankAbove(rows: readonly string[][], row: number): number | null {
  for (let above = row - 1; above >= 0; above -= 1) if (!isBlank(rows[above] ?? [])) return above;
  return null;
}

function isUnitsRow(cells: readonly string[]): boolean {
  const filled = withoutComment(cells).filter((cell) => !/^[\s-]*$/.test(cell));
  return filled.length > 0 && filled.every((cell) => unitOf(cell) !== null);
}

const withoutComment = (cells: readonly string[]) =>
  cells.map((cell, n) => (n === 0 && /^\s*(?:[#%]|\/\/)\s*\S/.test(cell) ? cell.replace(/^\s*[#%/]+\s*/, "") : cell));

/**
 * Heads of the columns. A head may be split in another way than the data below it; where that leaves a doubt, nothing is taken
 * from it.
 */
function headCells(row: readonly string[], { delimiter, cells }: Split): string[] {
  const own = withoutComment(row).map((cell) => cell.trim());
  const filled = own.filter((cell) => cell !== "");
  if (delimiter === " ") return headsOfWords(filled, cells);
  if (filled.length > 1 || cells === 1) return own;
  const [only = ""] = filled;
  const parts = only.split(/[,;|\t]/).map((part) => part.trim());
  if (parts.length === cells) return parts;
  return cells > 1 && parts.length === 1 ? headsOfWords(only.split(/\s+/), cells) : [];
}

const JOIN = "\u0000";

/** Heads that are parted like their own words: 'x (mm) z (µm)', or 'Position mm Height nm'. */
function headsOfWords(words: readonly string[], columns: number): string[] {
  // A unit in brackets belongs to the word before it.
  const parts = words
    .join(" ")
    .replace(/ (?=[([])/g, JOIN)
    .split(" ")
    .map((part) => part.replaceAll(JOIN, " "));
  if (parts.length === columns) return parts.map((part) => part.replace(/[,;]$/, ""));
  const heads: string[] = [];
  let open = "";
  for (const part of parts) {
    open = open === "" ? part : `${open} ${part}`;
    if (unitOf(part) === null && !/[)\]],?$/.test(part)) continue;
    heads.push(open.replace(/[,;]$/, ""));
    open = "";
  }
  return open === "" && heads.length === columns ? heads : [];
}
