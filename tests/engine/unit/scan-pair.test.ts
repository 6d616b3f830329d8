/*
 *   κ    curvature, positive for a bowl   1/m
 *   R    wafer radius                     m
 *   h    silicon thickness                m
 */
import { describe, expect, it } from "vitest";
import { commonPoints } from "#app/engine/profile/common-points.ts";
import { fitProfile } from "#app/engine/profile/fit-profile.ts";
import { fittedHeight, levelHeight } from "#app/engine/profile/fitted-height.ts";
import { smallDeflection } from "#app/engine/profile/small-deflection.ts";
import { criticalLinearCurvature } from "#app/engine/plate/critical-load.ts";
import { freeWaferShape } from "#app/engine/plate/free-wafer-shape.ts";
import { siliconPlateConstants } from "#app/engine/silicon/plane-constants.ts";

const line = (from: number, to: number, count: number, z: (x: number) => number) =>
  Array.from({ length: count }, (_, n) => from + ((to - from) * n) / (count - 1)).map((x) => ({ x, z: z(x) }));

describe("height on a fit", () => {
  it("gives back a tilted, lifted parabola, inside and outside the stretch that was fitted", () => {
    const parabola = (x: number) => 3e-6 + 2e-4 * (x - 0.02) + 0.005 * (x - 0.02) ** 2;
    const fit = fitProfile(line(-0.08, 0.1, 91, parabola), { edgeExclusion: 0.005 });
    expect(fit.centre).toBeCloseTo(0.01, 12);
    expect(fit.offset).toBeCloseTo(parabola(0.01), 14);
    for (const x of [-0.08, -0.03, 0.01, 0.06, 0.1])
      expect(Math.abs(fittedHeight(fit, x) - parabola(x))).toBeLessThan(1e-15);
  });

  it("gives back a circle where the scan is steep, its middle aside", () => {
    const radius = 0.5;
    const circle = (x: number) => radius - Math.sqrt(radius * radius - (x - 0.03) ** 2);
    const fit = fitProfile(line(-0.1, 0.1, 101, circle), { edgeExclusion: 0 });
    expect(fit.steep).toBe(true);
    expect(fit.curvature).toBeCloseTo(1 / radius, 9);
    for (const x of [-0.1, 0, 0.07]) expect(Math.abs(fittedHeight(fit, x) - circle(x))).toBeLessThan(1e-12);
  });

  it("is level at the middle once its straight part is taken away", () => {
    const fit = fitProfile(
      line(-0.1, 0.1, 101, (x) => 0.004 * x * x + 1e-4 * x + 7e-6),
      { edgeExclusion: 0 },
    );
    expect(fittedHeight(fit, 0) - levelHeight(fit, 0)).toBeCloseTo(0, 16);
    expect(fittedHeight(fit, 0.05) - levelHeight(fit, 0.05)).toBeCloseTo(0.004 * 0.05 * 0.05, 12);
  });
});

describe("points that two scans share", () => {
  it("are those of the first within the second, the second interpolated", () => {
    const pairs = commonPoints(
      line(-2, 2, 5, () => 1),
      line(-1.5, 1.5, 4, (x) => x),
    );
    expect(pairs).toEqual([
      { x: -1, before: 1, after: -1 },
      { x: 0, before: 1, after: 0 },
      { x: 1, before: 1, after: 1 },
    ]);
  });

  it("come in order, however the scans ran", () => {
    const pairs = commonPoints(
      line(1, -1, 3, () => 0),
      line(1, -1, 3, (x) => 2 * x),
    );
    expect(pairs.map(({ x, after }) => [x, after])).toEqual([
      [-1, -2],
      [0, 0],
      [1, 2],
    ]);
  });

  it("must exist", () => {
    expect(() =>
      commonPoints(
        line(0, 1, 9, () => 0),
        line(2, 3, 9, () => 0),
      ),
    ).toThrow(/does not overlap/);
  });
});

describe("small deflections of a monitor", () => {
  const wafer = { radius: 0.1, thickness: 725e-6, orientation: "100" } as const;
  const plate = { radius: 0.1, thickness: 725e-6, ...siliconPlateConstants("100"), crystal: "100" } as const;

  it("the inverse of the free wafer's shape: what a film of known force shows is traced back to it", () => {
    const linearCurvature = 0.6 * criticalLinearCurvature(plate);
    const after = freeWaferShape({ ...plate, linearCurvature }).parabolaCurvatureMajor;
    const { understatedBy } = smallDeflection({ ...wafer, before: 0, after });
    expect(understatedBy).toBeCloseTo(linearCurvature / after - 1, 9);
    expect(understatedBy).toBeGreaterThan(0.1);
  });

  it("vanish with the square of the curvature", () => {
    const at = (after: number) => smallDeflection({ ...wafer, before: 0, after }).understatedBy ?? NaN;
    expect(at(0.002) / at(0.001)).toBeCloseTo(4, 2);
    expect(smallDeflection({ ...wafer, before: 0.01, after: 0.01 })).toEqual({ understatedBy: 0, curled: false });
  });

  it("do not depend on the sign", () => {
    const there = smallDeflection({ ...wafer, before: 0, after: 0.05 });
    expect(smallDeflection({ ...wafer, before: 0, after: -0.05 })).toEqual(there);
  });

  it("end where no bowl can hold the curvature, before the film or after it", () => {
    const onset = freeWaferShape({ ...plate, linearCurvature: criticalLinearCurvature(plate) * 0.999999 });
    const limit = onset.parabolaCurvatureMajor;
    expect(smallDeflection({ ...wafer, before: 0, after: limit * 0.99 }).curled).toBe(false);
    expect(smallDeflection({ ...wafer, before: 0, after: limit * 1.01 })).toEqual({
      understatedBy: null,
      curled: true,
    });
    expect(smallDeflection({ ...wafer, before: -limit * 1.01, after: 0 }).curled).toBe(true);
  });
});
