/*
 * Small print of the thickness budget, bump cover, strength table and directional layers. SI throughout.
 *
 *   t     thickness variation, highest less lowest     m
 */
import { describe, expect, it } from "vitest";
import {
  bumpCover,
  EQUATIONS,
  gravitySag,
  solveDirectionalLaminate,
  solveLaminate,
  SOURCES,
  STRENGTH_DATA,
  siliconBiaxialModulus,
  thicknessBudget,
} from "#app/engine/index.ts";
import { siliconPlaneStiffness, turnStiffness } from "#app/engine/directional/plane-stiffness.ts";

describe("thickness budget", () => {
  const contributions = [
    { name: "carrier", variation: 1.0e-6 },
    { name: "adhesive", variation: 1.5e-6 },
    { name: "grinding", variation: 0.8e-6 },
  ];

  it("carrier 1.0, adhesive 1.5, grinding 0.8 µm on 30 µm of silicon: 3.3 linear, 2.0 together, of 3.0 allowed", () => {
    const budget = thicknessBudget({ contributions, finalThickness: 30e-6 });
    expect(budget.linear).toBeCloseTo(3.3e-6, 15);
    expect(budget.rootSumSquare).toBeCloseTo(Math.sqrt(1 + 2.25 + 0.64) * 1e-6, 15);
    expect(budget.allowed).toBeCloseTo(3e-6, 15);
    expect(budget.governedBy).toBe("final thickness");
    expect(budget.linearShare).toBeCloseTo(1.1, 12);
    expect(budget.shares.map(({ name }) => name)).toEqual(["carrier", "adhesive", "grinding"]);
  });

  it("vias that stand out by less govern", () => {
    const budget = thicknessBudget({ contributions, finalThickness: 50e-6, viaProtrusion: 2e-6 });
    expect(budget.allowed).toBe(2e-6);
    expect(budget.governedBy).toBe("via protrusion");
    expect(thicknessBudget({ contributions, finalThickness: 15e-6, viaProtrusion: 2e-6 }).governedBy).toBe(
      "final thickness",
    );
  });

  it("knows no share of nothing", () => {
    const budget = thicknessBudget({ contributions: [{ name: "carrier", variation: 0 }], finalThickness: 50e-6 });
    expect(budget).toMatchObject({ linear: 0, rootSumSquare: 0, shares: [{ name: "carrier", share: 0 }] });
  });
});

describe("bump cover", () => {
  it("35 µm under 50 µm is 0.70 with 15 µm left; 60 µm stands out", () => {
    const { ratio, left } = bumpCover({ bumpHeight: 35e-6, adhesiveThickness: 50e-6 });
    expect(ratio).toBeCloseTo(0.7, 12);
    expect(left).toBeCloseTo(15e-6, 15);
    expect(bumpCover({ bumpHeight: 60e-6, adhesiveThickness: 50e-6 }).left).toBeLessThan(0);
  });
});

describe("strength table", () => {
  it("names a source for each entry, ranges the right way round, and says where nobody published", () => {
    for (const { characteristicStrength, weibullModulus, source, gain, note } of STRENGTH_DATA) {
      expect(SOURCES).toHaveProperty(source);
      for (const range of [characteristicStrength, weibullModulus]) {
        if (range) expect(range[0]).toBeLessThanOrEqual(range[1]);
      }
      expect(characteristicStrength !== null || gain !== undefined).toBe(true);
      if (source === "common-practice") expect(note).toBeTruthy();
    }
  });
});

describe("silicon (001) in the plane", () => {
  it("turned by 45° from <100> it is itself along <110>", () => {
    const [turned, along] = [turnStiffness(siliconPlaneStiffness("100"), Math.PI / 4), siliconPlaneStiffness("110")];
    for (const part of ["xx", "xy", "yy", "ss"] as const) expect(turned[part] / along[part]).toBeCloseTo(1, 12);
    expect(Math.abs(turned.xs)).toBeLessThan(1e-4 * along.xx);
  });

  it("keeps its biaxial modulus in every direction", () => {
    for (const angle of [0, 0.3, 1, 2]) {
      const { xx, xy, yy } = turnStiffness(siliconPlaneStiffness("110"), angle);
      expect((xx + 2 * xy + yy) / 2 / siliconBiaxialModulus("100")).toBeCloseTo(1, 12);
    }
  });

  it("under an equal film curves like an isotropic wafer of that modulus, and more along <100> under lines", () => {
    const film = { thickness: 1e-6, youngsModulus: 70e9, poissonsRatio: 0.2, stress: 1e8 };
    const isotropic = {
      thickness: 2e-4,
      youngsModulus: 130.02e9,
      poissonsRatio: 1 - 130.02e9 / siliconBiaxialModulus("100"),
    };
    const equal = solveDirectionalLaminate([{ thickness: 2e-4, silicon: { direction: "100" } }, film]);
    const plain = solveLaminate([isotropic, film]);
    expect(equal.curvatureX / plain.curvature).toBeCloseTo(1, 4);
    const lines = { ...film, pattern: { kind: "lines" as const, coverage: 0.5, lineWidth: 1e-7, direction: 0 } };
    const along = (direction: "100" | "110") =>
      solveDirectionalLaminate([{ thickness: 2e-4, silicon: { direction } }, lines]).curvatureX;
    expect(along("100")).toBeGreaterThan(along("110"));
  });
});

describe("own weight", () => {
  it("of a 300 mm wafer of 775 µm: which supports are small deflections, which bound is known", () => {
    const wafer = { radius: 0.15, thickness: 775e-6, youngsModulus: 151.3e9, poissonsRatio: 0.1605, density: 2329 };
    const ring = gravitySag({ ...wafer, support: { kind: "edge-ring" } });
    expect(ring).toMatchObject({ linearValid: true, rms: null });
    expect(ring.centre).toBeLessThan(0);
    const cup = gravitySag({ ...wafer, thickness: 100e-6, support: { kind: "centre-cup", radius: 0.02 } });
    expect(cup).toMatchObject({ linearValid: false, largeDeflection: null, centre: 0 });
    expect(cup.rimLow).toBeLessThan(0);
    const fork = gravitySag({ ...wafer, thickness: 100e-6, support: { kind: "rails", halfSpacing: 0.1 } });
    expect(fork.largeDeflection?.low).toBeCloseTo(0.6 * fork.peakToValley, 12);
  });

  it("has an equation for each support", () => {
    for (const kind of ["edge-ring", "ring", "points", "centre-point", "centre-cup", "rails"]) {
      expect(EQUATIONS).toHaveProperty(`sag-${kind}`);
    }
  });
});
