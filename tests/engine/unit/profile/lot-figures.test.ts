/*
 *   x̄   centre      MR̄  mean moving range     s   standard deviation
 */
import { describe, expect, it } from "vitest";
import { acceptedValue } from "#app/engine/profile/lot-figures/accepted-value.ts";
import { controlChart, type ChartValue } from "#app/engine/profile/lot-figures/control-chart.ts";
import { predictedAgainstMeasured } from "#app/engine/profile/lot-figures/predicted-against-measured.ts";
import { draws } from "./honest-scan.ts";

const values = (numbers: number[]): ChartValue[] => numbers.map((value) => ({ value }));
const calm = [10, 12, 11, 9, 10, 11, 10, 12, 9, 11];

describe("controlChart", () => {
  it("limits from the mean moving range by 2.66 and 3.267", () => {
    const { limits, ranges, signals } = controlChart(values(calm));
    // Ranges 2 1 2 1 1 1 2 3 2: their mean is 15/9.
    expect(limits.centre).toBeCloseTo(10.5, 12);
    expect(limits.meanRange).toBeCloseTo(15 / 9, 12);
    expect(limits.upper).toBeCloseTo(10.5 + (2.66 * 15) / 9, 12);
    expect(limits.rangeLimit).toBeCloseTo((3.267 * 15) / 9, 12);
    expect(ranges[0]).toBeNull();
    expect(signals).toEqual([]);
  });

  it("holds new values against earlier limits and names the signals", () => {
    const { limits } = controlChart(values(calm));
    const rules = (numbers: number[]) =>
      controlChart(values(numbers), limits).signals.map(({ rule, at }) => [rule, ...at]);
    expect(rules([10, 16])).toEqual([
      ["beyond the limits", 1],
      ["moving range", 0, 1],
    ]);
    expect(rules([11, 12, 11, 11, 12, 11, 11, 12, 11])).toEqual([["nine on one side", 0, 1, 2, 3, 4, 5, 6, 7, 8]]);
    expect(rules([8, 9, 9.5, 10, 11, 12])).toEqual([["six rising or falling", 0, 1, 2, 3, 4, 5]]);
    expect(rules([10, 14, 11, 14.2])).toEqual([["two of three far out", 1, 3]]);
  });

  it("an excluded value stays in the list, takes no part, and can be brought back", () => {
    const spoiled: ChartValue[] = [...values(calm), { value: 40, excluded: "wrong film thickness" }, { value: 10 }];
    const chart = controlChart(spoiled);
    expect(chart.signals).toEqual([]);
    expect(chart.ranges[10]).toBeNull();
    // From the last value that counts, 11, to 10.
    expect(chart.ranges[11]).toBe(1);
    const back = controlChart(spoiled.map(({ value }) => ({ value })));
    expect(back.signals.map(({ rule }) => rule)).toContain("beyond the limits");
    expect(() => controlChart(values([1, 2, 3, 4]))).toThrow(/at least 5/);
  });

  it("signals on steady values about once in 55", () => {
    const limits = {
      centre: 0,
      lower: -3,
      upper: 3,
      meanRange: 1.128,
      rangeLimit: 3.267 * 1.128,
      standardDeviation: 1,
      from: 100,
    };
    const count = 50_000;
    const { signals } = controlChart(values([...draws(3, 0).normals(count)]), limits);
    expect(count / signals.length).toBeGreaterThan(50);
    expect(count / signals.length).toBeLessThan(60);
  });
});

