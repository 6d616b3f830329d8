import { EngineInputError } from "../errors.ts";
import type { CarrierInput, FlowInput } from "../flow/model.ts";
import type { LyingShape } from "../flow/shape.ts";
import { initialState } from "../flow/state.ts";
import { inStep, roomShape, stepField, takeStep } from "../flow/step.ts";
import { solveFor, type InverseAnswer } from "./solve-for.ts";

/** Expansions in which a carrier is sought, 1/K: from fused silica to soda-lime glass. */
export const EXPANSIONS = { from: 0.3e-6, to: 12e-6 };

/** Sagitta at 25 °C after every step, m, with the curvature's sign; null where tape or frame holds it flat. */
export function sagittasAfter(flow: FlowInput): (number | null)[] {
  return shapesAfter(flow).map((shape) => shape?.sagitta ?? null);
}

function shapesAfter(flow: FlowInput): (LyingShape | null)[] {
  let state = initialState(flow);
  return flow.steps.map((step, index) =>
    inStep(index, () => {
      const walked = takeStep(flow.wafer, state, step, { field: stepField(index), metalHistory: true });
      state = walked.after;
      return roomShape(flow.wafer, walked);
    }),
  );
}

/**
 * Shape at 25 °C after a step (from 1) as it lies on the tool.
 * @throws EngineInputError when the step does not exist or is held flat
 */
export function shapeAfter(flow: FlowInput, number: number): LyingShape {
  if (!flow.steps[number - 1]) throw new EngineInputError("step", "is not in the flow", `1 to ${flow.steps.length}`);
  const shape = shapesAfter({ ...flow, steps: flow.steps.slice(0, number) })[number - 1] ?? null;
  if (shape === null) throw new EngineInputError("step", `step ${number} is held flat and has no bow of its own`);
  return shape;
}

/** The sagitta of `shapeAfter`, m, with the curvature's sign. */
export function sagittaAfter(flow: FlowInput, number: number): number {
  return shapeAfter(flow, number).sagitta;
}

/** The flow with every bond's carrier changed. */
export function withCarrier(flow: FlowInput, change: (carrier: CarrierInput) => CarrierInput): FlowInput {
  return {
    ...flow,
    steps: flow.steps.map((step) =>
      step.bond ? { ...step, bond: { ...step.bond, carrier: change(step.bond.carrier) } } : step,
    ),
  };
}

/** The flow with another mean expansion (1/K) of every carrier. */
export function withCarrierExpansion(flow: FlowInput, value: number): FlowInput {
  return withCarrier(flow, (carrier) => ({
    ...carrier,
    expansion: { ...(carrier.expansion ?? { tolerance: null, source: "assumed" as const }), value },
  }));
}

/**
 * Mean expansion of the carrier, 1/K, with which the pair has a sagitta (m, curvature's sign; the standard bow is its opposite)
 * at 25 °C after a step, on the full walk with all its history. A carrier with a curve moves it as a whole.
 * @throws EngineInputError when the step does not exist, is held flat or no step bonds
 */
export function carrierExpansionFor(
  flow: FlowInput,
  step: number,
  sagitta: number,
  range: { from: number; to: number } = EXPANSIONS,
): InverseAnswer {
  if (!flow.steps.slice(0, step).some(({ bond }) => bond))
    throw new EngineInputError("step", "comes before anything is bonded");
  sagittaAfter(withCarrierExpansion(flow, (range.from + range.to) / 2), step);
  return solveFor({
    model: (value) => sagittaAfter(withCarrierExpansion(flow, value), step),
    ...range,
    target: sagitta,
    samples: 48,
  });
}
