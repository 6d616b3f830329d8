/*
 * How the pair's bow answers to the adhesive and to the carrier: the sensitivity table of the fixture, computed for this program
 * by another implementation of the same equations, and what a stated flow point changes, computed here. Regression values.
 *
 *   bow   standard bow at 25 °C after a step, device side up, centre above the rim positive, µm
 *
 * Tolerance of the table: the fixture's own for pairs, 8 % or 10 µm, half a micrometre more for printed whole ones; that of our
 * own figures is their last digit.
 */
import { describe, expect, it } from "vitest";
import type { BondingMaterialInput, FlowInput } from "#app/engine/flow/model.ts";
import { withCalibration } from "#app/engine/calibration/pair-model.ts";
import { sagittaAfter } from "#app/engine/inverse/flow-questions.ts";
import { standardBow } from "#app/engine/stoney/bow.ts";
import demo from "../../../fixtures/demo-flows.json" with { type: "json" };
import { demoFlow } from "../../fixtures/demo-flow-input.ts";

const bow = (flow: FlowInput, step: number) => standardBow(sagittaAfter(flow, step)) * 1e6;
const allowed = (wanted: number) => Math.max(0.08 * Math.abs(wanted), 10) + 0.5;
const { sensitivity } = demo;
const { flow: petrel } = demoFlow("Petrel");

describe("Petrel", () => {
  it.each(Object.entries(sensitivity.petrel_step12_bow_um_by_adhesive_modulus_GPa))(
    "step 12 with a locked-in modulus of %s GPa: %s µm",
    (modulus, wanted) => {
      const flow = withCalibration(petrel, [{ quantity: "lockedInModulus", value: Number(modulus) * 1e9 }]);
      expect(Math.abs(bow(flow, 12) - wanted)).toBeLessThanOrEqual(allowed(wanted));
    },
  );

  it.each(Object.entries(sensitivity.petrel_step10_12_15_bow_um_by_glass_ppm))(
    "steps 10, 12 and 15 on glass of %s ppm/K: %j µm",
    (ppm, wanted) => {
      const flow = withCalibration(petrel, [{ quantity: "carrierExpansion", value: Number(ppm) * 1e-6 }]);
      [10, 12, 15].forEach((step, n) => {
        const expected = wanted[n] ?? NaN;
        expect(Math.abs(bow(flow, step) - expected)).toBeLessThanOrEqual(allowed(expected));
      });
    },
  );
});

describe("Fulmar A with a flow point for its thermoplastic", () => {
  const withFlowPoint = (flow: FlowInput, change: Partial<BondingMaterialInput>): FlowInput => ({
    ...flow,
    steps: flow.steps.map((step) =>
      step.bond ? { ...step, bond: { ...step.bond, material: { ...step.bond.material, ...change } } } : step,
    ),
  });
  const flowPoint = { value: 423.15, tolerance: null, source: "assumed" } as const;
  const { flow } = demoFlow("Fulmar A");

  it("is as without one until a step reaches it", () => {
    const stated = withFlowPoint(flow, { flowPoint });
    for (const step of [10, 11, 12]) expect(Math.abs(bow(stated, step) - bow(flow, step))).toBeLessThan(10);
  });

  it("forgets at step 13 what its films had bent the pair by", () => {
    const stated = withFlowPoint(flow, { flowPoint });
    const at = (one: FlowInput) => [13, 14, 18].map((step) => Math.round(bow(one, step)));
    expect(at(flow)).toEqual([57, 153, 233]);
    expect(at(stated)).toEqual([91, 185, 172]);
  });
});
