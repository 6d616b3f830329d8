import type { SourceId } from "../sources.ts";
import type { UnitSymbol } from "../working.ts";

/** One equation of the engine, for the method page and for the working behind a figure. */
export interface Equation {
  title: string;
  /**
   * Plain text. `_` puts the letters and digits after it below the line, `^` the number or the bracket after it above it.
   * Only glyphs of the shipped fonts.
   */
  formula: string;
  symbols: readonly { symbol: string; meaning: string; unit: UnitSymbol }[];
  /** Where it holds. */
  range: string;
  sources: readonly SourceId[];
  /** What a reader might get wrong. */
  caution?: string;
}
