import type { DirectionalLayer } from "../directional/layer.ts";
import type { PlaneTensor } from "../directional/plane-stiffness.ts";
import { bondOn, glassTransition, lockTemperature, type BondState } from "./bond.ts";
import { carrierExpansion } from "./carrier-expansion.ts";
import { isDirectional } from "./film-entry.ts";
import { stackEntry, type StackEntry } from "./stack-entry.ts";
import type { FilmState, WaferState } from "./state.ts";

/** Films (without what they have flowed), silicon, adhesives and carriers from the bottom up, z out of the device side. */
export interface LayerStack {
  entries: StackEntry[];
  /** the film that each entry is; null for silicon, adhesives and carriers */
  films: (FilmState | null)[];
  /** how many entries lie under the wafer */
  below: number;
}

/** Share of its locked-in modulus that a bonding material keeps above its glass transition (common practice, no source). */
const SOFT_SHARE = 0.01;

function adhesiveEntry(bond: BondState, temperature: number): StackEntry {
  const { material, thickness, rest } = bond;
  const soft = temperature > (glassTransition(material) ?? Infinity);
  const made = stackEntry(
    {
      thickness: thickness.value,
      youngsModulus: material.effectiveModulus.value * (soft ? SOFT_SHARE : 1),
      poissonsRatio: material.poissonsRatio.value,
      cte: soft ? material.expansionAbove.value : material.expansionBelow.value,
      referenceTemperature: lockTemperature(bond),
      plasticStrain: rest?.adhesiveStrain ?? 0,
    },
    material.name,
  );
  return unequalEntry(made, rest?.unequal?.adhesive);
}

function carrierEntry(bond: BondState): StackEntry {
  const { carrier, rest } = bond;
  const made = stackEntry(
    {
      thickness: carrier.thickness.value,
      youngsModulus: carrier.youngsModulus.value,
      poissonsRatio: carrier.poissonsRatio.value,
      cte: carrierExpansion(carrier),
      referenceTemperature: lockTemperature(bond),
      plasticStrain: rest?.carrierStrain ?? 0,
    },
    carrier.name,
  );
  return unequalEntry(made, rest?.unequal?.carrier);
}

/** The layer with further free strain by direction. */
function unequalEntry(entry: StackEntry, freeStrain: PlaneTensor | undefined): StackEntry {
  return freeStrain ? { ...entry, directional: { ...entry.stated, freeStrain } } : entry;
}

/** The carrier by itself, as a plate that slides on the wafer. */
export function carrierPlate(bond: BondState): StackEntry {
  return carrierEntry(bond);
}

/** The laminate of a state at a temperature (K) with some of the carriers that it is bonded to, each on its face. */
export function layersOf(state: WaferState, temperature: number, bonds: readonly BondState[]): LayerStack {
  const { back, siliconEntries, front } = state;
  const entries: StackEntry[] = [];
  const films: LayerStack["films"] = [];
  const under = bondOn(bonds, "back");
  if (under) {
    entries.push(carrierEntry(under), adhesiveEntry(under, temperature));
    films.push(null, null);
  }
  const below = entries.length;
  for (let n = back.length - 1; n >= 0; n -= 1) putFilm(back[n], entries, films);
  for (const silicon of siliconEntries) {
    entries.push(silicon);
    films.push(null);
  }
  for (const film of front) putFilm(film, entries, films);
  const over = bondOn(bonds, "front");
  if (over) {
    entries.push(adhesiveEntry(over, temperature), carrierEntry(over));
    films.push(null, null);
  }
  return { entries, films, below };
}

function putFilm(film: FilmState | undefined, entries: StackEntry[], films: LayerStack["films"]): void {
  if (!film) return;
  entries.push(film.entry);
  films.push(film);
}

/** Whether a state bends differently along x and y. */
export function bendsUnequally({ incoming, front, back, bonds }: WaferState): boolean {
  const unequal =
    incoming !== null && (incoming.film.x !== incoming.film.y || incoming.crystal.x !== incoming.crystal.y);
  return (
    unequal ||
    bonds.some(({ rest }) => rest?.unequal !== undefined) ||
    front.some(({ addition }) => isDirectional(addition)) ||
    back.some(({ addition }) => isDirectional(addition))
  );
}

/** A layer with its directions apart, after it has flowed by a strain that is equal in both. */
export function directionalEntry({ stated, directional }: StackEntry, flowed: number): DirectionalLayer {
  const layer = directional ?? stated;
  return flowed === 0 ? layer : { ...layer, plasticStrain: (layer.plasticStrain ?? 0) + flowed };
}

export { lockTemperature };
