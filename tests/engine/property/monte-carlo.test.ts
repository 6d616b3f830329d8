/*
 * Sampling against closed forms: sums of normal, rectangular and triangular inputs, where everything is known; and its promises
 * for any model: unbiased, honest standard errors, the same for the same seed.
 *
 *   f        figure, any unit
 *   u        standard uncertainty, its unit
 *   L        limit, its unit
 *   p        probability beyond L
 */
import { describe, expect, it } from "vitest";
import type { UncertainQuantity } from "#app/engine/uncertainty/quantity.ts";
import { normalShareBelow } from "#app/engine/uncertainty/random/inverse-normal.ts";
import { sampleUncertainty, sampling } from "#app/engine/uncertainty/sample-uncertainty.ts";
import { SAMPLING_METHODS, standardDeviation, type SamplingMethod } from "#app/engine/uncertainty/summary.ts";
import { relative } from "../relative.ts";

const normal = (name: string, value: number, standard: number): UncertainQuantity => ({
  name,
  value,
  distribution: "normal",
  standard,
});
const bounded = (
  name: string,
  value: number,
  halfWidth: number,
  distribution: "rectangular" | "triangular" = "rectangular",
): UncertainQuantity => ({ name, value, distribution, halfWidth });

const sum = (inputs: Float64Array) => inputs.reduce((total, value) => total + value, 0);
/** A figure that bends: Stoney's, thickness squared in the denominator. */
const bent = ([force = 0, thickness = 1, modulus = 1]: Float64Array) => force / (modulus * thickness * thickness);
const bentInputs = [normal("force", 10, 1), normal("thickness", 1, 0.05), normal("modulus", 2, 0.1)];
const of = (name: string) => ["a", "b", "c", "d"].map((letter) => `${name} ${letter}`);

