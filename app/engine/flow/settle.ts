import { flowStrains, type StressBounds } from "../laminate/bounded-stress.ts";
import { newColumn } from "../laminate/column.ts";
import type { Layer } from "../laminate/layer.ts";
import { letFlow, placeLayers, type PlacedLayers } from "../laminate/placed-layers.ts";
import { balanceLayers, type LaminateBalance } from "../laminate/solve-laminate.ts";
import { noteBounds } from "./film-limits.ts";
import { locked, slides } from "./bond.ts";
import { bendsUnequally, carrierPlate, layersOf, type LayerStack } from "./layers.ts";
import type { StackEntry } from "./stack-entry.ts";
import type { FilmState, WaferState } from "./state.ts";
import { strainApart } from "./unequal.ts";

/** A stack at a temperature, its layers at their heights with what they have flowed. */
export interface PlacedStack extends LayerStack {
  placed: PlacedLayers;
}

export interface Settled extends PlacedStack {
  state: WaferState;
  temperature: number;
  heldFlat: boolean;
  solution: LaminateBalance;
  /** the carrier when it slides on the wafer; `entries` are those of the wafer then */
  slidingOn: StackEntry[] | null;
}

export interface SettleOptions {
  /** false keeps every metal elastic */
  metalHistory: boolean;
  /** true for a wafer on tape or frame: its films are stressed as in a flat stack, `solution` is that of the stack let go */
  heldFlat: boolean;
}

/** The layers of a stack with the strains that they have flowed, for a working. */
export function statedLayers({ entries, placed }: PlacedStack): Layer[] {
  return entries.map(({ stated }, at) => {
    const plasticStrain = placed.flowed[at] ?? 0;
    return plasticStrain === 0 ? stated : { ...stated, plasticStrain };
  });
}

/**
 * The laminate at a temperature with its films at their limits: a metal beyond its yield stress flows and keeps the strain
 * (kinematic: on reversal it answers elastically over twice the yield stress); a polymer stops at zero stress and keeps
 * nothing. All films are solved together inside the laminate, exactly. A bonding material at its flow point lets carrier and
 * wafer slide: they share one curvature and nothing else.
 */
export function settle(state: WaferState, temperature: number, { metalHistory, heldFlat }: SettleOptions): Settled {
  const sliding = state.bond !== null && slides(state.bond, temperature);
  const slidingOn = state.bond && sliding ? carrierPlate(state.bond) : null;
  const plate = slidingOn ? balanceLayers(placeLayers(slidingOn, temperature)) : undefined;
  const stack = placeStack(layersOf(state, temperature, { carrier: !sliding }), temperature);
  const { placed, films } = stack;
  const bounds = boundsOf(films, { temperature, metalHistory });
  let solution = balanceLayers(placed, plate);
  const strains = bounds && flowStrains(placed, bounds, solution, { heldFlat, slidingOn: plate });
  if (strains) {
    strains.forEach((by, at) => letFlow(placed, at, by));
    solution = balanceLayers(placed, plate);
  }
  const back = state.back.map((film, n) => renewed(film, temperature, placed.flowed[state.back.length - 1 - n]));
  const firstFront = state.back.length + state.siliconEntries.length;
  const front = state.front.map((film, n) => renewed(film, temperature, placed.flowed[firstFront + n]));
  return { ...stack, state: { ...state, back, front }, temperature, heldFlat, solution, slidingOn };
}

/** The layers of a stack at a temperature (K), with what its films have flowed so far. */
export function placeStack(stack: LayerStack, temperature: number): PlacedStack {
  const placed = placeLayers(stack.entries, temperature);
  stack.films.forEach((film, at) => {
    if (film && film.plasticStrain !== 0) letFlow(placed, at, film.plasticStrain);
  });
  return { ...stack, placed };
}

/** Limits of all layers; null when every one of them stays elastic. */
function boundsOf(
  films: LayerStack["films"],
  options: { temperature: number; metalHistory: boolean },
): StressBounds | null {
  const bounds = { low: newColumn(films.length), high: newColumn(films.length) };
  let some = false;
  bounds.low.fill(-Infinity);
  bounds.high.fill(Infinity);
  films.forEach((film, at) => {
    if (film && noteBounds(film.addition, options, bounds, at)) some = true;
  });
  return some ? bounds : null;
}

/** Mean stress of each film, Pa: as the stack lies by itself, or with its bending taken out by what holds it flat. */
export function filmStresses({ placed, films, solution, heldFlat }: Settled): { film: FilmState; stress: number }[] {
  const { midplaneStrain, curvature, neutralPlane } = solution;
  return films.flatMap((film, at) => {
    if (!film) return [];
    const strain = midplaneStrain - curvature * (heldFlat ? neutralPlane : (placed.centre[at] ?? 0));
    return [{ film, stress: (placed.biaxialModulus[at] ?? 0) * (strain - (placed.freeStrain[at] ?? 0)) }];
  });
}

/** The film after it has been at a temperature: a metal keeps what it has flowed. The same object when nothing changed. */
function renewed(film: FilmState, temperature: number, flowed: number | undefined): FilmState {
  const { addition, entry } = film;
  const plasticStrain = addition.film.kind === "metal" ? (flowed ?? film.plasticStrain) : film.plasticStrain;
  if (plasticStrain === film.plasticStrain && temperature <= film.hottest) return film;
  return { addition, entry, plasticStrain, hottest: Math.max(film.hottest, temperature) };
}

/**
 * The wafer of a sliding pair once it has cooled to its flow point and locks in the shape that it has there: flat where a tool
 * holds it flat. Where its directions differ each locks as it lies.
 */
export function lockedState(settled: Settled, flat: boolean): WaferState {
  const { state, placed, solution, temperature } = settled;
  if (!state.bond) return state;
  const { midplaneStrain, curvature, neutralPlane } = solution;
  const top = placed.total / 2;
  const adhesive = top + state.bond.thickness.value / 2;
  const carrier = top + state.bond.thickness.value + state.bond.carrier.thickness.value / 2;
  const strainAt = (z: number) => midplaneStrain - curvature * (flat ? neutralPlane : z);
  const apart = bendsUnequally(state) ? strainApart(settled, flat) : null;
  const beyond = (z: number) => {
    const { x = 0, y = 0, xy = 0 } = apart?.(z) ?? {};
    return { x: x - strainAt(z), y: y - strainAt(z), xy };
  };
  const bond = locked(
    state.bond,
    temperature,
    { adhesive: strainAt(adhesive), carrier: strainAt(carrier) },
    apart && { adhesive: beyond(adhesive), carrier: beyond(carrier) },
  );
  return { ...state, bond };
}
