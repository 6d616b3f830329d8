/*
 * First-order uncertainty of a flow's bow.
 *
 *   h        silicon thickness                        m
 *   σ        film stress                              Pa
 *   u        standard uncertainty: tolerance/√3       as its quantity
 *   B        sagitta of the wafer at 25 °C            m
 */
import { describe, expect, it } from "vitest";
import type { FlowInput } from "#app/engine/flow/model.ts";
import { flowUncertainty } from "#app/engine/flow/uncertainty.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { relative } from "../relative.ts";
import { addition, bondStep, carrier, exact, film, flow, step, um } from "./flow-samples.ts";

const limits = defaultLimits();
const sagitta = (input: FlowInput) => walkFlow(input, limits).steps.at(-1)?.atRoom?.sagitta ?? 0;
const last = (input: FlowInput) => {
  const found = flowUncertainty(input, limits).at(-1);
  if (!found) throw new Error("the flow has a step");
  return found;
};

/** A film thin enough, of a force small enough, that Stoney's formula holds to a thousandth. */
const film10nm = (stress = 100e6, tolerance: number | null = null) =>
  addition({ thickness: exact(10e-9), stress: exact(stress, tolerance) });
const coated = (thickness: number, tolerance: number | null, stressTolerance: number | null) =>
  flow([step({ adds: [film10nm(100e6, stressTolerance)] })], { thickness, tolerance });

describe("uncertainty of the bow", () => {
  it("agrees with Stoney's 2 u_h/h for the thickness alone", () => {
    const input = coated(725, 10, null);
    const { atRoom } = last(input);
    expect(relative((atRoom ?? 0) / Math.abs(sagitta(input)), (2 * (10 / Math.sqrt(3))) / 725)).toBeLessThan(0.01);
  });

  it("agrees with Stoney's u_σ/σ for the stress alone", () => {
    const input = coated(725, null, 12e6);
    const { atRoom } = last(input);
    expect(relative((atRoom ?? 0) / Math.abs(sagitta(input)), 0.12 / Math.sqrt(3))).toBeLessThan(0.01);
  });

  it("adds both in quadrature", () => {
    const input = coated(725, 10, 12e6);
    const expected = Math.hypot((2 * (10 / Math.sqrt(3))) / 725, 0.12 / Math.sqrt(3));
    expect(relative((last(input).atRoom ?? 0) / Math.abs(sagitta(input)), expected)).toBeLessThan(0.01);
  });

  it("agrees with a difference taken by hand, for the carrier's expansion under a bonded pair", () => {
    const pair = (expansion: number) =>
      flow([
        step({ adds: [addition({ thickness: exact(um(3)) })] }),
        bondStep(
          {},
          undefined,
          carrier({ material: "glass", youngsModulus: exact(74e9), expansion: exact(expansion, 0.1e-6) }),
        ),
      ]);
    const by = 0.01e-6;
    const slope = (sagitta(pair(3e-6 + by)) - sagitta(pair(3e-6 - by))) / (2 * by);
    const { atRoom, budget } = last(pair(3e-6));
    expect(relative(atRoom ?? 0, Math.abs(slope) * (0.1e-6 / Math.sqrt(3)))).toBeLessThan(0.01);
    expect(budget.map(({ input }) => input)).toEqual(["Silicon carrier, expansion"]);
  });

  it("moves a film that is used twice as one unknown: contributions add, not their squares", () => {
    const twice = flow([step({ adds: [film10nm(100e6, 12e6)] }), step({ adds: [film10nm(100e6, 12e6)] })]);
    expect(relative((last(twice).atRoom ?? 0) / Math.abs(sagitta(twice)), 0.12 / Math.sqrt(3))).toBeLessThan(0.01);
    const apart = film10nm(100e6, 12e6);
    const two = flow([
      step({ adds: [film10nm(100e6, 12e6), { ...apart, film: film({ id: "other", name: "Other" }) }] }),
    ]);
    expect(relative((last(two).atRoom ?? 0) / Math.abs(sagitta(two)), 0.12 / Math.sqrt(6))).toBeLessThan(0.01);
  });

  it("lists what moves the bow, largest first, and nothing else", () => {
    const { budget } = last(coated(725, 10, 12e6));
    expect(budget.map(({ input }) => input)).toEqual(["Film, stress", "Incoming silicon thickness"]);
    expect(budget[0]?.contribution).toBeGreaterThan(budget[1]?.contribution ?? Infinity);
  });

  it("is zero when everything is exact and absent where the wafer is held flat", () => {
    expect(last(coated(725, null, null)).atRoom).toBe(0);
    expect(last(flow([step({ planned: "film frame" })])).atRoom).toBeNull();
  });

  it("takes one side alone where the other cannot be computed", () => {
    const wide = (tolerance: number) =>
      flow([step({ adds: [addition({ thickness: exact(10e-9, tolerance) })] })], { tolerance: null });
    const { atRoom } = last(wide(20e-9));
    // Stoney is linear in the film's thickness, so one side gives the same slope as two.
    expect(relative((atRoom ?? 0) / Math.abs(sagitta(wide(20e-9))), 2 / Math.sqrt(3))).toBeLessThan(0.01);
  });
});
