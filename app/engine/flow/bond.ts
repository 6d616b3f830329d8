import type { PlaneTensor } from "../directional/plane-stiffness.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { siliconThermalStrain } from "../silicon/expansion.ts";
import type { Side } from "../vocabulary.ts";
import type { BondingMaterialInput, BondInput } from "./model.ts";

/** State of rest of a pair: where adhesive and carrier carry nothing while the wafer has its own shape. */
export interface BondRest {
  /** K */
  temperature: number;
  /** strain of adhesive and carrier beyond that of flat, free silicon at that temperature */
  adhesiveStrain: number;
  carrierStrain: number;
  /** what the strain by direction is beyond that, of a wafer whose directions differ */
  unequal?: PairStrain<PlaneTensor>;
}

/** Strain at the middles of adhesive and carrier. */
export interface PairStrain<Strain = number> {
  adhesive: Strain;
  carrier: Strain;
}

/** A bond as it is: what joins the pair, the temperature at which it was made, and how it has locked since. */
export interface BondState extends BondInput {
  bondTemperature: number;
  /** from the last time that it slid and locked again; absent while it rests as it was bonded */
  rest?: BondRest;
}

/** Face that a bond is on: the device side unless said. */
export function bondedFace(bond: Pick<BondInput, "face">): Side {
  return bond.face ?? "front";
}

/** What is bonded to a face, null when nothing is. */
export function bondOn<Bond extends Pick<BondInput, "face">>(bonds: readonly Bond[], face: Side): Bond | null {
  return bonds.find((bond) => bondedFace(bond) === face) ?? null;
}

/**
 * Place of the bond that a debond lets go, in bonds listed as they were made: the one on the face that is said, else the first
 * made, which is what a transfer between two carriers lets go first; -1 where there is none.
 */
export function letGoAt(bonds: readonly Pick<BondInput, "face">[], face: Side | null | undefined): number {
  return face ? bonds.findIndex((bond) => bondedFace(bond) === face) : bonds.length > 0 ? 0 : -1;
}

/** Temperature, K, above which a bonding material is a rubber; null when it has none in the range used. */
export function glassTransition({ glassTransition: stated, softening }: BondingMaterialInput): number | null {
  return (stated ?? softening)?.value ?? null;
}

/** Temperature, K, from which the plates slide; null for a cross-linked material and where nobody stated it. */
export function flowPoint({ flows, flowPoint: stated }: BondingMaterialInput): number | null {
  return flows ? (stated?.value ?? null) : null;
}

/** Whether the plates of a bond slide at a temperature (K). */
export function slides(bond: BondState, temperature: number): boolean {
  const from = flowPoint(bond.material);
  return from !== null && temperature >= from;
}

/** The bonds that slide at a temperature (K). */
export function slidingBonds(bonds: readonly BondState[], temperature: number): BondState[] {
  return bonds.filter((bond) => slides(bond, temperature));
}

/**
 * Temperature at which the pair was last at rest: that of bonding or, if lower, the flow point or else the glass transition,
 * below which the material transmits mismatch (common practice, no source).
 */
export function lockTemperature({ rest, material, bondTemperature }: BondState): number {
  if (rest) return rest.temperature;
  return Math.min(bondTemperature, flowPoint(material) ?? glassTransition(material) ?? Infinity);
}

/**
 * The bond locked at a temperature (K) in the shape that the wafer has there: its `strain`, continued to the middles of adhesive
 * and carrier, against flat silicon at 25 °C, and `unequal` what it is by direction beyond that. Curvature goes into that of the
 * adhesive as its middle alone, which leaves out its own bending stiffness, a millionth of the pair's.
 */
export function locked(
  bond: BondState,
  temperature: number,
  strain: PairStrain,
  unequal: BondRest["unequal"] | null = null,
): BondState {
  const silicon = siliconThermalStrain(ROOM_TEMPERATURE, temperature);
  const rest: BondRest = {
    temperature,
    adhesiveStrain: strain.adhesive - silicon,
    carrierStrain: strain.carrier - silicon,
    ...(unequal ? { unequal } : {}),
  };
  return { ...bond, rest };
}

/** Whether two bonds bend a wafer alike from here on. Their inputs are compared by identity. */
export function sameBond(a: BondState, b: BondState): boolean {
  return (
    a.carrier === b.carrier &&
    a.material === b.material &&
    a.thickness === b.thickness &&
    bondedFace(a) === bondedFace(b) &&
    a.bondTemperature === b.bondTemperature &&
    a.rest?.temperature === b.rest?.temperature &&
    a.rest?.carrierStrain === b.rest?.carrierStrain &&
    a.rest?.adhesiveStrain === b.rest?.adhesiveStrain &&
    sameTensor(a.rest?.unequal?.adhesive, b.rest?.unequal?.adhesive) &&
    sameTensor(a.rest?.unequal?.carrier, b.rest?.unequal?.carrier)
  );
}

function sameTensor(a: PlaneTensor | undefined, b: PlaneTensor | undefined): boolean {
  return a?.x === b?.x && a?.y === b?.y && a?.xy === b?.xy;
}
