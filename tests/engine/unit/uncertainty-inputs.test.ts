/*
 * Inputs of first order and sampling: what is taken, what is refused and by which name; first-order budgets; lots; steps.
 *
 *   u        standard uncertainty, unit of its figure
 *   c        slope of a figure with an input
 *   p        share of wafers beyond a limit        1
 */
import { describe, expect, it } from "vitest";
import { EngineInputError } from "#app/engine/errors.ts";
import { firstOrderUncertainty } from "#app/engine/uncertainty/first-order.ts";
import { firstOrderShare } from "#app/engine/uncertainty/first-order-share.ts";
import { lotSampling, lotShare } from "#app/engine/uncertainty/lot.ts";
import { spreadUncertainty, uncertainQuantity, type UncertainQuantity } from "#app/engine/uncertainty/quantity.ts";
import { normalShareBelow } from "#app/engine/uncertainty/random/inverse-normal.ts";
import { sampleSteps } from "#app/engine/uncertainty/sample-steps.ts";
import { sampleUncertainty } from "#app/engine/uncertainty/sample-uncertainty.ts";
import {
  firstOrderWorking,
  lotShareWorking,
  sampledChanceWorking,
  sampledWorking,
} from "#app/engine/uncertainty/working.ts";
import { relative } from "../relative.ts";

const normal = (name: string, value: number, standard: number, wafers?: number): UncertainQuantity => ({
  name,
  value,
  distribution: "normal",
  standard,
  ...(wafers === undefined ? {} : { betweenWafers: { distribution: "normal", standard: wafers } }),
});
const sum = (inputs: Float64Array) => inputs.reduce((total, value) => total + value, 0);

describe("inputs", () => {
  it("take a tolerance as rectangular and none as exact", () => {
    const stated = { value: 5, tolerance: 3, source: "supplier" as const };
    expect(uncertainQuantity("h", stated)).toEqual({ name: "h", value: 5, distribution: "rectangular", halfWidth: 3 });
    expect(spreadUncertainty(uncertainQuantity("h", stated))).toBeCloseTo(Math.sqrt(3), 15);
    expect(spreadUncertainty(uncertainQuantity("h", { ...stated, tolerance: null }))).toBe(0);
    expect(spreadUncertainty({ distribution: "triangular", halfWidth: 6 })).toBeCloseTo(Math.sqrt(6), 15);
  });

  const refused: [string, () => unknown][] = [
    ["a.standard", () => firstOrderUncertainty({ model: sum, inputs: [normal("a", 1, -1)] })],
    ["a.value", () => firstOrderUncertainty({ model: sum, inputs: [normal("a", Number.NaN, 1)] })],
    ["a", () => firstOrderUncertainty({ model: sum, inputs: [normal("a", 1, 1), normal("a", 1, 1)] })],
    ["a.betweenWafers.standard", () => firstOrderUncertainty({ model: sum, inputs: [normal("a", 1, 1, -2)] })],
    ["model", () => firstOrderUncertainty({ model: () => Number.NaN, inputs: [normal("a", 1, 1)] })],
    [
      "model",
      () =>
        sampleUncertainty({ model: ([a = 0]) => 1 / Math.max(0, a), inputs: [normal("a", 0, 1)], draws: 64, seed: 1 }),
    ],
    ["draws", () => sampleUncertainty({ model: sum, inputs: [normal("a", 0, 1)], draws: 10, seed: 1 })],
    ["draws", () => sampleUncertainty({ model: sum, inputs: [normal("a", 0, 1)], draws: 100.5, seed: 1 })],
    ["seed", () => sampleUncertainty({ model: sum, inputs: [normal("a", 0, 1)], draws: 100, seed: -1 })],
    [
      "inputs",
      () =>
        sampleUncertainty({
          model: { inputs: 2, evaluate: () => undefined },
          inputs: [normal("a", 0, 1)],
          draws: 100,
          seed: 1,
        }),
    ],
    [
      "correlation of a and b",
      () =>
        firstOrderUncertainty({
          model: sum,
          inputs: [normal("a", 0, 1), { name: "b", value: 0, distribution: "rectangular", halfWidth: 1 }],
          correlations: [{ between: ["a", "b"], coefficient: 0.5 }],
        }),
    ],
    [
      "correlations",
      () =>
        sampleUncertainty({
          model: sum,
          inputs: ["a", "b", "c"].map((name) => normal(name, 0, 1)),
          correlations: [
            { between: ["a", "b"], coefficient: 0.9 },
            { between: ["b", "c"], coefficient: 0.9 },
            { between: ["a", "c"], coefficient: -0.9 },
          ],
          draws: 100,
          seed: 1,
        }),
    ],
    [
      "steps[0].uses",
      () => sampleSteps({ steps: [{ model: sum, uses: [3] }], inputs: [normal("a", 0, 1)], draws: 64, seed: 1 }),
    ],
    ["wafers", () => lotShare({ model: sum, inputs: [normal("a", 0, 1)], limit: 1, lots: 100, wafers: 2, seed: 1 })],
  ];
  it.each(refused)("refuse %s by name", (field, call) => {
    try {
      call();
    } catch (error) {
      expect(error).toBeInstanceOf(EngineInputError);
      expect(error instanceof EngineInputError && error.field).toBe(field);
      return;
    }
    throw new Error("nothing was refused");
  });
});

