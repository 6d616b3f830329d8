/* Bad input throws EngineInputError with the name of the field, and nothing returns NaN. SI throughout. */
import { describe, expect, it } from "vitest";
import { EngineInputError } from "#app/engine/errors.ts";
import { layerFreeStrain } from "#app/engine/laminate/free-strain.ts";
import type { Layer } from "#app/engine/laminate/layer.ts";
import { mismatchStress } from "#app/engine/laminate/mismatch-stress.ts";
import { solveLaminate } from "#app/engine/laminate/solve-laminate.ts";
import { thermalStrain } from "#app/engine/laminate/thermal-strain.ts";
import { criticalFilmForce } from "#app/engine/plate/critical-load.ts";
import { freeWaferShape } from "#app/engine/plate/free-wafer-shape.ts";
import { cubicBiaxialModulus, siliconBiaxialModulus } from "#app/engine/silicon/biaxial-modulus.ts";
import { siliconStiffness } from "#app/engine/silicon/elastic-constants.ts";
import { siliconExpansion, siliconThermalStrain } from "#app/engine/silicon/expansion.ts";
import { siliconPlateConstants } from "#app/engine/silicon/plane-constants.ts";
import { bowFromCurvature, standardBow } from "#app/engine/stoney/bow.ts";
import { filmForce } from "#app/engine/stoney/film-force.ts";
import { stoneyCurvature, stoneyStress } from "#app/engine/stoney/stoney.ts";
import { combineUncertainty } from "#app/engine/uncertainty/combine.ts";
import { relative } from "../relative.ts";

const film = { filmThickness: 1e-6, substrateThickness: 725e-6, biaxialModulus: 180e9 };
const wafer: Layer = { thickness: 725e-6, youngsModulus: 130e9, poissonsRatio: 0.2786, cte: "silicon" };
const metal: Layer = { thickness: 5e-6, youngsModulus: 117e9, poissonsRatio: 0.34, stress: 1e8, cte: 16.7e-6 };
const plate = { radius: 0.15, thickness: 100e-6, youngsModulus: 130e9, poissonsRatio: 0.28 };

