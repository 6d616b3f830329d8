/** A coordinate as path text: hundredths of a pixel, no trailing zeros, no minus zero. */
export function coordinate(value: number): string {
  return String(Math.round(value * 100) / 100 + 0);
}
