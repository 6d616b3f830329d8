/*
 * Exercise statement, author not given: biaxial modulus of a zinc-blende epitaxial layer of orientation (hkl). Read. It gives
 *
 *   M(001) = C11 + C12 − 2 C12²/C11
 *   M(hkl) = (C11 + 2 C12)/2 × (3 − (C11 + 2 C12)/(C11 + 2 (2 C44 − C11 + C12) s)), s = l²m² + m²n² + n²l²
 *
 *   C11, C12, C44  elastic constants of silicon   165.64, 63.94, 79.51 GPa (silicon-properties-note)
 *   M              biaxial modulus                GPa
 */
import { describe, expect, it } from "vitest";
import { cubicBiaxialModulus, siliconBiaxialModulus } from "#app/engine/silicon/biaxial-modulus.ts";
import { siliconStiffness } from "#app/engine/silicon/elastic-constants.ts";

const [c11, c12, c44] = [165.64, 63.94, 79.51];

function general(s: number): number {
  const bulk = c11 + 2 * c12;
  return (bulk / 2) * (3 - bulk / (c11 + 2 * (2 * c44 - c11 + c12) * s));
}

describe("biaxial modulus of a cubic layer", () => {
  it("(001): the exercise's first formula, and its general one at s = 0", () => {
    const modulus = siliconBiaxialModulus("100") / 1e9;
    expect(modulus).toBeCloseTo(180.216, 3);
    // Two forms of one expression: rounding in double precision only.
    expect(modulus / general(0)).toBeCloseTo(1, 12);
  });

  it("(111): the general formula at s = 1/3 against the closed form in the engine", () => {
    const modulus = cubicBiaxialModulus("111", siliconStiffness()) / 1e9;
    expect(modulus).toBeCloseTo(228.9663, 4);
    expect(modulus / general(1 / 3)).toBeCloseTo(1, 12);
  });
});
