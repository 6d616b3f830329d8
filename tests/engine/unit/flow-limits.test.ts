import { describe, expect, it } from "vitest";
import { againstLowerLimit, againstUpperLimit, exceeds, reaches } from "#app/engine/rules/against-limit.ts";
import { shareBeyond } from "#app/engine/rules/share-beyond.ts";

describe("a limit has one meaning of 'at'", () => {
  it.each([
    { value: 79.9, outcome: "clear" },
    { value: 80, outcome: "caution" },
    { value: 99.9, outcome: "caution" },
    { value: 100, outcome: "caution" },
    { value: 100.1, outcome: "do not run" },
  ])("$value against at most 100, margin 20: $outcome", ({ value, outcome }) => {
    expect(againstUpperLimit(value, 100, 20, "do not run")).toBe(outcome);
  });

  it.each([
    { value: 121, outcome: "clear" },
    { value: 120, outcome: "caution" },
    { value: 100, outcome: "caution" },
    { value: 99.9, outcome: "needs support" },
  ])("$value against at least 100, margin 20: $outcome", ({ value, outcome }) => {
    expect(againstLowerLimit(value, 100, 20, "needs support")).toBe(outcome);
  });

  it("without a margin only 'at' is a caution", () => {
    expect([99.99, 100, 100.01].map((value) => againstUpperLimit(value, 100, 0, "do not run"))).toEqual([
      "clear",
      "caution",
      "do not run",
    ]);
  });

  it("does not depend on how a decimal quantity was turned into SI", () => {
    expect(50 * 1e-6).not.toBe(50e-6);
    expect(reaches(50 * 1e-6, 50e-6)).toBe(true);
    expect(exceeds(50e-6, 50 * 1e-6)).toBe(false);
    expect(againstLowerLimit(50 * 1e-6, 50e-6, 0, "do not run")).toBe("caution");
    expect(againstUpperLimit(353.15, 80 + 273.15, 0, "do not run")).toBe("caution");
  });

  it("still tells figures apart that differ", () => {
    expect(reaches(49.999e-6, 50e-6)).toBe(false);
    expect(exceeds(50.001e-6, 50e-6)).toBe(true);
  });

  it("holds for negative figures and zero", () => {
    expect(exceeds(0, 0)).toBe(false);
    expect(exceeds(-1, -2)).toBe(true);
    expect(reaches(-2, -1)).toBe(false);
  });
});

describe("share of wafers beyond a limit", () => {
  it.each([
    { sigmas: 4, words: "" },
    { sigmas: 2, words: "fewer than 1 wafer in 20" },
    { sigmas: 1, words: "fewer than 1 wafer in 5" },
    { sigmas: 0.5, words: "up to half" },
    { sigmas: -0.5, words: "more than half" },
    { sigmas: -2, words: "nearly all" },
  ])("limit $sigmas standard uncertainties above the figure: $words", ({ sigmas, words }) => {
    const said = shareBeyond(100e-6, 10e-6, (100 + 10 * sigmas) * 1e-6);
    if (words === "") expect(said).toBe("");
    else expect(said).toContain(words);
  });

  it("says nothing without an uncertainty", () => {
    expect(shareBeyond(2, null, 1)).toBe("");
    expect(shareBeyond(2, 0, 1)).toBe("");
  });
});
