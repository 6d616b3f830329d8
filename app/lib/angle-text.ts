import { formatQuantity } from "#app/engine/units/format.ts";

/** An angle in whole degrees, '45°'. */
export function angleText(radians: number): string {
  return formatQuantity(radians, "angle", { unit: "°", decimals: 0 });
}
