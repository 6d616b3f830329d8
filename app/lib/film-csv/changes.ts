import type { Measured } from "#app/engine/measured.ts";
import type { FilmChange } from "#app/schemas/film-import.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { formatMeasured } from "../format-measured.ts";
import { saysTheSame } from "../keep-unchanged.ts";
import { given, MEASURED_COLUMNS, PLAIN_COLUMNS, type FilmState, type MeasuredColumns } from "./columns.ts";

/** Every property of two films or of two states of one, in words, in the order of a table. */
export function filmsInWords(one: FilmState, other: FilmState): (FilmChange & { differs: boolean })[] {
  const changed = new Map(filmChanges(one, other).map((change) => [change.label, change]));
  const measured = MEASURED_COLUMNS.map((columns) => ({
    label: columns.label,
    from: measuredWords(given(one, columns.property, columns.handling) as Measured | null, columns),
    to: measuredWords(given(other, columns.property, columns.handling) as Measured | null, columns),
  }));
  const plain = PLAIN_COLUMNS.filter(({ property }) => property !== "name").map(
    ({ property, handling, label, unit }) => ({
      label,
      from: plainWords(given(one, property, handling), unit),
      to: plainWords(given(other, property, handling), unit),
    }),
  );
  return [...measured, ...plain].map((row) => ({ ...row, differs: changed.has(row.label) }));
}

/** What differs between two states of a film, property by property, in words. */
export function filmChanges(before: FilmState, after: FilmState): FilmChange[] {
  const plain = PLAIN_COLUMNS.flatMap(({ property, handling, label, unit }): FilmChange[] => {
    const [old, fresh] = [given(before, property, handling), given(after, property, handling)];
    return samePlain(old, fresh) ? [] : [{ label, from: plainWords(old, unit), to: plainWords(fresh, unit) }];
  });
  const measured = MEASURED_COLUMNS.flatMap((columns): FilmChange[] => {
    const { property, handling, label } = columns;
    const old = given(before, property, handling) as Measured | null;
    const fresh = given(after, property, handling) as Measured | null;
    if (old === null ? fresh === null : fresh !== null && saysTheSame(old, fresh)) return [];
    return [{ label, from: measuredWords(old, columns), to: measuredWords(fresh, columns) }];
  });
  return [...measured, ...plain];
}

/** A length that went through a table may differ in its last digits. */
const samePlain = (a: unknown, b: unknown) =>
  typeof a === "number" && typeof b === "number"
    ? Math.abs(a - b) <= 1e-9 * Math.max(Math.abs(a), Math.abs(b))
    : (a || null) === (b || null);

function plainWords(value: unknown, unit: string | undefined): string {
  if (typeof value === "number") return formatQuantity(value, "length", { unit, significant: 6, trim: true });
  return typeof value === "string" && value !== "" ? value : "not given";
}

/** '30 ± 3 MPa, supplier, data sheet, 2026-11-30' */
export function measuredWords(
  measured: Measured | null,
  { dimension, unit }: Pick<MeasuredColumns, "dimension" | "unit">,
): string {
  if (!measured) return "not given";
  const { source, note, on } = measured;
  return [formatMeasured(measured, dimension, { unit }), source, note, on].filter(Boolean).join(", ");
}
