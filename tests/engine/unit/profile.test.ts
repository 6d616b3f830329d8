/*
 *   κ  curvature, bowl positive   1/m
 *   x  position, z height         m
 */
import { describe, expect, it } from "vitest";
import { EngineInputError } from "#app/engine/errors.ts";
import { filmStressFromProfiles } from "#app/engine/profile/film-stress.ts";
import { fitProfile } from "#app/engine/profile/fit-profile.ts";
import type { ProfilePoint } from "#app/engine/profile/points.ts";
import { relative } from "../relative.ts";

function scan(height: (x: number) => number, count = 151, half = 0.075): ProfilePoint[] {
  return Array.from({ length: count }, (_, n) => {
    const x = -half + (2 * half * n) / (count - 1);
    return { x, z: height(x) };
  });
}

describe("fitProfile", () => {
  it("leaves out the edges of the scan", () => {
    // A rolled-off rim within 5 mm of the ends.
    const points = scan((x) => 0.005 * x * x - Math.max(0, Math.abs(x) - 0.07) ** 2);
    const fit = fitProfile(points, { edgeExclusion: 0.005 });
    expect(relative(fit.curvature, 0.01)).toBeLessThan(1e-12);
    expect(fit.used).toBe(141);
    expect(relative(fitProfile(points, { edgeExclusion: 0 }).curvature, 0.01)).toBeGreaterThan(1e-3);
  });

  it("tells a shape that is not spherical by its fourth-order share", () => {
    const [half, curvature] = [0.075, 0.01];
    const sagitta = (curvature * half ** 2) / 2;
    // Ten percent of the sagitta at the end in the fourth order.
    const fit = fitProfile(
      scan((x) => (curvature * x * x) / 2 + 0.1 * sagitta * (x / half) ** 4),
      { edgeExclusion: 0 },
    );
    // The parabola takes 6/7 of the fourth-order term along: 0.1/(1 + 0.1 × 6/7 + 0.1).
    expect(fit.quartic).toBeCloseTo(0.1 / (1.1 + 0.6 / 7), 3);
    expect(
      fitProfile(
        scan((x) => x * x),
        { edgeExclusion: 0 },
      ).quartic,
    ).toBeCloseTo(0, 9);
  });

  it("a flat scan has no curvature", () => {
    const fit = fitProfile(
      scan(() => 1e-6),
      { edgeExclusion: 0, robust: true },
    );
    expect(Math.abs(fit.curvature)).toBeLessThan(1e-15);
    expect(fit.rejected).toEqual([]);
  });

  it("scatter widens the uncertainty as 1/sqrt(N) and 1/L²", () => {
    const rough = (count: number, half: number) =>
      fitProfile(
        scan((x) => x * x, count, half).map(({ x, z }, n) => ({ x, z: z + (n % 2 ? 1e-8 : -1e-8) })),
        { edgeExclusion: 0 },
      ).standardUncertainty;
    expect(relative(rough(401, 0.05) / rough(1601, 0.05), 2)).toBeLessThan(0.01);
    expect(relative(rough(401, 0.025) / rough(401, 0.05), 4)).toBeLessThan(0.01);
  });

  it.each<[string, ProfilePoint[], number, RegExp]>([
    ["too few points", scan((x) => x, 6), 0, /at least 7/],
    ["too few left inside the edges", scan((x) => x, 100), 0.0725, /at least 7/],
    ["one position", Array.from({ length: 20 }, (_, n) => ({ x: 0.01, z: n })), 0, /same position/],
    ["too few positions", Array.from({ length: 20 }, (_, n) => ({ x: n % 5, z: n })), 0, /at least 7/],
    ["a height that is missing", [...scan((x) => x), { x: 0, z: Number.NaN }], 0, /points\[151\]\.z/],
    ["an endless position", [...scan((x) => x), { x: Infinity, z: 0 }], 0, /points\[151\]\.x/],
    ["a scan past a quarter turn", scan((x) => 20 * x * x), 0, /quarter turn/],
  ])("refuses %s", (_, points, edgeExclusion, reason) => {
    expect(() => fitProfile(points, { edgeExclusion })).toThrow(EngineInputError);
    expect(() => fitProfile(points, { edgeExclusion })).toThrow(reason);
  });
});

describe("filmStressFromProfiles", () => {
  const wafer = { filmThickness: 1e-6, substrateThickness: 725e-6, biaxialModulus: 180e9, edgeExclusion: 0.003 };

  it("a tensile film deepens the bowl: positive change, positive stress, and a budget that adds up", () => {
    const result = filmStressFromProfiles({
      ...wafer,
      pre: scan((x) => 0.001 * x * x),
      post: scan((x) => 0.006 * x * x + 3e-4 * x).map(({ x, z }, n) => ({ x, z: z + (n % 2 ? 2e-8 : -2e-8) })),
      uncertainties: { filmThickness: 10e-9, substrateThickness: 1.5e-6, biaxialModulus: 1.8e9 },
    });
    expect(relative(result.curvatureChange, 0.01)).toBeLessThan(1e-3);
    expect(result.stress).toBeGreaterThan(0);
    expect(result.budget.map(({ input }) => input)).toEqual([
      "curvature change",
      "biaxial modulus",
      "substrate thickness",
      "film thickness",
    ]);
    const total = Math.hypot(...result.budget.map(({ contribution }) => contribution));
    expect(result.standardUncertainty).toBe(total);
  });

  it("subtracts curvatures, not heights, on steep scans", () => {
    // A thin wafer: radius 0.5 m before, 0.4 m after.
    const circle = (radius: number) => (x: number) => radius - Math.sqrt(radius * radius - x * x);
    const result = filmStressFromProfiles({
      ...wafer,
      substrateThickness: 100e-6,
      pre: scan(circle(0.5)),
      post: scan(circle(0.4)),
    });
    expect(relative(result.curvatureChange, 0.5)).toBeLessThan(1e-9);
  });

  it("scans in any order of points, with points at the same place", () => {
    const pre = scan((x) => 0.001 * x * x);
    const post = scan((x) => 0.006 * x * x, 301);
    const sorted = filmStressFromProfiles({ ...wafer, pre, post });
    const shuffled = filmStressFromProfiles({
      ...wafer,
      pre: [...pre].reverse(),
      post: [...post.slice(100), ...post.slice(0, 120)],
    });
    expect(relative(shuffled.stress, sorted.stress)).toBeLessThan(1e-12);
  });

  it("refuses scans that do not meet, and bad inputs by name", () => {
    const pre = scan((x) => x * x);
    const post = pre.map(({ x, z }) => ({ x: x + 1, z }));
    expect(() => filmStressFromProfiles({ ...wafer, pre, post })).toThrow(/does not overlap/);
    expect(() => filmStressFromProfiles({ ...wafer, pre, post: [] })).toThrow(/does not overlap/);
    expect(() => filmStressFromProfiles({ ...wafer, pre, post: pre, filmThickness: 0 })).toThrow(/filmThickness/);
    expect(() => filmStressFromProfiles({ ...wafer, pre, post: pre, uncertainties: { biaxialModulus: -1 } })).toThrow(
      /uncertainties.biaxialModulus/,
    );
  });
});
