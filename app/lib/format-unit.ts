import type { Dimension } from "#app/engine/units/dimensions.ts";
import { formatNumber } from "#app/engine/units/format-number.ts";
import { formatQuantity } from "#app/engine/units/format.ts";
import type { UnitSymbol } from "#app/engine/working.ts";

const DIMENSION_OF: Partial<Record<UnitSymbol, Dimension>> = {
  m: "length",
  Pa: "stress",
  K: "temperatureDifference",
  "1/m": "curvature",
  "1/K": "expansion",
  "N/m": "forcePerLength",
  s: "time",
  "kg/m3": "density",
  rad: "angle",
};

/**
 * A figure in the SI unit that the engine names, as text in the unit that suits it, to five digits. `temperaturePoint` tells a
 * point, shown in °C, from a difference, shown in K.
 */
export function formatInUnit(value: number, unit: UnitSymbol, temperaturePoint = false): string {
  const style = { significant: 5, trim: true };
  if (temperaturePoint) return formatQuantity(value, "temperature", { ...style, unit: "°C" });
  const dimension = DIMENSION_OF[unit];
  if (dimension) return formatQuantity(value, dimension, style);
  const number = formatNumber(value, style);
  return unit === "1" ? number : `${number}\u00A0${unit}`;
}
