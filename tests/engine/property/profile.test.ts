/*
 * What must hold for any scan.
 *
 *   κ  curvature, bowl positive   1/m
 *   x  position, z height         m
 *   σ  film stress                Pa
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { filmStressFromProfiles } from "#app/engine/profile/film-stress.ts";
import { fitProfile } from "#app/engine/profile/fit-profile.ts";
import { stoneyCurvature } from "#app/engine/stoney/stoney.ts";
import { relative } from "../relative.ts";
import { between, logarithmic } from "./arbitraries.ts";

const scans = fc.record({
  length: logarithmic(0.02, 0.3),
  count: fc.integer({ min: 30, max: 300 }),
  start: between(-0.3, 0.3),
});

function positions({ length, count, start }: { length: number; count: number; start: number }): number[] {
  return Array.from({ length: count }, (_, n) => start + (length * n) / (count - 1));
}

/** Height of a circle of curvature κ whose slope at x = middle is `slope`. */
function circleHeight(x: number, middle: number, curvature: number, slope: number): number {
  const sine = slope / Math.hypot(1, slope);
  const at = sine + curvature * (x - middle);
  return ((x - middle) * (sine + at)) / (Math.sqrt(1 - sine * sine) + Math.sqrt(1 - at * at));
}

describe("fitProfile", () => {
  it("finds the curvature of a shallow parabola, whatever its tilt and height", () => {
    fc.assert(
      fc.property(
        scans,
        between(-0.05, 0.05),
        between(-0.005, 0.005),
        between(-1e-3, 1e-3),
        (scan, curvature, slope, height) => {
          const xs = positions(scan);
          const middle = scan.start + scan.length / 2;
          const points = xs.map((x) => ({ x, z: height + slope * (x - middle) + (curvature * (x - middle) ** 2) / 2 }));
          const fit = fitProfile(points, { edgeExclusion: 0.02 * scan.length });
          // Rounding of heights of up to 3 mm over the sagitta's lever, and the tilt's share of the curvature, taken out.
          const tilted = curvature / (1 + slope * slope) ** 1.5;
          expect(Math.abs(fit.curvature - tilted)).toBeLessThan(
            (1e-15 * 8) / scan.length ** 2 + 1e-12 * Math.abs(curvature),
          );
          // One point more at one end moves the middle by half a spacing.
          expect(Math.abs(fit.tilt - Math.atan(slope))).toBeLessThan(
            1e-9 + (Math.abs(curvature) * scan.length) / scan.count,
          );
          expect(fit.rms).toBeLessThan(1e-14);
          expect(fit.steep).toBe(false);
        },
      ),
    );
  });

  it("finds the curvature of a steep circle", () => {
    fc.assert(
      fc.property(scans, between(0.05, 0.6), fc.boolean(), between(-0.2, 0.2), (scan, angle, up, slope) => {
        const curvature = ((up ? 1 : -1) * angle * 2) / scan.length;
        const middle = scan.start + scan.length / 2;
        const points = positions(scan).map((x) => ({ x, z: circleHeight(x, middle, curvature, slope) }));
        const fit = fitProfile(points, { edgeExclusion: 0 });
        expect(fit.steep).toBe(true);
        // The fixed point stops at 1e-13; 1e-15 m of rounding on the sagitta is less.
        expect(relative(fit.curvature, curvature)).toBeLessThan(1e-10);
      }),
    );
  });

  it("robust: leaves out gross outliers and keeps the curvature", () => {
    fc.assert(
      fc.property(scans, between(-0.05, 0.05), fc.nat(), fc.nat(), (scan, curvature, first, second) => {
        const xs = positions({ ...scan, start: -scan.length / 2 });
        const spoiled = new Set([first % xs.length, second % xs.length]);
        // Scatter of some 20 nm that repeats after seven points; outliers of 5 µm.
        const points = xs.map((x, n) => ({
          x,
          z: (curvature * x * x) / 2 + 7e-9 * (((n * 3) % 7) - 3) + (spoiled.has(n) ? 5e-6 : 0),
        }));
        const fit = fitProfile(points, { edgeExclusion: 0, robust: true });
        expect(fit.rejected).toEqual([...spoiled].sort((a, b) => a - b));
        expect(fit.used).toBe(xs.length - spoiled.size);
        expect(Math.abs(fit.curvature - curvature)).toBeLessThan(6 * fit.standardUncertainty + 1e-12);
      }),
    );
  });
});

describe("filmStressFromProfiles", () => {
  it("finds the film's stress under any shape of the wafer, tilts and offsets of the scans", () => {
    const wafer = fc.record({
      filmThickness: logarithmic(50e-9, 5e-6),
      substrateThickness: logarithmic(300e-6, 800e-6),
      stress: fc.oneof(between(20e6, 500e6), between(-500e6, -20e6)),
    });
    fc.assert(
      fc.property(wafer, between(-0.01, 0.01), between(-0.002, 0.002), between(-1e-3, 1e-3), (i, own, tilt, height) => {
        const biaxialModulus = 180e9;
        const film = stoneyCurvature({ ...i, filmStress: i.stress, biaxialModulus });
        // A steep parabola is no circle; steep scans have a test of their own.
        fc.pre(Math.abs(film) * 0.08 < 0.02);
        const shape = (x: number) => (own * x * x) / 2 + 0.3 * x ** 3 + 2 * x ** 4;
        const pre = Array.from({ length: 161 }, (_, n) => -0.08 + n * 1e-3).map((x) => ({ x, z: shape(x) }));
        // After the film: on the same positions but with more points beside them, shifted, and over another range.
        const post = Array.from({ length: 321 }, (_, n) => -0.07 + n * 0.5e-3).map((x) => ({
          x,
          z: shape(x) + (film * x * x) / 2 + tilt * x + height,
        }));
        const result = filmStressFromProfiles({ ...i, biaxialModulus, pre, post, edgeExclusion: 0.003 });
        // The slope of the difference in the middle of the common range counts as (1 + slope²)^−1.5: 0.0033 makes 1.6e-5.
        expect(relative(result.stress, i.stress)).toBeLessThan(2e-5 + 1e-12 / Math.abs(film));
        expect(Math.abs(result.difference.quartic)).toBeLessThan(0.01);
      }),
    );
  });
});
