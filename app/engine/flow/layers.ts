import type { NamedLayer } from "../laminate/free-strain.ts";
import { checkLayer, type Layer } from "../laminate/layer.ts";
import { siliconPlateConstants, type PlateConstants } from "../silicon/plane-constants.ts";
import type { Orientation } from "../silicon/orientation.ts";
import { carrierExpansion } from "./carrier-expansion.ts";
import type { FilmAddition } from "./model.ts";
import { glassTransition, lockTemperature, type BondState } from "./bond.ts";
import type { FilmState, WaferState } from "./state.ts";

/** Depth over which a ground face carries its force, m: subsurface damage of a ground wafer (Marks 2014, `marks-2014`). */
const GROUND_FACE_DEPTH = 0.2e-6;

/** A layer as it is stated, and as it is checked. */
export interface StackEntry extends NamedLayer {
  stated: Layer;
}

/** Films (without what they have flowed), silicon, adhesive and carrier from the bottom up, z out of the device side. */
export interface LayerStack {
  entries: StackEntry[];
  /** the film that each entry is; null for silicon, adhesive and carrier */
  films: (FilmState | null)[];
}

function entry(stated: Layer, field: string): StackEntry {
  return { stated, field, layer: checkLayer(stated, field) };
}

/** The layer of a film as it came, without what it has flowed since. */
export function filmEntry({ film, thickness, stress, coverage }: FilmAddition): StackEntry {
  return entry(
    {
      thickness: thickness.value,
      youngsModulus: film.youngsModulus.value,
      poissonsRatio: film.poissonsRatio.value,
      stress: stress.value,
      cte: film.expansion.value,
      coverage,
    },
    film.name,
  );
}

const plateConstants = new Map<Orientation, PlateConstants>();

/** `siliconPlateConstants` at 25 °C, worked out once for each orientation. */
export function waferConstants(orientation: Orientation): PlateConstants {
  const known = plateConstants.get(orientation);
  if (known) return known;
  const made = siliconPlateConstants(orientation);
  plateConstants.set(orientation, made);
  return made;
}

/** The silicon from its back face up: one layer, or two when a ground face carries a force (N/m). */
export function siliconEntries(orientation: Orientation, thickness: number, groundFaceForce: number): StackEntry[] {
  const silicon = { ...waferConstants(orientation), cte: "silicon" as const };
  if (groundFaceForce === 0) return [entry({ ...silicon, thickness }, "silicon")];
  // The damaged depth is part of the silicon, so it takes nothing from the stiffness and adds nothing to the thickness.
  const depth = Math.min(GROUND_FACE_DEPTH, thickness / 2);
  return [
    entry({ ...silicon, thickness: depth, stress: groundFaceForce / depth }, "groundFace"),
    entry({ ...silicon, thickness: thickness - depth }, "silicon"),
  ];
}

/** Share of its locked-in modulus that a bonding material keeps above its glass transition (common practice, no source). */
const SOFT_SHARE = 0.01;

function adhesiveEntry(bond: BondState, temperature: number): StackEntry {
  const { material, thickness, rest } = bond;
  const soft = temperature > (glassTransition(material) ?? Infinity);
  return entry(
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
}

function carrierEntry(bond: BondState): StackEntry {
  const { carrier, rest } = bond;
  return entry(
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
}

/** The carrier by itself, as a plate that slides on the wafer. */
export function carrierPlate(bond: BondState): StackEntry[] {
  return [carrierEntry(bond)];
}

/** The laminate of a state at a temperature (K), with or without the carrier that it is bonded to. */
export function layersOf(state: WaferState, temperature: number, options: { carrier: boolean }): LayerStack {
  const entries: StackEntry[] = [];
  const films: LayerStack["films"] = [];
  const put = (entry: StackEntry, film: FilmState | null) => {
    entries.push(entry);
    films.push(film);
  };
  for (const film of state.back.toReversed()) put(film.entry, film);
  for (const silicon of state.siliconEntries) put(silicon, null);
  for (const film of state.front) put(film.entry, film);
  if (options.carrier && state.bond) {
    put(adhesiveEntry(state.bond, temperature), null);
    put(carrierEntry(state.bond), null);
  }
  return { entries, films };
}

export { lockTemperature };
