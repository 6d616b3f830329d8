import { EngineInputError } from "#app/engine/errors.ts";
import type { FlowInput, StepInput } from "#app/engine/flow/model.ts";
import { nominalWalk } from "#app/engine/flow/moved-walks.ts";
import { initialState, type WaferState } from "#app/engine/flow/state.ts";
import { releasedShape, stepField, takeStep } from "#app/engine/flow/step.ts";
import { shareOfHalfTurn } from "../comparison/half-turn.ts";
import { remembered } from "../comparison/crossings.ts";

interface Range {
  from: number;
  to: number;
}

/** A step that thins the silicon: to `from`, which it leaves, from `to`, m. */
export interface ThinningStep extends Range {
  number: number;
  title: string;
}

/** A wafer on the way of its thinning, let go at 25 °C. */
export interface ThinnedWarp {
  warp: number;
  curled: boolean;
  /** rolled past half a turn, where the warp means nothing */
  rolledUp: boolean;
}

/** How the wafer of a flow warps while it is thinned, if nothing held it. */
export interface Thinning {
  /** in the order of the flow, thick to thin */
  steps: ThinningStep[];
  range: Range;
  /** At a thickness within the range, m: where two steps meet, as the earlier one leaves it. */
  at: (thickness: number) => ThinnedWarp;
  /** The same within one of the steps, whose ends belong to it. */
  within: (step: ThinningStep, thickness: number) => ThinnedWarp;
}

/** Thickness that counts as thinned, as a share of what was there. */
const THINNED = 1e-9;

/**
 * The thinning of a flow: each step that thins is stopped on its way, with all that was done to the wafer before it, and the wafer let
 * go. Null for a flow that thins nothing. Of one that parts by slot it takes a leg.
 * @throws EngineInputError as a walk does
 */
export function thinningOf(flow: FlowInput): Thinning | null {
  const { states } = nominalWalk(flow, () => null);
  const before = (index: number): WaferState => (index === 0 ? undefined : states[index - 1]) ?? initialState(flow);
  const steps = states.flatMap((after, index): ThinningStep[] => {
    const [from, to] = [after.silicon.value, before(index).silicon.value];
    const title = flow.steps[index]?.title ?? "";
    return from < to * (1 - THINNED) ? [{ number: index + 1, title, from, to }] : [];
  });
  const [first] = steps;
  const last = steps.at(-1);
  if (!first || !last) return null;
  const curves = new Map(
    steps.map(({ number }) => {
      const step = flow.steps[number - 1];
      if (!step) throw new Error("a step that thins is a step of the flow");
      return [number, remembered((thickness) => stoppedAt(flow, before(number - 1), step, { number, thickness }))];
    }),
  );
  const within = ({ number }: ThinningStep, thickness: number) => {
    const curve = curves.get(number);
    if (!curve) throw new Error(`step ${number} thins nothing`);
    return curve(thickness);
  };
  return {
    steps,
    range: { from: last.from, to: first.to },
    at: (thickness) => within(steps.find(({ from }) => thickness >= from) ?? last, thickness),
    within,
  };
}

/** The wafer let go when a step has thinned it to a thickness, m. What lies beyond anything that can be computed counts as rolled up. */
function stoppedAt(
  { wafer }: FlowInput,
  before: WaferState,
  step: StepInput,
  { number, thickness }: { number: number; thickness: number },
): ThinnedWarp {
  try {
    const siliconAfter = { ...(step.siliconAfter ?? before.silicon), value: thickness };
    const walked = takeStep(
      wafer,
      before,
      { ...step, siliconAfter },
      { field: stepField(number - 1), metalHistory: true },
    );
    const shape = releasedShape(wafer, walked);
    return {
      warp: shape.warp,
      curled: shape.regime === "curled",
      rolledUp: shareOfHalfTurn(shape, wafer.diameter) >= 1,
    };
  } catch (error) {
    if (error instanceof EngineInputError) return { warp: 0, curled: true, rolledUp: true };
    throw error;
  }
}
