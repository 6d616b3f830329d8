import { flowStrains, type StressBounds } from "../laminate/bounded-stress.ts";
import { newColumn } from "../laminate/column.ts";
import type { Layer } from "../laminate/layer.ts";
import { letFlow, placeLayers, type PlacedLayers } from "../laminate/placed-layers.ts";
import { balanceLayers, joinPlates, type LaminateBalance } from "../laminate/solve-laminate.ts";
import { noteBounds } from "./film-limits.ts";
import { bondedFace, flowPoint, locked, slidingBonds, type BondState } from "./bond.ts";
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
  /** the carriers that slide on the wafer, a plate each; `entries` are the rest then. Null where none slides */
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
 * nothing. All films are solved together inside the laminate, exactly. A bonding material at its flow point lets its carrier
 * slide on the wafer: they share one curvature and nothing else.
 */
export function settle(state: WaferState, temperature: number, { metalHistory, heldFlat }: SettleOptions): Settled {
  const sliding = slidingBonds(state.bonds, temperature);
  const slidingOn = sliding.length > 0 ? sliding.map(carrierPlate) : null;
  const plate = slidingOn
    ? joinPlates(slidingOn.map((entry) => balanceLayers(placeLayers([entry], temperature))))
    : undefined;
  const locking = sliding.length > 0 ? state.bonds.filter((bond) => !sliding.includes(bond)) : state.bonds;
  const stack = placeStack(layersOf(state, temperature, locking), temperature);
  const { placed, films } = stack;
  const bounds = boundsOf(films, { temperature, metalHistory });
  let solution = balanceLayers(placed, plate);
  const strains = bounds && flowStrains(placed, bounds, solution, { heldFlat, slidingOn: plate });
  if (strains) {
    strains.forEach((by, at) => letFlow(placed, at, by));
    solution = balanceLayers(placed, plate);
  }
  const lastBack = stack.below + state.back.length - 1;
  const back = state.back.map((film, n) => renewed(film, temperature, placed.flowed[lastBack - n]));
  const firstFront = lastBack + 1 + state.siliconEntries.length;
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
 * A wafer on sliding carriers once it has cooled to the highest of their flow points: the carriers that lock there lock in the
 * shape that the wafer has, flat where a tool holds it flat.
 */
export function lockedState(settled: Settled, flat: boolean): WaferState {
  const { state, temperature } = settled;
  const sliding = slidingBonds(state.bonds, temperature);
  const first = Math.max(...sliding.map(({ material }) => flowPoint(material) ?? -Infinity));
  const bonds = state.bonds.map((bond) =>
    sliding.includes(bond) && flowPoint(bond.material) === first ? lockedBond(settled, bond, flat) : bond,
  );
  return { ...state, bonds };
}

/** A bond that locks at the temperature of a settled wafer, which it is no part of there. Where directions differ each locks as it lies. */
export function lockedBond(settled: Settled, bond: BondState, flat: boolean): BondState {
  const { state, placed, solution, temperature } = settled;
  const { midplaneStrain, curvature, neutralPlane } = solution;
  const out = bondedFace(bond) === "front" ? 1 : -1;
  const face = placed.total / 2;
  const adhesive = out * (face + bond.thickness.value / 2);
  const carrier = out * (face + bond.thickness.value + bond.carrier.thickness.value / 2);
  const strainAt = (z: number) => midplaneStrain - curvature * (flat ? neutralPlane : z);
  const apart = bendsUnequally(state) ? strainApart(settled, flat) : null;
  const beyond = (z: number) => {
    const { x = 0, y = 0, xy = 0 } = apart?.(z) ?? {};
    return { x: x - strainAt(z), y: y - strainAt(z), xy };
  };
  return locked(
    bond,
    temperature,
    { adhesive: strainAt(adhesive), carrier: strainAt(carrier) },
    apart && { adhesive: beyond(adhesive), carrier: beyond(carrier) },
  );
}
