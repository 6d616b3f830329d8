import { formatQuantity } from "#app/engine/units/format.ts";

/** A bow or warp for hands: to the nearest 10 µm, in mm from 2 mm on. */
export function roundedWarp(metres: number): string {
  if (metres >= 2e-3) return formatQuantity(metres, "length", { unit: "mm", decimals: 1 });
  return formatQuantity(metres, "length", { unit: "µm", decimals: -1 });
}

/** A limit for hands: down to 10 µm, never up. */
export function roundedLimit(metres: number): string {
  // A decimal limit turned into SI may lie a rounding error below itself.
  return roundedWarp(Math.floor(metres / 1e-5 + 1e-6) * 1e-5);
}

/** A roll radius for hands: one digit. */
export function roundedRadius(metres: number): string {
  return metres < 0.095
    ? formatQuantity(Math.max(metres, 0.01), "length", { unit: "mm", decimals: -1 })
    : formatQuantity(metres, "length", { unit: "m", significant: 1 });
}
