import type { FilmLines } from "../patterned/pattern.ts";
import type { Orientation } from "../silicon/orientation.ts";
import type { Side } from "../vocabulary.ts";

/** A film of a stack with the numbers that its pull follows from, SI. */
export interface StackFilm {
  side: Side;
  thickness: number;
  /** at 25 °C on a full-thickness monitor held flat, tension positive */
  stress: number;
  youngsModulus: number;
  poissonsRatio: number;
  /** 1/K; needed only away from the reference temperature */
  expansion?: number | undefined;
  /** K, default 298.15 */
  referenceTemperature?: number | undefined;
  /** area fraction, default 1 */
  coverage?: number | undefined;
  /** the film is cut in lines that cover that area; without it both directions bend alike */
  lines?: FilmLines | undefined;
  /** half-widths; none: counted as exact */
  thicknessTolerance?: number | undefined;
  stressTolerance?: number | undefined;
}

/** Films on silicon of a given remaining thickness; films of a side are listed from the silicon outwards. */
export interface StackInput {
  wafer: {
    diameter: number;
    orientation: Orientation;
    thickness: number;
    /** half-width, m */
    thicknessTolerance?: number | undefined;
  };
  films: StackFilm[];
  /** K, default 298.15 */
  temperature?: number | undefined;
}

/** The same films on silicon of another thickness (m). */
export function withThickness(stack: StackInput, thickness: number): StackInput {
  return { ...stack, wafer: { ...stack.wafer, thickness } };
}
