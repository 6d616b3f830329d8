import { importProfileOf } from "#app/lib/scan-reading/import-profile-of.ts";
import type { Ambiguity, ColumnRole, Reading, ReadColumn, ReadUnit } from "#app/lib/scan-reading/reading.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";

/** An answer to choose, with what it makes of the import profile. */
export interface Answer {
  label: string;
  profile: ImportProfile;
}

/**
 * The answers to what a file leaves open, each as the import profile that it makes. A question that is answered in the table of
 * columns, or by more than one choice, has none.
 */
export function answersTo(open: Ambiguity, reading: Reading, profile: ImportProfile): Answer[] {
  switch (open.what) {
    case "delimiter":
      return open.choices.map((label) => ({ label, profile: { ...profile, delimiter: reading.delimiter } }));
    case "decimal mark":
      return open.choices.map((choice) => markAnswer(choice, open.shown, profile));
    case "unit": {
      const role = reading.columns[open.column ?? -1]?.role ?? null;
      return role === null
        ? []
        : open.choices.map((unit) => ({
            label: unit,
            profile: withUnit(profile, role, open.column, unit as ReadUnit),
          }));
    }
    case "date order":
      return [
        { label: "day, then month", profile: { ...profile, dateOrder: "dmy" } },
        { label: "month, then day", profile: { ...profile, dateOrder: "mdy" } },
      ];
    case "what lies under the wafer":
      return (["nothing", "tape", "carrier"] as const).map((underneath) => ({
        label: underneath,
        profile: { ...profile, underneath },
      }));
    case "columns":
    case "kind":
    case "how measured":
      return [];
  }
}

/** '1,234' is 1.234 or 1234: the second also says what the comma is. */
function markAnswer(choice: string, shown: string | undefined, profile: ImportProfile): Answer {
  if (choice === "thousands") {
    const thousands = profile.decimalMark === "comma" ? "point" : "comma";
    return { label: "thousands are grouped", profile: { ...profile, thousands } };
  }
  const decimalMark = choice === "comma" ? "comma" : "point";
  const sign = shown?.includes(",") ? "comma" : "point";
  const number = shown ?? "";
  if (shown === undefined || sign === decimalMark) {
    const label = shown === undefined ? `decimal ${decimalMark}` : `${number.replace(",", ".")}, a decimal ${sign}`;
    return { label, profile: { ...without(profile, "thousands"), decimalMark } };
  }
  return {
    label: `${number.replace(/[.,]/, "")}, thousands grouped by a ${sign}`,
    profile: { ...profile, decimalMark, thousands: sign },
  };
}

/** The profile without one of its answers, so that the file tells it again. */
export function without(profile: ImportProfile, key: keyof ImportProfile): ImportProfile {
  const { [key]: _, ...rest } = profile;
  return rest;
}

/** The profile with a unit for a role, also where it names the column itself. */
export function withUnit(
  profile: ImportProfile,
  role: ColumnRole,
  column: number | null,
  unit: ReadUnit | null,
): ImportProfile {
  const { [role]: _, ...others } = profile.units ?? {};
  const units = unit === null ? others : { ...others, [role]: unit };
  const columns = profile.columns?.map((each) => {
    if (each.index !== column) return each;
    const { unit: _unit, ...plain } = each;
    return plain;
  });
  const next = { ...profile, units, ...(columns ? { columns } : {}) };
  return Object.keys(units).length === 0 ? without(next, "units") : next;
}

/** The profile with another role for a column; the other columns stay as they were understood. */
export function withRole(profile: ImportProfile, columns: readonly ReadColumn[], index: number, role: ColumnRole) {
  const changed = columns.map((column) => (column.index === index ? { ...column, role } : column));
  const read = changed.flatMap((column) =>
    column.role === null || column.role === "not read" ? [] : { index: column.index, role: column.role },
  );
  return read.length === 0 ? without(profile, "columns") : { ...profile, columns: read };
}

/** What is kept for an instrument: how the file was understood, and what a person has said of it. */
export const keptProfile = (reading: Reading, profile: ImportProfile): ImportProfile => ({
  ...importProfileOf(reading),
  ...profile,
});
