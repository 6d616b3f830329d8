import type { Measured } from "#app/engine/measured.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import { formatBare } from "./format-measured.ts";

/** A film's thickness, m, the way the trade says it: 0.3 µm, but 20 nm. */
export function filmThicknessText(thickness: number): string {
  return formatQuantity(thickness, "length", { unit: thickness >= 0.1e-6 && thickness < 1e-3 ? "µm" : undefined });
}

/** Silicon in µm without the unit, with its half-width as it was stated: '110 ± 3'. */
export function siliconText({ value, tolerance }: Measured): string {
  const text = formatBare(value, "length", "µm");
  return tolerance === null ? text : `${text}\u00A0±\u00A0${formatBare(tolerance, "length", "µm")}`;
}