describe("first order", () => {
  it("adds independent shares in quadrature, largest first", () => {
    const model = ([a = 0, b = 0, c = 0]: Float64Array) => 3 * a - 4 * b + 0 * c;
    const found = firstOrderUncertainty({ model, inputs: [normal("a", 1, 1), normal("b", 1, 1), normal("c", 1, 1)] });
    expect(found.standardUncertainty).toBeCloseTo(5, 12);
    expect(found.lines.map(({ input }) => input)).toEqual(["b", "a"]);
    expect(found.lines[0]?.contribution).toBeCloseTo(-4, 12);
    expect(found.linear).toBe(true);
  });

  it("lets fully correlated errors add or cancel", () => {
    const inputs = [normal("a", 1, 1), normal("b", 1, 2)];
    const u = (coefficient: number) =>
      firstOrderUncertainty({ model: sum, inputs, correlations: [{ between: ["a", "b"], coefficient }] })
        .standardUncertainty;
    expect(u(1)).toBeCloseTo(3, 12);
    expect(u(-1)).toBeCloseTo(1, 12);
    expect(u(0)).toBeCloseTo(Math.sqrt(5), 12);
  });

  it("keeps what is common to all wafers apart from what differs between them", () => {
    const found = firstOrderUncertainty({ model: sum, inputs: [normal("a", 0, 3, 4), normal("b", 0, 4, 3)] });
    expect(found.common.standardUncertainty).toBeCloseTo(5, 12);
    expect(found.betweenWafers.standardUncertainty).toBeCloseTo(5, 12);
    expect(found.standardUncertainty).toBeCloseTo(Math.sqrt(50), 12);
    expect(found.lines.map(({ contribution }) => contribution)).toEqual([5, 5].map((u) => expect.closeTo(u, 12)));
  });

  it("says in words where the figure bends, and agrees with sampling where it does not", () => {
    const inputs = [normal("thickness", 1, 0.2), normal("force", 10, 1)];
    const model = ([thickness = 1, force = 0]: Float64Array) => force / thickness ** 2;
    const bent = firstOrderUncertainty({ model, inputs });
    expect(bent.linear).toBe(false);
    expect(bent.departures.map(({ input }) => input)).toEqual(["thickness"]);
    expect(bent.remark).toContain("not linear over the uncertainty of thickness");
    const narrow = [normal("thickness", 1, 0.005), normal("force", 10, 0.05)];
    const straight = firstOrderUncertainty({ model, inputs: narrow });
    expect(straight.linear).toBe(true);
    const sampled = sampleUncertainty({ model, inputs: narrow, draws: 2 ** 15, seed: 1, method: "lattice" });
    // Within the flag's own threshold a figure's u moves by less than its square.
    expect(relative(sampled.standardUncertainty, straight.standardUncertainty)).toBeLessThan(0.01);
  });

  it("takes one side alone where the other cannot be computed, and says so", () => {
    const model = ([a = 0]: Float64Array) => {
      if (a > 1) throw new EngineInputError("a", "is too large");
      return 2 * a;
    };
    const found = firstOrderUncertainty({ model, inputs: [normal("a", 1, 0.5)] });
    expect(found.standardUncertainty).toBeCloseTo(1, 12);
    expect(found.linear).toBe(false);
  });

  it("does not take a bounded input beyond its ends", () => {
    const seen: number[] = [];
    const model = ([a = 0]: Float64Array) => {
      seen.push(a);
      return a;
    };
    firstOrderUncertainty({ model, inputs: [{ name: "a", value: 5, distribution: "rectangular", halfWidth: 1 }] });
    expect(Math.max(...seen)).toBeLessThanOrEqual(6);
    expect(Math.min(...seen)).toBeGreaterThanOrEqual(4);
  });
});

