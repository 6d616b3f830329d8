import { excerpt } from "#app/lib/excerpt.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import { behaviourOf } from "./behaviour.ts";
import { columnName, describedColumns, settleUnits, type DescribedColumn } from "./columns.ts";
import { dateLine } from "./date-line.ts";
import { marksOf, type Marks } from "./decimal-mark.ts";
import { headAbove, type Head } from "./head.ts";
import { markEvidence } from "./numbers.ts";
import { pairsOf, settleProfileColumns } from "./profile-columns.ts";
import type { Ambiguity, Encoding, Reading } from "./reading.ts";
import { ScanFileError } from "./refusal.ts";
import { dimensionOfRole, kindOfRoles, UNIT_CHOICES } from "./roles.ts";
import { bestSplit, type Split } from "./splits.ts";
import { refuseNoTable, refuseTooWide } from "./unreadable.ts";

/** Rows and cells of what a person is shown of a file. */
const PREVIEW_ROWS = 12;
const PREVIEW_CELLS = 24;

export interface Layout {
  reading: Reading;
  /** the first rows from the head on, as they stand in the file */
  preview: { row: number; cells: string[] }[];
}

/**
 * Tells how a file is written from its beginning, under what a person has already said.
 * @throws ScanFileError when it holds no table, or contradicts what was said
 */
export function layoutOf(name: string, sample: string, encoding: Encoding, profile: ImportProfile): Layout {
  const named = /^sep=(.)\n/i.exec(sample)?.[1] ?? null;
  if (named !== null && profile.delimiter !== undefined && profile.delimiter !== named)
    throw new ScanFileError(
      `${name}, row 1: “sep=${named}” says that “${named}” stands between the columns; by the import profile it is “${profile.delimiter}”.`,
    );
  const split = bestSplit(name, sample, profile.delimiter ?? named, profile.decimalMark ?? null);
  refuseTooWide(name, split);
  if (split.score === 0) refuseNoTable(name, sample, profile, split);
  if (profile.firstRow !== undefined) split.first = profile.firstRow - 1;
  const head = headAbove(split, profile);
  const marks = marksOf(split, profile);
  const columns = describedColumns(name, split, head, profile);
  const kind = profile.kind ?? kindOfRoles(columns.map(({ role }) => role));
  const ambiguities: (Ambiguity | null)[] = [wholeNumbers(split, head, profile), marks.ambiguity];
  if (kind === "profiles") {
    if (split.dataColumns.length < 2) refuseNoTable(name, sample, profile, split);
    ambiguities.push(settleProfileColumns(columns, split, marks, profile.columns !== undefined));
  } else
    for (const column of columns)
      if (column.role === null) Object.assign(column, { role: "not read", why: "names nothing that is read here" });
  settleUnits(name, columns, head, profile);
  const pairs = kind === "profiles" ? pairsOf(columns) : [];
  const read =
    kind === "profiles"
      ? columns.filter(({ index }) => pairs.some(({ position, height }) => index === position || index === height))
      : columns;
  ambiguities.push(...read.map((column) => openUnit(column, split, marks)));
  const date = dateLine(linesAbove(split, head), profile.dateOrder);
  if (date?.day === null) ambiguities.push(openDate(date));
  if (kind === "summary" && !profile.measured) ambiguities.push(openMeasuring());
  if (kind === "thickness map" && !profile.underneath) ambiguities.push(openUnderneath());
  return {
    reading: {
      kind,
      encoding,
      delimiter: split.delimiter,
      delimiterNamed: named !== null,
      decimalMark: marks.decimalMark,
      thousands: marks.thousands,
      headerRow: head.headerRow === null ? null : head.headerRow + 1,
      unitsRow: head.unitsRow === null ? null : head.unitsRow + 1,
      firstRow: split.first + 1,
      columns: columns.map(({ fileUnit: _, ...column }) => column),
      pairs,
      date,
      ambiguities: ambiguities.filter((one) => one !== null),
    },
    preview: previewOf(split, head),
  };
}

function previewOf({ rows, first }: Split, { headerRow, unitsRow }: Head): Layout["preview"] {
  const from = headerRow ?? unitsRow ?? first;
  return rows.slice(from, from + PREVIEW_ROWS).map((cells, n) => ({
    row: from + n + 1,
    cells: cells.slice(0, PREVIEW_CELLS).map((cell) => excerpt(cell, 40)),
  }));
}

const linesAbove = ({ rows, first, delimiter }: Split, { headerRow }: Head) =>
  rows.slice(0, headerRow ?? first).map((cells) => cells.join(delimiter));

const ask = (what: Ambiguity["what"], sentence: string, choices: string[], blocks = true): Ambiguity => ({
  what,
  column: null,
  choices,
  chosen: null,
  blocks,
  sentence,
});

/** '-95,00,8,236' reads as four whole numbers under commas: nobody can tell which comma is which. */
function wholeNumbers({ rows, first, cells, delimiter }: Split, head: Head, profile: ImportProfile): Ambiguity | null {
  if (delimiter !== "," || profile.delimiter !== undefined || cells % 2 !== 0) return null;
  if (head.headings.filter((heading) => heading !== "").length === cells) return null;
  if (cells === 2 && profile.decimalMark === "point") return null;
  const data = rows.slice(first).filter((row) => row.length === cells);
  const pairs = data.every((row) =>
    row.every((cell, n) => (n % 2 === 0 ? markEvidence(cell).kind === "none" : /^\d+$/.test(cell))),
  );
  const [shown] = data;
  if (!pairs || !shown) return null;
  const count = cells === 2 ? "two" : cells === 4 ? "four" : String(cells);
  return ask(
    "delimiter",
    `every row holds ${count} whole numbers, such as “${excerpt(shown.join(","), 40)}”. Commas for decimals and commas between columns cannot be told apart: export with semicolons between the columns.`,
    [`${count} columns of whole numbers`],
  );
}

function openUnit(column: DescribedColumn, split: Split, marks: Marks): Ambiguity | null {
  const dimension = dimensionOfRole(column.role);
  if (dimension === null || column.unit !== null) return null;
  const { least, most } = behaviourOf(split, column.index, marks);
  const range = Number.isFinite(least) ? `; its numbers run from ${least} to ${most}` : "";
  return {
    ...ask("unit", `the ${column.role} column, ${columnName(column)}, names no unit${range}.`, [
      ...UNIT_CHOICES[dimension],
    ]),
    column: column.index,
  };
}

const openDate = ({ row, text }: { row: number; text: string }) =>
  ask("date order", `row ${row} holds “${text}”: day and month may be either way round.`, ["dmy", "mdy"], false);

const openMeasuring = () =>
  ask(
    "how measured",
    "nothing says which side was up, what the wafer lay on, and whether gravity was compensated.",
    ["device side up", "back side up"],
    false,
  );

const openUnderneath = () =>
  ask(
    "what lies under the wafer",
    "nothing says whether a tape or a carrier lay under the wafer.",
    ["nothing", "tape", "carrier"],
    false,
  );
