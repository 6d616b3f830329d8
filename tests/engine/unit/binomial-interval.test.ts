/*
 * Clopper and Pearson's interval against published examples and closed forms.
 *
 *   x  how often it happened      n  trials
 */
import { describe, expect, it } from "vitest";
import { binomialInterval } from "#app/engine/uncertainty/binomial-interval.ts";

describe("binomialInterval", () => {
  // R. G. Newcombe 1998, Statistics in Medicine 17, page 857, table I, method 5 (Clopper-Pearson); values from memory, and the same
  // to these digits by another implementation of the beta distribution's quantile.
  it.each([
    [81, 263, 0.2527, 0.3676],
    [15, 148, 0.0578, 0.1617],
    [0, 20, 0, 0.1684],
    [1, 29, 0.0009, 0.1776],
  ])("%i of %i", (events, trials, low, high) => {
    const found = binomialInterval(events, trials);
    expect(found.share).toBe(events / trials);
    expect(found.low).toBeCloseTo(low, 4);
    expect(found.high).toBeCloseTo(high, 4);
  });

  it.each([1, 7, 25, 1000, 250_000])("has its closed form where nothing happened in %i, and mirrors it", (trials) => {
    // (1 − p)^n = 2.5 %
    const bound = -Math.expm1(Math.log(0.025) / trials);
    const none = binomialInterval(0, trials);
    expect(none).toMatchObject({ share: 0, low: 0 });
    expect(Math.abs(none.high / bound - 1)).toBeLessThan(1e-9);
    const all = binomialInterval(trials, trials);
    expect(all.high).toBe(1);
    expect(all.low).toBeCloseTo(1 - bound, 9);
  });

  it("holds the true share in at least 95 % of outcomes, summed outcome by outcome", () => {
    for (const [trials, share] of [
      [10, 0.1],
      [25, 0.02],
      [40, 0.3],
      [100, 0.01],
    ] as const) {
      let held = 0;
      let chance = (1 - share) ** trials;
      for (let events = 0; events <= trials; events += 1) {
        const { low, high } = binomialInterval(events, trials);
        if (low <= share && share <= high) held += chance;
        chance *= ((trials - events) / (events + 1)) * (share / (1 - share));
      }
      expect(held).toBeGreaterThanOrEqual(0.95);
    }
  });

  it("refuses what is no count", () => {
    expect(() => binomialInterval(2, 1)).toThrow(/events/);
    expect(() => binomialInterval(0.5, 3)).toThrow(/events/);
    expect(() => binomialInterval(0, 0)).toThrow(/trials/);
  });
});