describe("acceptedValue", () => {
  const reading = (value: number, excluded?: string) => ({ value, standardUncertainty: 2, excluded });

  it("mean, spread and what the next film may be", () => {
    const found = acceptedValue(
      [100, 104, 96, 102, 98].map((value) => reading(value)),
      3,
    );
    expect(found.mean).toBe(100);
    expect(found.spread).toBeCloseTo(Math.sqrt(10), 12);
    // t(4) = 2.869 at 95.45 %.
    const few = 2.869 / 2;
    expect(found.meanUncertainty).toBeCloseTo(Math.hypot((few * Math.sqrt(10)) / Math.sqrt(5), 3), 2);
    expect(found.standardUncertainty).toBeCloseTo(Math.hypot(few * Math.sqrt(10) * Math.sqrt(1.2), 3), 2);
    expect(found.tolerance).toBeCloseTo(Math.sqrt(3) * found.standardUncertainty, 12);
    expect(found.agreement).toBeCloseTo(10 / 4, 12);
  });

  it("leaves out what is excluded; one value keeps its own uncertainty", () => {
    const found = acceptedValue([reading(100), reading(500, "slot mixed up")], 1.5);
    expect(found).toMatchObject({ mean: 100, count: 1, spread: 2, standardUncertainty: 2.5 });
    expect(found.remark).toMatch(/^One value/);
    expect(() => acceptedValue([reading(1, "no")])).toThrow(/none counts/);
  });
});

describe("predictedAgainstMeasured", () => {
  it("counts what points share of their prediction once in the bias", () => {
    const point = (measured: number, shared?: string) => ({
      step: "plated",
      predicted: 100,
      predictedUncertainty: 4,
      measured,
      measuredUncertainty: 1,
      ...(shared === undefined ? {} : { shared }),
    });
    const measured = [105, 105, 105, 105];
    const bias = (keys: (string | undefined)[]) =>
      predictedAgainstMeasured(measured.map((value, n) => point(value, keys[n]))).all;
    expect(bias([]).biasUncertainty).toBeCloseTo(Math.hypot(4, 1) / 2, 12);
    expect(bias(["a", "a", "a", "a"]).biasUncertainty).toBeCloseTo(Math.hypot(4, 0.5), 12);
    // Two predictions, two points each: their errors are independent of one another.
    expect(bias(["a", "a", "b", "b"]).biasUncertainty).toBeCloseTo(Math.hypot(4 / Math.SQRT2, 0.5), 12);
    // Each with a key of its own is as if none had one.
    expect(bias(["a", "b", "c", "d"]).biasUncertainty).toBeCloseTo(bias([]).biasUncertainty, 12);
    expect(bias([]).off).toContain("bias");
    expect(bias(["a", "a", "a", "a"]).off).not.toContain("bias");
  });

  const point = (step: string, predicted: number, measured: number) => ({
    step,
    predicted,
    measured,
    predictedUncertainty: 1,
    measuredUncertainty: 1,
  });

  it("agrees within what is stated", () => {
    const { all, steps } = predictedAgainstMeasured([
      point("a", 10, 10.5),
      point("a", 50, 49.2),
      point("b", 100, 100.4),
      point("b", 150, 150.9),
    ]);
    expect(all.off).toEqual([]);
    expect(all.slope?.value).toBeCloseTo(1, 1);
    expect(steps.map(({ step, count }) => [step, count])).toEqual([
      ["a", 2],
      ["b", 2],
    ]);
  });

  it("finds a slope of 0.8, and a bias", () => {
    const { all } = predictedAgainstMeasured([10, 50, 100, 150, 200].map((p) => point("a", p, 0.8 * p)));
    expect(all.slope?.value).toBeCloseTo(0.8, 9);
    // Errors of both sides: hypot(1, 0.8) over the spread of the predictions.
    expect(all.slope?.standardUncertainty).toBeCloseTo(Math.hypot(1, 0.8) / Math.sqrt(23080), 6);
    expect(all.off).toContain("slope");
    expect(all.sentence).toMatch(/0.80 times the predicted/);
    const shifted = predictedAgainstMeasured([10, 50, 100, 150].map((p, n) => point("a", p, p + 5 + (n % 2) * 0.2)));
    expect(shifted.all.bias).toBeCloseTo(5.1, 9);
    expect(shifted.all.off).toContain("bias");
  });
});
