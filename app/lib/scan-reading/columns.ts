import { excerpt } from "#app/lib/excerpt.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import { sameHead, type Head } from "./head.ts";
import type { ColumnRole, ReadColumn, ReadUnit } from "./reading.ts";
import { ScanFileError } from "./refusal.ts";
import { dimensionOfRole, roleOfHead } from "./roles.ts";
import type { Split } from "./splits.ts";
import { dimensionOf } from "./units.ts";

/** A column as its head and the import profile describe it, before the rest is told by the numbers. */
export interface DescribedColumn extends ReadColumn {
  /** unit that the file names, whether it is read here or not */
  fileUnit: Head["units"][number];
}

export const columnName = ({ index, heading }: { index: number; heading: string }) =>
  heading === "" ? `column ${index + 1}` : `“${excerpt(heading, 40)}”`;

/**
 * Columns by what their heads and the import profile say.
 * @throws ScanFileError where the file contradicts the profile
 */
export function describedColumns(name: string, split: Split, head: Head, profile: ImportProfile): DescribedColumn[] {
  const count = Math.max(split.cells, head.headings.length);
  const columns = Array.from({ length: count }, (_, index): DescribedColumn => {
    const heading = head.headings[index] ?? "";
    const fileUnit = head.units[index] ?? null;
    const role = roleOfHead(heading);
    return {
      index,
      heading: excerpt(heading, 80),
      role,
      unit: typeof fileUnit === "string" ? fileUnit : null,
      fileUnit,
      why: role === null ? "" : "by its head",
    };
  });
  if (profile.columns) mapColumns(name, columns, profile.columns, split, head);
  return columns;
}

type Mapped = NonNullable<ImportProfile["columns"]>;

function mapColumns(name: string, columns: DescribedColumn[], mapped: Mapped, split: Split, head: Head): void {
  const row = (head.headerRow ?? split.first) + 1;
  for (const column of columns) {
    column.role = "not read";
    column.why = "the import profile leaves it out";
  }
  for (const wanted of mapped) {
    const found =
      wanted.index === undefined
        ? columns.find(({ heading }) => sameHead(heading, wanted.heading ?? ""))
        : columns[wanted.index];
    if (!found)
      throw new ScanFileError(
        wanted.index === undefined
          ? `${name}, row ${row}: no column is headed “${excerpt(wanted.heading ?? "", 40)}”, which the import profile reads.`
          : `${name}, row ${split.first + 1}: the import profile reads column ${wanted.index + 1}, but there are ${columns.length} columns.`,
      );
    if (wanted.index !== undefined && wanted.heading !== undefined && !sameHead(found.heading, wanted.heading))
      throw new ScanFileError(
        `${name}, row ${row}: column ${wanted.index + 1} is headed “${found.heading}”; by the import profile it is “${excerpt(wanted.heading, 40)}”.`,
      );
    found.role = wanted.role;
    found.why = "by the import profile";
    if (wanted.unit) takeUnit(name, found, wanted.unit, head);
  }
}

/**
 * Gives a column the unit that a person has stated.
 * @throws ScanFileError when the file names another one
 */
export function takeUnit(name: string, column: DescribedColumn, unit: ReadUnit, head: Head): void {
  const { fileUnit, heading, index } = column;
  if (fileUnit !== null && fileUnit !== unit) {
    const named = typeof fileUnit === "string" ? fileUnit : fileUnit.notRead;
    const row = (heading === "" ? head.unitsRow : head.headerRow) ?? 0;
    const inHead = heading !== "" && head.unitsRow === null;
    const place = (inHead ? row : (head.unitsRow ?? row)) + 1;
    const remedy =
      typeof fileUnit === "string"
        ? `Choose ${named}, or the file that is in ${unit}.`
        : `${named} is not read here: export the column in another unit.`;
    const headed = heading === "" ? `column ${index + 1}` : `the ${column.role ?? "named"} column`;
    throw new ScanFileError(
      `${name}, row ${place}: ${headed} is headed “${excerpt(inHead ? heading : named, 40)}”, in ${named}, but ${unit} is chosen. ${remedy}`,
    );
  }
  column.unit = unit;
}

/** Roles whose unit a stated one for another role covers as well. */
const LIKE: Partial<Record<ColumnRole, ColumnRole>> = {
  radius: "position",
  "levelled height": "height",
  y: "position",
};

/**
 * Gives every column that is read its unit: the import profile's, else the file's.
 * @throws ScanFileError for units that contradict each other, that are not read here, or of something else
 */
export function settleUnits(name: string, columns: DescribedColumn[], head: Head, profile: ImportProfile): void {
  for (const column of columns) {
    const { role } = column;
    const dimension = dimensionOfRole(role);
    if (role === null || dimension === null) {
      column.unit = null;
      continue;
    }
    const stated = profile.units?.[role] ?? profile.units?.[LIKE[role] ?? role];
    if (stated) takeUnit(name, column, stated, head);
    if (column.unit === null && column.fileUnit !== null && typeof column.fileUnit !== "string")
      throw new ScanFileError(
        `${name}, row ${(head.unitsRow ?? head.headerRow ?? 0) + 1}: the ${role} column is in ${column.fileUnit.notRead}, which is not read here. Export it in another unit.`,
      );
    if (column.unit !== null && dimensionOf(column.unit) !== dimension)
      throw new ScanFileError(
        `${name}, row ${(head.unitsRow ?? head.headerRow ?? 0) + 1}: ${columnName(column)} is taken as ${role}, but ${column.unit} is no unit of ${dimension}.`,
      );
  }
}
