/*
 *   κ  curvature, bowl positive   1/m
 *   x  position, z height         m
 */
import { describe, expect, it } from "vitest";
import { fitScan } from "#app/engine/profile/fit-scan.ts";
import { relative } from "../../relative.ts";

const COUNT = 1401;
const x = Float64Array.from({ length: COUNT }, (_, n) => -0.07 + n * 1e-4);
/** Scatter of 20 nm that repeats after seven points and adds up to nothing. */
const scatter = (n: number) => 10e-9 * (((n * 3) % 7) - 3);
const bowl = (at: number) => 0.005 * at * at;
const heights = (extra: (at: number, n: number) => number) => x.map((at, n) => bowl(at) + scatter(n) + extra(at, n));

describe("fitScan, robust", () => {
  it("lists spikes with their places and leaves the curvature alone", () => {
    const z = heights((_, n) => (n === 100 || n === 101 ? 3e-6 : n === 900 ? -2e-6 : 0));
    const fit = fitScan({ x, z }, { edgeExclusion: 0, robust: true });
    expect(fit.rejected).toEqual([100, 101, 900]);
    expect(fit.runs.map(({ kind, count }) => [kind, count])).toEqual([
      ["spike", 2],
      ["spike", 1],
    ]);
    expect(fit.runs[0]?.height).toBeCloseTo(3e-6, 7);
    expect(relative(fit.curvature, 0.01)).toBeLessThan(1e-4);
  });

  it("leaves out a step at the end of the scan, which bends a plain fit", () => {
    const z = heights((at) => (at > 0.045 ? 4e-6 : 0));
    const fit = fitScan({ x, z }, { edgeExclusion: 0, robust: true });
    expect(relative(fit.curvature, 0.01)).toBeLessThan(1e-3);
    expect(relative(fitScan({ x, z }, { edgeExclusion: 0 }).curvature, 0.01)).toBeGreaterThan(0.05);
    expect(fit.runs).toMatchObject([{ kind: "step", count: 250 }]);
    expect(fit.runs[0]?.from).toBeCloseTo(0.0451, 6);
  });

  it("leaves out a plateau of a third of the scan", () => {
    const z = heights((at) => (at > -0.02 && at < 0.026 ? 5e-6 : 0));
    const fit = fitScan({ x, z }, { edgeExclusion: 0, robust: true });
    expect(relative(fit.curvature, 0.01)).toBeLessThan(1e-3);
    expect(fit.runs[0]).toMatchObject({ kind: "step" });
  });

  it("numbers rejected points as they were given, in whatever order", () => {
    const z = heights((_, n) => (n === 100 ? 3e-6 : 0));
    const turned = { x: Float64Array.from(x).reverse(), z: Float64Array.from(z).reverse() };
    expect(fitScan(turned, { edgeExclusion: 0, robust: true }).rejected).toEqual([COUNT - 1 - 100]);
    expect([...turned.x.slice(0, 2)]).toEqual([x[COUNT - 1], x[COUNT - 2]]);
  });

  it("keeps all of a scan in coarse steps of height", () => {
    const z = x.map((at) => Math.round((0.002 * at * at) / 1e-6) * 1e-6);
    const fit = fitScan({ x, z }, { edgeExclusion: 0, robust: true });
    expect(fit.rejected).toEqual([]);
    expect(relative(fit.curvature, 0.004)).toBeLessThan(0.05);
  });
});

describe("fitScan, what it says of the scan", () => {
  it("finds a gap inside the scan", () => {
    const rows = [...x].map((at, n) => ({ at, z: bowl(at) + scatter(n) })).filter(({ at }) => at < 0.03 || at > 0.033);
    const fit = fitScan({ x: rows.map(({ at }) => at), z: rows.map(({ z }) => z) }, { edgeExclusion: 0.003 });
    expect(fit.gaps).toHaveLength(1);
    expect(fit.gaps[0]?.from).toBeCloseTo(0.0299, 6);
    expect(fitScan({ x, z: heights(() => 0) }, { edgeExclusion: 0 }).gaps).toEqual([]);
  });

  it("calls a shape not spherical when the fourth order is both large and no chance", () => {
    const quartic = heights((at) => 2e-6 * (at / 0.07) ** 4);
    expect(fitScan({ x, z: quartic }, { edgeExclusion: 0 }).shape.notSpherical).toBe(true);
    // The same share of a bow that the scatter drowns.
    const faint = x.map((at, n) => 1e-9 * (at / 0.07) ** 2 + scatter(n));
    expect(fitScan({ x, z: faint }, { edgeExclusion: 0 }).shape.notSpherical).toBe(false);
  });

  it("does not claim more than the scatter's memory allows", () => {
    const wavy = heights((at) => 200e-9 * Math.sin(at * 700) + 150e-9 * Math.sin(at * 433 + 1));
    const fit = fitScan({ x, z: wavy }, { edgeExclusion: 0 });
    expect(fit.scatter.correlated).toBe(true);
    expect(fit.scatter.inflation).toBeGreaterThan(1.5);
    expect(fit.scatter.degreesOfFreedom).toBe(12);
    expect(Math.abs(fit.curvature - 0.01)).toBeLessThan(fit.expandedUncertainty);
  });

  it.each([
    ["columns of unequal length", { x: [0, 1], z: [0] }, /2 positions but 1 heights/],
    ["too many points", { x: new Float64Array(2_000_001), z: new Float64Array(2_000_001) }, /too many/],
  ])("refuses %s", (_, scan, reason) => {
    expect(() => fitScan(scan, { edgeExclusion: 0 })).toThrow(reason);
  });
});
