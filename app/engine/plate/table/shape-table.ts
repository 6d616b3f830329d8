import type { Extent } from "./chebyshev.ts";

/** Coefficients of one or several functions of a shape's place in the table, in the order of `eachTerm`. */
export interface ShapeTable {
  /** Version of the generator that made it. */
  generator: number;
  /** m/s³ of `plate-energy.ts`. */
  energy: { extent: Extent; quantum: number; values: readonly number[] };
  /**
   * (value/uniform − 1) (1 + R/3)/P of what is read off a shape: bow, centre curvature and fitted parabola, each the mean of the
   * two axes and then half their difference, and the mean height of the rim.
   */
  measures: { extent: Extent; quantum: number; values: readonly (readonly number[])[] };
}
