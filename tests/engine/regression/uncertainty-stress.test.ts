/*
 * Film stress from a change of curvature with its uncertainty, worked out for this program by the law of propagation (JCGM
 * 100:2008, equation 10) and by a million draws in NumPy. No printed values.
 *
 *   M        biaxial modulus of the wafer     Pa
 *   h        wafer thickness                  m
 *   h_f      film thickness                   m
 *   Δκ       change of curvature              1/m
 *   σ        film stress, u its uncertainty   Pa
 */
import { describe, expect, it } from "vitest";
import { stoneyStress } from "#app/engine/stoney/stoney.ts";
import { firstOrderUncertainty } from "#app/engine/uncertainty/first-order.ts";
import type { UncertainQuantity } from "#app/engine/uncertainty/quantity.ts";
import { sampleUncertainty } from "#app/engine/uncertainty/sample-uncertainty.ts";
import { relative } from "../relative.ts";

const inputs = [
  ["biaxial modulus", 180.216e9, 1.80216e9],
  ["wafer thickness", 725e-6, 1.5e-6],
  ["film thickness", 1e-6, 0.01e-6],
  ["change of curvature", 0.01, 0.000282855],
].map(([name, value, standard]): UncertainQuantity => ({
  name: String(name),
  value: Number(value),
  distribution: "normal",
  standard: Number(standard),
}));

const model = ([biaxialModulus = 0, substrateThickness = 0, filmThickness = 0, curvatureChange = 0]: Float64Array) =>
  stoneyStress({ biaxialModulus, substrateThickness, filmThickness, curvatureChange });

describe("stress of a monitor wafer's film", () => {
  it("has the budget worked out by hand", () => {
    const found = firstOrderUncertainty({ model, inputs });
    // The values are kept to 4 digits.
    expect(relative(found.value, 157.877e6)).toBeLessThan(1e-5);
    expect(relative(found.standardUncertainty, 5.035e6)).toBeLessThan(2e-4);
    expect(found.lines.map(({ input }) => input)[0]).toBe("change of curvature");
    expect(found.lines.map(({ contribution }) => Math.abs(contribution / found.value) * 100)).toEqual(
      [2.83, 1, 1, 0.41].map((share) => expect.closeTo(share, 2)),
    );
    expect(found.linear).toBe(true);
  });

  it("has the mean and uncertainty of the draws", () => {
    const found = sampleUncertainty({ model, inputs, draws: 2 ** 14, seed: 1, method: "lattice" });
    // A million plain draws leave the mean open by 0.005 MPa and the uncertainty by 0.0036 MPa; kept to 0.01 and 0.001 MPa.
    expect(Math.abs(found.mean - 157.9e6)).toBeLessThan(0.015e6);
    expect(Math.abs(found.standardUncertainty - 5.036e6)).toBeLessThan(0.03e6);
  });
});
