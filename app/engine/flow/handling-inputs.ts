import type { Measured } from "../measured.ts";
import type { Exposure, Side } from "../vocabulary.ts";

/**
 * What the handling rules ask beyond the physics of a step: contact, clocks, chemistry, light, tools. Every property may be
 * missing or null, which means 'not given': inputs of earlier assessments stay readable. What a missing property leads to is
 * said at each; where nothing is said the rule has no say there. SI units; times in s.
 */

/** What stands in the flow. Everything but a silicon wafer is refused by name. Missing: a silicon wafer. */
export const WAFER_KINDS = ["silicon wafer", "moulded wafer", "reconstituted wafer", "panel", "package"] as const;
export type WaferKind = (typeof WAFER_KINDS)[number];

/** What a material does in a chemical, in vacuum or in light. `unknown` counts as not given. */
export const RESISTANCE_WORDS = ["resists", "attacked", "unknown"] as const;
export type ResistanceWord = (typeof RESISTANCE_WORDS)[number];

/** `longest` is the time that it stands, s: 'ok 30 min' is resists with 1800. Null: no time is named. */
export interface Resistance {
  word: ResistanceWord;
  longest?: number | null;
}

export const SOLVENT_FAMILIES = [
  "alcohol",
  "ketone",
  "ester or glycol ether",
  "hydrocarbon",
  "polar aprotic",
  "bonding material remover",
] as const;
export type SolventFamily = (typeof SOLVENT_FAMILIES)[number];

/** What a bonding material or a tape stands. Missing at a step that exposes it: 'cannot judge' (tape: caution). */
export interface Resistances {
  vacuum?: Resistance | null;
  plasma?: Resistance | null;
  solvent?: Resistance | null;
  acid?: Resistance | null;
  base?: Resistance | null;
  ultraviolet?: Resistance | null;
  /** solvents that attack it although `solvent` resists; missing: none known */
  attackedBy?: SolventFamily[] | null;
}

export const CONTACT_MEANS = ["pad", "pin", "edge grip", "full area", "vacuum cup"] as const;
export type ContactMeans = (typeof CONTACT_MEANS)[number];

/** Which face is touched at a step, and with what. */
export interface ContactInput {
  face: Side;
  means: ContactMeans;
}

/** Bumps, balls or pillars on the device side from this step on. */
export interface BumpsInput {
  /** over the face, tallest */
  height: Measured;
  /** peel force per width that they stood in a trial, N/m; missing: a peel is a caution */
  standsPeelForce?: Measured | null;
}

/** Grinding tape, dicing tape on a frame, or the tape of an edge ring. */
export interface TapeInput {
  /** the record of the library that it is; missing: only what the step itself states of it */
  id?: string | null;
  name: string;
  /** missing: the site's limit for tape */
  temperatureLimit?: Measured | null;
  resistances?: Resistances | null;
  /** whether ultraviolet light lets it go; missing: taken as not */
  releasesInLight?: boolean | null;
  /** longest time on it, s; missing: the site's red line */
  longestTime?: Measured | null;
  /** soft layer that takes up bumps, m; zero when it has none; missing with bumps under it: 'cannot judge' */
  embeddingDepth?: Measured | null;
  /** thickness variation of the tape, m; missing: left out of the budget on tape */
  thicknessVariation?: Measured | null;
}

/** What a film's stress was measured on. Missing: nothing is said of it. */
export interface StressRecord {
  /** ISO date; missing: the date of the stress itself, or none */
  on?: string | null;
  state?: "as deposited" | "after heating" | null;
  /** film thickness at which it was measured, m */
  filmThickness?: number | null;
  monitorThickness?: number | null;
  monitorDiameter?: number | null;
}

export interface FilmHandling {
  /** temperature at which the solder of this film melts, K; missing for solder: its temperature limit */
  solderMelting?: Measured | null;
}

export interface FilmAdditionHandling {
  stressRecord?: StressRecord | null;
}

export interface CarrierHandling {
  /** kg/m3; missing: silicon's own; of glass 'cannot judge' against a weight limit */
  density?: Measured | null;
  /** total thickness variation, m; missing: the thickness budget of a pair cannot be judged */
  thicknessVariation?: Measured | null;
  /** light that passes it; missing for glass at a release through it: 'cannot judge'; silicon passes no ultraviolet */
  passesUltraviolet?: boolean | null;
  passesInfrared?: boolean | null;
  /** metal or another opaque layer of the carrier in the light's way; missing: none */
  metalInLight?: boolean | null;
  /** openings for the solvent; missing at a solvent release: 'cannot judge' */
  perforated?: boolean | null;
  /** for electrostatic clamping of glass; missing: caution at a tool that clamps so */
  conductiveCoating?: boolean | null;
  /** whether optical sensors see it (frosted, coated, ground rim); missing for glass: caution at a tool that senses so */
  seenBySensors?: boolean | null;
  /** serial or laser mark of this piece; missing with a use limit and no count: nothing is said while planning */
  identity?: string | null;
  /** times that this piece has been bonded before */
  uses?: number | null;
  useLimit?: number | null;
  /** why this piece is not to be used any more: 'scrapped'; missing: it is in use */
  outOfUse?: string | null;
}

