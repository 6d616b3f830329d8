import type { ExpansionCurve } from "../laminate/expansion-curve.ts";
import type { FilmPattern } from "../patterned/pattern.ts";
import type { Measured } from "../measured.ts";
import type { Exposure, FaceUp, Holding, Side } from "../vocabulary.ts";
import type {
  BondHandling,
  BondingMaterialHandling,
  CarrierHandling,
  EquipmentHandling,
  FilmAdditionHandling,
  FilmHandling,
  FlowHandling,
  StepHandling,
  WaferHandling,
} from "./handling-inputs.ts";
import type { TemperatureProfile } from "./temperature-profile.ts";

/**
 * What a flow is made of, complete in itself: names, values and provenance are copied in, so a stored assessment can be
 * read for ever without the library it came from. SI units; temperatures in K.
 *
 * What the handling rules ask beyond the physics stands in `handling-inputs.ts`.
 *
 * Left out in this version: wafers of a lot.
 */

export const STEP_KINDS = [
  "receive",
  "measure",
  "deposit",
  "cure",
  "anneal",
  "pattern",
  "plate",
  "reflow",
  "clean",
  "edge trim",
  "laminate tape",
  "bond",
  "grind",
  "stress relief",
  "polish",
  "via reveal",
  "back-side film",
  "mount on frame",
  "debond",
  "dice",
  "move",
  "store",
  "hold",
] as const;
export type StepKind = (typeof STEP_KINDS)[number];

export const FILM_KINDS = ["metal", "polymer", "inorganic", "solder"] as const;
export type FilmKind = (typeof FILM_KINDS)[number];

/** A film material. `yieldStress` is that at 25 °C; only metals that yield have one. */
export interface FilmInput extends FilmHandling {
  id: string;
  name: string;
  kind: FilmKind;
  youngsModulus: Measured;
  poissonsRatio: Measured;
  expansion: Measured;
  yieldStress: Measured | null;
  temperatureLimit: Measured | null;
  /**
   * Of a polymer: from here on it carries no stress, K; below, its stress falls in a straight line from that at 25 °C to zero
   * here, on thick silicon. Without it the stress falls with the film's expansion until it is zero.
   */
  zeroStressTemperature?: Measured | null;
}

/**
 * A film put down by a step. `stress` at 25 °C on a full-thickness monitor held flat, tension positive, of the film before it
 * is cut into a pattern.
 */
export interface FilmAddition extends FilmAdditionHandling {
  side: Side;
  film: FilmInput;
  thickness: Measured;
  stress: Measured;
  /** area fraction, 0 to 1 */
  coverage: number;
  /** how it is cut, with its own coverage; without it the film bends both directions alike by its `coverage` */
  pattern?: FilmPattern | null;
}

/**
 * Shape that the wafer comes in with, flattened by nothing, gravity compensated. Curvatures are positive for a bowl, along x
 * (the notch or flat, <110> on silicon (100)) and across it.
 */
export interface IncomingShape {
  curvature: { x: Measured; y: Measured };
  /** share of it, 0 to 1, that films on the device side cause, which grows as 1/h² when the wafer is thinned; the crystal's own
   * stays. null when nobody knows: taken as film */
  filmShare: Measured | null;
}

export const CARRIER_MATERIALS = ["silicon", "glass"] as const;
export type CarrierMaterial = (typeof CARRIER_MATERIALS)[number];

/**
 * A carrier. `expansion` null means silicon's own curve; a number is a mean, and `meanExpansionOver` (K) says between which
 * temperatures. With `expansionCurve` the curve is integrated instead, and `expansion` only moves it as a whole: by how much
 * its value lies above the mean of the curve over `meanExpansionOver`, by default the curve's own range, and its tolerance is the
 * uncertainty of the whole curve.
 */
export interface CarrierInput extends CarrierHandling {
  id: string;
  name: string;
  material: CarrierMaterial;
  thickness: Measured;
  diameter: number;
  youngsModulus: Measured;
  poissonsRatio: Measured;
  expansion: Measured | null;
  meanExpansionOver?: { from: number; to: number } | null;
  expansionCurve?: ExpansionCurve | null;
  temperatureLimit: Measured;
}

