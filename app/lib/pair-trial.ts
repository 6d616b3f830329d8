import type { Contribution } from "#app/engine/flow/uncertainty.ts";
import type { Measured } from "#app/engine/measured.ts";
import type { PairEstimate } from "./pair.ts";

/** A carrier bonded to a blank wafer, as its page shows it. SI units. */
export interface TriedPair extends Omit<PairEstimate, "budget"> {
  wafer: { name: string; diameter: number; thickness: number };
  siliconLeft: number;
  material: { name: string; effectiveModulus: Measured; bondTemperature: number };
  bondThickness: number;
  /** the largest few */
  budget: Contribution[];
  /** why this material could not let go of this carrier */
  cannotRelease: string | null;
}

/** What a carrier's page offers to try it with, and what came of it. */
export interface PairTrial {
  materials: { id: string; name: string }[];
  chosen: { material: string; silicon: string };
  /** why there is no pair, in a sentence for the field of the silicon */
  fault: string | null;
  pair: TriedPair | null;
}
