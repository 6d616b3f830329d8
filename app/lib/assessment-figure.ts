import { formatQuantity, formatWithUncertainty } from "#app/engine/units/format.ts";
import type { UnitSymbol } from "#app/engine/working.ts";
import { formatInUnit } from "./format-unit.ts";

/** Lengths up to here stand in µm: a warp and its limit are compared at a glance. */
const LONGEST_IN_MICROMETRES = 0.01;

interface SiFigure {
  value: number;
  unit: UnitSymbol;
  temperaturePoint?: boolean;
  standardUncertainty?: number | null;
}

/** A stored SI figure as text with its unit; a length with its expanded uncertainty, k = 2, where it has one. */
export function figureText({ value, unit, temperaturePoint, standardUncertainty }: SiFigure): string {
  if (unit !== "m") return temperaturePoint ? celsius(value) : formatInUnit(value, unit);
  if (Math.abs(value) < LONGEST_IN_MICROMETRES) return micrometres(value, standardUncertainty ?? null);
  return standardUncertainty
    ? formatWithUncertainty(value, 2 * standardUncertainty, "length")
    : formatQuantity(value, "length");
}

/** A length in µm; with expanded uncertainty, k = 2, where it has one, else to a tenth below 100 µm and whole above. */
export function micrometres(value: number, standardUncertainty: number | null = null): string {
  return standardUncertainty
    ? formatWithUncertainty(value, 2 * standardUncertainty, "length", { unit: "µm" })
    : formatQuantity(value, "length", { unit: "µm", decimals: Math.abs(value) < 1e-4 ? 1 : 0, trim: true });
}

/** A temperature (K) in whole °C. */
export function celsius(kelvin: number): string {
  return formatQuantity(kelvin, "temperature", { unit: "°C", decimals: 0 });
}
