import { EngineInputError } from "../errors.ts";
import type { SourceId } from "../sources.ts";

/** State of the wafer's edge, which breaks first when a whole wafer is bent. */
export type EdgeState = "ground" | "relieved and trimmed";

export interface DesignStress {
  /** Tension up to which a wafer is handled without more proof, Pa: the cautious and the usual value. */
  low: number;
  high: number;
  source: SourceId;
}

/**
 * Design stress of a whole wafer in handling: 50 to 100 MPa with a ground edge, 150 MPa relieved and trimmed. Edge chips govern,
 * so the far higher strengths of dies and faces do not apply. Common practice, no source; a site sets its own.
 */
export function designStress(edge: EdgeState): DesignStress {
  switch (edge) {
    case "ground":
      return { low: 50e6, high: 100e6, source: "common-practice" };
    case "relieved and trimmed":
      return { low: 150e6, high: 150e6, source: "common-practice" };
    default:
      throw new EngineInputError("edge", "is not a state of the edge known here", "ground, or relieved and trimmed");
  }
}
