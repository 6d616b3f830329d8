/*
 * Plate, circular, central: spreadsheet of the deflection of a centrally loaded circular plate after Roark's formulas, author
 * not given, with a finite-element value beside each result. Read: radius 150 mm, thickness 1.50 mm, E = 200 GPa, ν = 0.29,
 * load 314 N; simply supported 5.854 mm, by finite elements 5.787 mm.
 *
 *   w     deflection                            m
 *   W     load at the centre                    N
 */
import { describe, expect, it } from "vitest";
import { gravitySag } from "#app/engine/gravity/gravity-sag.ts";

describe("centrally loaded circular plate, simply supported", () => {
  it("314 N bend it by 5.854 mm", () => {
    // A plate that weighs 314 N: on a point under its centre its rim droops by the deflection of that load less the sag of its
    // own weight on a ring, so that the two sags add up to the deflection of a central load.
    const [radius, thickness, load] = [0.15, 1.5e-3, 314];
    const plate = {
      radius,
      thickness,
      youngsModulus: 200e9,
      poissonsRatio: 0.29,
      gravity: 100,
      density: load / (100 * Math.PI * radius ** 2 * thickness),
    };
    const ring = gravitySag({ ...plate, support: { kind: "edge-ring" } });
    const point = gravitySag({ ...plate, support: { kind: "centre-point" } });
    const deflection = ring.peakToValley + point.peakToValley;
    // The sheet found its load from a stress and rounded it to 314 N afterwards: its formula gives 5.837 mm for that (0.3 %).
    expect(Math.abs(deflection / 5.854e-3 - 1)).toBeLessThan(0.005);
    // Its finite elements lie 1.1 % below its own formula; half of that again as margin.
    expect(Math.abs(deflection / 5.787e-3 - 1)).toBeLessThan(0.015);
  });
});
