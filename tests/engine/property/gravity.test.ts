/*
 * What must hold for the sag of any wafer on any support.
 *
 *   w, r, θ   height, radius over the wafer's, angle     q a⁴/D, 1, rad
 *   ν         Poisson's ratio
 *   m         order of a harmonic cos mθ
 *   PV        peak to valley
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import {
  centreCupProfile,
  centrePointProfile,
  ringProfile,
  type Profile,
} from "#app/engine/gravity/axisymmetric-sag.ts";
import { gravitySag, type GravitySagInput } from "#app/engine/gravity/gravity-sag.ts";
import { linearSag } from "#app/engine/gravity/linear-sag.ts";
import { pointSag } from "#app/engine/gravity/point-sag.ts";
import { harmonic, harmonicValue } from "#app/engine/gravity/point-series.ts";
import type { Support } from "#app/engine/gravity/support.ts";
import { relative } from "../relative.ts";
import { between, logarithmic } from "./arbitraries.ts";

const ratios = between(0, 0.45);
const wafers = fc.record({
  radius: between(0.02, 0.225),
  thickness: logarithmic(20e-6, 1e-3),
  youngsModulus: logarithmic(50e9, 200e9),
  poissonsRatio: ratios,
  density: between(2000, 8000),
});
/** Each kind of support, its length as a share of the radius. */
const supports = fc.oneof(
  fc.constant((): Support => ({ kind: "edge-ring" })),
  fc.constant((): Support => ({ kind: "centre-point" })),
  between(0.2, 1).map((at) => (radius: number): Support => ({ kind: "ring", radius: at * radius })),
  between(0.05, 0.9).map((at) => (radius: number): Support => ({ kind: "centre-cup", radius: at * radius })),
  between(0.05, 0.98).map((at) => (radius: number): Support => ({ kind: "rails", halfSpacing: at * radius })),
  fc
    .tuple(fc.integer({ min: 3, max: 12 }), between(0.2, 1))
    .map(([count, at]) => (radius: number): Support => ({ kind: "points", count, radius: at * radius })),
);

/** Radial moment and Kirchhoff's shear of w cos mθ at the rim, by differences; both are zero at a free edge. */
function rimForces(w: Profile, m: number, nu: number): { moment: number; shear: number } {
  const step = 2e-3 / m;
  const at = (k: number) => w(1 - k * step);
  // One-sided differences of second order.
  const d1 = (3 * at(0) - 4 * at(1) + at(2)) / (2 * step);
  const d2 = (2 * at(0) - 5 * at(1) + 4 * at(2) - at(3)) / step ** 2;
  const d3 = (5 * at(0) - 18 * at(1) + 24 * at(2) - 14 * at(3) + 3 * at(4)) / (2 * step ** 3);
  const square = m * m;
  return {
    moment: d2 + nu * (d1 - square * at(0)),
    shear: d3 + d2 - d1 - square * (d1 - 2 * at(0)) - (1 - nu) * square * (d1 - at(0)),
  };
}

