import { packIntegers, unpackIntegers } from "../packed-integers.ts";

/** Values of a smooth function, a row for each place and in it a column for each Poisson's ratio. */
export type SmoothTable = readonly (readonly number[])[];

/** Differences of this order of a smooth column are little more than its rounding: one or two characters each. */
const ORDER = 4;

/** A table as text: its columns one after the other, rounded to whole `1/perUnit`, as differences along the column. */
export function packTable(rows: SmoothTable, perUnit: number): string {
  const columns = (rows[0] ?? []).map((_, column) => rows.map((row) => Math.round((row[column] ?? NaN) * perUnit)));
  for (const column of columns)
    for (let order = 0; order < ORDER; order += 1)
      for (let n = column.length - 1; n > order; n -= 1) column[n] = (column[n] ?? NaN) - (column[n - 1] ?? NaN);
  return packIntegers(columns.flat());
}

/** The table of `columns` columns that `packTable` has made text of. */
export function unpackTable(text: string, columns: number, perUnit: number): SmoothTable {
  const all = unpackIntegers(text);
  const length = all.length / columns;
  const sums = Array.from({ length: columns }, (_, column) => all.slice(column * length, (column + 1) * length));
  for (const column of sums)
    for (let order = ORDER - 1; order >= 0; order -= 1)
      for (let n = order + 1; n < length; n += 1) column[n] = (column[n] ?? NaN) + (column[n - 1] ?? NaN);
  return Array.from({ length }, (_, row) => sums.map((column) => (column[row] ?? NaN) / perUnit));
}
