import type { Measured } from "#app/engine/measured.ts";
import { isMeasured } from "./input-property.ts";

/**
 * A record's new values, with each property that came back from its form as it was left whole: a form shows text, and what it does
 * not show, such as that a value is a mean of others, would be lost.
 */
export function keepUnchanged(record: object, values: Record<string, unknown>): Record<string, unknown> {
  const stored = record as Record<string, unknown>;
  return Object.fromEntries(
    Object.entries(values).map(([name, value]) => {
      const before = stored[name];
      return [
        name,
        isMeasured(before) && isMeasured(value) && saysTheSame(before, value) ? { ...before, ...value } : value,
      ];
    }),
  );
}

export const saysTheSame = (a: Measured, b: Measured) =>
  sameNumber(a.value, b.value) &&
  sameNumber(a.tolerance, b.tolerance) &&
  a.source === b.source &&
  (a.note ?? "") === (b.note ?? "") &&
  (a.on ?? "") === (b.on ?? "");

/** A number that went through the text of a form may differ in its last digits. */
const sameNumber = (a: number | null, b: number | null) =>
  a === null || b === null ? a === b : Math.abs(a - b) <= 1e-9 * Math.max(Math.abs(a), Math.abs(b));
