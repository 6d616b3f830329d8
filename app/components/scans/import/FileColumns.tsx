import type { Layout } from "#app/lib/scan-reading/layout.ts";
import { withRole, withUnit } from "#app/lib/scan-import/answers.ts";
import {
  ANGLE_UNITS,
  COLUMN_ROLES,
  LENGTH_UNITS,
  STRESS_UNITS,
  type ColumnRole,
  type Place,
  type ReadColumn,
  type ReadUnit,
} from "#app/lib/scan-reading/reading.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";

interface Props {
  name: string;
  layout: Layout;
  /** cells that could not be used */
  faulty: readonly Place[];
  profile: ImportProfile;
  onProfile: (profile: ImportProfile) => void;
}

/** Columns that are shown; a file with more is told from its first ones. */
const MOST_COLUMNS = 24;
const NAMES: readonly (ColumnRole | null)[] = [
  "index",
  "time",
  "date",
  "slope",
  "lot",
  "slot",
  "wafer",
  "not read",
  null,
];

/** The first rows of a file, each column with its role and unit, why, and both to be changed. */
export function FileColumns({ name, layout: { reading, preview }, faulty, profile, onProfile }: Props) {
  const columns = reading.columns.slice(0, MOST_COLUMNS);
  const rows = preview.filter(({ row }) => row !== reading.headerRow && row !== reading.unitsRow);
  const setRole = (index: number, role: ColumnRole) => onProfile(withRole(profile, reading.columns, index, role));
  const setUnit = (role: ColumnRole, index: number, unit: ReadUnit | null) =>
    onProfile(withUnit(profile, role, index, unit));
  return (
    <div
      className="min-w-0 overflow-x-auto border border-line"
      tabIndex={0}
      role="region"
      aria-label={`First rows of ${name}`}
    >
      <table className="table w-auto">
        <caption className="sr-only">First rows of {name} and how its columns are read</caption>
        <thead>
          <tr>
            <th scope="col" className="num">
              Row
            </th>
            {columns.map((column) => (
              <th scope="col" key={column.index} className="min-w-36">
                <ColumnHead column={column} onRole={setRole} onUnit={setUnit} />
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {rows.map(({ row, cells }) => (
            <tr key={row}>
              <th scope="row" className="num font-normal text-quiet">
                {row}
              </th>
              {columns.map(({ index, role }) => (
                <td key={index} className={`num ${cellStyle(faulty, row, index, role)}`}>
                  {cells[index] ?? ""}
                </td>
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </div>
  );
}

function cellStyle(faulty: readonly Place[], row: number, column: number, role: ColumnRole | null): string {
  if (faulty.some((place) => place.row === row && (place.column === column || place.column === null)))
    return "font-semibold text-stop outline-2 -outline-offset-2 outline-stop";
  return role === "not read" ? "text-quiet line-through" : "";
}

function ColumnHead({
  column: { index, heading, role, unit, why },
  onRole,
  onUnit,
}: {
  column: ReadColumn;
  onRole: (index: number, role: ColumnRole) => void;
  onUnit: (role: ColumnRole, index: number, unit: ReadUnit | null) => void;
}) {
  const called = heading === "" ? `column ${index + 1}` : heading;
  return (
    <>
      <span className="block font-semibold text-ink wrap-anywhere">{called}</span>
      <select
        className="input mt-1"
        aria-label={`Role of ${called}`}
        value={role ?? ""}
        onChange={({ currentTarget: { value } }) => onRole(index, value as ColumnRole)}
      >
        {role === null && <option value="">not known</option>}
        {COLUMN_ROLES.map((each) => (
          <option key={each}>{each}</option>
        ))}
      </select>
      {role !== null && !NAMES.includes(role) && (
        <select
          className="input mt-1"
          aria-label={`Unit of ${called}`}
          value={unit ?? ""}
          onChange={({ currentTarget: { value } }) => onUnit(role, index, value === "" ? null : (value as ReadUnit))}
        >
          <option value="">{unit === null ? "no unit" : "as the file says"}</option>
          {unitsOf(role).map((each) => (
            <option key={each}>{each}</option>
          ))}
        </select>
      )}
      <span className="mt-1 block max-w-48">{why === "by the import profile" ? "chosen" : why}</span>
    </>
  );
}

function unitsOf(role: ColumnRole): readonly ReadUnit[] {
  if (role === "angle") return ANGLE_UNITS;
  return role === "stress" || role === "modulus" ? STRESS_UNITS : LENGTH_UNITS;
}