const refusals: [string, () => unknown][] = [
  ["filmThickness", () => stoneyCurvature({ ...film, filmStress: 1e8, filmThickness: 0 })],
  ["filmThickness", () => stoneyStress({ ...film, curvatureChange: 0.01, filmThickness: -1e-6 })],
  ["substrateThickness", () => stoneyCurvature({ ...film, filmStress: 1e8, substrateThickness: Number.NaN })],
  ["biaxialModulus", () => stoneyCurvature({ ...film, filmStress: 1e8, biaxialModulus: Infinity })],
  ["filmStress", () => stoneyCurvature({ ...film, filmStress: Number.NaN })],
  ["curvatureChange", () => stoneyStress({ ...film, curvatureChange: Number.NaN })],
  ["curvature", () => bowFromCurvature({ curvature: Number.NaN, radius: 0.15 })],
  ["radius", () => bowFromCurvature({ curvature: 1, radius: 0 })],
  ["sagitta", () => standardBow(Number.NaN)],
  ["coverage", () => filmForce({ stress: 1e8, thickness: 1e-6, coverage: 1.1 })],
  ["temperature", () => siliconExpansion(100)],
  ["from", () => siliconThermalStrain(100, 300)],
  ["to", () => siliconThermalStrain(300, 1600)],
  ["temperature", () => siliconBiaxialModulus("100", 1100)],
  ["temperature", () => siliconStiffness(Number.NaN)],
  // What JavaScript callers may pass.
  ["orientation", () => siliconBiaxialModulus(JSON.parse('"110"'))],
  ["orientation", () => siliconPlateConstants(JSON.parse('"110"'))],
  ["orientation", () => cubicBiaxialModulus(JSON.parse("null"), siliconStiffness())],
  ["layers", () => solveLaminate([])],
  ["layers", () => solveLaminate([{ ...wafer, coverage: 0 }])],
  ["layers[1].thickness", () => solveLaminate([wafer, { ...metal, thickness: 0 }])],
  ["layers[0].youngsModulus", () => solveLaminate([{ ...wafer, youngsModulus: -1 }])],
  ["layers[0].poissonsRatio", () => solveLaminate([{ ...wafer, poissonsRatio: 0.5 }])],
  ["layers[1].stress", () => solveLaminate([wafer, { ...metal, stress: { x: 1e8, y: 0 } }])],
  ["layers[1].stress.y", () => solveLaminate([wafer, { ...metal, stress: { x: 1e8, y: Number.NaN } }])],
  ["layers[1].coverage", () => solveLaminate([wafer, { ...metal, coverage: -0.1 }])],
  ["layers[1].cte", () => solveLaminate([wafer, { ...metal, cte: 1 }])],
  ["layers[1].cte", () => solveLaminate([wafer, { ...metal, cte: JSON.parse('"copper"') }])],
  ["layers[1].cte", () => solveLaminate([wafer, { ...metal, cte: undefined }], { temperature: 400 })],
  ["layers[1].cte", () => solveLaminate([wafer, { ...metal, cte: () => Number.NaN }], { temperature: 400 })],
  ["layers[1].plasticStrain", () => solveLaminate([wafer, { ...metal, plasticStrain: Infinity }])],
  ["layers[1].referenceTemperature", () => solveLaminate([wafer, { ...metal, referenceTemperature: -1 }])],
  ["temperature", () => solveLaminate([wafer], { temperature: 0 })],
  ["to", () => solveLaminate([wafer], { temperature: 1600 })],
  ["youngsModulus", () => mismatchStress({ ...metal, cte: 1e-6, youngsModulus: 0, from: 300, to: 400 })],
  ["thickness", () => freeWaferShape({ ...plate, thickness: 0.031, linearCurvature: 1 })],
  ["poissonsRatio", () => freeWaferShape({ ...plate, poissonsRatio: -0.1, linearCurvature: 1 })],
  ["linearCurvature", () => freeWaferShape({ ...plate, linearCurvature: Number.NaN })],
  ["linearCurvature.y", () => freeWaferShape({ ...plate, linearCurvature: { x: 1, y: Number.NaN } })],
  ["crystal", () => freeWaferShape({ ...plate, linearCurvature: 1, crystal: JSON.parse('"110"') })],
  ["radius", () => criticalFilmForce({ ...plate, radius: -0.15 })],
  ["a.standardUncertainty", () => combineUncertainty([{ input: "a", sensitivity: 1, standardUncertainty: -1 }])],
];

describe("refusals", () => {
  it.each(refusals)("%s", (field, act) => {
    let thrown: unknown = null;
    try {
      act();
    } catch (error) {
      thrown = error;
    }
    expect(thrown).toBeInstanceOf(EngineInputError);
    expect(thrown).toMatchObject({ field });
  });
});

describe("small print", () => {
  it("standardBow turns the sign and knows no negative zero", () => {
    expect(standardBow(1e-4)).toBe(-1e-4);
    expect(Object.is(standardBow(0), 0)).toBe(true);
    expect(Object.is(standardBow(-0), 0)).toBe(true);
  });

  it("an arc beyond half a turn keeps the height of the roll", () => {
    expect(bowFromCurvature({ curvature: 30, radius: 0.15, exact: true })).toBeCloseTo(2 / 30, 15);
    expect(bowFromCurvature({ curvature: -30, radius: 0.15, exact: true })).toBeCloseTo(-2 / 30, 15);
    expect(bowFromCurvature({ curvature: 0, radius: 0.15, exact: true })).toBe(0);
  });

  it("silicon's plate constants keep the biaxial modulus of their face", () => {
    for (const orientation of ["100", "111"] as const) {
      const { youngsModulus, poissonsRatio } = siliconPlateConstants(orientation);
      expect(relative(youngsModulus / (1 - poissonsRatio), siliconBiaxialModulus(orientation))).toBeLessThan(1e-14);
    }
    // Rounded as they are usually quoted.
    expect(siliconPlateConstants("100").youngsModulus / 1e9).toBeCloseTo(151.3, 1);
    expect(siliconPlateConstants("100").poissonsRatio).toBeCloseTo(0.1605, 4);
    expect(siliconPlateConstants("111").youngsModulus / 1e9).toBeCloseTo(169.0, 1);
    expect(siliconPlateConstants("111").poissonsRatio).toBeCloseTo(0.262, 3);
  });

  it("silicon softens by 9.3e-5 per kelvin in its biaxial modulus", () => {
    const slope = (siliconBiaxialModulus("100", 299.15) / siliconBiaxialModulus("100", 298.15) - 1) / 1;
    expect(relative(slope, -9.32e-5)).toBeLessThan(1e-3);
  });
});

