import { EngineInputError } from "../errors.ts";
import { standardUncertainty, type Measured } from "../measured.ts";
import type { SiteLimits } from "../rules/limits.ts";
import type { StepUncertainty } from "../rules/finding.ts";
import type { FlowInput } from "./model.ts";
import { initialState, sameState, type WaferState } from "./state.ts";
import { inStep, peakShape, roomShape, stepField, takeStep } from "./step.ts";
import { firstTouched, lastTouched, moved, unknowns, type Unknown } from "./unknowns.ts";

/** How much one input moves a step's sagitta: its standard uncertainty times the sensitivity, m. */
export interface Contribution {
  input: string;
  source: Measured["source"];
  contribution: number;
}

export interface FlowUncertainty extends StepUncertainty {
  /** largest first */
  budget: Contribution[];
}

/** Sagittas of a step at 25 °C and at peak, m; null where it has none. */
interface Outline {
  atRoom: number | null;
  atPeak: number | null;
}

/** The flow as stated: outlines, and the wafer after each step. */
interface Nominal {
  outlines: Outline[];
  states: WaferState[];
}

/** Sagittas of a flow from a step on. `onState` is told of the wafer after each step and ends the walk by `true`. */
function outline(
  flow: FlowInput,
  from: { index: number; state: WaferState },
  onState: (state: WaferState, index: number) => boolean,
): Outline[] {
  let { state } = from;
  const found: Outline[] = [];
  for (let index = from.index; index < flow.steps.length; index += 1) {
    const step = flow.steps[index];
    if (!step) break;
    const before = state;
    inStep(index, () => {
      const walked = takeStep(flow.wafer, before, step, { field: stepField(index), metalHistory: true });
      const atRoom = roomShape(flow.wafer, walked)?.sagitta ?? null;
      found.push({ atRoom, atPeak: peakShape(flow.wafer, walked)?.sagitta ?? null });
      state = walked.after;
    });
    if (onState(state, index)) break;
  }
  return found;
}

function walkNominal(flow: FlowInput): Nominal {
  const states: WaferState[] = [];
  const outlines = outline(flow, { index: 0, state: initialState(flow) }, (state) => {
    states.push(state);
    return false;
  });
  return { outlines, states };
}

/**
 * Standard uncertainty of every step's sagitta at 25 °C and at peak, first order (JCGM 100:2008 5.1.2, equation 10), each
 * sensitivity from the walk itself one standard uncertainty up and down, or to one side where the other cannot be computed.
 * Only steps that an input can change are walked again. Inputs without a tolerance count as exact.
 */
export function flowUncertainty(flow: FlowInput, _limits?: SiteLimits): FlowUncertainty[] {
  const nominal = walkNominal(flow);
  const { outlines } = nominal;
  const sum = outlines.map(() => ({ atRoom: 0, atPeak: 0, budget: [] as Contribution[] }));
  for (const unknown of unknowns(flow)) {
    const first = firstTouched(unknown);
    const u = standardUncertainty(unknown.measured);
    const up = walkMoved(flow, nominal, unknown, u);
    const down = walkMoved(flow, nominal, unknown, -u);
    const widths = Math.max(1, [up, down].filter(Boolean).length);
    for (let index = first; index < outlines.length; index += 1) {
      const [at, total] = [outlines[index], sum[index]];
      if (!at || !total) continue;
      // A walk that was refused stays at the nominal value; one that has come back to the nominal wafer ends early.
      const [high, low] = [up?.[index - first] ?? at, down?.[index - first] ?? at];
      const half = (pick: "atRoom" | "atPeak") => ((high[pick] ?? 0) - (low[pick] ?? 0)) / widths;
      const room = half("atRoom");
      total.atRoom += room ** 2;
      total.atPeak += half("atPeak") ** 2;
      if (room !== 0)
        total.budget.push({ input: unknown.label, source: unknown.measured.source, contribution: Math.abs(room) });
    }
  }
  return sum.map(({ atRoom, atPeak, budget }, index) => ({
    atRoom: (outlines[index]?.atRoom ?? null) === null ? null : Math.sqrt(atRoom),
    atPeak: (outlines[index]?.atPeak ?? null) === null ? null : Math.sqrt(atPeak),
    budget: budget.sort((a, b) => b.contribution - a.contribution),
  }));
}

/**
 * The flow from the first step that an unknown touches, with it moved, up to where the wafer is the nominal one again and no
 * later step differs; null where that leaves what can be computed.
 */
function walkMoved(flow: FlowInput, { states }: Nominal, unknown: Unknown, by: number): Outline[] | null {
  const index = firstTouched(unknown);
  const last = lastTouched(unknown);
  try {
    const other = moved(flow, unknown, by);
    const state = (index === 0 ? undefined : states[index - 1]) ?? initialState(other);
    return outline(other, { index, state }, (after, at) => {
      const same = states[at];
      return at >= last && same !== undefined && sameState(after, same);
    });
  } catch (error) {
    if (error instanceof EngineInputError) return null;
    throw error;
  }
}
