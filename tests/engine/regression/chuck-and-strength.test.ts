/*
 * Flattening on a chuck, bending and Weibull statistics as worked out for this program by other means: a strip model, an
 * axisymmetric plate with one-sided contact, and plain arithmetic. No printed values.
 *
 *   κ, w      curvature as on the chuck, bow             1/m, m
 *   h, R      thickness, radius                          m
 *   M         biaxial modulus                            Pa
 *   p         pressure difference                        Pa
 *   m0        moment that flattens, M h³ κ/12            N
 *   L, lift   width of the rim that stands off, height   m
 *   ρ         radius of curvature                        m
 *   σ0, m     characteristic strength, Weibull modulus   Pa
 *   A, A0     area of the part, of the pieces tested     m²
 */
import { describe, expect, it } from "vitest";
import { chuckFlattening } from "#app/engine/chuck/chuck-flattening.ts";
import { flatChuckStress } from "#app/engine/chuck/flat-chuck-stress.ts";
import { bendingStress, minimumBendRadius } from "#app/engine/strength/bending.ts";
import { designStress } from "#app/engine/strength/design-stress.ts";
import { failureProbability, scaledStrength } from "#app/engine/strength/weibull.ts";
import { relative } from "../relative.ts";

const full = { radius: 0.15, thickness: 775e-6, biaxialModulus: 180.216e9, poissonsRatio: 0.1605 };
const thin = { ...full, thickness: 100e-6 };
const curvatureOf = (bow: number) => (2 * bow) / 0.15 ** 2;

describe("300 mm of 775 µm with 0.5 mm of bow at 80 kPa", () => {
  const bowl = chuckFlattening({ ...full, curvature: curvatureOf(5e-4), vacuum: 80e3 });
  const dome = chuckFlattening({ ...full, curvature: curvatureOf(-5e-4), vacuum: 80e3 });

  it("bowl: the exact rim stands off 2.793 mm wide and 0.1012 µm high", () => {
    // Four digits written down from an independent solution of the same free boundary.
    expect(relative(bowl.rimLength, 2.793e-3)).toBeLessThan(2e-4);
    expect(relative(bowl.rimLift, 1.012e-7)).toBeLessThan(5e-4);
  });

  it("dome: the hump is 3.963 mm wide and 0.01432 µm high", () => {
    expect(relative(dome.rimLength, 3.963e-3)).toBeLessThan(2e-4);
    expect(relative(dome.rimLift, 1.432e-8)).toBeLessThan(5e-4);
  });

  it("a strip is close: L = sqrt(2 m0/p) = 2.787 mm, lift m0²/(2 p D) = 0.1002 µm, m0 = 0.3107 N", () => {
    const moment = (full.biaxialModulus * full.thickness ** 3 * curvatureOf(5e-4)) / 12;
    // Four digits written down.
    expect(relative(moment, 0.3107)).toBeLessThan(2e-4);
    const stiffness = (full.biaxialModulus * full.thickness ** 3) / (12 * 1.1605);
    expect(relative(Math.sqrt((2 * moment) / 80e3), 2.787e-3)).toBeLessThan(2e-4);
    expect(relative(moment ** 2 / (2 * 80e3 * stiffness), 1.002e-7)).toBeLessThan(5e-4);
    // What the round plate adds to the strip.
    expect(relative(bowl.rimLength, 2.787e-3)).toBeLessThan(0.003);
    expect(relative(bowl.rimLift, 1.002e-7)).toBeLessThan(0.015);
  });

  it("stress at the faces 3.1 MPa, pressures 86 Pa for the dome and 59 for the bowl; 1.8 and 1.3 at 100 µm and 5 mm", () => {
    // Two digits written down.
    expect(Math.abs(bowl.surfaceStress - 3.1e6)).toBeLessThan(5e4);
    expect(Math.abs(dome.pressureNeeded - 86)).toBeLessThan(0.5);
    expect(Math.abs(bowl.pressureNeeded - 59)).toBeLessThan(0.5);
    const at = (bow: number) => chuckFlattening({ ...thin, curvature: curvatureOf(bow), vacuum: 80e3 }).pressureNeeded;
    expect(Math.abs(at(-5e-3) - 1.84)).toBeLessThan(0.05);
    expect(Math.abs(at(5e-3) - 1.27)).toBeLessThan(0.05);
  });

  it("1 mm of bow: 3.94 mm wide by the strip, 0.40 µm high", () => {
    const twice = chuckFlattening({ ...full, curvature: curvatureOf(1e-3), vacuum: 80e3 });
    // Three and two digits written down for the strip; the plate adds 0.3 % and 1.5 %.
    expect(relative(twice.rimLength, 3.94e-3)).toBeLessThan(0.005);
    expect(relative(twice.rimLift, 0.4e-6)).toBeLessThan(0.025);
  });
});

