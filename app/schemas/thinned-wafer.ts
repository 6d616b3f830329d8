import type { ShapeRegime } from "#app/engine/vocabulary.ts";

/** One wafer of the sign-in page's drawing: the same films, less silicon. */
export interface ThinnedWafer {
  thickness: number;
  diameter: number;
  regime: ShapeRegime;
  warp: number;
  /** standard bow, for one that is not rolled */
  bow: number;
  rollRadius: number | null;
}
