import type { NamedLayer } from "../laminate/free-strain.ts";
import { checkLayer, type Layer } from "../laminate/layer.ts";
import { siliconPlateConstants, type PlateConstants } from "../silicon/plane-constants.ts";
import type { Orientation } from "../silicon/orientation.ts";
import type { FilmAddition } from "./model.ts";
import type { BondState, FilmState, WaferState } from "./state.ts";

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

function bondEntries(bond: BondState, temperature: number): StackEntry[] {
  const referenceTemperature = lockTemperature(bond);
  const soft = bond.material.softening !== null && temperature > bond.material.softening.value;
  return [
    entry(
      {
        thickness: bond.thickness.value,
        youngsModulus: bond.material.effectiveModulus.value * (soft ? SOFT_SHARE : 1),
        poissonsRatio: bond.material.poissonsRatio.value,
        cte: soft ? bond.material.expansionAbove.value : bond.material.expansionBelow.value,
        referenceTemperature,
      },
      bond.material.name,
    ),
    entry(
      {
        thickness: bond.carrier.thickness.value,
        youngsModulus: bond.carrier.youngsModulus.value,
        poissonsRatio: bond.carrier.poissonsRatio.value,
        cte: bond.carrier.expansion === null ? "silicon" : bond.carrier.expansion.value,
        referenceTemperature,
      },
      bond.carrier.name,
    ),
  ];
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
  if (options.carrier && state.bond) for (const part of bondEntries(state.bond, temperature)) put(part, null);
  return { entries, films };
}
