import Papa from "papaparse";
import type { FileReading, SkippedRow } from "#app/schemas/scan-result.ts";
import type { LengthUnit } from "#app/schemas/scan.ts";

/** A profile as read: positions and heights in metres, and how the file was understood. */
export interface ReadProfile {
  points: { x: number; z: number }[];
  reading: FileReading;
}

/** A file that is no profile, with the sentence for the person who chose it. */
export class ProfileFileError extends Error {}

export interface ProfileFormat {
  positionUnit: LengthUnit;
  heightUnit: LengthUnit;
  decimalMark: "point" | "comma";
}

const METRES: Record<LengthUnit, number> = { m: 1, mm: 1e-3, µm: 1e-6, nm: 1e-9 };
const LEAST_POINTS = 7;
const SHOWN_ROWS = 20;

/** First bytes of files that are often dropped by mistake. */
const OTHER_FILES: { name: string; bytes: number[] }[] = [
  { name: "a zip archive (a spreadsheet saved as .xlsx is one too)", bytes: [0x50, 0x4b] },
  { name: "a PDF", bytes: [0x25, 0x50, 0x44, 0x46] },
  { name: "a PNG picture", bytes: [0x89, 0x50, 0x4e, 0x47] },
  { name: "a JPEG picture", bytes: [0xff, 0xd8, 0xff] },
  { name: "a gzip archive", bytes: [0x1f, 0x8b] },
  { name: "an old spreadsheet (.xls)", bytes: [0xd0, 0xcf, 0x11, 0xe0] },
];

function decode(bytes: Uint8Array, name: string): string {
  if (bytes.length === 0) throw new ProfileFileError(`${name} is empty. Choose the file that the profilometer wrote.`);
  const other = OTHER_FILES.find(({ bytes: start }) => start.every((byte, index) => bytes[index] === byte));
  if (other)
    throw new ProfileFileError(
      `${name} is ${other.name}, not a text file. Export the profile as CSV with two columns.`,
    );
  const [first, second] = bytes;
  if (first === 0xff && second === 0xfe) return new TextDecoder("utf-16le").decode(bytes);
  if (first === 0xfe && second === 0xff) return new TextDecoder("utf-16be").decode(bytes);
  if (bytes.subarray(0, 4096).includes(0))
    throw new ProfileFileError(`${name} is not a text file. Export the profile as CSV with two columns.`);
  try {
    return new TextDecoder("utf-8", { fatal: true }).decode(bytes);
  } catch {
    return new TextDecoder("windows-1252").decode(bytes);
  }
}

/** A number in a cell under a decimal mark that the person has stated; null when it is anything else. */
function cellNumber(cell: string, decimalMark: "point" | "comma"): number | null {
  const text = cell.trim().replace("\u2212", "-");
  const pattern =
    decimalMark === "point" ? /^[+-]?(\d+\.?\d*|\.\d+)([eE][+-]?\d+)?$/ : /^[+-]?(\d+,?\d*|,\d+)([eE][+-]?\d+)?$/;
  if (!pattern.test(text)) return null;
  const value = Number(text.replace(",", "."));
  return Number.isFinite(value) ? value : null;
}

/**
 * Reads the first two columns of a profilometer's CSV as position and height. A heading line, comments above it and blank lines
 * are passed over; a row further down that is no pair of numbers is left out and reported with its row and column.
 * @throws ProfileFileError with a sentence that says what is wrong and what to do
 */
export function readProfile(bytes: Uint8Array, name: string, format: ProfileFormat): ReadProfile {
  const text = decode(bytes, name);
  const delimiters = format.decimalMark === "comma" ? [";", "\t", "|"] : [",", ";", "\t", "|"];
  const parsed = Papa.parse<string[]>(text, { delimitersToGuess: delimiters, skipEmptyLines: false });
  const points: ReadProfile["points"] = [];
  const skipped: SkippedRow[] = [];
  let heading: string | null = null;
  let rows = 0;
  parsed.data.forEach((cells, index) => {
    if (cells.every((cell) => cell.trim() === "")) return;
    const [x, z] = [cells[0] ?? "", cells[1] ?? ""].map((cell) => cellNumber(cell, format.decimalMark));
    if (points.length === 0 && x === null && z === null) {
      heading = cells.slice(0, 2).join(", ").slice(0, 80);
      return;
    }
    rows += 1;
    if (x === null || x === undefined)
      skipped.push({ row: index + 1, column: "position", text: (cells[0] ?? "").slice(0, 40) });
    else if (z === null || z === undefined)
      skipped.push({ row: index + 1, column: "height", text: (cells[1] ?? "").slice(0, 40) });
    else points.push({ x: x * METRES[format.positionUnit], z: z * METRES[format.heightUnit] });
  });
  refuseUnusable(points.length, rows, skipped, name, format);
  return {
    points,
    reading: {
      rows,
      used: points.length,
      heading,
      delimiter: parsed.meta.delimiter,
      skipped: skipped.slice(0, SHOWN_ROWS),
      skippedInAll: skipped.length,
    },
  };
}

function refuseUnusable(used: number, rows: number, skipped: SkippedRow[], name: string, format: ProfileFormat): void {
  const first = skipped[0];
  const example = first
    ? ` Row ${first.row}, ${first.column}: “${first.text}” is not a number with a decimal ${format.decimalMark}.`
    : "";
  if (rows === 0)
    throw new ProfileFileError(
      `${name} has no row of numbers with a decimal ${format.decimalMark}. It needs two columns: position and height.`,
    );
  if (skipped.length > rows / 2)
    throw new ProfileFileError(
      `${name}: ${skipped.length} of ${rows} rows are no pair of numbers.${example} Check the decimal mark.`,
    );
  if (used < LEAST_POINTS)
    throw new ProfileFileError(
      `${name} has ${used} usable rows; a curvature needs at least ${LEAST_POINTS}.${example}`,
    );
}
