import type { ImportProfile } from "#app/schemas/import-profile.ts";
import type { Reading } from "./reading.ts";

/** A reading as the import profile that reads the next file of the same instrument in the same way. Encoding is each file's own. */
export function importProfileOf({ kind, delimiter, decimalMark, thousands, columns }: Reading): ImportProfile {
  return {
    kind,
    delimiter,
    ...(decimalMark === null ? {} : { decimalMark, thousands }),
    columns: columns.flatMap(({ index, heading, role, unit }) =>
      role === null || role === "not read"
        ? []
        : { ...(heading === "" ? { index } : { index, heading }), role, ...(unit === null ? {} : { unit }) },
    ),
  };
}
