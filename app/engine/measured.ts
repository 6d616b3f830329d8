import type { SourceKind } from "./vocabulary.ts";

/**
 * A property as somebody stated it. `value` in SI; `tolerance` is the half-width of the interval believed to hold the
 * value, null when nobody gave one; `on` is the ISO date of the measurement; `text` is what was typed. `meanOf` is there when it is
 * the mean of that many measured values, and goes when somebody states another.
 */
export interface Measured {
  value: number;
  tolerance: number | null;
  source: SourceKind;
  note?: string;
  on?: string | null;
  text?: string;
  meanOf?: number;
}

/**
 * Standard uncertainty of a stated value: tolerance/√3, the rectangular distribution of JCGM 100:2008 4.3.7, when only an
 * interval is known. Zero when no tolerance was given, which rules report on their own.
 */
export const standardUncertainty = ({ tolerance }: Measured): number => fromTolerance(tolerance);

/** Standard uncertainty of a tolerance by itself, in its unit: that of a stated value with it. */
export const fromTolerance = (tolerance: number | null): number => (tolerance === null ? 0 : tolerance / Math.sqrt(3));

/** Where a value comes from, in words: 'supplier', or 'assumed, common practice, no source'. */
export function provenance({ source, note }: Measured): string {
  return note ? `${source}, ${note}` : source;
}
