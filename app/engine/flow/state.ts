import type { PlaneTensor } from "../directional/plane-stiffness.ts";
import { EngineInputError } from "../errors.ts";
import type { Measured } from "../measured.ts";
import type { Orientation } from "../silicon/orientation.ts";
import type { FaceUp, Holding, Side } from "../vocabulary.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import type { BondState } from "./bond.ts";
import { filmEntry } from "./film-entry.ts";
import { incomingParts, siliconEntries, type Incoming } from "./silicon.ts";
import type { StackEntry } from "./stack-entry.ts";
import type { BumpsInput, TapeInput } from "./handling-inputs.ts";
import type { BondInput, FilmAddition, FlowInput, StepInput } from "./model.ts";

/** A film as it is on the wafer, with what it has been through. */
export interface FilmState {
  addition: FilmAddition;
  /** its layer as it came, checked */
  entry: StackEntry;
  /** strain left by yielding, biaxial, tension positive */
  plasticStrain: number;
  /** hottest step so far, K */
  hottest: number;
}

/** The wafer between two steps. Films are listed from the silicon outwards. */
export interface WaferState {
  orientation: Orientation;
  silicon: Measured;
  /** shape that it came in with; null for one that came flat */
  incoming: Incoming | null;
  /** its layers, checked */
  siliconEntries: StackEntry[];
  front: FilmState[];
  back: FilmState[];
  /** force per length of the ground or polished back face, N/m, compression negative */
  groundFaceForce: number;
  bond: BondState | null;
  /** carrier on the other face, from the second bond of a transfer to the debond of the first */
  transfer: BondState | null;
  /** tape or frame that the wafer is on, if any */
  mount: "grinding tape" | "film frame" | "edge ring" | null;
  /** data of that tape where they were given */
  tape: TapeInput | null;
  trim: { width: Measured; depth: Measured } | null;
  ground: boolean;
  /** whether the damage of the last grind was taken off */
  relieved: boolean;
  bumps: BumpsInput | null;
  /** tallest feature of the device side that is no bump */
  topography: Measured | null;
  diced: boolean;
  holding: Holding;
  faceUp: FaceUp;
}

/** Face that a bond is on: the device side unless said. */
export function bondedFace(bond: Pick<BondInput, "face">): Side {
  return bond.face ?? "front";
}

/**
 * The wafer before its first step: bare silicon, device side up.
 * @throws EngineInputError for a wafer without thickness, and for anything that is no silicon wafer
 */
export function initialState(flow: FlowInput): WaferState {
  const kind = flow.wafer.kind ?? "silicon wafer";
  if (kind !== "silicon wafer")
    throw new EngineInputError("wafer.kind", `a ${kind} is out of scope: its bow follows other laws`, "silicon wafer");
  if (!(flow.wafer.thickness.value > 0))
    throw new EngineInputError("wafer.thickness", "the silicon must have a thickness", "> 0 m");
  const { orientation, thickness } = flow.wafer;
  const incoming = incomingParts(flow.wafer);
  return {
    orientation,
    silicon: thickness,
    incoming,
    siliconEntries: siliconEntries(orientation, thickness.value, 0, incoming),
    front: [],
    back: [],
    groundFaceForce: 0,
    bond: null,
    transfer: null,
    mount: null,
    tape: null,
    trim: null,
    ground: false,
    relieved: false,
    bumps: null,
    topography: null,
    diced: false,
    holding: "bare",
    faceUp: "device side",
  };
}

function add(films: FilmState[], side: Side, step: StepInput): FilmState[] {
  const added = step.adds
    .filter((addition) => addition.side === side)
    .map((addition) => ({ addition, entry: filmEntry(addition), plasticStrain: 0, hottest: ROOM_TEMPERATURE }));
  return [...films, ...added];
}

/** Takes off the outermost film of that material; one that is not there is left to the order rule. */
function remove(films: FilmState[], side: Side, step: StepInput): FilmState[] {
  let rest = films;
  for (const removal of step.removes) {
    if (removal.side !== side) continue;
    const at = rest.findLastIndex((film) => film.addition.film.id === removal.filmId);
    if (at >= 0) rest = rest.filter((_, index) => index !== at);
  }
  return rest;
}

function mountAfter(before: WaferState, step: StepInput): WaferState["mount"] {
  if (step.kind === "bond") return null;
  if (step.kind === "laminate tape") return "grinding tape";
  if (step.kind === "mount on frame") return step.planned === "edge ring" ? "edge ring" : "film frame";
  if (step.planned === "bare" || step.planned === "thin-wafer gripper") return null;
  return before.mount;
}

/** The tape that it is on after the step: that which this step names, else that which it came on. */
function tapeAfter(before: WaferState, step: StepInput, mount: WaferState["mount"]): TapeInput | null {
  if (mount === null) return null;
  if (step.kind === "laminate tape" || step.kind === "mount on frame") return step.tape ?? null;
  return step.tape ?? before.tape;
}

/** The carriers after the step: a second bond on the other face is a transfer, and a debond takes the first one off. */
function bondsAfter(before: WaferState, step: StepInput): Pick<WaferState, "bond" | "transfer"> {
  const { bond, transfer } = before;
  if (step.kind === "debond") return { bond: transfer, transfer: null };
  if (step.kind !== "bond" || !step.bond) return { bond, transfer };
  const made = { ...step.bond, bondTemperature: step.peakTemperature };
  if (!bond) return { bond: made, transfer };
  return { bond, transfer: !transfer && bondedFace(made) !== bondedFace(bond) ? made : transfer };
}

/**
 * The face that is usually up: the one away from the carrier, the back side on grinding tape, else the device side. In a transfer
 * the carrier that stays lies below.
 */
