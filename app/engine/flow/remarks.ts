import { formatQuantity } from "../units/format.ts";
import type { StepInput } from "./model.ts";
import type { WaferState } from "./state.ts";

const celsius = (kelvin: number) => formatQuantity(kelvin, "temperature", { unit: "°C", decimals: 0 });

/** What a step's figures rest on that nobody stated, a sentence each. */
export function stepRemarks(step: StepInput, after: WaferState): string[] {
  return [...unstatedFlowPoint(step, after)];
}

function unstatedFlowPoint({ peakTemperature }: StepInput, { bond }: WaferState): string[] {
  if (!bond?.material.flows || bond.material.flowPoint) return [];
  const { name, softening } = bond.material;
  if (softening === null || peakTemperature < softening.value) return [];
  return [
    `${name} is a thermoplastic without a flow point: above ${celsius(softening.value)} its plates are taken not to slide, and the pair keeps its state of rest.`,
  ];
}
