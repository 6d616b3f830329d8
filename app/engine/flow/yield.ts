import type { Layer } from "../laminate/layer.ts";
import { solveLaminate, type LaminateResult } from "../laminate/solve-laminate.ts";
import type { Orientation } from "../silicon/orientation.ts";
import { layersOf } from "./layers.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import type { FilmState, WaferState } from "./state.ts";

/** Yield stress falls linearly to zero this far above 25 °C, K (common practice, no source; trend of Thouless 1993, from memory). */
const YIELD_FALLS_TO_ZERO_OVER = 600;

/** Change of stress below which the iteration is done, Pa: a thousandth of what any figure shows. */
const SETTLED = 100;
const MOST_ROUNDS = 200;

/** Yield stress of a metal film at a temperature (K), Pa: σ_y(25 °C)·(1 − (T − 25 °C)/600 K), never below zero. */
export function yieldStress(atRoom: number, temperature: number): number {
  return atRoom * Math.max(0, 1 - (temperature - ROOM_TEMPERATURE) / YIELD_FALLS_TO_ZERO_OVER);
}

export interface Settled {
  state: WaferState;
  /** the laminate that was solved, strains as they came out */
  layers: Layer[];
  solution: LaminateResult;
  /** mean stress of each film at this temperature, in the order of `layersOf(...).films` */
  filmStress: { film: FilmState; stress: number }[];
}

/** Mean stress of each layer, Pa: as the stack lies by itself, or with its bending taken out by what holds it flat. */
function layerStresses(layers: Layer[], solution: LaminateResult, heldFlat: boolean): number[] {
  if (!heldFlat) return solution.meanStress;
  const strain = solution.midplaneStrain - solution.curvature * solution.neutralPlane;
  return layers.map(
    ({ youngsModulus, poissonsRatio }, index) =>
      (youngsModulus / (1 - poissonsRatio)) * (strain - (solution.freeStrain[index] ?? 0)),
  );
}

/**
 * The laminate at a temperature with its films at their limits: a metal beyond its yield stress flows and keeps the strain
 * (kinematic: on reversal it answers elastically over twice the yield stress); a polymer stops at zero stress and keeps
 * nothing. Solved layer by layer inside the laminate until no stress moves.
 * `metalHistory: false` keeps every metal elastic. `heldFlat: true` is for a wafer on tape or frame: its films are stressed as
 * in a flat stack, while `solution` stays that of the stack let go.
 */
export function settle(
  state: WaferState,
  orientation: Orientation,
  temperature: number,
  options: { metalHistory: boolean; heldFlat: boolean },
): Settled {
  const { layers, films } = layersOf(state, orientation, temperature, { carrier: true });
  const given = layers.map((layer) => layer.plasticStrain ?? 0);
  let solution = solveLaminate(layers, { temperature });
  let stresses = layerStresses(layers, solution, options.heldFlat);
  for (let round = 0; round < MOST_ROUNDS; round++) {
    let moved = 0;
    for (const { film, at } of films) {
      const layer = layers[at];
      const stress = stresses[at];
      if (!layer || stress === undefined) continue;
      const excess = beyondLimit(
        film,
        stress,
        temperature,
        options.metalHistory,
        (layer.plasticStrain ?? 0) !== given[at],
      );
      if (excess === 0) continue;
      const modulus = layer.youngsModulus / (1 - layer.poissonsRatio);
      layer.plasticStrain = (layer.plasticStrain ?? 0) + excess / modulus;
      moved = Math.max(moved, Math.abs(excess));
    }
    if (moved < SETTLED) break;
    solution = solveLaminate(layers, { temperature });
    stresses = layerStresses(layers, solution, options.heldFlat);
  }
  const after = new Map<FilmState, FilmState>();
  const filmStress = films.map(({ film, at }) => {
    const metal = film.addition.film.kind === "metal";
    const next = {
      ...film,
      plasticStrain: metal ? (layers[at]?.plasticStrain ?? 0) : film.plasticStrain,
      hottest: Math.max(film.hottest, temperature),
    };
    after.set(film, next);
    return { film: next, stress: stresses[at] ?? 0 };
  });
  const renew = (film: FilmState) => after.get(film) ?? film;
  return {
    state: { ...state, front: state.front.map(renew), back: state.back.map(renew) },
    layers,
    solution,
    filmStress,
  };
}

/** How far a film's stress lies beyond what it can carry, Pa, with the sign of the strain that relieves it. */
function beyondLimit(
  film: FilmState,
  stress: number,
  temperature: number,
  metalHistory: boolean,
  relaxed: boolean,
): number {
  const material = film.addition.film;
  if (material.kind === "polymer") return stress < 0 || relaxed ? stress : 0;
  if (material.kind !== "metal" || material.yieldStress === null || !metalHistory) return 0;
  const limit = yieldStress(material.yieldStress.value, temperature);
  return Math.abs(stress) > limit ? stress - Math.sign(stress) * limit : 0;
}
