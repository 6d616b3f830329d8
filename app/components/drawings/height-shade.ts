import { colour } from "./colour.ts";

/** Fill of a height between the lowest and the highest: silicon below the middle, copper above, stronger towards the ends. */
export function heightShade(
  { low, high }: { low: number; high: number },
  height: number,
): { fill: string; fillOpacity: number } {
  const share = high > low ? Math.min(1, Math.max(0, (height - low) / (high - low))) : 0.5;
  const off = Math.abs(share - 0.5) * 2;
  return { fill: colour(share < 0.5 ? "silicon" : "copper"), fillOpacity: Math.round((0.06 + 0.5 * off) * 100) / 100 };
}
