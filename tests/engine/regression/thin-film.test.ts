/*
 * Numbers worked out for this program with Stoney's formula in its biaxial form and with plate theory, not printed anywhere.
 *
 *   M    biaxial modulus of the wafer   Pa
 *   h    wafer thickness                m
 *   h_f  film thickness                 m
 *   σ    film stress                    Pa
 *   κ    curvature, bowl positive       1/m
 *   D    wafer diameter                 m
 */
import { describe, expect, it } from "vitest";
import { solveLaminate } from "#app/engine/laminate/solve-laminate.ts";
import { bowFromCurvature } from "#app/engine/stoney/bow.ts";
import { filmForce } from "#app/engine/stoney/film-force.ts";
import { stoneyCurvature, stoneyStress } from "#app/engine/stoney/stoney.ts";
import { mismatchStress } from "#app/engine/laminate/mismatch-stress.ts";
import { siliconThermalStrain } from "#app/engine/silicon/expansion.ts";
import { relative } from "../relative.ts";

describe("Stoney's formula forward", () => {
  it.each([
    { h: 775e-6, hf: 1e-6, stress: 100e6, D: 0.3, bow: 6.243496e-5 },
    { h: 675e-6, hf: 1e-7, stress: 100e6, D: 0.15, bow: 2.057613e-6 },
    { h: 380e-6, hf: 1e-7, stress: 500e6, D: 0.1, bow: 1.442752e-5 },
  ])("$D m wafer, $h m thick", ({ h, hf, stress, D, bow }) => {
    const film = { filmThickness: hf, substrateThickness: h, biaxialModulus: 180e9 };
    const curvature = stoneyCurvature({ ...film, filmStress: stress });
    // Seven digits written down.
    expect(relative(bowFromCurvature({ curvature, radius: D / 2 }), bow)).toBeLessThan(1e-6);
    expect(relative(stoneyStress({ ...film, curvatureChange: curvature }), stress)).toBeLessThan(1e-14);
  });

  it("radius of curvature of the first case", () => {
    const curvature = stoneyCurvature({
      filmStress: 100e6,
      filmThickness: 1e-6,
      substrateThickness: 775e-6,
      biaxialModulus: 180e9,
    });
    expect(relative(curvature, 0.005549774)).toBeLessThan(1e-6);
    expect(relative(1 / curvature, 180.1875)).toBeLessThan(1e-6);
  });
});

describe("plate theory", () => {
  it("silicon faces under a film force of 100 N/m on 100 µm: −4 and +2 MPa free", () => {
    // A film so thin and soft that only its force counts: its own stiffness is 1e-8 of the wafer's.
    const film = { thickness: 1e-9, youngsModulus: 1e9, poissonsRatio: 0, stress: 1e11 };
    const wafer = { thickness: 100e-6, youngsModulus: 180e9, poissonsRatio: 0 };
    expect(relative(filmForce({ stress: 1e11, thickness: 1e-9 }), 100)).toBeLessThan(1e-15);
    const { stressBottom, stressTop } = solveLaminate([wafer, film]);
    // The film's thickness shifts its lever by 1e-5 of the wafer's half thickness.
    expect(relative(stressTop[0], -4e6)).toBeLessThan(2e-5);
    expect(relative(stressBottom[0], 2e6)).toBeLessThan(2e-5);
  });
});

describe("arc", () => {
  it("sagitta of a 300 mm wafer rolled to a radius of 0.1 m", () => {
    const roll = { curvature: 10, radius: 0.15 };
    expect(relative(bowFromCurvature(roll), 0.1125)).toBeLessThan(1e-14);
    // Six digits written down.
    expect(relative(bowFromCurvature({ ...roll, exact: true }), 0.0929263)).toBeLessThan(1e-6);
  });
});

describe("thermal strain and stress", () => {
  it.each([
    [423.15, 372.2102e-6],
    [473.15, 543.1016e-6],
    [523.15, 722.4588e-6],
    [573.15, 908.4787e-6],
    [623.15, 1099.8175e-6],
  ])("silicon from 25 °C to %d K", (to, strain) => {
    // Seven digits written down.
    expect(relative(siliconThermalStrain(298.15, to), strain)).toBeLessThan(1e-7);
    expect(relative(siliconThermalStrain(to, 298.15), -strain)).toBeLessThan(1e-7);
  });

  it("aluminium on a wafer over 50 K of cooling", () => {
    const stress = mismatchStress({
      youngsModulus: 70e9,
      poissonsRatio: 0.33,
      cte: 20e-6,
      substrateCte: 0,
      from: 350,
      to: 300,
    });
    // Seven digits written down.
    expect(relative(stress, 104.4776e6)).toBeLessThan(1e-6);
    expect(Math.abs((140e6 / stress) * 50 - 67)).toBeLessThan(0.01);
  });

  it("thermal oxide from 1000 °C to 25 °C", () => {
    expect(relative(siliconThermalStrain(298.15, 1273.15), 0.00383007)).toBeLessThan(2e-6);
    const stress = mismatchStress({
      youngsModulus: 70e9,
      poissonsRatio: 0.17,
      cte: 0.55e-6,
      from: 1273.15,
      to: 298.15,
    });
    // Four digits written down.
    expect(relative(stress, -277.8e6)).toBeLessThan(2e-4);
  });
});
