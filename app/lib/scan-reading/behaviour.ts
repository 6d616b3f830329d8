import { numberReader } from "./numbers.ts";
import type { DecimalMark, Thousands } from "./reading.ts";
import type { Split } from "./splits.ts";

/** How the numbers of a column run in the sample. */
export interface Behaviour {
  /** steps of one sign throughout */
  steady: boolean;
  /** steps of one length, within a hundredth */
  even: boolean;
  /** 0, 1, 2 … or 1, 2, 3 … */
  counts: boolean;
  constant: boolean;
  least: number;
  most: number;
}

export function behaviourOf(
  { rows, first }: Split,
  column: number,
  { decimalMark, thousands }: { decimalMark: DecimalMark | null; thousands: Thousands },
): Behaviour {
  const read = numberReader(decimalMark ?? "point", thousands);
  const values = rows.slice(first).flatMap((cells) => {
    const cell = cells[column] ?? "";
    const value = read(decimalMark === null ? cell.replace(",", ".") : cell);
    return Number.isNaN(value) ? [] : [value];
  });
  const steps = values.slice(1).map((value, n) => value - (values[n] ?? 0));
  const [least, most] = [Math.min(...values), Math.max(...values)];
  const sign = Math.sign(steps[0] ?? 0);
  const lengths = steps.map(Math.abs);
  const [short, long] = [Math.min(...lengths), Math.max(...lengths)];
  return {
    steady: steps.length > 1 && sign !== 0 && steps.every((step) => Math.sign(step) === sign),
    // The last digit that is written may round a step either way.
    even:
      steps.length > 1 && long - short <= 0.01 * long + 4 * Number.EPSILON * Math.max(Math.abs(least), Math.abs(most)),
    counts: steps.length > 1 && (values[0] === 0 || values[0] === 1) && steps.every((step) => step === 1),
    constant: steps.every((step) => step === 0),
    least,
    most,
  };
}
