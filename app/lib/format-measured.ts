import type { Measured } from "#app/engine/measured.ts";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { formatQuantity, formatWithUncertainty } from "#app/engine/units/format.ts";

interface Style {
  unit: string;
  sign?: boolean;
  /** without its unit, where that stands in the head of the column */
  bare?: boolean;
}

/** A value with its tolerance, '30 ± 3 MPa'; the half-width as somebody stated it, not an uncertainty. */
export function formatMeasured(
  { value, tolerance }: Measured,
  dimension: Dimension,
  { unit, sign, bare }: Style,
): string {
  const text =
    tolerance === null || tolerance === 0
      ? formatQuantity(value, dimension, { unit, sign })
      : formatWithUncertainty(value, tolerance, dimension, { unit, sign });
  return bare ? withoutUnit(text) : text;
}

/** A value alone, for a column whose head names the unit. */
export function formatBare(value: number, dimension: Dimension, unit: string): string {
  return withoutUnit(formatQuantity(value, dimension, { unit }));
}

/** A formatted quantity without the unit that a column's head names. */
export function withoutUnit(text: string): string {
  return text.replace(/\u00A0[^\u00A0]*$/, "");
}