describe("the plate's equations", () => {
  it("harmonics of points leave the rim without moment and shear", () => {
    fc.assert(
      fc.property(fc.integer({ min: 2, max: 12 }), between(0.2, 0.9), ratios, (m, at, nu) => {
        const h = harmonic(m, at, nu);
        const w = (r: number) => harmonicValue(h, r, (at * r) ** m, (Math.min(r, at) / Math.max(r, at)) ** m);
        const { moment, shear } = rimForces(w, m, nu);
        // Measured against what the two would be for the height alone, with the error of the differences.
        const size = Math.abs(w(1)) + Math.abs(w(at));
        expect(Math.abs(moment)).toBeLessThan(2e-3 * m ** 2 * size);
        expect(Math.abs(shear)).toBeLessThan(2e-2 * m ** 3 * size);
      }),
    );
  });

  it("harmonics of points join smoothly at the points' circle", () => {
    fc.assert(
      fc.property(fc.integer({ min: 2, max: 60 }), between(0.2, 0.95), ratios, (m, at, nu) => {
        const h = harmonic(m, at, nu);
        const w = (r: number) => harmonicValue(h, r, (at * r) ** m, (Math.min(r, at) / Math.max(r, at)) ** m);
        const step = 1e-6 * at;
        const [inside, here, outside] = [w(at - step), w(at), w(at + step)];
        expect(Math.abs(inside - 2 * here + outside)).toBeLessThan(1e-9 * m * m * Math.abs(here) + 1e-16);
      }),
    );
  });

  it("profiles of full symmetry: load 1 inside, no moment at the rim, zero at the support", () => {
    fc.assert(
      fc.property(between(0.1, 0.95), ratios, (at, nu) => {
        for (const [w, zero] of [
          [ringProfile(at, nu), at],
          [centreCupProfile(at, nu), at],
          [centrePointProfile(nu), 0],
        ] as const) {
          expect(Math.abs(w(zero))).toBeLessThan(1e-15);
          const step = 1e-3;
          const d1 = (3 * w(1) - 4 * w(1 - step) + w(1 - 2 * step)) / (2 * step);
          const d2 = (2 * w(1) - 5 * w(1 - step) + 4 * w(1 - 2 * step) - w(1 - 3 * step)) / step ** 2;
          expect(Math.abs(d2 + nu * d1)).toBeLessThan(1e-4);
        }
      }),
    );
  });
});

describe("limits", () => {
  it("a ring of the wafer's radius is an edge ring, and a tiny ring a centre point", () => {
    fc.assert(
      fc.property(wafers, (wafer) => {
        const at = (support: Support) => gravitySag({ ...wafer, support });
        const { radius } = wafer;
        expect(at({ kind: "ring", radius })).toEqual(at({ kind: "edge-ring" }));
        const tiny = at({ kind: "ring", radius: 0.01 * radius });
        expect(relative(tiny.peakToValley, at({ kind: "centre-point" }).peakToValley)).toBeLessThan(2e-3);
      }),
    );
  });

  it("many points are a ring", () => {
    fc.assert(
      fc.property(between(0.3, 1), ratios, (at, nu) => {
        const [ring, many] = [linearSag({ kind: "ring", at }, nu), linearSag({ kind: "points", count: 90, at }, nu)];
        // Between points the ring's sag differs by about 1/n³ of the unit.
        expect(Math.abs(many.centre - ring.centre)).toBeLessThan(3e-6);
        expect(Math.abs(many.peakToValley - ring.peakToValley)).toBeLessThan(1e-5);
      }),
    );
  });

  it("a small cup is a centre point", () => {
    fc.assert(
      fc.property(ratios, (nu) => {
        const point = linearSag({ kind: "centre-point" }, nu);
        const cup = linearSag({ kind: "centre-cup", at: 0.01 }, nu);
        // Holding a disc of c flat takes some 14 c² ln(1/c) off the droop.
        expect(relative(cup.peakToValley, point.peakToValley)).toBeLessThan(14 * 0.01 ** 2 * Math.log(100) + 1e-3);
      }),
    );
  });
});

