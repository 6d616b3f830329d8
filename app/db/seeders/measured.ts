import type { Measured } from "#app/engine/measured.ts";

type Source = Measured["source"];

/** A value with its tolerance and provenance, in SI; the words of a seed. */
export function measured(
  value: number,
  tolerance: number | null,
  source: Source,
  note = "",
  on: string | null = null,
): Measured {
  return { value, tolerance, source, note, on };
}

/** °C to K for seeds. */
export const celsius = (temperature: number): number => temperature + 273.15;

/** The middle of a range with half its width as tolerance. */
export function range(low: number, high: number, source: Source, note: string): Measured {
  return measured((low + high) / 2, (high - low) / 2, source, note);
}