describe.each(SAMPLING_METHODS)("%s draws", (method) => {
  it("give the sum of four normal inputs its known distribution", () => {
    const inputs = of("normal").map((name) => normal(name, 1, 1));
    const found = sampleUncertainty({ model: sum, inputs, draws: 2 ** 15, seed: 1, method });
    expect(Math.abs(found.mean - 4)).toBeLessThan(4 * found.standardErrorOfMean + 1e-12);
    // 4 times the standard error of a standard deviation, u / sqrt(2 N).
    expect(relative(found.standardUncertainty, 2)).toBeLessThan(4 / Math.sqrt(2 ** 16));
    const [low, high] = found.interval;
    const [lowError, highError] = found.standardErrorOfInterval();
    expect(Math.abs(low - (4 - 2 * 1.959963984540054))).toBeLessThan(4 * lowError + 1e-3);
    expect(Math.abs(high - (4 + 2 * 1.959963984540054))).toBeLessThan(4 * highError + 1e-3);
    const chance = found.chanceAbove(6);
    expect(Math.abs(chance.probability - normalShareBelow(-1))).toBeLessThan(4 * chance.standardError + 1e-5);
  });

  it("give the sum of four rectangular inputs its known distribution", () => {
    const inputs = of("rectangular").map((name) => bounded(name, 0, Math.sqrt(3)));
    const found = sampleUncertainty({ model: sum, inputs, draws: 2 ** 15, seed: 2, method });
    expect(relative(found.standardUncertainty, 2)).toBeLessThan(0.01);
    // Sum of four uniform numbers (Irwin and Hall): beyond 4 - t lies t^4/24 while t < 1.
    const end = 2 * Math.sqrt(3) * (2 - (24 * 0.025) ** 0.25);
    const [lowError, highError] = found.standardErrorOfInterval();
    expect(Math.abs(found.interval[0] + end)).toBeLessThan(4 * lowError);
    expect(Math.abs(found.interval[1] - end)).toBeLessThan(4 * highError);
    const [shortLow, shortHigh] = found.shortestInterval();
    expect(shortHigh - shortLow).toBeLessThanOrEqual(found.interval[1] - found.interval[0] + 1e-9);
  });

  it("give a triangular input its known distribution", () => {
    const found = sampleUncertainty({
      model: sum,
      inputs: [bounded("a", 5, 1, "triangular")],
      draws: 2 ** 14,
      seed: 3,
      method,
    });
    expect(relative(found.standardUncertainty, 1 / Math.sqrt(6))).toBeLessThan(0.02);
    const chance = found.chanceAbove(5.5);
    expect(Math.abs(chance.probability - 0.125)).toBeLessThan(4 * chance.standardError + 1e-4);
  });

  it("follow correlated inputs", () => {
    const inputs = [normal("a", 0, 1), normal("b", 0, 2)];
    const correlations = [{ between: ["a", "b"] as const, coefficient: -0.6 }];
    const found = sampleUncertainty({ model: sum, inputs, correlations, draws: 2 ** 15, seed: 4, method });
    expect(relative(found.standardUncertainty, Math.sqrt(1 + 4 - 2.4))).toBeLessThan(0.02);
  });

  it("take normal and bounded inputs together, both parts of each, and more of them than a lattice has places", () => {
    const many = Array.from({ length: 45 }, (_, n): UncertainQuantity => {
      const name = `input ${n}`;
      return n % 3 === 0
        ? { ...normal(name, 1, 1), betweenWafers: { distribution: "triangular", halfWidth: Math.sqrt(6) } }
        : bounded(name, 1, Math.sqrt(3));
    });
    const found = sampleUncertainty({ model: sum, inputs: many, draws: 2 ** 14, seed: 9, method });
    expect(Math.abs(found.mean - 45)).toBeLessThan(4 * found.standardErrorOfMean + 1e-10);
    // Variance 1 of each of 60 sources; four standard errors of a standard deviation.
    expect(relative(found.standardUncertainty, Math.sqrt(60))).toBeLessThan(4 / Math.sqrt(2 ** 15));
    const chance = found.chanceAbove(45 + Math.sqrt(60));
    // So many sources add up to a normal figure within 0.001.
    expect(Math.abs(chance.probability - normalShareBelow(-1))).toBeLessThan(4 * chance.standardError + 1e-3);
  });

  it("are the same for the same seed and others for another", () => {
    const run = (seed: number) =>
      sampleUncertainty({ model: bent, inputs: bentInputs, draws: 1000, seed, method }).mean;
    expect(run(5)).toBe(run(5));
    expect(run(5)).not.toBe(run(6));
  });

  it("are unbiased for a figure that bends, with standard errors that hold", () => {
    const runs = Array.from({ length: 60 }, (_, seed) =>
      sampleUncertainty({ model: bent, inputs: bentInputs, draws: 1024, seed, method }),
    );
    // E(force) E(1/modulus) E(1/thickness²) to the eighth order in the relative uncertainty of 5 %.
    const inverse = 1 + 0.05 ** 2 + 3 * 0.05 ** 4 + 15 * 0.05 ** 6 + 105 * 0.05 ** 8;
    const inverseSquare = 1 + 3 * 0.05 ** 2 + 15 * 0.05 ** 4 + 105 * 0.05 ** 6 + 945 * 0.05 ** 8;
    const expected = (10 / 2) * inverse * inverseSquare;
    const errors = runs.map(({ mean }) => mean - expected);
    const scatter = standardDeviation(errors);
    expect(Math.abs(errors.reduce((total, error) => total + error, 0) / errors.length)).toBeLessThan(
      (4 * scatter) / Math.sqrt(errors.length),
    );
    // Within two standard errors in 95 of 100; with 60 runs fewer than 51 would come once in 300 times.
    const covered = runs.filter(({ mean, standardErrorOfMean }) => Math.abs(mean - expected) < 2 * standardErrorOfMean);
    expect(covered.length).toBeGreaterThanOrEqual(51);
    const limit = 6;
    const chances = runs.map((run) => run.chanceAbove(limit));
    const best = sampleUncertainty({ model: bent, inputs: bentInputs, draws: 2 ** 18, seed: 99 }).chanceAbove(limit);
    const inside = chances.filter(
      ({ probability, standardError }) =>
        Math.abs(probability - best.probability) < 2 * Math.hypot(standardError, best.standardError),
    );
    expect(inside.length).toBeGreaterThanOrEqual(51);
  });
});

