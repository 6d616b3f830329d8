/*
 * Uncertainty of a fitted curvature and of a film stress, worked out for this program from the normal equations and from the law of
 * propagation (formula: JCGM 100:2008, 5.1.2, equation 10, read). No printed values.
 *
 *   L     length of the scan                        m
 *   N     number of points
 *   s     standard deviation of the heights         m
 *   u(κ)  standard uncertainty of the curvature     1/m
 */
import { describe, expect, it } from "vitest";
import { filmStressFromCurvature } from "#app/engine/profile/film-stress.ts";
import { fitProfile } from "#app/engine/profile/fit-profile.ts";
import { siliconBiaxialModulus } from "#app/engine/silicon/biaxial-modulus.ts";
import { relative } from "../relative.ts";

describe("uncertainty of a curvature", () => {
  it("801 points over 160 mm with 50 nm of scatter: 1.847e-6 1/m", () => {
    const [length, count, scatter] = [0.16, 801, 50e-9];
    // Heights alternate about zero; scaled so that the estimate with N − 3 degrees of freedom is the scatter itself.
    const size = scatter * Math.sqrt((count - 3) / count);
    const points = Array.from({ length: count }, (_, n) => ({
      x: (length * n) / (count - 1) - length / 2,
      z: n % 2 === 0 ? size : -size,
    }));
    const { standardUncertainty } = fitProfile(points, { edgeExclusion: 0 });
    // Four digits written down; the alternation is orthogonal to a parabola within 1/N.
    expect(relative(standardUncertainty, 1.847e-6)).toBeLessThan(5e-4);
  });
});

describe("uncertainty of a film stress", () => {
  it("M to 1 %, h to 1.5 µm, h_f to 10 nm, two curvatures to 2e-4 1/m", () => {
    const biaxialModulus = siliconBiaxialModulus("100");
    const { stress, standardUncertainty, budget } = filmStressFromCurvature({
      curvatureChange: 0.01,
      curvatureUncertainty: 0.000282855,
      filmThickness: 1e-6,
      substrateThickness: 725e-6,
      biaxialModulus,
      uncertainties: { biaxialModulus: 0.01 * biaxialModulus, substrateThickness: 1.5e-6, filmThickness: 1e-8 },
    });
    // Six and four digits written down.
    expect(relative(stress, 157.877e6)).toBeLessThan(4e-6);
    expect(relative(standardUncertainty, 5.035e6)).toBeLessThan(2e-4);
    const shares = Object.fromEntries(budget.map(({ input, contribution }) => [input, (contribution / stress) * 100]));
    expect(shares["curvature change"]).toBeCloseTo(2.83, 2);
    expect(shares["biaxial modulus"]).toBeCloseTo(1.0, 3);
    expect(shares["substrate thickness"]).toBeCloseTo(0.41, 2);
    expect(shares["film thickness"]).toBeCloseTo(1.0, 3);
  });
});
