import type { Measured } from "../measured.ts";

/** The quantity at a value that is tried: nobody measured it, its spread is taken to stay what it was. */
export function tried(was: Measured | null, value: number, note: string): Measured {
  const tolerance = was?.tolerance ?? null;
  const spread = tolerance !== null && tolerance < Math.abs(value) ? tolerance : null;
  return { value, tolerance: spread, source: "assumed", note, on: null };
}
