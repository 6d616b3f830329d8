import { EngineInputError } from "../errors.ts";
import type { FlowInput } from "../flow/model.ts";
import { sagittasAfter } from "../inverse/flow-questions.ts";

/** What measured pairs can tell. */
export const CALIBRATED = ["lockedInModulus", "carrierExpansion"] as const;
export type Calibrated = (typeof CALIBRATED)[number];

/** A bow of a pair that somebody measured, gravity compensated. */
export interface PairMeasurement {
  /** the flow that the pair has been through, in any state of its calibration */
  flow: FlowInput;
  /** step after which it was measured, at 25 °C, from 1 */
  step: number;
  /** centre to rim along the axis that bends most, m, sign of the curvature: the opposite of the standard bow */
  sagitta: number;
  /** m */
  standardUncertainty: number;
}

/** Step of each parameter for derivatives: of the logarithm of the modulus, and in 1/K. */
export const STEPS: Record<Calibrated, number> = { lockedInModulus: 0.01, carrierExpansion: 0.01e-6 };

/** A modulus known to no better than this factor, or an expansion to no better than this, is not known, 1 and 1/K. */
export const LEAST_KNOWN: Record<Calibrated, number> = { lockedInModulus: Math.log(2), carrierExpansion: 1e-6 };

export const fromParameter = (quantity: Calibrated, parameter: number) =>
  quantity === "lockedInModulus" ? Math.exp(parameter) : parameter;
export const toParameter = (quantity: Calibrated, value: number) =>
  quantity === "lockedInModulus" ? Math.log(value) : value;

export function statedValue(flow: FlowInput, quantity: Calibrated): number | null {
  const bond = flow.steps.find((step) => step.bond)?.bond;
  const stated = quantity === "lockedInModulus" ? bond?.material.effectiveModulus : bond?.carrier.expansion;
  return stated?.value ?? null;
}

/** The flow with values in place of those that it states, in every bond. */
export function withCalibration(
  flow: FlowInput,
  values: readonly { quantity: Calibrated; value: number }[],
): FlowInput {
  const found = (quantity: Calibrated) => values.find((one) => one.quantity === quantity)?.value;
  const [modulus, expansion] = [found("lockedInModulus"), found("carrierExpansion")];
  return {
    ...flow,
    steps: flow.steps.map((step) => {
      if (!step.bond) return step;
      const { carrier, material } = step.bond;
      return {
        ...step,
        bond: {
          ...step.bond,
          carrier:
            expansion === undefined || carrier.expansion === null
              ? carrier
              : { ...carrier, expansion: { ...carrier.expansion, value: expansion } },
          material:
            modulus === undefined
              ? material
              : { ...material, effectiveModulus: { ...material.effectiveModulus, value: modulus } },
        },
      };
    }),
  };
}

/** Sagittas after every step of one flow with parameters in place; null where they cannot be computed. */
function computed(flow: FlowInput, quantities: readonly Calibrated[], parameters: readonly number[]) {
  const values = quantities.map((quantity, n) => ({ quantity, value: fromParameter(quantity, parameters[n] ?? 0) }));
  try {
    return sagittasAfter(withCalibration(flow, values));
  } catch (error) {
    if (error instanceof EngineInputError) return null;
    throw error;
  }
}

export function weightedResiduals(measurements: readonly PairMeasurement[], quantities: readonly Calibrated[]) {
  return (parameters: readonly number[]): number[] | null => {
    const walks = new Map<FlowInput, (number | null)[] | null>();
    for (const { flow } of measurements) if (!walks.has(flow)) walks.set(flow, computed(flow, quantities, parameters));
    const found = measurements.map(({ flow, step, sagitta, standardUncertainty }) => {
      const value = walks.get(flow)?.[step - 1] ?? null;
      return value === null ? null : (sagitta - value) / standardUncertainty;
    });
    return found.every((value) => value !== null) ? found : null;
  };
}
