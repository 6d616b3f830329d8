import { describe, expect, it } from "vitest";
import { ROOM_TEMPERATURE } from "#app/engine/laminate/layer.ts";
import { thermalStrain } from "#app/engine/laminate/thermal-strain.ts";
import type { Measured } from "#app/engine/measured.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { siliconBiaxialModulus } from "#app/engine/silicon/biaxial-modulus.ts";
import { cannotRelease, estimatePair, type PairInput } from "#app/lib/pair.ts";

/**
 * M biaxial modulus, Pa; h thickness, m; d distance of the mid-planes, m; e free strain of the carrier over that of silicon;
 * R radius of the wafer, m; bow: standard, device side up, centre above the plane is positive, m.
 */
const exact = (value: number, tolerance: number | null = null): Measured => ({ value, tolerance, source: "supplier" });
const celsius = (temperature: number) => temperature + 273.15;
const LIMITS = defaultLimits();

const MATERIAL: PairInput["material"] = {
  id: "b",
  name: "Laser-release adhesive",
  effectiveModulus: exact(0.15e9),
  poissonsRatio: exact(0.38),
  expansionBelow: exact(65e-6),
  expansionAbove: exact(180e-6),
  softening: exact(celsius(150)),
  flows: false,
  bondTemperature: exact(celsius(180)),
  temperatureLimit: exact(celsius(280)),
  release: "laser through glass",
  releaseTemperature: exact(celsius(25)),
};

const glass = (ppm: number, tolerance: number | null = null): PairInput["carrier"] => ({
  id: "c",
  name: "Glass carrier",
  material: "glass",
  thickness: exact(700e-6),
  diameter: 0.3,
  youngsModulus: exact(74e9),
  poissonsRatio: exact(0.22),
  expansion: exact(ppm * 1e-6, tolerance),
  temperatureLimit: exact(celsius(400)),
});

const SILICON: PairInput["carrier"] = {
  ...glass(0),
  name: "Silicon carrier",
  material: "silicon",
  thickness: exact(775e-6),
  youngsModulus: exact(130e9),
  poissonsRatio: exact(0.2786),
  expansion: null,
};

const pair = (carrier: PairInput["carrier"], siliconLeft: number | null = null, material = MATERIAL) =>
  estimatePair(
    {
      wafer: { name: "Silicon", diameter: 0.3, orientation: "100", thickness: exact(775e-6) },
      siliconLeft: siliconLeft === null ? null : exact(siliconLeft),
      carrier,
      material,
      bondThickness: exact(50e-6),
    },
    LIMITS,
  );

describe("a blank pair", () => {
  it("couples below its softening point, which is lower than its bond temperature", () => {
    expect(pair(glass(3)).locksAt).toBeCloseTo(celsius(150), 6);
  });

  it("agrees with two plates that a soft bond joins at the distance of their mid-planes, to 1 %", () => {
    // Independent of the laminate: force and moment balance of two plates. 1 %: up to there the shape counts as linear.
    const carrier = glass(3.05);
    const silicon = { h: 775e-6, M: siliconBiaxialModulus("100") };
    const plate = { h: 700e-6, M: 74e9 / (1 - 0.22) };
    const e =
      thermalStrain(3.05e-6, celsius(150), ROOM_TEMPERATURE) - thermalStrain("silicon", celsius(150), ROOM_TEMPERATURE);
    const d = 50e-6 + (silicon.h + plate.h) / 2;
    const stiffness = (silicon.M * silicon.h ** 3 + plate.M * plate.h ** 3) / 12;
    const curvature = (e * d) / (stiffness * (1 / (silicon.M * silicon.h) + 1 / (plate.M * plate.h)) + d * d);
    const sagitta = (Math.abs(curvature) * 0.15 ** 2) / 2;
    const { warp } = pair(carrier, null, { ...MATERIAL, effectiveModulus: exact(1e6) });
    expect(warp / sagitta).toBeGreaterThan(0.99);
    expect(warp / sagitta).toBeLessThan(1.01);
  });

  it("moves by 110 to 135 µm on 300 mm for 0.1 ppm/K of the carrier's expansion", () => {
    const { perTenthPpm } = pair(glass(3));
    expect(perTenthPpm).toBeGreaterThan(110e-6);
    expect(perTenthPpm).toBeLessThan(135e-6);
    const difference = Math.abs(pair(glass(3.05)).bow - pair(glass(2.95)).bow);
    expect(difference / (perTenthPpm ?? 0)).toBeCloseTo(1, 2);
  });

  it("lies edges down on a carrier that expands more than silicon, edges up on one that expands less", () => {
    expect(pair(glass(3.3))).toMatchObject({ lies: "edges down" });
    expect(pair(glass(2.6))).toMatchObject({ lies: "edges up" });
    // Back side up: edges down is a bowl seen device side up, whose centre is low.
    expect(pair(glass(3.3)).bow).toBeLessThan(0);
  });

  it("is flat at full thickness on a silicon carrier, and has no figure per ppm/K there", () => {
    const estimate = pair(SILICON);
    expect(estimate).toMatchObject({ lies: "flat", perTenthPpm: null });
    expect(estimate.warp).toBeLessThan(1e-9);
  });

  it("bows on a silicon carrier once it is thinned, from the bonding material alone", () => {
    expect(pair(SILICON, 50e-6).warp).toBeGreaterThan(10e-6);
  });

  it("takes its uncertainty from the carrier's expansion first", () => {
    const estimate = pair(glass(3, 0.1e-6));
    expect(estimate.budget[0]?.input).toContain("expansion");
    // A rectangular half-width of 0.1 ppm/K has a standard uncertainty of 0.1/√3.
    expect(estimate.uncertainty / ((estimate.perTenthPpm ?? 0) / Math.sqrt(3))).toBeCloseTo(1, 1);
  });
});

describe("letting go", () => {
  it.each([
    ["laser through glass", { material: "silicon", perforated: false }, "laser through glass"],
    ["laser through glass then peel", { material: "silicon", perforated: false }, "laser through glass"],
    ["solvent through perforated carrier", { material: "glass", perforated: false }, "not perforated"],
  ] as const)("by %s is refused where the carrier does not allow it", (release, carrier, words) => {
    expect(cannotRelease(release, carrier)).toContain(words);
  });

  it.each([
    ["laser through glass", { material: "glass", perforated: false }],
    ["solvent through perforated carrier", { material: "glass", perforated: true }],
    ["mechanical peel", { material: "silicon", perforated: false }],
    ["thermal slide", { material: "silicon", perforated: false }],
  ] as const)("by %s is not objected to otherwise", (release, carrier) => {
    expect(cannotRelease(release, carrier)).toBeNull();
  });
});
