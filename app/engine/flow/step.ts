import { EngineInputError } from "../errors.ts";
import { ROOM_TEMPERATURE } from "../laminate/layer.ts";
import { balanceLayers } from "../laminate/solve-laminate.ts";
import type { Holding } from "../vocabulary.ts";
import { bondedFace, bondOn, flowPoint, slides, slidingBonds, type BondState } from "./bond.ts";
import { bendsUnequally, layersOf } from "./layers.ts";
import type { FlowInput, StepInput } from "./model.ts";
import { restOnPair } from "./second-bond.ts";
import { lockedState, placeStack, settle, statedLayers, type Settled, type SettleOptions } from "./settle.ts";
import { lyingShape, type LyingShape } from "./shape.ts";
import { unequalCurvature } from "./unequal.ts";
import { applyStep, type WaferState } from "./state.ts";
import { turningTemperatures } from "./temperature-profile.ts";

type Wafer = FlowInput["wafer"];

/** A step as it was walked, before anybody asks for a shape. */
export interface WalkedStep {
  after: WaferState;
  /** at the hottest of the step, and at 25 °C after it; one and the same for a step at room temperature */
  hot: Settled;
  cold: Settled;
  /** whether tape or frame keeps it flat, so that it has no bow of its own */
  flat: boolean;
}

const FLAT_HOLDINGS: Holding[] = ["grinding tape", "film frame", "edge ring"];

/** Whether what holds the wafer keeps it flat, so that it has no bow of its own at that step. */
export function heldFlat(holding: Holding): boolean {
  return FLAT_HOLDINGS.includes(holding);
}

/**
 * What a step does to the wafer: it changes, is heated, and cools to 25 °C. With a profile it settles wherever that turns; a bond is
 * made and let go at the hottest of it.
 */
export function takeStep(
  wafer: Wafer,
  before: WaferState,
  step: StepInput,
  { field, metalHistory }: { field: string; metalHistory: boolean },
): WalkedStep {
  if (step.skipped) return passedOver(before, metalHistory);
  const applied = applyStep(before, step, field);
  const flat = heldFlat(step.planned);
  const options = { metalHistory, heldFlat: flat };
  const places = turningTemperatures(step);
  const hottest = places.indexOf(Math.max(...places));
  const second = before.bonds.length > 0 && applied.bonds.length > before.bonds.length;
  let state = hottest > 0 ? { ...applied, bonds: before.bonds } : applied;
  let settled: Settled | null = null;
  let hot: Settled | null = null;
  for (const [at, temperature] of places.entries()) {
    if (at === hottest && at > 0) state = { ...state, bonds: asTheyAre(applied.bonds, state.bonds) };
    const pressed = second && at === hottest;
    settled = settle(pressed ? restOnPair(state, temperature, options) : state, temperature, options);
    if (at === hottest) hot = settled;
    // A second bond is pressed flat until all has locked.
    state = pressed ? settled.state : relock(before, settled, { step, options, next: places[at + 1] });
  }
  if (!hot || !settled) throw new Error("a step has a hottest moment");
  const cold = settled.temperature === ROOM_TEMPERATURE ? settled : settle(state, ROOM_TEMPERATURE, options);
  return { after: cold.state, hot, cold, flat };
}

/** The wafer at a step that it skips: as it was, held as it was. */
function passedOver(before: WaferState, metalHistory: boolean): WalkedStep {
  const flat = heldFlat(before.holding);
  const cold = settle(before, ROOM_TEMPERATURE, { metalHistory, heldFlat: flat });
  return { after: before, hot: cold, cold, flat };
}

/** The bonds after a step, those that were there before as the step has left them so far. */
const asTheyAre = (after: readonly BondState[], now: readonly BondState[]): BondState[] =>
  after.map((bond) => bondOn(now, bondedFace(bond)) ?? bond);

interface Cooling {
  step: StepInput;
  options: SettleOptions;
  /** temperature at which the step turns next, K; none when it goes to 25 °C */
  next: number | undefined;
}

/**
 * A pair that has slid, cooled to where it locks, if it locks before the step turns next; between two carriers, the one with the
 * higher flow point first. One that is bonded in this step is pressed flat while it cools, and rests flat on the silicon; one that
 * was bonded before locks as it lies, flat on a tool that holds it flat.
 */
function relock(before: WaferState, hot: Settled, { step, options, next }: Cooling): WaferState {
  if (before.bonds.length === 0) return hot.state;
  const flat = options.heldFlat || step.equipment?.atPeak === "held";
  const points = slidingBonds(hot.state.bonds, hot.temperature)
    .filter((bond) => next === undefined || !slides(bond, next))
    .map(({ material }) => flowPoint(material) ?? 0);
  return [...new Set(points)]
    .sort((a, b) => b - a)
    .reduce((state, from) => lockedState(settle(state, from, { ...options, heldFlat: flat }), flat), hot.state);
}

/** Shape at 25 °C after the step as it lies on the tool; null when tape or frame holds it flat. */
export function roomShape(wafer: Wafer, { after, cold, flat }: WalkedStep): LyingShape | null {
  return flat ? null : settledShape(wafer, cold, after.bonds.length > 0);
}

/** Shape at the hottest of the step; null at room temperature or when tape or frame holds it flat. */
export function peakShape(wafer: Wafer, { after, hot, flat }: WalkedStep): LyingShape | null {
  return flat || hot.temperature <= ROOM_TEMPERATURE ? null : settledShape(wafer, hot, after.bonds.length > 0);
}

/** Shape at 25 °C as it would lie if nothing held it. */
export function releasedShape(wafer: Wafer, { after, cold }: WalkedStep): LyingShape {
  if (after.bonds.length === 0) return settledShape(wafer, cold, false);
  const temperature = ROOM_TEMPERATURE;
  const stack = placeStack(layersOf(after, temperature, []), temperature);
  const solution = balanceLayers(stack.placed);
  const unequal = bendsUnequally(after) ? unequalCurvature(stack, temperature, null) : undefined;
  return lyingShape(wafer, { layers: () => statedLayers(stack), solution, temperature, bonded: false, unequal });
}

function settledShape(wafer: Wafer, settled: Settled, bonded: boolean): LyingShape {
  const { solution, temperature, state } = settled;
  return lyingShape(wafer, {
    layers: () => statedLayers(settled),
    solution,
    temperature,
    bonded,
    slidingOn: settled.slidingOn?.map(({ stated }) => stated),
    unequal: bendsUnequally(state) ? unequalCurvature(settled, temperature, settled.slidingOn) : undefined,
  });
}

/** How errors name a step, by its index. */
export function stepField(index: number): string {
  return `steps[${index}]`;
}

/** Runs what belongs to a step, so that a refusal names it. A curvature is nobody's input, so that one is said by its causes. */
export function inStep<T>(index: number, run: () => T): T {
  const step = stepField(index);
  try {
    return run();
  } catch (error) {
    if (!(error instanceof EngineInputError)) throw error;
    const { field, reason, allowed } = error;
    if (field.startsWith("steps[")) throw error;
    if (field === "linearCurvature")
      throw new EngineInputError(
        step,
        "the films would bend the wafer beyond anything that can be computed. Check their thickness, stress and modulus, and the silicon left",
      );
    throw new EngineInputError(`${step}.${field}`, reason, allowed);
  }
}
