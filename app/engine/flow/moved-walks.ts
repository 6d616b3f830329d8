import { EngineInputError } from "../errors.ts";
import type { FlowInput } from "./model.ts";
import { initialState, sameState, type WaferState } from "./state.ts";
import { inStep, stepField, takeStep, type WalkedStep } from "./step.ts";
import { firstTouched, lastTouched, moved, type Unknown } from "./unknowns.ts";

/** What is read off each step of a walk. */
export type ReadStep<Reading> = (wafer: FlowInput["wafer"], walked: WalkedStep) => Reading;

/** The flow as stated: a reading of every step, and the wafer after it. */
export interface NominalWalk<Reading> {
  readings: Reading[];
  states: WaferState[];
}

/** Readings of a flow from a step on. `onState` is told of the wafer after each step and ends the walk by `true`. */
function readOn<Reading>(
  flow: FlowInput,
  from: { index: number; state: WaferState },
  read: ReadStep<Reading>,
  onState: (state: WaferState, index: number) => boolean,
): Reading[] {
  let { state } = from;
  const found: Reading[] = [];
  for (let index = from.index; index < flow.steps.length; index += 1) {
    const step = flow.steps[index];
    if (!step) break;
    const before = state;
    inStep(index, () => {
      const walked = takeStep(flow.wafer, before, step, { field: stepField(index), metalHistory: true });
      found.push(read(flow.wafer, walked));
      state = walked.after;
    });
    if (onState(state, index)) break;
  }
  return found;
}

/** Walks a flow as it is stated. @throws EngineInputError as `walkFlow` does */
export function nominalWalk<Reading>(flow: FlowInput, read: ReadStep<Reading>): NominalWalk<Reading> {
  const states: WaferState[] = [];
  const readings = readOn(flow, { index: 0, state: initialState(flow) }, read, (state) => {
    states.push(state);
    return false;
  });
  return { readings, states };
}

/**
 * The flow with one unknown moved by `by` (SI), from the first step that it touches, up to where the wafer is the nominal one again
 * and no later step differs; null where that leaves what can be computed.
 */
export function movedWalk<Reading>(
  flow: FlowInput,
  { states }: NominalWalk<Reading>,
  unknown: Unknown,
  by: number,
  read: ReadStep<Reading>,
): Reading[] | null {
  const index = firstTouched(unknown);
  const last = lastTouched(unknown);
  try {
    const other = moved(flow, unknown, by);
    const state = (index === 0 ? undefined : states[index - 1]) ?? initialState(other);
    return readOn(other, { index, state }, read, (after, at) => {
      const same = states[at];
      return at >= last && same !== undefined && sameState(after, same);
    });
  } catch (error) {
    if (error instanceof EngineInputError) return null;
    throw error;
  }
}
