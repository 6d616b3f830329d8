/*
 * Models compiled for sampling give what the calculations themselves give.
 *
 *   κ        curvature of a laminate                1/m
 *   h        thickness                              m
 *   b        sagitta of the free wafer, w its warp  m
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { assessFlow } from "#app/engine/flow/assess.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import type { Layer } from "#app/engine/laminate/layer.ts";
import { solveLaminate } from "#app/engine/laminate/solve-laminate.ts";
import { freeWaferShape } from "#app/engine/plate/free-wafer-shape.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { laminateInputNames, laminateInputValues, laminateModel } from "#app/engine/uncertainty/laminate-model.ts";
import { scalarModel } from "#app/engine/uncertainty/model.ts";
import type { UncertainQuantity } from "#app/engine/uncertainty/quantity.ts";
import { sampleUncertainty } from "#app/engine/uncertainty/sample-uncertainty.ts";
import { shapeCurve } from "#app/engine/uncertainty/shape-curve.ts";
import { relative } from "../relative.ts";
import { addition, exact, flow, step } from "../unit/flow-samples.ts";
import { anyLayer, between, logarithmic, siliconLayer } from "./arbitraries.ts";

/** The layers with the inputs of a row in their places. */
function withInputs(layers: readonly Layer[], row: ArrayLike<number>): Layer[] {
  const count = layers.length;
  return layers.map((layer, n) => ({
    ...layer,
    thickness: row[n] ?? 0,
    youngsModulus: row[count + n] ?? 0,
    stress: row[2 * count + n] ?? 0,
  }));
}

const stacks = fc.tuple(fc.array(anyLayer, { maxLength: 5 }), siliconLayer, fc.array(anyLayer, { maxLength: 5 }));

describe("laminate", () => {
  it("has the curvature of solveLaminate for draws near its own layers, cold and hot", () => {
    const shift = fc.array(between(0.9, 1.1), { minLength: 33, maxLength: 33 });
    fc.assert(
      fc.property(stacks, shift, between(280, 500), ([below, silicon, above], factors, temperature) => {
        const layers = [...below, silicon, ...above];
        const row = Float64Array.from(laminateInputValues(layers), (value, n) => value * (factors[n] ?? 1));
        const solved = solveLaminate(withInputs(layers, row), { temperature });
        const curvature = scalarModel(laminateModel(layers, { temperature }).curvature)(row);
        // Against the size of what adds up, since opposite films may cancel to almost nothing.
        const pulls = withInputs(layers, row).map((layer, n) => {
          const stiffness = (layer.youngsModulus / (1 - layer.poissonsRatio)) * layer.thickness * (layer.coverage ?? 1);
          return stiffness * Math.abs((solved.freeStrain[n] ?? 0) - solved.midplaneStrain);
        });
        const height = layers.reduce((total, layer) => total + layer.thickness, 0);
        const scale = (pulls.reduce((total, pull) => total + pull, 0) * height) / solved.bendingStiffness;
        expect(Math.abs(curvature - solved.curvature)).toBeLessThanOrEqual(1e-14 * scale);
      }),
      { seed: 1, numRuns: 300 },
    );
  });

  it("names and orders its inputs: thicknesses, moduli, stresses", () => {
    expect(laminateInputNames(2)).toEqual([
      "layer 1, thickness",
      "layer 2, thickness",
      "layer 1, modulus",
      "layer 2, modulus",
      "layer 1, stress",
      "layer 2, stress",
    ]);
    expect(() => laminateInputNames(0)).toThrow("layers");
  });
});

