import type { StepKind } from "#app/engine/flow/model.ts";
import type { Exposure, Holding, Side } from "#app/engine/vocabulary.ts";

import type { StepHandlingValues } from "#app/schemas/step-handling.ts";

/** A film put down in the demo: µm and MPa. */
export interface DemoAddition {
  side: Side;
  film: string;
  thickness: number;
  /** left out: the film's own */
  stress?: number;
  coverage: number;
}

/** What a demo flow is bonded with, °C and µm, and how the debond goes that follows from it. */
export interface DemoBond {
  carrier: string;
  material: string;
  thickness: number;
  peak: number;
  /** of the adhesive, when better known than the material's share, and of the grind on this pair */
  variation?: number;
  grindVariation?: number;
  debond: { title: string; peak: number };
}

/** A step of the demo: °C, minutes, µm, mm, N/m; carrier, film and tool by name. What is left out does not happen. */
export interface DemoStep {
  kind: StepKind;
  title: string;
  peak: number;
  minutes?: number;
  equipment: string;
  exposures?: Exposure[];
  planned: Holding;
  silicon?: { thickness: number; tolerance: number };
  adds?: DemoAddition[];
  removes?: { side: Side; film: string }[];
  trim?: { width: number; depth: number };
  groundFaceForce?: number;
  bond?: DemoBond;
  tape?: string;
  /** SI, as it is stored */
  handling?: Partial<StepHandlingValues>;
}

/** 'Bond to Glass carrier 3.0 ppm, Laser-release adhesive B, 50 µm'. */
export const bondTitle = ({ carrier, material, thickness }: DemoBond): string =>
  `Bond to ${carrier}, ${material}, ${thickness} µm`;