describe("stresses while flat", () => {
  it("100 N/m of thin film on 100 µm: −1 MPa in the silicon, the monitor's stress in the film", () => {
    const film = { thickness: 1e-9, youngsModulus: 1e9, poissonsRatio: 0.3, stress: 100 / 1e-9 };
    const wafer = { thickness: 100e-6, youngsModulus: 130e9, poissonsRatio: 0.2785, cte: "silicon" as const };
    const flat = flatChuckStress([wafer, film]);
    // A film so thin and soft that its own stiffness does not count.
    expect(relative(flat.stress[0]?.x, -1e6)).toBeLessThan(1e-6);
    expect(relative(flat.stress[1]?.x, 1e11)).toBeLessThan(1e-6);
    // Free, the front carries −4 MPa and the back +2: flattening changes them by +3 and −3.
    expect(relative(flat.changeTop[0]?.x, 3e6)).toBeLessThan(2e-5);
    expect(relative(flat.changeBottom[0]?.x, -3e6)).toBeLessThan(2e-5);
  });
});

describe("bending", () => {
  it("50 µm at 150 MPa along <110>: 28.27 mm", () => {
    // Four digits written down, with E' rounded to 169.62 GPa.
    const radius = minimumBendRadius({ thickness: 50e-6, stress: 150e6, direction: "110" });
    expect(relative(radius, 0.02827)).toBeLessThan(2e-4);
  });

  it.each([
    [50e-6, 100e6, 42.4e-3],
    [50e-6, 300e6, 14.1e-3],
    [50e-6, 500e6, 8.5e-3],
    [100e-6, 100e6, 84.8e-3],
    [775e-6, 150e6, 438e-3],
  ])("%d m at %d Pa along <110>: %d m", (thickness, stress, radius) => {
    // Two to three digits written down.
    expect(relative(minimumBendRadius({ thickness, stress, direction: "110" }), radius)).toBeLessThan(3e-3);
  });

  it("E' is 169.6 GPa along <110>, 141.0 along <100>, 180.2 for a sphere", () => {
    const modulus = (direction: "100" | "110" | "biaxial") =>
      bendingStress({ thickness: 1e-4, radiusOfCurvature: 1, direction }) / 0.5e-4 / 1e9;
    // Four digits written down.
    expect(modulus("110")).toBeCloseTo(169.6, 1);
    expect(modulus("100")).toBeCloseTo(141.0, 1);
    expect(modulus("biaxial")).toBeCloseTo(180.2, 1);
  });
});

describe("Weibull", () => {
  const dies = { characteristicStrength: 500e6, weibullModulus: 6, referenceArea: 10e-6 };

  it("500 MPa on 10 mm² with m = 6 is 114.13 MPa on a 300 mm face, and 100 MPa breaks 36.389 % of them", () => {
    // Five digits written down.
    expect(relative(scaledStrength({ ...dies, area: 0.0706858 }), 114.13e6)).toBeLessThan(5e-5);
    expect(relative(failureProbability({ ...dies, area: 0.0706858, stress: 100e6 }), 0.36389)).toBeLessThan(2e-5);
  });
});

describe("design stress", () => {
  it("50 to 100 MPa with a ground edge, 150 relieved and trimmed, marked as common practice", () => {
    expect(designStress("ground")).toEqual({ low: 50e6, high: 100e6, source: "common-practice" });
    expect(designStress("relieved and trimmed")).toEqual({ low: 150e6, high: 150e6, source: "common-practice" });
  });
});
