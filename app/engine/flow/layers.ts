import type { Layer } from "../laminate/layer.ts";
import { siliconPlateConstants } from "../silicon/plane-constants.ts";
import type { Orientation } from "../silicon/orientation.ts";
import type { BondState, FilmState, WaferState } from "./state.ts";

/** Depth over which a ground face carries its force, m: subsurface damage of a ground wafer (Marks 2014, `marks-2014`). */
const GROUND_FACE_DEPTH = 0.2e-6;

/** Films, silicon, adhesive and carrier from the bottom up, z out of the device side, with the index of each film in it. */
export interface LayerStack {
  layers: Layer[];
  /** position in `layers` of every film of the state, back films first (outermost first), then front films */
  films: { film: FilmState; at: number }[];
}

function filmLayer({ addition, plasticStrain }: FilmState): Layer {
  return {
    thickness: addition.thickness.value,
    youngsModulus: addition.film.youngsModulus.value,
    poissonsRatio: addition.film.poissonsRatio.value,
    stress: addition.stress.value,
    cte: addition.film.expansion.value,
    coverage: addition.coverage,
    plasticStrain,
  };
}

function siliconLayers(state: WaferState, orientation: Orientation): Layer[] {
  const { youngsModulus, poissonsRatio } = siliconPlateConstants(orientation);
  const silicon = { youngsModulus, poissonsRatio, cte: "silicon" as const };
  const thickness = state.silicon.value;
  if (state.groundFaceForce === 0) return [{ ...silicon, thickness }];
  // The damaged depth is part of the silicon, so it takes nothing from the stiffness and adds nothing to the thickness.
  const depth = Math.min(GROUND_FACE_DEPTH, thickness / 2);
  return [
    { ...silicon, thickness: depth, stress: state.groundFaceForce / depth },
    { ...silicon, thickness: thickness - depth },
  ];
}

/**
 * Temperature at which the pair is at rest: that of bonding or, if lower, the softening point, below which the material
 * transmits mismatch (common practice, no source).
 */
export function lockTemperature(bond: BondState): number {
  const softening = bond.material.softening?.value ?? Infinity;
  return Math.min(bond.bondTemperature, softening);
}

/** Share of its locked-in modulus that a bonding material keeps above its softening point (common practice, no source). */
const SOFT_SHARE = 0.01;

function bondLayers(bond: BondState, temperature: number): Layer[] {
  const referenceTemperature = lockTemperature(bond);
  const soft = bond.material.softening !== null && temperature > bond.material.softening.value;
  return [
    {
      thickness: bond.thickness.value,
      youngsModulus: bond.material.effectiveModulus.value * (soft ? SOFT_SHARE : 1),
      poissonsRatio: bond.material.poissonsRatio.value,
      cte: soft ? bond.material.expansionAbove.value : bond.material.expansionBelow.value,
      referenceTemperature,
    },
    {
      thickness: bond.carrier.thickness.value,
      youngsModulus: bond.carrier.youngsModulus.value,
      poissonsRatio: bond.carrier.poissonsRatio.value,
      cte: bond.carrier.expansion === null ? "silicon" : bond.carrier.expansion.value,
      referenceTemperature,
    },
  ];
}

/** The laminate of a state at a temperature (K), with or without the carrier that it is bonded to. */
export function layersOf(
  state: WaferState,
  orientation: Orientation,
  temperature: number,
  options: { carrier: boolean },
): LayerStack {
  const back = state.back.toReversed();
  const silicon = siliconLayers(state, orientation);
  const films = [
    ...back.map((film, index) => ({ film, at: index })),
    ...state.front.map((film, index) => ({ film, at: back.length + silicon.length + index })),
  ];
  const layers = [...back.map(filmLayer), ...silicon, ...state.front.map(filmLayer)];
  if (options.carrier && state.bond) layers.push(...bondLayers(state.bond, temperature));
  return { layers, films };
}
