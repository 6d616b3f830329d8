import { formatQuantity, formatWithUncertainty } from "#app/engine/units/format.ts";
import type { SourceKind } from "#app/engine/vocabulary.ts";
import type { ScanResult } from "#app/schemas/scan-result.ts";
import { formatMeasured } from "./format-measured.ts";

/** Coverage factor of every uncertainty on a screen. */
export const COVERAGE = 2;

/** A stress with its expanded uncertainty, '31.2 ± 1.4 MPa'. */
export function stressText({ stress, stressUncertainty }: Pick<ScanResult, "stress" | "stressUncertainty">): string {
  return formatWithUncertainty(stress, COVERAGE * stressUncertainty, "stress", { unit: "MPa" });
}

/** How a stress pulls, or that it cannot be told from none. */
export function senseOf({ stress, stressUncertainty }: Pick<ScanResult, "stress" | "stressUncertainty">): string {
  if (Math.abs(stress) <= COVERAGE * stressUncertainty) return "not told from zero";
  return stress > 0 ? "tension" : "compression";
}

/** The word of a standard bow: where the centre lies with the device side up. */
export function bowWord(bow: number, uncertainty: number): string {
  if (Math.abs(bow) <= COVERAGE * uncertainty) return "flat within its uncertainty";
  return bow < 0 ? "centre low, device side up" : "centre high, device side up";
}

interface LibraryFilm {
  name: string;
  stress: number;
  stressTolerance: number | null;
  source: SourceKind;
}

/**
 * The answer of a scan: what was measured, and how it stands to what the library uses. A wafer that has rolled gives no stress,
 * because the relation behind it does not hold there.
 */
export function scanAnswer(label: string, film: LibraryFilm | null, result: ScanResult): string[] {
  const name = film?.name ?? label;
  if (result.curled) return [`${name}: the wafer has rolled up, so these scans give no film stress.`];
  const measured = `${name}: ${stressText(result)}, ${senseOf(result)}.`;
  if (!film) return [measured, "It is not compared: no film of the library was named."];
  const used = formatMeasured({ value: film.stress, tolerance: film.stressTolerance, source: film.source }, "stress", {
    unit: "MPa",
  });
  const source = film.source === "assumed" ? ", assumed" : "";
  return [measured, `The library uses ${used}${source}${against(film, result)}`];
}

/** Two values agree when they differ by no more than the root sum of squares of their intervals. */
function against({ stress, stressTolerance }: LibraryFilm, result: ScanResult): string {
  const difference = result.stress - stress;
  const together = Math.hypot(COVERAGE * result.stressUncertainty, stressTolerance ?? 0);
  if (Math.abs(difference) <= together) return ": the two agree.";
  const size = formatQuantity(Math.abs(difference), "stress", { unit: "MPa", significant: 2 });
  return `: this scan lies ${size} further towards ${difference > 0 ? "tension" : "compression"}.`;
}
