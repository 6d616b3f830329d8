/*
 * A die of a wafer's stack over temperature, against the laminate it is made of. No printed values.
 *
 *   κ     curvature, bowl positive     1/m
 *   a     edge                         m
 *   T     temperature                  K
 */
import { describe, expect, it } from "vitest";
import { dieAfterDicing } from "#app/engine/die/die-after-dicing.ts";
import { directionalAverage } from "#app/engine/directional/plane-stiffness.ts";
import { solveDirectionalLaminate } from "#app/engine/directional/solve-directional-laminate.ts";
import { solveLaminate } from "#app/engine/laminate/solve-laminate.ts";
import type { Layer } from "#app/engine/laminate/layer.ts";
import { criticalLinearCurvature } from "#app/engine/plate/critical-load.ts";
import { relative } from "../relative.ts";

const silicon: Layer = { thickness: 200e-6, youngsModulus: 151.3e9, poissonsRatio: 0.1605, cte: "silicon" };
const copper: Layer = {
  thickness: 5e-6,
  youngsModulus: 117e9,
  poissonsRatio: 0.34,
  cte: 16.7e-6,
  stress: 150e6,
  coverage: 0.4,
};
const stack = [silicon, copper];

describe("10 mm × 6 mm of 200 µm silicon with 5 µm of copper", () => {
  const { curve, worst } = dieAfterDicing({ layers: stack, length: 10e-3, width: 6e-3 });

  it("runs from 25 to 260 °C in steps of 5 K", () => {
    expect(curve).toHaveLength(48);
    expect(curve[0]?.temperature).toBe(298.15);
    expect(curve.at(-1)?.temperature).toBeCloseTo(533.15, 9);
  });

  it("at each temperature has the laminate's curvature: corner height κ (a² + b²)/8, which is its warp", () => {
    for (const { temperature, curvatureX, alongX, alongY, cornerSame, cornerOpposite, warp } of curve) {
      const { curvature } = solveLaminate(stack, { temperature });
      expect(Math.abs(curvatureX - curvature)).toBeLessThan(1e-12);
      expect(relative(alongX, (curvature * 10e-3 ** 2) / 8)).toBeLessThan(1e-9);
      expect(relative(alongY, (curvature * 6e-3 ** 2) / 8)).toBeLessThan(1e-9);
      expect(relative(cornerSame, (curvature * (10e-3 ** 2 + 6e-3 ** 2)) / 8)).toBeLessThan(1e-9);
      expect(cornerOpposite).toBe(cornerSame);
      expect(relative(warp, Math.abs(cornerSame))).toBeLessThan(1e-9);
    }
  });

  it("turns over on the way to reflow: copper pulls at 25 °C and pushes at 260", () => {
    expect(curve[0]?.curvatureX).toBeGreaterThan(0);
    expect(curve.at(-1)?.curvatureX).toBeLessThan(0);
    expect(worst.temperature).toBe(533.15);
    expect(worst.linearValid).toBe(true);
  });

  it("its critical size is that of the disc of equal area", () => {
    const { curvature, effectiveThickness } = solveLaminate(stack);
    const { poissonsRatio } = directionalAverage(solveDirectionalLaminate(stack).freeBendingStiffness);
    const edge = curve[0]?.criticalEdge ?? NaN;
    const critical = criticalLinearCurvature({
      radius: edge / Math.sqrt(Math.PI),
      thickness: effectiveThickness,
      youngsModulus: 151.3e9,
      poissonsRatio,
    });
    expect(relative(critical, curvature)).toBeLessThan(1e-9);
    // Copper on the outside lifts the ratio of the whole stack above the silicon's.
    expect(poissonsRatio).toBeGreaterThan(0.1605);
    expect(poissonsRatio).toBeLessThan(0.17);
    expect(curve[0]?.criticalShare).toBeCloseTo((10e-3 * 6e-3) / edge ** 2, 9);
  });
});
