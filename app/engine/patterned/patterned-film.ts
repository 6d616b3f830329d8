import { checkDirectionalLayer, type DirectionalFilm } from "../directional/layer.ts";
import {
  applyStiffness,
  scaleStiffness,
  type PlaneStiffness,
  type PlaneTensor,
} from "../directional/plane-stiffness.ts";
import { edgeReliefOf } from "./pattern-stiffness.ts";
import type { FilmPattern } from "./pattern.ts";

export interface PatternedFilmInput {
  /** Stress of the blanket film, Pa, tension positive; x and y apart when they differ. */
  stress: number | { x: number; y: number };
  /** m */
  thickness: number;
  /** Pa */
  youngsModulus: number;
  poissonsRatio: number;
  pattern: FilmPattern;
}

export interface PatternedFilm {
  /** Force per width, N/m, averaged over the area: what bends the wafer. */
  force: PlaneTensor;
  /** Stress per strain, Pa, averaged over the area, in the axes x, y. */
  stiffness: PlaneStiffness;
  /** Mean stress of the film's parts over their own cross-section while the wafer is flat, Pa. */
  meanStress: PlaneTensor;
  /** Share of the area. */
  coverage: number;
  /** Share g of the blanket stress kept across a line or in an island. */
  edgeRelief: number;
  /** The film as a layer of `solveDirectionalLaminate`, to which expansion and reference temperature may be added. */
  layer: DirectionalFilm;
}

/**
 * Stiffness and force of a film that covers part of the wafer as full film, parallel lines, islands or a pattern without
 * direction. `stress` is what the same film carries unpatterned on a thick wafer.
 *
 * Wide lines and random patterns pull with coverage times the blanket force in both directions; narrow tall lines with
 * N = f σ h_f (1 − ν) along their length and nothing across, both exact. Between these limits the share kept across a line is
 * practical shear lag: within 0.09 of the blanket force for lines and 0.14 for islands, see `edgeRelief`. Lines fill the space
 * between them with nothing; embedded lines are stiffer across. Bad input throws `EngineInputError`.
 */
export function patternedFilm(i: PatternedFilmInput): PatternedFilm {
  const layer: DirectionalFilm = { ...i };
  const { stiffness, coverage, stressStrain } = checkDirectionalLayer(layer, "film");
  const force = applyStiffness(scaleStiffness(stiffness, -coverage * layer.thickness), stressStrain);
  const meanStress = applyStiffness(scaleStiffness(stiffness, -1), stressStrain);
  return {
    force,
    stiffness: scaleStiffness(stiffness, coverage),
    meanStress,
    coverage,
    edgeRelief: edgeReliefOf(i),
    layer,
  };
}
