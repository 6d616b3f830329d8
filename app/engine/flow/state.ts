import { EngineInputError } from "../errors.ts";
import type { Measured } from "../measured.ts";
import type { Orientation } from "../silicon/orientation.ts";
import { otherSide, type FaceUp, type Holding, type Side } from "../vocabulary.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { bondedFace, bondOn, letGoAt, sameBond, type BondState } from "./bond.ts";
import { filmEntry } from "./film-entry.ts";
import { hasLegs } from "./legs.ts";
import { incomingParts, siliconEntries, type Incoming } from "./silicon.ts";
import type { StackEntry } from "./stack-entry.ts";
import type { BumpsInput, TapeInput } from "./handling-inputs.ts";
import type { FilmAddition, FlowInput, StepInput } from "./model.ts";

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
  /** what is bonded to it, at most one to a face, in the order in which they were made */
  bonds: readonly BondState[];
  /** tape or frame that the wafer is on, if any */
  mount: "grinding tape" | "film frame" | "edge ring" | null;
  /** side that this tape or frame is on */
  mountedSide: Side | null;
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

/**
 * The wafer before its first step: bare silicon, device side up.
 * @throws EngineInputError for a wafer without thickness, for anything that is no silicon wafer, and for a flow that parts by slot
 * of which no leg was chosen: there is no one wafer then
 */
export function initialState(flow: FlowInput): WaferState {
  const kind = flow.wafer.kind ?? "silicon wafer";
  if (kind !== "silicon wafer")
    throw new EngineInputError("wafer.kind", `a ${kind} is out of scope: its bow follows other laws`, "silicon wafer");
  if (hasLegs(flow))
    throw new EngineInputError(
      "slots",
      "some steps are for some slots only: choose the slots that are looked at",
      "one leg",
    );
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
    bonds: [],
    mount: null,
    mountedSide: null,
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

/** The side that tape or frame is on: that which no carrier covers; of a wafer by itself, the device side for grinding tape. */
function mountedSideAfter(before: WaferState, step: StepInput, mount: WaferState["mount"]): Side | null {
  if (mount === null) return null;
  if (step.kind !== "laminate tape" && step.kind !== "mount on frame") return before.mountedSide;
  const [bond, other] = before.bonds;
  if (bond && !other) return otherSide(bondedFace(bond));
  return mount === "grinding tape" ? "front" : "back";
}

/** The carriers after the step. A second one goes on the other face: one on a face that is bonded is left to the order rule. */
function bondsAfter({ bonds }: WaferState, step: StepInput): readonly BondState[] {
  if (step.kind === "debond") {
    const at = letGoAt(bonds, step.debondFace);
    return bonds.filter((_, index) => index !== at);
  }
  if (step.kind !== "bond" || !step.bond || bondOn(bonds, bondedFace(step.bond))) return bonds;
  return [...bonds, { ...step.bond, bondTemperature: step.peakTemperature }];
}

/** The bond that a step lets go; null when it is no debond, or of what is not bonded. */
export function bondLetGo({ bonds }: Pick<WaferState, "bonds">, step: StepInput): BondState | null {
  return step.kind === "debond" ? (bonds[letGoAt(bonds, step.debondFace)] ?? null) : null;
}

/**
/**
 * The face that is usually up once the step is planned as it is: the one away from the carrier, or from tape or frame. Between two
 * carriers it lies on the one that was bonded last.
 */
function usualFaceUp({ holding, bonds, mount, mountedSide }: Lying): FaceUp {
  const lies = bonds.at(-1);
  const onFront = lies
    ? bondedFace(lies) === "front"
    : holding === "grinding tape" || (mount !== "grinding tape" && mountedSide === "front");
  return onFront ? "back side" : "device side";
}

type Lying = Pick<WaferState, "holding" | "bonds" | "mount" | "mountedSide">;

const TURNS: StepInput["kind"][] = ["bond", "debond", "laminate tape", "mount on frame"];

/** Whether a step may turn the wafer while it is done, so that it is loaded as it came from the step before. */
export function turnsIt({ kind }: Pick<StepInput, "kind">): boolean {
  return TURNS.includes(kind);
}

/**
 * The face that is up after a step: as stated, else as usual where the step bonds, debonds or puts it on tape or frame or another
 * holder turns it, else as it was.
 */
function faceUpAfter(before: WaferState, step: StepInput, lying: Lying): FaceUp {
  const usual = usualFaceUp(lying);
  const turned = turnsIt(step) || usual !== usualFaceUp(before);
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
 * grind to more than there is) is left undone here and reported by the order rule; a step that it skips leaves it as it was.
 * @throws EngineInputError when the remaining silicon is not positive
 */
export function applyStep(before: WaferState, step: StepInput, field: string): WaferState {
  if (step.skipped) return before;
  if (step.siliconAfter && !(step.siliconAfter.value > 0))
    throw new EngineInputError(`${field}.siliconAfter`, "no silicon would be left after this step", "> 0 m");
  const thinner = step.siliconAfter !== null && step.siliconAfter.value <= before.silicon.value;
  const bonds = bondsAfter(before, step);
  const mount = mountAfter(before, step);
  const mountedSide = mountedSideAfter(before, step, mount);
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
    bonds,
    mount,
    mountedSide,
    tape: tapeAfter(before, step, mount),
    trim: step.edgeTrim ?? before.trim,
    ground: before.ground || step.kind === "grind",
    relieved: relievedAfter(before, step),
    bumps: step.bumps ?? before.bumps,
    topography: step.topography ?? before.topography,
    diced: before.diced || step.kind === "dice",
    holding: step.planned,
    faceUp: faceUpAfter(before, step, { holding: step.planned, bonds, mount, mountedSide }),
  };
}

/** Films on both sides, outermost last. */
export function allFilms(state: WaferState): FilmState[] {
  return [...state.front, ...state.back];
}

/**
 * Whether two states bend alike from here on: the same silicon, films with the same history, ground face and bonds. Inputs are
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
    sameBonds(a.bonds, b.bonds) &&
    alike(a.front, b.front) &&
    alike(a.back, b.back)
  );
}

function sameBonds(a: readonly BondState[], b: readonly BondState[]): boolean {
  return (
    a.length === b.length &&
    a.every((bond, n) => {
      const other = b[n];
      return other !== undefined && sameBond(bond, other);
    })
  );
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
