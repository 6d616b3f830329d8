/*
 *   κ, u(κ)   curvature change and its standard uncertainty    1/m
 *   M, h, h_f biaxial modulus, silicon and film thickness      Pa, m, m
 *   σ, u(σ)   film stress and its standard uncertainty         Pa
 */
import { describe, expect, it } from "vitest";
import { readOneProfile } from "#app/lib/scan-reading/one-profile.ts";
import type { ScanValues } from "#app/schemas/scan.ts";
import { scanResult } from "#app/services/scan-result-of.ts";
import {
  FILM_CURVATURE,
  MONITOR,
  MONITOR_PARAMETERS,
  monitorProfile,
  profileCsv,
} from "#app/db/seeders/demo-monitor.ts";

const VALUES: ScanValues = {
  program: "00000000-0000-4000-8000-000000000000",
  label: "M-0388",
  film: null,
  ...MONITOR_PARAMETERS,
};

type Points = { x: number; z: number }[];
const profile = (points: Points) =>
  readOneProfile(new TextEncoder().encode(profileCsv(points, { heightPerMetre: 1e6 })), "scan.csv", VALUES);
const resultOf = (before: Points, after: Points, values: Partial<ScanValues> = {}) =>
  scanResult({ ...VALUES, ...values }, profile(before), profile(after));
const measured = (values: Partial<ScanValues> = {}) =>
  resultOf(monitorProfile("before"), monitorProfile("after"), values);

describe("a film of known stress", () => {
  const result = measured();

  it("comes back within twice its standard uncertainty, and its curvature too", () => {
    expect(Math.abs(result.stress - MONITOR.filmStress)).toBeLessThan(2 * result.stressUncertainty);
    expect(Math.abs(result.curvatureChange - FILM_CURVATURE)).toBeLessThan(2 * result.curvatureUncertainty);
    expect(Math.abs(result.curvatureBefore - MONITOR.curvatureBefore)).toBeLessThan(1e-5);
    expect(result.curvatureAfter - result.curvatureBefore).toBeCloseTo(result.curvatureChange, 9);
  });

  it("has the standard bow: a tensile film lowers the centre", () => {
    expect(result.bowChange).toBeCloseTo(-(result.curvatureChange * 0.1 * 0.1) / 2, 15);
    expect(result.bowUncertainty).toBeCloseTo((result.curvatureUncertainty * 0.1 * 0.1) / 2, 15);
  });

  it("has the uncertainty of the law of propagation, its parts in the budget", () => {
    const relative = [
      result.curvatureUncertainty / result.curvatureChange,
      0.01,
      (2 * 1.5e-6) / Math.sqrt(3) / 725e-6,
      0.05e-6 / Math.sqrt(3) / 5e-6,
    ];
    expect(result.stressUncertainty / result.stress).toBeCloseTo(Math.hypot(...relative), 10);
    expect(result.budget.map(({ input }) => input)).toEqual([
      "curvature change",
      "biaxial modulus",
      "silicon thickness",
      "film thickness",
    ]);
    result.budget.forEach(({ contribution, given }, n) => {
      expect(contribution / result.stress).toBeCloseTo(relative[n] ?? 0, 10);
      expect(given).toBe(true);
    });
  });

  it("says which tolerances nobody gave", () => {
    const { budget } = measured({ filmThicknessTolerance: null, siliconThicknessTolerance: null });
    expect(budget.filter(({ given }) => !given).map(({ input }) => input)).toEqual([
      "silicon thickness",
      "film thickness",
    ]);
  });
});

describe("the curves", () => {
  const { curve, from, to } = measured();

  it("lie level on the middle of the scan, and the parabola on the difference", () => {
    expect([from, to]).toEqual([-0.095, 0.095]);
    for (const { x, before, after, difference, fitted } of curve) {
      // Four standard deviations of the noise of one scan, six for two of them.
      expect(Math.abs(before - (MONITOR.curvatureBefore * x * x) / 2)).toBeLessThan(0.24e-6);
      expect(Math.abs(after - before - difference)).toBeLessThan(1e-12);
      expect(Math.abs(difference - fitted)).toBeLessThan(0.36e-6);
    }
  });

  it("are thinned to what a plot shows", () => {
    const dense = Array.from({ length: 4001 }, (_, n) => ({ x: -0.095 + (0.19 * n) / 4000, z: 0 }));
    const bowl = dense.map(({ x }) => ({ x, z: 0.004 * x * x }));
    const { curve: drawn, used } = resultOf(dense, bowl);
    expect(drawn.length).toBeLessThanOrEqual(400);
    expect(used).toBeGreaterThan(3700);
  });
});

it("points off the parabola are left out of the fit and counted with their places", () => {
  const after = monitorProfile("after").map((point, n) => (n === 190 || n === 250 ? { ...point, z: 3e-5 } : point));
  const result = resultOf(monitorProfile("before"), after);
  expect(result.rejected).toBe(2);
  expect(result.rejectedAt[0]).toBeCloseTo(0, 12);
  expect(result.rejectedAt[1]).toBeCloseTo(0.03, 12);
  expect(result.stress).toBeCloseTo(measured().stress, -5);
});

describe("a wafer that bends far", () => {
  const bent = (curvature: number, thickness: number) =>
    resultOf(
      monitorProfile("before", { noise: 0 }),
      monitorProfile("before", { noise: 0 }).map(({ x, z }) => ({ x, z: z + (curvature * x * x) / 2 })),
      { siliconThickness: thickness },
    );

  it("is told to be understated while it is a bowl", () => {
    const { understatedBy, curled } = bent(0.04, 725e-6);
    expect(curled).toBeNull();
    expect(understatedBy).toBeGreaterThan(0.02);
    expect(understatedBy).toBeLessThan(0.04);
  });

  it("has rolled where no bowl can hold that curvature: radius and edge lift instead of a bow", () => {
    const { understatedBy, curled } = bent(0.4, 100e-6);
    expect(understatedBy).toBeNull();
    // The profile is a parabola and a circle is fitted to it: 0.05 % apart at this slope.
    expect(curled?.rollRadius).toBeCloseTo(1 / 0.4008, 2);
    // An arc of 100 mm at that radius: (1 − cos κR)/κ.
    expect(curled?.edgeLift).toBeCloseTo((1 - Math.cos(0.4008 * 0.1)) / 0.4008, 5);
  });
});