function usualFaceUp(holding: Holding, { bond, transfer }: Pick<WaferState, "bond" | "transfer">): FaceUp {
  const lies = transfer ?? bond;
  if (lies) return bondedFace(lies) === "front" ? "back side" : "device side";
  return holding === "grinding tape" ? "back side" : "device side";
}

const TURNS: StepInput["kind"][] = ["bond", "debond", "laminate tape", "mount on frame"];

/** Whether a step may turn the wafer while it is done, so that it is loaded as it came from the step before. */
export function turnsIt({ kind }: Pick<StepInput, "kind">): boolean {
  return TURNS.includes(kind);
}

/**
 * The face that is up after a step: as stated, else as usual where the step bonds, debonds or puts it on tape or frame or another
 * holder turns it, else as it was.
 */
function faceUpAfter(before: WaferState, step: StepInput, bonds: Pick<WaferState, "bond" | "transfer">): FaceUp {
  const usual = usualFaceUp(step.planned, bonds);
  const turned = turnsIt(step) || usual !== usualFaceUp(before.holding, before);
  return step.sideUp ?? (turned ? usual : before.faceUp);
}

/** The face that is up as the wafer is loaded for a step: as it came, unless it is turned for a step that does not turn it itself. */
export function faceUpLoaded(before: WaferState, step: StepInput): FaceUp {
  return step.sideUp && !turnsIt(step) ? step.sideUp : before.faceUp;
}

const RELIEVES = ["stress relief", "polish", "via reveal"];

function relievedAfter(before: WaferState, step: StepInput): boolean {
  if (step.kind === "grind") return false;
  return before.relieved || (before.ground && RELIEVES.includes(step.kind));
}

/**
 * The wafer after a step has added, removed or changed what it states. What the step cannot do (debond what is not bonded,
 * grind to more than there is) is left undone here and reported by the order rule.
 * @throws EngineInputError when the remaining silicon is not positive
 */
export function applyStep(before: WaferState, step: StepInput, field: string): WaferState {
  if (step.siliconAfter && !(step.siliconAfter.value > 0))
    throw new EngineInputError(`${field}.siliconAfter`, "no silicon would be left after this step", "> 0 m");
  const thinner = step.siliconAfter !== null && step.siliconAfter.value <= before.silicon.value;
  const bonds = bondsAfter(before, step);
  const mount = mountAfter(before, step);
  const { orientation, incoming } = before;
  const silicon = thinner && step.siliconAfter ? step.siliconAfter : before.silicon;
  const groundFaceForce = step.groundFaceForce?.value ?? before.groundFaceForce;
  const unchanged = silicon === before.silicon && groundFaceForce === before.groundFaceForce;
  return {
    orientation,
    silicon,
    incoming,
    siliconEntries: unchanged
      ? before.siliconEntries
      : siliconEntries(orientation, silicon.value, groundFaceForce, incoming),
    // A seed that is stripped and left only under the lines is one removal and one addition.
    front: add(remove(before.front, "front", step), "front", step),
    back: add(remove(before.back, "back", step), "back", step),
    groundFaceForce,
    ...bonds,
    mount,
    tape: tapeAfter(before, step, mount),
    trim: step.edgeTrim ?? before.trim,
    ground: before.ground || step.kind === "grind",
    relieved: relievedAfter(before, step),
    bumps: step.bumps ?? before.bumps,
    topography: step.topography ?? before.topography,
    diced: before.diced || step.kind === "dice",
    holding: step.planned,
    faceUp: faceUpAfter(before, step, bonds),
  };
}

/** Films on both sides, outermost last. */
export function allFilms(state: WaferState): FilmState[] {
  return [...state.front, ...state.back];
}

/**
 * Whether two states bend alike from here on: the same silicon, films with the same history, ground face and bond. Inputs are
 * compared by identity, which is what copies of one flow share.
 */
export function sameState(a: WaferState, b: WaferState): boolean {
  const alike = (left: FilmState[], right: FilmState[]) =>
    left.length === right.length &&
    left.every((film, n) => {
      const other = right[n];
      return film.addition === other?.addition && film.plasticStrain === other.plasticStrain;
    });
  return (
    a.silicon === b.silicon &&
    sameIncoming(a.incoming, b.incoming) &&
    a.groundFaceForce === b.groundFaceForce &&
    sameBond(a.bond, b.bond) &&
    alike(a.front, b.front) &&
    alike(a.back, b.back)
  );
}

function sameBond(a: BondState | null, b: BondState | null): boolean {
  return (
    a?.carrier === b?.carrier &&
    a?.material === b?.material &&
    a?.thickness === b?.thickness &&
    a?.bondTemperature === b?.bondTemperature &&
    a?.rest?.carrierStrain === b?.rest?.carrierStrain &&
    a?.rest?.adhesiveStrain === b?.rest?.adhesiveStrain &&
    sameTensor(a?.rest?.unequal?.carrier, b?.rest?.unequal?.carrier) &&
    sameTensor(a?.rest?.unequal?.adhesive, b?.rest?.unequal?.adhesive)
  );
}

function sameTensor(a: PlaneTensor | undefined, b: PlaneTensor | undefined): boolean {
  return a?.x === b?.x && a?.y === b?.y && a?.xy === b?.xy;
}

function sameIncoming(a: Incoming | null, b: Incoming | null): boolean {
  return (
    a?.thickness === b?.thickness &&
    a?.film.x === b?.film.x &&
    a?.film.y === b?.film.y &&
    a?.crystal.x === b?.crystal.x &&
    a?.crystal.y === b?.crystal.y
  );
}