export interface BondingMaterialHandling {
  resistances?: Resistances | null;
  /** its thickness variation as a share of its thickness; missing: the thickness budget of a pair cannot be judged */
  thicknessVariationShare?: Measured | null;
  /** thinnest and thickest bond that it is made for, m; missing: no thickness is found fault with */
  leastThickness?: number | null;
  mostThickness?: number | null;
  /** highest temperature in vacuum, K; missing: the temperature limit alone */
  vacuumTemperatureLimit?: Measured | null;
  /** weight loss in vacuum at its limit, fraction */
  weightLoss?: Measured | null;
  /** longest time at its temperature limit, s */
  limitTime?: Measured | null;
  /** how many heatings it stands between bond and debond */
  thermalCycles?: Measured | null;
  /** total time hot between bond and debond, s */
  thermalTime?: Measured | null;
  /** light that lets it go; missing: ultraviolet for a laser through glass */
  releaseLight?: "ultraviolet" | "infrared" | null;
  /** force per width at the peel front, N/m; missing: a peel with bumps is a caution */
  peelForce?: Measured | null;
  /** bend radius of the wafer at the peel front, m; missing: a peel is a caution */
  peelRadius?: Measured | null;
  /** what takes it off after the debond */
  remover?: SolventFamily | null;
}

export interface BondHandling {
  /** face that is bonded; missing: the device side */
  face?: Side | null;
  /** variation of the adhesive of this bond, m, when better known than the material's share */
  thicknessVariation?: Measured | null;
}

/** How a tool holds what lies on it. */
export const CLAMPINGS = [
  "vacuum",
  "full-area vacuum",
  "electrostatic",
  "clamp ring",
  "edge grip",
  "polishing head",
  "boat",
  "pins",
  "belt or plate",
  "ledges",
  "frame",
] as const;
export type Clamping = (typeof CLAMPINGS)[number];

export interface EquipmentHandling {
  /** missing: rule 4 and the electrostatic questions of rule 7 have no say */
  clamping?: Clamping | null;
  /** rim gap that its seal still closes, m; missing: the site's limit for plain or compliant seals */
  sealGap?: Measured | null;
  seal?: "plain" | "compliant" | null;
  /** clear height over and under what lies in a slot, m; missing: the site's limit in stores, none elsewhere */
  slotClearance?: Measured | null;
  /** heaviest, kg, and thickest, m, that its robot and aligner take */
  weightLimit?: Measured | null;
  totalThicknessLimit?: Measured | null;
  /** finds the wafer by light; missing: taken as not */
  sensesOptically?: boolean | null;
  /** what it touches at every step that names no contact of its own */
  contact?: ContactInput | null;
  /** takes off charge at a peel; missing: a reminder, no caution */
  ioniser?: boolean | null;
}

export interface StepHandling {
  /** of a debond: the face whose carrier it lets go; missing: the one bond there is, of two 'cannot judge' */
  debondFace?: Side | null;
  /** how long each exposure lasts, s; missing: the hold time, else not known */
  exposureTimes?: Partial<Record<Exposure, number>> | null;
  solvent?: SolventFamily | null;
  contact?: ContactInput | null;
  /** tape that this step puts it on; missing: tape with the site's limits, its chemistry not known */
  tape?: TapeInput | null;
  /** from tape to the next holder without standing free; missing: taken as in line; false: it stands free in between */
  inLine?: boolean | null;
  /** time since the step before ended, s; missing: clocks are not judged, their red lines are said */
  timeSincePrevious?: number | null;
  /** baked dry before its vacuum; missing on a wet polymer or pair: caution */
  dehydrationBake?: boolean | null;
  bumps?: BumpsInput | null;
  /** tallest feature of the device side that is no bump, m, from this step on */
  topography?: Measured | null;
  /** how far vias stand out after this step, m */
  viaProtrusion?: Measured | null;
  /** thickness variation that this step's thinning adds, m; missing: the thickness budget of a pair cannot be judged */
  thicknessVariation?: Measured | null;
}

/** What the flow was assessed for, and what this lot came in with. Bow is the standard one. */
export interface IncomingGate {
  /** accepted band: value ± tolerance, m */
  bow?: Measured | null;
  /** largest accepted, m */
  warp?: Measured | null;
  /** the lot as received; missing: a plan, nothing to judge. A figure missing that has a limit: 'cannot judge' */
  lot?: {
    name: string;
    bow?: number | null;
    warp?: number | null;
    thickness?: number | null;
    edgeChips?: "none" | "found" | null;
    identity?: "matches" | "differs" | null;
  } | null;
}

export interface WaferHandling {
  kind?: WaferKind | null;
}

export interface FlowHandling {
  /** ISO date of the assessment, against which the age of records is counted; missing: ages are not judged */
  assessedOn?: string | null;
  gate?: IncomingGate | null;
}
