/*
 * The tables of rails and of large deflections against their own generator: a handful of places made anew, on the grid and
 * between its rows.
 *
 *   at    half spacing of the rails over the radius of the wafer
 *   ν     Poisson's ratio
 *   Q     load q a⁴/(D h)
 */
import { describe, expect, it } from "vitest";
import { edgeRingCurve } from "#app/engine/gravity/generator/edge-ring-curve.ts";
import { plateOnPoints, threePointRatios } from "#app/engine/gravity/generator/points-ritz.ts";
import { railsContact } from "#app/engine/gravity/generator/rails-contact.ts";
import { edgeRingRatio, threePointRatio } from "#app/engine/gravity/large-sag.ts";
import { pointSag } from "#app/engine/gravity/point-sag.ts";
import { railsSag } from "#app/engine/gravity/rails-sag.ts";
import { places, RAIL_GRID, RATIO_GRID, RING_GRID } from "#app/engine/gravity/table-grid.ts";
import { RAILS_CENTRE, RAILS_HIGH, RAILS_RIM_ALONG } from "#app/engine/gravity/table/rails.ts";
import { RING_LOGARITHMS } from "#app/engine/gravity/table/large-sag.ts";
import { relative } from "../relative.ts";

describe("rails", () => {
  it("a row of the table is what the generator makes, to its six digits", () => {
    for (const [row, column] of [
      [2, 1],
      [20, 3],
    ] as const) {
      const angle = places(RAIL_GRID)[row] ?? NaN;
      const made = railsContact(Math.cos(angle), places(RATIO_GRID)[column] ?? NaN);
      expect(relative(RAILS_CENTRE[row]?.[column], made.centre)).toBeLessThan(6e-6);
      expect(relative(RAILS_RIM_ALONG[row]?.[column], made.rimAlong)).toBeLessThan(6e-6);
      expect(relative(RAILS_HIGH[row]?.[column], made.high)).toBeLessThan(6e-6);
    }
  });

  it.each([
    [0.33, 0.21],
    [0.47, 0.37],
    [0.62, 0.1605],
    [0.86, 0.28],
    [0.94, 0.4],
  ])("between its rows, at %d and ν = %d, it keeps the bound of its docstring", (at, nu) => {
    const [made, table] = [railsContact(at, nu), railsSag(at, nu)];
    for (const part of ["centre", "rimHigh", "rimLow", "peakToValley"] as const) {
      expect(Math.abs(table[part] - made[part])).toBeLessThan(5e-4);
    }
    expect(relative(table.peakToValley, made.peakToValley)).toBeLessThan(at > 0.45 && at < 0.5 ? 0.02 : 2e-3);
  });

  it("half as fine a contact tells its error: 0.00002 q a⁴/D", () => {
    for (const at of [0.3, 0.75, 0.95]) {
      const [fine, coarse] = [railsContact(at, 0.28), railsContact(at, 0.28, false, { points: 20, harmonics: 240 })];
      expect(Math.abs(fine.centre - coarse.centre)).toBeLessThan(2e-5);
      expect(Math.abs(fine.peakToValley - coarse.peakToValley)).toBeLessThan(2e-5);
    }
  });

  it("carries the weight, pushes everywhere, and beyond 0.9 on the ends alone", () => {
    for (const at of [0.2, 0.5, 0.8, 0.92]) {
      const { contact } = railsContact(at, 0.16);
      expect(contact.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 9);
      for (const { share } of contact) expect(share).toBeGreaterThan(0);
      if (at > 0.9) expect(contact).toHaveLength(1);
    }
  });

  it("pinned along the rails, the solution of others: 0.0528, 0.0094, 0.0417, 0.110 at 0.3, 0.5, 0.6, 0.75", () => {
    for (const [at, expected] of [
      [0.3, 0.0528],
      [0.5, 0.0094],
      [0.6, 0.0417],
      [0.75, 0.11],
    ] as const) {
      // Ritz in polynomials, three digits, 1 % as its own bound; stiffer the nearer the rim.
      expect(relative(railsContact(at, 0.28, true).peakToValley, expected)).toBeLessThan(0.017);
    }
  });
});

describe("large deflections", () => {
  it("edge ring: the generator's values on the grid, and 0.05 % between its rows", () => {
    const nu = places(RATIO_GRID)[1] ?? NaN;
    const power = RING_GRID.first + 10 * RING_GRID.step;
    const [made = NaN] = edgeRingCurve(nu, [10 ** power], 36);
    const linear = ((5 + nu) / (64 * (1 + nu))) * 10 ** power;
    expect(relative(Math.exp(RING_LOGARITHMS[10]?.[1] ?? NaN), made / linear)).toBeLessThan(2e-5);
    const loads = [0.17, 2.5, 25, 170, 3000, 1e5];
    const curve = edgeRingCurve(0.38, loads, 36);
    loads.forEach((load, n) => {
      const table = edgeRingRatio(load, 0.38) * ((5 + 0.38) / (64 * 1.38)) * load;
      expect(relative(table, curve[n] ?? NaN)).toBeLessThan(6e-4);
    });
  });

  it("three points: a coarser basis is within the 1 % claimed", () => {
    const loads = [4, 20, 75, 220];
    const ratios = threePointRatios(0.25, loads, { degree: 12, radial: 28, around: 14 });
    loads.forEach((load, n) =>
      expect(Math.abs((threePointRatio(load, 0.25) ?? NaN) - (ratios[n] ?? NaN))).toBeLessThan(0.01),
    );
    expect(threePointRatio(301, 0.25)).toBeNull();
  });

  it("three points: at a small load the basis gives the series back, within 0.4 %", () => {
    const plate = plateOnPoints(3, 1, 0.1605, { degree: 9, radial: 24, around: 12 });
    const centre = plate.height(plate.solve(0.01, plate.start()), 0, 0) / 0.01;
    // Quadrature of the bending that is singular at the points.
    expect(relative(centre, pointSag(3, 1, 0.1605).onSupport(0))).toBeLessThan(4e-3);
  });
});
