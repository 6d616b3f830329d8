import { excerpt } from "#app/lib/excerpt.ts";
import { isMissing, markEvidence } from "./numbers.ts";
import type { DecimalMark, Fault } from "./reading.ts";

/** Places that are kept of each cause. */
const SHOWN = 5;
const LONGEST_CELL = 40;

/** Faults of a file, grouped by cause: a million of one kind takes no more room than five. */
export class FaultList {
  readonly #causes = new Map<string, Fault>();
  /** rows with a fault */
  rows = 0;

  add(cause: string, row: number, column: number | null, text: string): void {
    const known = this.#causes.get(cause);
    const fault = known ?? { cause, count: 0, places: [] };
    if (!known) this.#causes.set(cause, fault);
    fault.count += 1;
    if (fault.places.length < SHOWN) fault.places.push({ row, column, text: excerpt(text, LONGEST_CELL) });
  }

  /** The most frequent cause first. */
  list(): Fault[] {
    return [...this.#causes.values()].sort((one, other) => other.count - one.count);
  }
}

/** Why a cell is no number under a decimal mark. */
export function causeOf(cell: string | undefined, mark: DecimalMark | null): string {
  if (cell === undefined) return "column missing";
  if (cell.trim() === "") return "empty cell";
  if (isMissing(cell)) return "no value";
  const { kind } = markEvidence(cell);
  if (mark === null && kind !== null) return "decimal mark not known";
  if (kind !== null) return `not a number with a decimal ${mark}`;
  return "not a number";
}
