/*
 * W.-F. Chen, J. Y. R. Liew (editors), The Civil Engineering Handbook, second edition, CRC Press, 2003, page 47-50. Read.
 *
 *   w     deflection                            m
 *   q     load per area                         Pa
 *   a     radius of the plate                   m
 *   D     bending stiffness                     N·m
 *   ν     Poisson's ratio
 */
import { describe, expect, it } from "vitest";
import { ringProfile } from "#app/engine/gravity/axisymmetric-sag.ts";
import { gravitySag } from "#app/engine/gravity/gravity-sag.ts";

describe("simply supported circular plate under a uniform load, equation 47.75", () => {
  it("largest deflection (5 + ν) q a⁴/(64 (1 + ν) D): 0.0637019 at ν = 0.3", () => {
    const [radius, thickness, youngsModulus, density, gravity] = [0.15, 1e-3, 200e9, 7850, 10];
    const sag = gravitySag({
      radius,
      thickness,
      youngsModulus,
      poissonsRatio: 0.3,
      density,
      gravity,
      support: { kind: "edge-ring" },
    });
    const stiffness = (youngsModulus * thickness ** 3) / (12 * (1 - 0.3 ** 2));
    const unit = (density * gravity * thickness * radius ** 4) / stiffness;
    // The printed formula at ν = 0.3, seven decimals worked out from it.
    expect(-sag.centre / unit).toBeCloseTo(0.0637019, 7);
    expect(sag.peakToValley).toBeCloseTo(-sag.centre, 15);
    expect(sag.rimHigh).toBe(0);
  });

  it.each([0, 0.16, 0.3, 0.45])(
    "the whole profile, q (a² − r²)/(64 D) × ((5 + ν) a²/(1 + ν) − r²), at ν = %d",
    (nu) => {
      const profile = ringProfile(1, nu);
      for (const r of [0, 0.2, 0.5, 0.8, 0.95, 1]) {
        const printed = ((1 - r * r) / 64) * ((5 + nu) / (1 + nu) - r * r);
        // Two forms of one polynomial: rounding in double precision only.
        expect(-profile(r)).toBeCloseTo(printed, 15);
      }
    },
  );
});