describe("thermal strain", () => {
  it("of a function is its integral, kinks and all", () => {
    expect(
      relative(thermalStrain(siliconExpansion, 298.15, 523.15), siliconThermalStrain(298.15, 523.15)),
    ).toBeLessThan(1e-9);
    const kinked = (t: number) => (t < 423.37 ? 60e-6 : 190e-6);
    const exact = 60e-6 * (423.37 - 300) + 190e-6 * (500 - 423.37);
    expect(relative(thermalStrain(kinked, 300, 500), exact)).toBeLessThan(1e-6);
    expect(relative(thermalStrain(kinked, 500, 300), -exact)).toBeLessThan(1e-6);
  });
});

describe("layerFreeStrain", () => {
  it("counts the base to the layer's reference temperature, then the layer itself", () => {
    const bonded = { ...metal, stress: 0, referenceTemperature: 423.15 };
    const expected = siliconThermalStrain(298.15, 423.15) + 16.7e-6 * (298.15 - 423.15);
    expect(relative(layerFreeStrain(bonded, wafer, 298.15), expected)).toBeLessThan(1e-12);
    // At its reference temperature the layer is as long as the base there, whatever its own expansion.
    expect(relative(layerFreeStrain(bonded, wafer, 423.15), siliconThermalStrain(298.15, 423.15))).toBeLessThan(1e-12);
    // A carrier needs no expansion of its own at the bonding temperature.
    expect(layerFreeStrain({ ...bonded, cte: undefined }, wafer, 423.15)).toBe(siliconThermalStrain(298.15, 423.15));
  });

  it("takes stress off and plastic strain on", () => {
    const modulus = 117e9 / 0.66;
    expect(relative(layerFreeStrain(metal, wafer, 298.15), -1e8 / modulus)).toBeLessThan(1e-14);
    expect(
      relative(layerFreeStrain({ ...metal, plasticStrain: 5e-4 }, wafer, 298.15), 5e-4 - 1e8 / modulus),
    ).toBeLessThan(1e-12);
    // Plastic strain that equals the stress over the modulus relaxes the film.
    expect(Math.abs(layerFreeStrain({ ...metal, plasticStrain: 1e8 / modulus }, wafer, 298.15))).toBeLessThan(1e-18);
  });

  it("needs the base's expansion when the reference temperature is another one", () => {
    expect(() => layerFreeStrain({ ...metal, referenceTemperature: 400 }, { ...wafer, cte: undefined }, 400)).toThrow(
      /base\.cte/,
    );
  });
});

describe("the base", () => {
  it("is silicon where there is any, else the thickest layer", () => {
    const glass: Layer = { thickness: 1e-3, youngsModulus: 74e9, poissonsRatio: 0.22, cte: 3e-6 };
    const onSilicon = solveLaminate([glass, { ...wafer, thickness: 50e-6 }], { temperature: 400 });
    expect(onSilicon.freeStrain[1]).toBe(siliconThermalStrain(298.15, 400));
    const bonded = { ...metal, referenceTemperature: 400, stress: 0 };
    const onGlass = solveLaminate([glass, bonded], { temperature: 400 });
    expect(relative(onGlass.freeStrain[1], 3e-6 * (400 - 298.15))).toBeLessThan(1e-12);
  });
});
