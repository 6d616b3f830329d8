/*
 * Y. Okada, Y. Tokumaru, Precise determination of lattice parameter and thermal expansion coefficient of silicon between 300 and
 * 1500 K, Journal of Applied Physics 56 (1984) 314. The formula was read in the abstract; the values are that formula worked
 * out with a calculator's precision.
 *
 *   α  linear expansion coefficient   1/K
 *   T  temperature                    K
 */
import { describe, expect, it } from "vitest";
import { EngineInputError } from "#app/engine/errors.ts";
import { siliconExpansion } from "#app/engine/silicon/expansion.ts";

describe("Okada and Tokumaru 1984, abstract", () => {
  it.each([
    [300, 2.5681e-6],
    [400, 3.2119e-6],
    [500, 3.5941e-6],
    [600, 3.8311e-6],
    [700, 3.9874e-6],
    [800, 4.0989e-6],
    [1000, 4.2582e-6],
  ])("expansion at %d K", (temperature, expected) => {
    // Five digits written down: half a unit of the last is at most 2e-5 of the value.
    expect(Math.abs(siliconExpansion(temperature) / expected - 1)).toBeLessThan(2e-5);
  });

  it("is refused outside the range of the formula, 120 to 1500 K", () => {
    expect(siliconExpansion(120)).toBeLessThan(0.1e-6);
    expect(siliconExpansion(1500)).toBeGreaterThan(4.5e-6);
    expect(() => siliconExpansion(119.9)).toThrow(EngineInputError);
    expect(() => siliconExpansion(1500.1)).toThrow(EngineInputError);
  });
});
