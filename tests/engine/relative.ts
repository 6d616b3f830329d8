/** Size of the difference between a value and what is expected, relative to the latter. A missing value is infinitely off. */
export function relative(value: number | undefined, expected: number): number {
  return value === undefined ? Number.POSITIVE_INFINITY : Math.abs(value - expected) / Math.abs(expected);
}
