import type { BondingMaterialInput, CarrierInput, FlowInput, StepInput } from "../flow/model.ts";
import { withPeak } from "../flow/temperature-profile.ts";
import { tried } from "../trial/tried.ts";
import type { BondSpan } from "./bond-spans.ts";

/** A carrier, a bonding material with the way it lets go, and how thick it is put on, m. */
export interface BondChoice {
  carrier: CarrierInput;
  material: BondingMaterialInput;
  thickness: number;
}

/** Where a value comes from that a trial has put in. */
export const FINDER_NOTE = "from the carrier finder";

/** Whether a choice is what the flow plans already. */
export function isPlanned(flow: FlowInput, { from }: BondSpan, { carrier, material, thickness }: BondChoice): boolean {
  const bond = flow.steps[from - 1]?.bond;
  return bond?.carrier.id === carrier.id && bond.material.id === material.id && bond.thickness.value === thickness;
}

/**
 * The flow with another bond. A material that was not planned is bonded and let go at its own temperatures; what was known of the
 * spread of the old adhesive does not hold for another one.
 */
export function withBond(flow: FlowInput, span: BondSpan, choice: BondChoice): FlowInput {
  if (isPlanned(flow, span, choice)) return flow;
  const planned = flow.steps[span.from - 1]?.bond?.material.id;
  const otherMaterial = planned !== choice.material.id;
  return {
    ...flow,
    steps: flow.steps.map((step, index) => {
      if (index + 1 === span.from) return rebonded(step, choice, otherMaterial);
      if (index + 1 === span.to && otherMaterial) return withPeak(step, choice.material.releaseTemperature.value);
      return step;
    }),
  };
}

function rebonded(step: StepInput, choice: BondChoice, otherMaterial: boolean): StepInput {
  const { bond } = step;
  if (!bond) return step;
  const { carrier, material } = choice;
  const { thicknessVariation: _known, ...rest } = bond;
  const sameLayer = !otherMaterial && bond.thickness.value === choice.thickness;
  const thickness = sameLayer
    ? bond.thickness
    : tried(otherMaterial ? null : bond.thickness, choice.thickness, FINDER_NOTE);
  return {
    ...(otherMaterial ? withPeak(step, material.bondTemperature.value) : step),
    // The piece that is planned stays the same piece under another adhesive.
    bond: {
      ...(sameLayer ? bond : rest),
      carrier: carrier.id === bond.carrier.id ? bond.carrier : carrier,
      material,
      thickness,
    },
  };
}
