/*
 * Spread of a stack's warp over wafers.
 *
 *   w    warp of the free wafer            m
 *   u    its standard uncertainty          m
 *   h    silicon thickness                 m
 *   σ    film stress                       Pa
 */
import { describe, expect, it } from "vitest";
import { warpModel, warpUncertainty } from "#app/engine/stack/warp-uncertainty.ts";
import type { StackInput } from "#app/engine/stack/model.ts";
import { spreadSentences, warpWords } from "#app/lib/stack-words.ts";
import { warpSampling } from "#app/lib/warp-sampling.ts";

const STACK: StackInput = {
  wafer: { diameter: 0.3, orientation: "100", thickness: 775e-6, thicknessTolerance: 20e-6 },
  films: [
    {
      side: "front",
      thickness: 4e-6,
      stress: 15e6,
      youngsModulus: 117e9,
      poissonsRatio: 0.34,
      thicknessTolerance: 0.2e-6,
      stressTolerance: 1.5e6,
    },
  ],
};

function spreadOf(stack: StackInput, limit: number) {
  const told: number[] = [];
  const run = warpSampling({ stack, limit });
  for (;;) {
    const step = run.next();
    if (step.done) return { spread: step.value, told };
    told.push(step.value.done);
  }
}

describe("the warp of a stack with tolerances", () => {
  const first = warpUncertainty(STACK);
  const { spread, told } = spreadOf(STACK, 150e-6);

  it("is the warp itself at the best estimates, with an input for each tolerance", () => {
    const { inputs, model } = warpModel(STACK);
    expect(inputs.map(({ name }) => name)).toEqual(["silicon thickness", "thickness of film 1", "stress of film 1"]);
    expect(first?.value).toBe(model(Float64Array.from(inputs, ({ value }) => value)));
  });

  it("has the uncertainty of w ~ σ·h_f/h² by hand: relative parts in quadrature", () => {
    const relative = Math.hypot((2 * 20) / 775, 0.2 / 4, 1.5 / 15) / Math.sqrt(3);
    // Holds to the second order of the tolerances and to the part of large deflection, both below 1 % of u here.
    expect((first?.standardUncertainty ?? 0) / (first?.value ?? 1) / relative).toBeCloseTo(1, 1);
    expect(first?.linear).toBe(true);
  });

  it("agrees with drawing where the warp is linear", () => {
    expect(spread.mean / (first?.value ?? 1)).toBeCloseTo(1, 2);
    expect(spread.standardUncertainty / (first?.standardUncertainty ?? 1)).toBeCloseTo(1, 1);
    expect(spread.draws).toBe(2 ** 15);
    expect(spread.inputs).toBe(3);
  });

  it(
    "has about half of the wafers beyond the mean, and the same spread whatever the limit",
    { timeout: 30_000 },
    () => {
      const at = spreadOf(STACK, spread.mean).spread;
      expect(at.beyond.probability).toBeGreaterThan(0.4);
      expect(at.beyond.probability).toBeLessThan(0.6);
      expect({ ...at, limit: spread.limit, beyond: spread.beyond }).toEqual(spread);
      // 150 µm is far above what this film bends the wafer to.
      expect(spread.beyond.probability).toBe(0);
    },
  );

  it("tells how far it is", () => {
    expect(told.length).toBeGreaterThan(10);
    expect(told).toEqual(told.toSorted((a, b) => a - b));
  });

  it("without any tolerance has no uncertainty", () => {
    const exact = { wafer: { ...STACK.wafer, thicknessTolerance: undefined }, films: [] };
    expect(warpUncertainty(exact)).toBeNull();
  });
});

describe("in words", () => {
  const shape = {
    regime: "linear" as const,
    bow_m: -343e-6,
    across: null,
    warp_m: 343e-6,
    roll_radius_m: null,
    stability_ratio: 0.1,
  };

  it("the warp carries ± only where first order may be trusted", () => {
    const plain = (text: string) => text.replaceAll("\u00A0", " ");
    const words = (u: number | null, linear: boolean | null) =>
      plain(warpWords({ ...shape, warp_standard_uncertainty_m: u, warp_linear: linear }));
    expect(words(20e-6, true)).toBe("343 ± 40 µm");
    expect(words(20e-6, false)).toBe("343 µm");
    expect(words(null, null)).toBe("343 µm");
  });

  it("a spread says the share first", () => {
    const sentences = spreadSentences({
      draws: 32768,
      inputs: 1,
      mean: 343e-6,
      standardUncertainty: 20e-6,
      interval: [310e-6, 380e-6],
      limit: 400e-6,
      beyond: { probability: 0.1234, standardError: 0.002 },
    }).map((text) => text.replaceAll("\u00A0", " "));
    expect(sentences[0]).toBe("12.3 % (± 0.2 % of drawing) of the wafers warp by more than 400 µm.");
    expect(sentences[1]).toContain("95 % lie between 310 µm and 380 µm");
    expect(sentences[2]).toContain("one input that has a tolerance");
  });
});