describe("shape", () => {
  const disc = { radius: 0.15, youngsModulus: 130e9, poissonsRatio: 0.2786 };
  const curves = [disc, { ...disc, crystal: "100" as const }].map((kind) => ({ kind, curve: shapeCurve(kind) }));

  it("is that of freeWaferShape within 1e-4, below and beyond rolling", () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...curves),
        logarithmic(20e-6, 800e-6),
        logarithmic(0.01, 100),
        fc.boolean(),
        ({ kind, curve }, thickness, load, up) => {
          const linearCurvature = ((up ? 1 : -1) * load * 4 * thickness) / kind.radius ** 2;
          const { bowMajor, warp } = freeWaferShape({ ...kind, thickness, linearCurvature });
          expect(relative(curve.sagitta(linearCurvature, thickness), bowMajor)).toBeLessThan(1e-4);
          expect(relative(curve.warp(linearCurvature, thickness), warp)).toBeLessThan(1e-4);
        },
      ),
      { seed: 2, numRuns: 400 },
    );
  });

  it("of a flat wafer is flat", () => {
    expect(curves[0]?.curve.sagitta(0, 1e-4)).toBe(0);
    expect(curves[0]?.curve.warp(0, 1e-4)).toBe(0);
  });
});

describe("probability of exceeding", () => {
  const layers: Layer[] = [
    { thickness: 100e-6, youngsModulus: 130e9, poissonsRatio: 0.2786, cte: "silicon" },
    { thickness: 1e-6, youngsModulus: 70e9, poissonsRatio: 0.2, stress: 20e6 },
  ];
  const spread = [2e-6, 0.02e-6, 1e9, 3e9, 0, 3e6];
  const inputs = laminateInputValues(layers).map((value, n): UncertainQuantity => ({
    name: laminateInputNames(2)[n] ?? "",
    value,
    distribution: "normal",
    standard: spread[n] ?? 0,
  }));
  const disc = { radius: 0.1, youngsModulus: 130e9, poissonsRatio: 0.2786, crystal: "100" as const };

  it("of a free wafer's warp is the same through the curve as through freeWaferShape itself", () => {
    const model = (row: Float64Array) => {
      const { curvature, effectiveThickness } = solveLaminate(withInputs(layers, row));
      return freeWaferShape({ ...disc, thickness: effectiveThickness, linearCurvature: curvature }).warp;
    };
    const compiled = laminateModel(layers).shape(shapeCurve(disc), "warp");
    const [direct, fast] = [model, compiled].map((each) =>
      sampleUncertainty({ model: each, inputs, draws: 2048, seed: 1 }),
    );
    expect(relative(fast?.mean, direct?.mean ?? 0)).toBeLessThan(1e-4);
    const limit = direct?.quantile(0.9) ?? 0;
    expect(direct?.probabilityAbove(limit)).toBeCloseTo(0.1, 2);
    // Draws within 1e-4 of the limit may fall to either side.
    expect(Math.abs((fast?.probabilityAbove(limit) ?? 0) - (direct?.probabilityAbove(limit) ?? 0))).toBeLessThan(0.002);
  });

  it("of a step of a flow is sampled through the walk, and agrees with its first-order uncertainty", () => {
    const limits = defaultLimits();
    const walked = ([thickness = 0, stress = 0]: ArrayLike<number> & Iterable<number>) =>
      flow([step({ adds: [addition({ stress: exact(stress) })] })], { thickness: thickness * 1e6 });
    const model = (row: Float64Array) => walkFlow(walked(row), limits).steps[0]?.atRoom?.warp ?? 0;
    const flowInputs: UncertainQuantity[] = [
      { name: "silicon", value: 725e-6, distribution: "rectangular", halfWidth: 10e-6 },
      { name: "stress", value: 100e6, distribution: "rectangular", halfWidth: 12e6 },
    ];
    const sampled = sampleUncertainty({ model, inputs: flowInputs, draws: 1024, seed: 1, method: "lattice" });
    const stated = flow([step({ adds: [addition({ stress: exact(100e6, 12e6) })] })], { tolerance: 10 });
    const assessed = assessFlow(stated, limits);
    const figure = assessed.findings.find(({ rule }) => rule === 2)?.figures[0];
    expect(relative(sampled.standardUncertainty, figure?.standardUncertainty ?? 0)).toBeLessThan(0.02);
    expect(sampled.probabilityAbove(sampled.quantile(0.5))).toBeCloseTo(0.5, 1);
  });
});
