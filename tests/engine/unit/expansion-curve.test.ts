/*
 * Expansion that is stated as a curve.
 *
 *   α   coefficient of expansion      1/K
 *   T   temperature                   K
 *   ε   thermal strain                1
 *
 * Closed integrals against exact ones, or the numerical one of the same function: 1e-9, what the latter promises.
 */
import { describe, expect, it } from "vitest";
import type { ExpansionCurve } from "#app/engine/laminate/expansion-curve.ts";
import { checkLayer } from "#app/engine/laminate/layer.ts";
import { thermalStrain } from "#app/engine/laminate/thermal-strain.ts";
import type { CarrierInput } from "#app/engine/flow/model.ts";
import { flowUncertainty } from "#app/engine/flow/uncertainty.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { relative } from "../relative.ts";
import { bondStep, carrier, celsius, exact, flow, step } from "./flow-samples.ts";

const limits = defaultLimits();
const points: ExpansionCurve = {
  kind: "points",
  temperatures: [293.15, 373.15, 573.15],
  coefficients: [3e-6, 3.4e-6, 3.8e-6],
};
const rising: ExpansionCurve = { kind: "polynomial", terms: [2e-6, 3e-9], from: 293.15, to: 600 };

describe("strain along a curve", () => {
  it("adds trapezoids between points", () => {
    expect(relative(thermalStrain(points, 293.15, 373.15), 3.2e-6 * 80)).toBeLessThan(1e-12);
    expect(relative(thermalStrain(points, 333.15, 473.15), 3.3e-6 * 40 + 3.5e-6 * 100)).toBeLessThan(1e-12);
    expect(thermalStrain(points, 473.15, 333.15)).toBeCloseTo(-thermalStrain(points, 333.15, 473.15), 18);
  });

  it("integrates a polynomial", () => {
    const byNumbers = thermalStrain((t) => 2e-6 + 3e-9 * t, 298.15, 500);
    expect(relative(thermalStrain(rising, 298.15, 500), byNumbers)).toBeLessThan(1e-9);
  });

  it("keeps the value of its end for 25 K, and is refused beyond", () => {
    expect(relative(thermalStrain(points, 573.15, 593.15), 3.8e-6 * 20)).toBeLessThan(1e-12);
    expect(relative(thermalStrain(points, 283.15, 293.15), 3e-6 * 10)).toBeLessThan(1e-12);
    expect(() => thermalStrain(points, 293.15, 600)).toThrow(/not known at 600 K/);
  });

  it("moves as a whole by its shift", () => {
    const moved = { ...points, shift: 0.2e-6 };
    expect(relative(thermalStrain(moved, 300, 400) - thermalStrain(points, 300, 400), 0.2e-6 * 100)).toBeLessThan(1e-9);
  });
});

describe("a curve that cannot be used", () => {
  const check = (cte: ExpansionCurve) => () =>
    checkLayer({ thickness: 1e-3, youngsModulus: 1e9, poissonsRatio: 0.2, cte }, "layer");
  it.each<[ExpansionCurve, RegExp]>([
    [{ kind: "points", temperatures: [300], coefficients: [3e-6] }, /one coefficient for each/],
    [{ kind: "points", temperatures: [300, 400], coefficients: [3e-6] }, /one coefficient for each/],
    [{ kind: "points", temperatures: [400, 300], coefficients: [3e-6, 3e-6] }, /above the one before/],
    [{ kind: "points", temperatures: [300, 400], coefficients: [3e-6, 3] }, /coefficients\[1\]/],
    [{ kind: "polynomial", terms: [], from: 300, to: 400 }, /missing/],
    [{ kind: "polynomial", terms: [1e-6], from: 400, to: 300 }, /above where the polynomial starts/],
    [{ kind: "polynomial", terms: [1], from: 300, to: 400 }, /too large/],
  ])("is refused: %o", (cte, reason) => {
    expect(check(cte)).toThrow(reason);
  });
});

describe("a carrier in a flow", () => {
  const glass = (overrides: Partial<CarrierInput>) =>
    carrier({
      material: "glass",
      youngsModulus: exact(74e9),
      poissonsRatio: exact(0.2),
      expansion: exact(3.2e-6),
      ...overrides,
    });
  const pair = (overrides: Partial<CarrierInput>, peak = 100) =>
    flow([bondStep({}, undefined, glass(overrides)), step({ planned: "carrier", peakTemperature: celsius(peak) })]);
  const bow = (overrides: Partial<CarrierInput>) =>
    walkFlow(pair(overrides), limits).steps.at(-1)?.atRoom?.sagitta ?? NaN;

  it("expands by its curve, not by its mean", () => {
    const mean = thermalStrain(points, 298.15, celsius(150)) / 125;
    const stated = { from: 298.15, to: celsius(150) };
    const byCurve = bow({ expansion: exact(mean), expansionCurve: points, meanExpansionOver: stated });
    // Bonded at 150 °C and looked at 25 °C, only the mean between the two matters: the curve gives the same pair.
    expect(relative(byCurve, bow({ expansion: exact(mean) }))).toBeLessThan(1e-9);
    expect(relative(byCurve, bow({ expansion: null, expansionCurve: points }))).toBeLessThan(1e-9);
    expect(relative(byCurve, bow({ expansion: exact(3.4e-6) }))).toBeGreaterThan(0.01);
  });

  it("is moved as a whole by its stated mean, and so is its uncertainty", () => {
    const mean = thermalStrain(points, 298.15, celsius(150)) / 125;
    const stated = { expansionCurve: points, meanExpansionOver: { from: 298.15, to: celsius(150) } };
    const spread = (overrides: Partial<CarrierInput>) =>
      flowUncertainty(pair({ expansion: exact(mean, 0.1e-6), ...overrides }), limits).at(-1)?.atRoom ?? 0;
    expect(spread({})).toBeGreaterThan(0);
    expect(relative(spread(stated), spread({}))).toBeLessThan(1e-9);
  });

  it("says where its expansion is used beyond the range that it is stated for", () => {
    const remarks = (overrides: Partial<CarrierInput>, peak: number) =>
      walkFlow(pair(overrides, peak), limits).steps.at(-1)?.remarks ?? [];
    expect(remarks({ meanExpansionOver: { from: celsius(20), to: celsius(300) } }, 200)).toEqual([]);
    expect(remarks({ meanExpansionOver: { from: celsius(20), to: celsius(120) } }, 100)).toEqual([
      expect.stringMatching(/^The expansion of Silicon carrier is stated for 20.°C to 120.°C and used at 150.°C\.$/),
    ]);
    expect(remarks({}, 200)).toEqual([]);
  });
});
