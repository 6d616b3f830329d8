import { formatQuantity } from "#app/engine/units/format.ts";
import { COVERAGE } from "#app/lib/scan-answer.ts";
import { bowOfCurvature } from "#app/lib/study-readings.ts";

/** Expanded repeatability of a curvature from its standard uncertainty, 1/m. */
export function repeatabilityText(forTwo: number): string {
  return `±\u00A0${formatQuantity(COVERAGE * forTwo, "curvature", { unit: "1/km", significant: 2 })}`;
}

/** The same as a bow over a diameter, m. */
export function repeatabilityOfBow(forTwo: number, diameter: number): string {
  return `±\u00A0${formatQuantity(bowOfCurvature(COVERAGE * forTwo, diameter), "length", { unit: "µm", significant: 2 })}`;
}
