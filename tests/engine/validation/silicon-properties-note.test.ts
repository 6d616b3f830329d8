/*
 * Technical note of a wafer maker, Basic Mechanical and Thermal Properties of Silicon, without year. Read.
 *
 *   C11, C12, C44  elastic constants of the crystal   Pa
 *   α              linear expansion coefficient       1/K
 */
import { describe, expect, it } from "vitest";
import { siliconStiffness } from "#app/engine/silicon/elastic-constants.ts";
import { siliconExpansion } from "#app/engine/silicon/expansion.ts";

describe("Basic Mechanical and Thermal Properties of Silicon", () => {
  it("elastic constants at 25 °C, reference 6 of the note", () => {
    // The printed digits themselves.
    expect(siliconStiffness()).toEqual({ c11: 165.64e9, c12: 63.94e9, c44: 79.51e9 });
  });

  it("temperature coefficients of the elastic constants, first set", () => {
    const [at25, at125] = [siliconStiffness(), siliconStiffness(398.15)];
    // Two digits printed; the engine is linear in temperature, so only rounding in double precision remains.
    expect((at125.c11 / at25.c11 - 1) / 100).toBeCloseTo(-9.4e-5, 12);
    expect((at125.c12 / at25.c12 - 1) / 100).toBeCloseTo(-9.8e-5, 12);
    expect((at125.c44 / at25.c44 - 1) / 100).toBeCloseTo(-8.3e-5, 12);
  });

  it("recommended expansion at 25 °C, 2.59 ± 0.05 ppm/K", () => {
    // The printed uncertainty is the tolerance; Okada and Tokumaru's fit lies 1.4 % below the value.
    expect(Math.abs(siliconExpansion(298.2) - 2.59e-6)).toBeLessThan(0.05e-6);
  });
});