describe("gravitySag", () => {
  it("scales with g, 1/E, ρ, a⁴ and 1/h² as small deflections do", () => {
    fc.assert(
      fc.property(wafers, supports, between(0.3, 1.7), (wafer, support, factor) => {
        const sag = (change: Partial<GravitySagInput>) => {
          const changed = { ...wafer, ...change };
          return gravitySag({ ...changed, support: support(changed.radius) }).peakToValley;
        };
        const base = sag({});
        const tolerance = 1e-9;
        expect(relative(sag({ gravity: 9.80665 * factor }), factor * base)).toBeLessThan(tolerance);
        expect(relative(sag({ density: wafer.density * factor }), factor * base)).toBeLessThan(tolerance);
        expect(relative(sag({ youngsModulus: wafer.youngsModulus * factor }), base / factor)).toBeLessThan(tolerance);
        expect(relative(sag({ thickness: wafer.thickness * factor }), base / factor ** 2)).toBeLessThan(tolerance);
        expect(relative(sag({ radius: wafer.radius * factor }), factor ** 4 * base)).toBeLessThan(tolerance);
      }),
    );
  });

  it("peak to valley holds centre and rim, and large deflections never exceed small ones", () => {
    fc.assert(
      fc.property(wafers, supports, (wafer, support) => {
        const sag = gravitySag({ ...wafer, support: support(wafer.radius) });
        const slack = 1e-12 * sag.peakToValley;
        expect(sag.rimHigh).toBeGreaterThanOrEqual(sag.rimLow);
        const high = Math.max(sag.rimHigh, sag.centre, 0);
        const low = Math.min(sag.rimLow, sag.centre, 0);
        expect(sag.peakToValley).toBeGreaterThanOrEqual(high - low - slack);
        if (sag.largeDeflection) {
          expect(sag.largeDeflection.low).toBeGreaterThan(0);
          expect(sag.largeDeflection.high).toBeLessThanOrEqual(sag.peakToValley * 1.001);
        }
        if (sag.linearValid) expect(sag.largeDeflection).not.toBeNull();
      }),
    );
  });

  it("is valid for thick wafers and not for thin ones, once and for all", () => {
    fc.assert(
      fc.property(wafers, supports, between(1.01, 3), (wafer, support, factor) => {
        const valid = (thickness: number) =>
          gravitySag({ ...wafer, thickness, support: support(wafer.radius) }).linearValid;
        if (valid(wafer.thickness)) expect(valid(wafer.thickness * factor)).toBe(true);
      }),
    );
  });

  it("on points no place of the wafer lies outside the peak to valley found on the mirror lines", () => {
    fc.assert(
      fc.property(fc.integer({ min: 3, max: 8 }), between(0.2, 1), ratios, (count, at, nu) => {
        const sag = pointSag(count, at, nu);
        const { peakToValley, rimHigh, rimLow } = linearSag({ kind: "points", count, at }, nu);
        let [low, high, rimLeast, rimMost] = [0, 0, 0, -1];
        for (let n = 0; n <= 12; n += 1) {
          for (let k = 0; k <= 12; k += 1) {
            const value = sag.at(n / 12, (k * Math.PI) / (12 * count));
            low = Math.min(low, value);
            high = Math.max(high, value);
            if (n === 12) [rimLeast, rimMost] = [Math.min(rimLeast, value), Math.max(rimMost, value)];
          }
        }
        expect(high - low).toBeLessThanOrEqual(peakToValley * (1 + 2e-3) + 1e-7);
        expect(rimMost).toBeLessThanOrEqual(rimHigh + 1e-7);
        expect(rimLeast).toBeGreaterThanOrEqual(Math.min(rimLow, 0) - 1e-7);
      }),
      { numRuns: 40 },
    );
  });

  it("gives finite numbers for any legal wafer", () => {
    const wild = fc.record({
      radius: logarithmic(1e-4, 10),
      share: logarithmic(1e-9, 0.19),
      youngsModulus: logarithmic(1, 5e12),
      poissonsRatio: between(0, 0.4999),
      density: between(1, 30000),
      gravity: between(0, 100),
    });
    fc.assert(
      fc.property(wild, supports, ({ share, ...wafer }, support) => {
        const thickness = Math.min(0.1, Math.max(1e-10, share * wafer.radius));
        const sag = gravitySag({ ...wafer, thickness, support: support(wafer.radius) });
        expect(JSON.stringify({ ...sag, rms: sag.rms ?? 0, largeDeflection: sag.largeDeflection ?? 0 })).not.toContain(
          "null",
        );
        expect(sag.peakToValley).toBeGreaterThanOrEqual(0);
      }),
    );
  });
});
