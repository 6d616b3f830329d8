import type { FilmLines } from "#app/engine/patterned/pattern.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { Side } from "#app/engine/vocabulary.ts";
import type { ComparedWords, ComparisonChart, ComparisonView } from "./comparison.ts";

/** A stored stack as a comparison takes it: SI, films of a side from the silicon outwards, device side first. */
export interface ComparedInputs {
  id: string;
  name: string;
  program: { name: string };
  silicon: { name: string; diameter: number; nominalThickness: number };
  siliconThickness: Measured;
  layers: readonly {
    side: Side;
    filmId: string;
    filmName: string;
    thickness: Measured;
    stress: Measured;
    coverage: number;
    lines?: FilmLines | null;
  }[];
}

/** Stacks side by side, in words and as a chart. */
export interface ComparedStacks extends ComparedWords {
  /** at which temperature */
  temperature: string;
  chart: ComparisonChart;
}

export type StackComparisonView = ComparisonView<ComparedStacks>;