export const RELEASE_METHODS = [
  "thermal slide",
  "laser through glass",
  "mechanical peel",
  "laser through glass then peel",
  "solvent through perforated carrier",
] as const;
export type ReleaseMethod = (typeof RELEASE_METHODS)[number];

/**
 * A temporary bonding material. `effectiveModulus` is the locked-in modulus that couples the pair, calibrated on measured
 * pairs and far below the data sheet's. `flows` is true for a thermoplastic, false for a cross-linked material.
 *
 * `softening` is what data sheets call glass transition or softening point. Where it is known better, `glassTransition` says
 * where the material turns from its locked-in modulus to a rubber (by default the softening point), and `flowPoint`, of a
 * thermoplastic alone, from where on the plates slide. Without a flow point nothing slides: the pair keeps the state of rest
 * that it was bonded in, and a step that reaches the softening point says so in its remarks.
 */
export interface BondingMaterialInput extends BondingMaterialHandling {
  id: string;
  name: string;
  effectiveModulus: Measured;
  poissonsRatio: Measured;
  expansionBelow: Measured;
  expansionAbove: Measured;
  softening: Measured | null;
  glassTransition?: Measured | null;
  flowPoint?: Measured | null;
  flows: boolean;
  bondTemperature: Measured;
  temperatureLimit: Measured;
  release: ReleaseMethod;
  releaseTemperature: Measured;
}

export const PEAK_HOLDINGS = ["free", "held"] as const;
export type PeakHolding = (typeof PEAK_HOLDINGS)[number];

/** A tool with its two warp limits; null where the wafer comes on a frame and no limit is given. */
export interface EquipmentInput extends EquipmentHandling {
  id: string;
  name: string;
  warpLimitEdgesUp: Measured | null;
  warpLimitEdgesDown: Measured | null;
  /** thinnest silicon it takes without support, m */
  leastUnsupportedThickness: Measured | null;
  /** whether the wafer is free while it is hot (boat, pins, belt) or held (vacuum, clamp, frame) */
  atPeak: PeakHolding;
  /** largest wafer or carrier diameter it takes, m */
  largestDiameter: Measured;
}

export interface BondInput extends BondHandling {
  carrier: CarrierInput;
  material: BondingMaterialInput;
  thickness: Measured;
}

export interface StepInput extends StepHandling {
  kind: StepKind;
  title: string;
  /** slots of the cassette that take it, from 1, each once and in order; missing: all of them */
  slots?: number[] | null;
  /** whether the wafer walked here is in none of its slots, so that it is passed over: `legFlows` says so, nobody else */
  skipped?: boolean;
  peakTemperature: number;
  /** minutes at peak kept in seconds; null when it does not matter */
  holdTime: number | null;
  /** how it gets hot and cools, where that is known: peak and hold time are the profile's own then. Missing: up to the peak and back */
  profile?: TemperatureProfile | null;
  /** side up on the tool; missing: as at the step before, turned where a step turns it */
  sideUp?: FaceUp | null;
  /** which of several machines, 'oven 3', and by which recipe it is done: said, not judged */
  machine?: string | null;
  recipe?: string | null;
  equipment: EquipmentInput | null;
  exposures: Exposure[];
  planned: Holding;
  /** remaining silicon after the step; null leaves it as it was */
  siliconAfter: Measured | null;
  adds: FilmAddition[];
  removes: { side: Side; filmId: string; filmName: string }[];
  edgeTrim: { width: Measured; depth: Measured } | null;
  bond: BondInput | null;
  /** force of the ground or polished back face per length, N/m, compression negative; null leaves it as it was */
  groundFaceForce: Measured | null;
}

export interface FlowInput extends FlowHandling {
  name: string;
  wafer: {
    name: string;
    diameter: number;
    orientation: "100" | "111";
    thickness: Measured;
    incoming?: IncomingShape | null;
  } & WaferHandling;
  steps: StepInput[];
  /** the slots that this flow is for, of one that parts by slot; missing: all of them, or not chosen yet */
  leg?: { slots: number[] } | null;
}
