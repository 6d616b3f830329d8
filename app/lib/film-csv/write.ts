import type { Measured } from "#app/engine/measured.ts";
import { fromSi, stepFromSi } from "#app/engine/units/convert.ts";
import { findUnit, type Dimension } from "#app/engine/units/dimensions.ts";
import { csvOf, type CsvMark } from "../csv.ts";
import {
  allHeads,
  given,
  headOf,
  MEASURED_COLUMNS,
  PLAIN_COLUMNS,
  type FilmState,
  type MeasuredColumns,
} from "./columns.ts";

/** Films as a table, which reads back as the same films whatever its decimal mark. Blank where nothing is given. */
export function filmsCsv(films: readonly FilmState[], mark?: CsvMark): string {
  const heads = allHeads();
  const lines = films.map((film) => {
    const cells = cellsOf(film);
    return heads.map((head) => cells.get(head) ?? "");
  });
  return csvOf([heads, ...lines], mark);
}

/** What each column says of a film, numbers in the unit of its head. */
function cellsOf(film: FilmState): Map<string, string | number> {
  const cells = new Map<string, string | number>();
  for (const { property, handling, head, unit } of PLAIN_COLUMNS) {
    const value = given(film, property, handling);
    if (typeof value === "string") cells.set(head, value);
    if (typeof value === "number" && unit) cells.set(head, inUnit(value, "length", unit));
  }
  for (const columns of MEASURED_COLUMNS) {
    const measured = given(film, columns.property, columns.handling) as Measured | null;
    if (measured) setMeasured(cells, columns, measured);
  }
  return cells;
}

function setMeasured(cells: Map<string, string | number>, columns: MeasuredColumns, measured: Measured) {
  const { dimension, unit, tolerance = { dimension, unit } } = columns;
  cells.set(headOf(columns, "value"), inUnit(measured.value, dimension, unit));
  if (measured.tolerance !== null)
    cells.set(headOf(columns, "tolerance"), inUnit(measured.tolerance, tolerance.dimension, tolerance.unit, true));
  cells.set(headOf(columns, "source"), measured.source);
  cells.set(headOf(columns, "note"), measured.note ?? "");
  cells.set(headOf(columns, "date"), measured.on ?? "");
}

/** The same as text with units, as a table that is read says it. */
export function textCellsOf(film: FilmState): Map<string, string> {
  const units = new Map(
    MEASURED_COLUMNS.flatMap((columns) => [
      [headOf(columns, "value"), columns.unit] as const,
      [headOf(columns, "tolerance"), columns.tolerance?.unit ?? columns.unit] as const,
    ]),
  );
  for (const { head, unit } of PLAIN_COLUMNS) if (unit) units.set(head, unit);
  return new Map(
    [...cellsOf(film)].map(([head, cell]) => [
      head,
      typeof cell === "number" ? `${cell} ${units.get(head) ?? ""}`.trim() : cell,
    ]),
  );
}

function inUnit(value: number, dimension: Dimension, spelling: string, isStep = false): number {
  const unit = findUnit(dimension, spelling);
  const number = unit ? (isStep ? stepFromSi : fromSi)(value, unit, dimension) : value;
  return Number(number.toPrecision(12));
}
