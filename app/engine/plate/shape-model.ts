import type { Orientation } from "../silicon/orientation.ts";
import { softening } from "./plate-energy.ts";
import { readingsAtHighest } from "./highest-rim.ts";
import { crossedState, reachedState, snappedState } from "./load-path.ts";
import { isotropicPlate, siliconPlates, type Plate } from "./plate.ts";
import { dipAcross, readingsOf, rimTop, type Readings } from "./readings.ts";
import type { CurvaturePair } from "./stable-state.ts";
import { keepsDirection, turnedState } from "./turned-state.ts";

/** What the shape of a plate depends on besides its size and its load. */
export interface PlateKind {
  /** 0 to 0.5 */
  poissonsRatio: number;
  /** Silicon (100) replaces the isotropic coefficients by those of the crystal; (111) is isotropic. */
  crystal?: Orientation;
  /** Direction of the load's x axis on the face of silicon (100), default <100>. */
  axes?: "100" | "110";
}

/**
 * Shape of a free plate beyond small deflections, without dimensions: curvatures times R²/(4h), heights over 2 h. Everything
 * that the rest of the engine knows about large deflections is behind this file.
 */
export interface ReachedShape extends Readings {
  /** The area mean of the curvature along its own principal axes. */
  average: CurvaturePair;
  /** Lowest point below the centre and highest above it, both zero or more, of the shape or of its mirror image. */
  dip: number;
  top: number;
  /** m of `plate-energy.ts` there: the share of the membrane's resistance to uniform curvature that is left. */
  softening: number;
  /** Angle from the load's x axis to the axis that the readings call x, on which the rim is highest, rad, −π/4 to π/4. */
  turn: number;
  /** Load over the load at which the shape becomes unstable, as by `loadRatio`. */
  loadRatio: number;
}

export interface PlateShape extends ReachedShape {
  /** Bows of the other stable shapes of another size under the same load. */
  others: CurvaturePair[];
}

/** Bows closer than this share are one shape: the roll about the other axis under almost equal loads. */
const SAME_SHAPE = 1e-3;

/** Equal small-deflection curvature at which rolling begins, times R²/(4h). */
export function criticalLoad(kind: PlateKind): number {
  return kind.crystal === "100" ? siliconPlates().soft.criticalLoad : isotropicPlate(kind.poissonsRatio).criticalLoad;
}

/** The shape under a load given as the two curvatures of small deflections, with the others that the load could hold. */
export function plateShape(load: CurvaturePair, kind: PlateKind): PlateShape {
  const { size, signs } = sizeAndSigns(load);
  const main = mainState(size, kind);
  const bows = alternativeBows(size, kind, straightPlate(kind), main.state);
  const others = bows.filter((bow) => !sameShape(bow, main.readings.bow)).map((bow) => signed(bow, signs));
  return { ...shapeOf(load, kind, main), others };
}

/** That shape alone. */
export function reachedShape(load: CurvaturePair, kind: PlateKind): ReachedShape {
  return shapeOf(load, kind, mainState(sizeAndSigns(load).size, kind));
}

/** The load with both parts zero or more, and what was taken from it. */
function sizeAndSigns({ mean, halfDifference }: CurvaturePair) {
  return {
    size: { mean: Math.abs(mean), halfDifference: Math.abs(halfDifference) },
    // A saddle of no mean may snap either way: up along x.
    signs: { mean: sign(mean === 0 ? halfDifference : mean), halfDifference: sign(halfDifference) },
  };
}

function shapeOf(load: CurvaturePair, kind: PlateKind, { plate, state, turn, readings }: MainState): ReachedShape {
  const { size, signs } = sizeAndSigns(load);
  const straight = straightPlate(kind);
  const turned = turn === 0 ? 0 : turn * sign(load.halfDifference);
  return {
    bow: signed(readings.bow, signs),
    centre: signed(readings.centre, signs),
    parabola: signed(readings.parabola, signs),
    rim: readings.rim * signs.mean,
    average: signed(state, signs),
    softening: softening(plate.energy, state),
    dip: dipAcross(alongY(readings.bow), alongY(readings.centre), alongY(readings.parabola)),
    top: rimTop(readings),
    turn: turned,
    loadRatio: Math.max(size.mean / criticalLoad(kind), size.halfDifference / straight.saddleLoad),
  };
}

/** The plate for shapes along the axes of the load. */
function straightPlate({ crystal, axes, poissonsRatio }: PlateKind): Plate {
  if (crystal !== "100") return isotropicPlate(poissonsRatio);
  return axes === "110" ? siliconPlates().hard : siliconPlates().soft;
}

interface MainState {
  plate: Plate;
  state: CurvaturePair;
  turn: number;
  readings: Readings;
}

function mainState(load: CurvaturePair, kind: PlateKind): MainState {
  if (kind.crystal === "100" && kind.axes === "110") {
    const turned = turnedState(load);
    return { ...turned, ...readingsAtHighest(turned) };
  }
  const plate = straightPlate(kind);
  const state = reachedState(plate, load);
  return { plate, state, turn: 0, readings: readingsOf(plate, state) };
}

/** Bows of shapes that other loads could have led to, in the frame of a load with both parts zero or more. */
function alternativeBows(load: CurvaturePair, kind: PlateKind, plate: Plate, reached: CurvaturePair): CurvaturePair[] {
  const found: CurvaturePair[] = [];
  const direction = kind.axes === "110" ? "hard" : "soft";
  const keeps = (state: CurvaturePair, pull: number) =>
    kind.crystal !== "100" || keepsDirection(direction, state, pull);
  const snapped = snappedState(plate, load, reached);
  if (snapped && keeps(snapped, load.halfDifference)) {
    const { bow } = readingsOf(plate, snapped);
    found.push({ mean: -bow.mean, halfDifference: bow.halfDifference });
  }
  // An isotropic plate turns to the axis of the load; so does a crystal from its hard axes.
  if (kind.crystal === "100" && direction === "soft" && load.halfDifference > 0) {
    const crossed = crossedState(plate, load);
    if (crossed && keeps(crossed, -load.halfDifference)) {
      const { bow } = readingsOf(plate, crossed);
      found.push({ mean: bow.mean, halfDifference: -bow.halfDifference });
    }
  }
  return found;
}

/** Whether two shapes have the same bows, whichever axis is which. Upside down is another shape. */
function sameShape(a: CurvaturePair, b: CurvaturePair): boolean {
  const close = (x: number, y: number) =>
    Math.abs(x - y) <= SAME_SHAPE * (Math.abs(b.mean) + Math.abs(b.halfDifference));
  return close(a.mean, b.mean) && close(Math.abs(a.halfDifference), Math.abs(b.halfDifference));
}

function sign(value: number): 1 | -1 {
  return value < 0 ? -1 : 1;
}

function signed({ mean, halfDifference }: CurvaturePair, signs: CurvaturePair): CurvaturePair {
  return { mean: mean * signs.mean, halfDifference: halfDifference * signs.halfDifference };
}

function alongY({ mean, halfDifference }: CurvaturePair): number {
  return mean - halfDifference;
}
