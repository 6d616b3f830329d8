import { unpackIntegers } from "../../packed-integers.ts";
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

/** A table as its file holds it: each list of coefficients as packed text, those of parabola and rim over those of the bow. */
interface PackedTable {
  generator: number;
  energy: { extent: Extent; quantum: number; values: string };
  measures: { extent: Extent; quantum: number; values: readonly string[] };
}

/** The list of the bow that a list of measures is told over: mean over mean, half difference over half difference. */
function baseOf<List>(lists: readonly List[], n: number): List | undefined {
  return n < 4 ? undefined : lists[n % 2];
}

/** The lists of measures as they are packed. */
export function overBow(lists: ShapeTable["measures"]["values"]): number[][] {
  return lists.map((list, n) => list.map((value, term) => value - (baseOf(lists, n)?.[term] ?? 0)));
}

export function unpackTable({ generator, energy, measures }: PackedTable): ShapeTable {
  const lists = measures.values.map(unpackIntegers);
  return {
    generator,
    energy: { ...energy, values: unpackIntegers(energy.values) },
    measures: {
      ...measures,
      values: lists.map((list, n) => list.map((value, term) => value + (baseOf(lists, n)?.[term] ?? 0))),
    },
  };
}
