import type { EquationId } from "./equations.ts";

/** SI unit of a figure as plain text, the way it is stored and sent. `1` is a pure number. */
export type UnitSymbol =
  "m" | "Pa" | "K" | "1/m" | "1/K" | "N/m" | "N·m" | "1" | "s" | "kg" | "kg/m3" | "rad" | "N" | "m2" | "m/s2";

/** One symbol of a calculation with its value. `source` is a bibliography id or the provenance of an input in words. */
export interface WorkingLine {
  symbol: string;
  meaning: string;
  value: number;
  unit: UnitSymbol;
  /** true for a temperature point, so that it is shown in °C; differences stay in K. */
  temperaturePoint?: boolean;
  source?: string;
}

/**
 * The calculation behind a figure, as data: which equation, with which inputs, giving what, valid where.
 * Screens, sheets, the API and the method page render it; nobody writes the formula a second time.
 */
export interface Working {
  equation: EquationId;
  inputs: WorkingLine[];
  result: WorkingLine;
  /** Range remark or simplification that applies to this use, in one sentence. */
  note?: string;
  /** Calculations that this one rests on. */
  from?: Working[];
}
