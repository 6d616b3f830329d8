/*
 * N. Cheung, EE143 Microfabrication Technology, homework 12 with solutions, University of California, Berkeley, fall 2010.
 * Text of the solutions read.
 *
 *   σ    film stress                    Pa      tension positive
 *   h_f  film thickness                 m
 *   h    wafer thickness                m
 *   M    biaxial modulus E/(1 − ν)      Pa
 *   κ    curvature                      1/m     bowl positive
 *   r    radius of curvature, 1/κ       m
 */
import { describe, expect, it } from "vitest";
import { mismatchStress } from "#app/engine/laminate/mismatch-stress.ts";
import { stoneyCurvature, stoneyStress } from "#app/engine/stoney/stoney.ts";

const biaxialModulus = 190e9 / (1 - 0.272);

describe("EE143 homework 12", () => {
  it("problem 1(a): thermal stress of a film with 22 ppm/K of mismatch over 100 K", () => {
    // Printed 154 MPa with E in place of E/(1 − ν); with ν = 0 the two are the same formula. Exact product, printed in full.
    const stress = mismatchStress({
      youngsModulus: 70e9,
      poissonsRatio: 0,
      cte: 24.6e-6,
      substrateCte: 2.6e-6,
      from: 400,
      to: 300,
    });
    expect(stress / 154e6).toBeCloseTo(1, 9);
    // The biaxial film that the engine means carries 1/(1 − ν) more.
    const biaxial = mismatchStress({
      youngsModulus: 70e9,
      poissonsRatio: 0.33,
      cte: 24.6e-6,
      substrateCte: 2.6e-6,
      from: 400,
      to: 300,
    });
    expect(biaxial / (154e6 / 0.67)).toBeCloseTo(1, 9);
  });

  it("problem 1(b): radius of curvature under 1 µm at 154 MPa on 50 µm", () => {
    const curvature = stoneyCurvature({
      filmStress: 154e6,
      filmThickness: 1e-6,
      substrateThickness: 50e-6,
      biaxialModulus,
    });
    // Printed 0.7 m, one significant digit: half a unit of it is 0.05 m; the formula gives 0.706 m.
    expect(Math.abs(1 / curvature - 0.7)).toBeLessThan(0.05);
    expect(curvature).toBeGreaterThan(0);
  });

  it("problem 2(a): stress from the radii before and after deposition, 300 m and 200 m", () => {
    // The film lies on the outside of the bend: a dome, curvature negative, so the stress is compressive as printed.
    const stress = stoneyStress({
      curvatureChange: -1 / 200 - -1 / 300,
      filmThickness: 300e-9,
      substrateThickness: 500e-6,
      biaxialModulus,
    });
    // Printed 60.5 MPa; the formula gives 60.41: three digits printed, the last rounded along the way (0.2 %).
    expect(Math.abs(stress / -60.5e6 - 1)).toBeLessThan(0.003);
  });
});
