/** The number asked for, kept between 1 and one more than there are steps; the end for anything else. */
export function stepNumber(asked: string | null, steps: number): number {
  const number = Number.parseInt(asked ?? "", 10);
  return Number.isInteger(number) ? Math.min(Math.max(1, number), steps + 1) : steps + 1;
}
