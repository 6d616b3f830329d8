import { bowFromCurvature, standardBow } from "#app/engine/stoney/bow.ts";
import type { RepeatsOf } from "#app/schemas/instrument.ts";
import { readQuantity, type QuantityRule } from "./read-quantity.ts";

/** Most repeats of one study. */
const MOST_READINGS = 200;

/** Curvature, 1/m, of a wafer whose standard bow over its diameter is `bow`, both m. */
export function curvatureOfBow(bow: number, diameter: number): number {
  return standardBow(bow) / bowFromCurvature({ curvature: 1, radius: diameter / 2 });
}

/** Size of the bow, m, that a curvature (1/m) makes over a diameter (m). */
export function bowOfCurvature(curvature: number, diameter: number): number {
  return Math.abs(bowFromCurvature({ curvature, radius: diameter / 2 }));
}

/**
 * Repeats typed one a line, each with its unit, as curvatures in 1/m. Blank lines are passed over.
 * @returns the line and what is wrong with it when one cannot be read
 */
export function readTypedRepeats(
  text: string,
  { typedAs, diameter, rule }: { typedAs: RepeatsOf; diameter: number; rule: QuantityRule },
): { ok: true; curvatures: number[] } | { ok: false; fault: string } {
  const lines = text.split(/\r\n?|\n|;/).map((line) => line.trim());
  const curvatures: number[] = [];
  for (const [n, line] of lines.entries()) {
    if (line === "") continue;
    const read = readQuantity(line, rule);
    if (!read.ok) return { ok: false, fault: `Line ${n + 1}: ${read.message}` };
    curvatures.push(typedAs === "bow" ? curvatureOfBow(read.value, diameter) : read.value);
  }
  if (curvatures.length > MOST_READINGS)
    return { ok: false, fault: `${curvatures.length} readings are more than a study takes, ${MOST_READINGS}.` };
  return { ok: true, curvatures };
}