describe("lots", () => {
  // One normal input: common part 1, between wafers 2, limit 3 above the best estimate.
  const lot = { model: sum, inputs: [normal("a", 0, 1, 2)], limit: 3, lots: 1500, wafers: 400, seed: 1 };
  const shareGiven = (common: number) => normalShareBelow((common - 3) / 2);
  const moment = (power: number) => {
    // Mean of share^power over the common part, by the trapezoidal rule, which is exact here to all digits that matter.
    let total = 0;
    for (let n = -800; n <= 800; n += 1) {
      const z = n / 100;
      total += (shareGiven(z) ** power * Math.exp((-z * z) / 2)) / Math.sqrt(2 * Math.PI) / 100;
    }
    return total;
  };

  it("have the share and its uncertainty of the closed form", () => {
    const found = lotShare(lot);
    expect(moment(1)).toBeCloseTo(normalShareBelow(-3 / Math.sqrt(5)), 10);
    expect(Math.abs(found.share - moment(1))).toBeLessThan(4 * found.standardError);
    const expected = Math.sqrt(moment(2) - moment(1) ** 2);
    // Four times the standard error of a standard deviation from 1500 lots, widened for the skew of the shares.
    expect(relative(found.standardUncertainty, expected)).toBeLessThan(0.15);
    expect(found.interval[0]).toBeLessThan(shareGiven(-1.9));
    expect(found.interval[1]).toBeGreaterThan(shareGiven(1.7));
  });

  it("are known exactly when nothing is common, and all or nothing when all is", () => {
    const wafersOnly = lotShare({ ...lot, inputs: [normal("a", 0, 0, 2)] });
    expect(wafersOnly.standardUncertainty).toBeLessThan(0.002);
    expect(Math.abs(wafersOnly.share - normalShareBelow(-1.5))).toBeLessThan(4 * wafersOnly.standardError);
    const commonOnly = lotShare({ ...lot, inputs: [normal("a", 0, 2, 0)], wafers: 16 });
    expect(commonOnly.noneBeyond).toBeCloseTo(1 - commonOnly.share, 12);
  });

  it("have the same share by first order where the figure is straight", () => {
    const { share, interval } = firstOrderShare(firstOrderUncertainty(lot), lot.limit);
    expect(share).toBeCloseTo(moment(1), 10);
    expect(interval).toEqual([expect.closeTo(shareGiven(-2), 12), expect.closeTo(shareGiven(2), 12)]);
    const certain = firstOrderUncertainty({ ...lot, inputs: [normal("a", 0, 1)] });
    expect(firstOrderShare(certain, 1.5)).toEqual({ share: normalShareBelow(-1.5), interval: [0, 1] });
    expect(firstOrderShare(certain, 2.5).interval).toEqual([0, 0]);
  });

  it("report how far they are", () => {
    const run = lotSampling({ ...lot, lots: 20, wafers: 20 });
    expect(run.next().value).toEqual({ done: 20, of: 400 });
  });
});

describe("steps", () => {
  it("share their draws: what is common to two steps cancels in neither", () => {
    const inputs = [normal("a", 1, 1), normal("b", 2, 1)];
    const [both, first, again] = sampleSteps({
      steps: [{ model: sum }, { model: sum, uses: [0] }, { model: ([a = 0]) => 2 * a, uses: [0] }],
      inputs,
      draws: 5000,
      seed: 3,
    });
    expect(again?.mean).toBeCloseTo(2 * (first?.mean ?? 0), 12);
    expect(relative(both?.standardUncertainty, Math.SQRT2)).toBeLessThan(0.05);
  });
});

describe("workings", () => {
  const name = { symbol: "b", meaning: "bow", unit: "m" as const };
  const input = { model: sum, inputs: [normal("a", 1, 1)], draws: 256, seed: 1 };

  it("carry the results of the calculations", () => {
    expect(firstOrderWorking(input, name).result.value).toBe(firstOrderUncertainty(input).standardUncertainty);
    expect(sampledWorking(input, name).result.value).toBe(sampleUncertainty(input).standardUncertainty);
    expect(sampledChanceWorking(input, 2, name).result.value).toBe(sampleUncertainty(input).probabilityAbove(2));
    const lot = { model: sum, inputs: [normal("a", 1, 1, 1)], limit: 2, lots: 16, wafers: 16, seed: 1 };
    expect(lotShareWorking(lot, name).result.value).toBe(lotShare(lot).share);
  });
});