describe.each(SAMPLING_METHODS)("%s draws of bounded inputs", (method) => {
  it("are unbiased for a figure that bends, with standard errors that hold", () => {
    const halfWidth = 0.2;
    const inputs = [bounded("force", 10, 1, "triangular"), bounded("thickness", 1, halfWidth)];
    const model = ([force = 0, thickness = 1]: Float64Array) => force / (thickness * thickness);
    // The mean of 1/h² for h even from 1 − a to 1 + a is 1/(1 − a²).
    const expected = 10 / (1 - halfWidth * halfWidth);
    const runs = Array.from({ length: 60 }, (_, seed) =>
      sampleUncertainty({ model, inputs, draws: 1024, seed, method }),
    );
    const errors = runs.map(({ mean }) => mean - expected);
    const mean = errors.reduce((total, error) => total + error, 0) / errors.length;
    expect(Math.abs(mean)).toBeLessThan((4 * standardDeviation(errors)) / Math.sqrt(errors.length));
    const covered = runs.filter((run) => Math.abs(run.mean - expected) < 2 * run.standardErrorOfMean);
    expect(covered.length).toBeGreaterThanOrEqual(51);
  });
});

describe("what the methods save", () => {
  const errorOf = (method: SamplingMethod) => {
    const runs = Array.from({ length: 24 }, (_, seed) =>
      sampleUncertainty({ model: bent, inputs: bentInputs, draws: 2048, seed, method }),
    );
    return {
      mean: standardDeviation(runs.map(({ mean }) => mean)),
      high: standardDeviation(runs.map(({ interval }) => interval[1])),
    };
  };
  const plain = errorOf("plain");

  it("is most of the scatter of mean and 95 % point", () => {
    const [controlled, lattice] = [errorOf("control variate"), errorOf("lattice")];
    expect(controlled.mean).toBeLessThan(plain.mean / 3);
    expect(controlled.high).toBeLessThan(plain.high / 1.3);
    expect(lattice.mean).toBeLessThan(plain.mean / 8);
    expect(lattice.high).toBeLessThan(plain.high / 2);
  });
});

describe("sampling in pieces", () => {
  const input = { model: sum, inputs: [normal("a", 0, 1)], draws: 1000, seed: 1 };

  it("reports how far it is and ends with the same result", () => {
    const run = sampling(input);
    const seen: number[] = [];
    let step = run.next();
    for (; !step.done; step = run.next()) {
      expect(step.value.of).toBe(1000);
      seen.push(step.value.done);
    }
    expect(seen.at(-1)).toBe(1000);
    expect(seen).toEqual(seen.toSorted((a, b) => a - b));
    expect(step.value.mean).toBe(sampleUncertainty(input).mean);
  });

  it("can be left early", () => {
    const run = sampling(input);
    run.next();
    expect(run.return(sampleUncertainty(input)).done).toBe(true);
    expect(run.next().done).toBe(true);
  });
});

describe("stopping by itself", () => {
  it.each(SAMPLING_METHODS)(
    "reaches the standard errors asked for with %s draws, and no sooner than 16 replicates",
    (method) => {
      const found = sampleUncertainty({
        model: bent,
        inputs: bentInputs,
        draws: 2 ** 17,
        seed: 8,
        method,
        until: { standardErrorOfMean: 0.01, chanceAbove: { limit: 6, standardError: 0.004 } },
      });
      expect(found.standardErrorOfMean).toBeLessThanOrEqual(0.01);
      expect(found.chanceAbove(6).standardError).toBeLessThanOrEqual(0.004);
      expect(found.draws).toBeGreaterThanOrEqual(16 * 512);
      expect(found.draws).toBeLessThan(2 ** 17);
    },
  );
});
