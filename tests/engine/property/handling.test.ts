/*
 * What must hold on a chuck, in bending, for strength, for the thickness budget and for a die.
 *
 *   κ, w      curvature, height                          1/m, m
 *   p         pressure difference                        Pa
 *   σ         stress                                     Pa
 *   P         probability of failure
 *   t         thickness variation                        m
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { chuckFlattening } from "#app/engine/chuck/chuck-flattening.ts";
import { flatChuckStress } from "#app/engine/chuck/flat-chuck-stress.ts";
import { dieAfterDicing } from "#app/engine/die/die-after-dicing.ts";
import { dieShape } from "#app/engine/die/die-shape.ts";
import { bendingStress, minimumBendRadius } from "#app/engine/strength/bending.ts";
import { failureProbability, scaledStrength } from "#app/engine/strength/weibull.ts";
import { thicknessBudget } from "#app/engine/thickness-budget/thickness-budget.ts";
import { relative } from "../relative.ts";
import { anyLayer, between, logarithmic, siliconLayer } from "./arbitraries.ts";

const wafers = fc.record({
  radius: between(0.02, 0.225),
  thickness: logarithmic(20e-6, 1e-3),
  biaxialModulus: logarithmic(50e9, 250e9),
  poissonsRatio: between(0, 0.45),
});
/** Bow over radius. */
const slopes = logarithmic(1e-7, 1e-2);

describe("chuckFlattening", () => {
  it("tends to a strip where the rim that stands off is narrow", () => {
    fc.assert(
      fc.property(
        wafers,
        logarithmic(1e-6, 3e-3),
        fc.constantFrom(1, -1),
        logarithmic(1e-6, 1e-2),
        (wafer, narrow, sign, slope) => {
          const { radius, thickness, biaxialModulus, poissonsRatio } = wafer;
          const curvature = (2 * slope) / radius;
          const moment = (biaxialModulus * thickness ** 3 * curvature) / 12;
          const stiffness = (biaxialModulus * thickness ** 3) / (12 * (1 + poissonsRatio));
          const vacuum = (2 * moment) / (narrow * radius) ** 2;
          fc.pre(vacuum <= 1e7);
          const { rimLength, rimLift } = chuckFlattening({ ...wafer, curvature: sign * curvature, vacuum });
          const bowl = sign > 0;
          const strip = bowl
            ? { length: narrow * radius, lift: moment ** 2 / (2 * vacuum * stiffness) }
            : { length: Math.SQRT2 * narrow * radius, lift: (0.0703125 * moment ** 2) / (vacuum * stiffness) };
          // A plate departs from a strip by the first power of the width over the radius.
          expect(relative(rimLength, strip.length)).toBeLessThan(narrow + 1e-6);
          expect(relative(rimLift, strip.lift)).toBeLessThan(2 * narrow + 3e-4);
        },
      ),
    );
  });

  it("the lift falls with the pressure, from the gap without any, without a jump", () => {
    fc.assert(
      fc.property(wafers, slopes, fc.constantFrom(1, -1), logarithmic(1e-3, 1e3), (wafer, slope, sign, share) => {
        const curvature = (sign * 2 * slope) / wafer.radius;
        const at = (vacuum: number) => chuckFlattening({ ...wafer, curvature, vacuum });
        const { gap, pressureNeeded } = at(0);
        fc.pre(share * pressureNeeded * 1.001 < 1e7);
        expect(at(0).rimLift).toBeCloseTo(gap, 12);
        const [lift, next] = [at(share * pressureNeeded).rimLift, at(share * pressureNeeded * 1.001).rimLift];
        expect(lift).toBeLessThanOrEqual(gap * (1 + 1e-12));
        expect(lift).toBeGreaterThan(0);
        expect(next).toBeLessThanOrEqual(lift * (1 + 1e-9));
        expect(next).toBeGreaterThan(lift * 0.98);
      }),
    );
  });

  it("a flat wafer needs nothing", () => {
    fc.assert(
      fc.property(wafers, between(0, 1e5), (wafer, vacuum) => {
        expect(chuckFlattening({ ...wafer, curvature: 0, vacuum })).toEqual({
          gap: 0,
          pressureNeeded: 0,
          surfaceStress: 0,
          rimLift: 0,
          rimLength: 0,
        });
      }),
    );
  });

  it("finite for any legal wafer", () => {
    fc.assert(
      fc.property(wafers, between(-1e3, 1e3), between(0, 1e7), (wafer, curvature, vacuum) => {
        for (const value of Object.values(chuckFlattening({ ...wafer, curvature, vacuum }))) {
          expect(Number.isFinite(value)).toBe(true);
          expect(value).toBeGreaterThanOrEqual(0);
        }
      }),
    );
  });
});

describe("flatChuckStress", () => {
  it("balances forces", () => {
    fc.assert(
      fc.property(
        siliconLayer,
        fc.array(anyLayer, { minLength: 1, maxLength: 4 }),
        between(260, 600),
        (wafer, films, temperature) => {
          const layers = [wafer, ...films];
          const { stress } = flatChuckStress(layers, { temperature });
          const pulls = layers.map(({ thickness, coverage = 1 }, n) => coverage * thickness * (stress[n]?.x ?? NaN));
          const held = layers.reduce(
            (sum, { thickness, youngsModulus, poissonsRatio }) =>
              sum + (thickness * youngsModulus * 0.05) / (1 - poissonsRatio),
            0,
          );
          expect(Math.abs(pulls.reduce((sum, pull) => sum + pull, 0))).toBeLessThan(1e-12 * held);
        },
      ),
    );
  });
});

describe("bending", () => {
  it("the smallest radius is where the stress is reached; <110> is stiffer than <100>, a sphere more than both", () => {
    fc.assert(
      fc.property(logarithmic(5e-6, 1e-3), logarithmic(1e6, 1e9), (thickness, stress) => {
        for (const direction of ["100", "110", "biaxial"] as const) {
          const radiusOfCurvature = minimumBendRadius({ thickness, stress, direction });
          expect(relative(bendingStress({ thickness, radiusOfCurvature, direction }), stress)).toBeLessThan(1e-14);
        }
        const radius = (direction: "100" | "110" | "biaxial") => minimumBendRadius({ thickness, stress, direction });
        expect(radius("100")).toBeLessThan(radius("110"));
        expect(radius("110")).toBeLessThan(radius("biaxial"));
      }),
    );
  });
});

describe("Weibull", () => {
  const strengths = fc.record({
    characteristicStrength: logarithmic(1e7, 1e9),
    weibullModulus: between(2, 30),
    area: logarithmic(1e-6, 0.1),
    referenceArea: logarithmic(1e-6, 1e-3),
  });

  it("a part at its own characteristic strength breaks with 1 − 1/e", () => {
    fc.assert(
      fc.property(strengths, (strength) => {
        const probability = failureProbability({ ...strength, stress: scaledStrength(strength) });
        expect(relative(probability, 1 - Math.exp(-1))).toBeLessThan(1e-10);
      }),
    );
  });

  it("two halves survive together as the whole does", () => {
    fc.assert(
      fc.property(strengths, between(0.2, 1), (strength, share) => {
        const stress = share * scaledStrength(strength);
        const survives = (area: number) => 1 - failureProbability({ ...strength, area, stress });
        expect(relative(survives(strength.area / 2) ** 2, survives(strength.area))).toBeLessThan(1e-9);
      }),
    );
  });

  it("rises with stress and area, keeps its digits far below, and compression never breaks", () => {
    fc.assert(
      fc.property(strengths, between(0.01, 2), between(1.01, 3), (strength, share, more) => {
        const stress = share * strength.characteristicStrength;
        const at = (s: number, area = strength.area) => failureProbability({ ...strength, area, stress: s });
        expect(at(stress * more)).toBeGreaterThanOrEqual(at(stress));
        expect(at(stress, strength.area * more)).toBeGreaterThanOrEqual(at(stress));
        expect(at(stress)).toBeGreaterThanOrEqual(0);
        expect(at(stress)).toBeLessThanOrEqual(1);
        expect(at(-stress)).toBe(0);
        const small = at(strength.characteristicStrength * 1e-3);
        expect(small).toBeGreaterThan(0);
      }),
    );
  });
});

describe("thicknessBudget", () => {
  const budgets = fc.record({
    contributions: fc.array(fc.record({ name: fc.constant("part"), variation: logarithmic(1e-9, 1e-4) }), {
      minLength: 1,
      maxLength: 6,
    }),
    finalThickness: logarithmic(5e-6, 1e-3),
    viaProtrusion: fc.option(logarithmic(1e-7, 1e-5), { nil: undefined }),
  });

  it("the largest part is at most the root of squares, that at most the sum; shares add up to 1", () => {
    fc.assert(
      fc.property(budgets, (budget) => {
        const { linear, rootSumSquare, shares, allowed, linearShare, rootSumSquareShare, governedBy } =
          thicknessBudget(budget);
        const parts = budget.contributions.map(({ variation }) => variation);
        expect(rootSumSquare).toBeGreaterThanOrEqual(Math.max(...parts) * (1 - 1e-12));
        expect(linear).toBeGreaterThanOrEqual(rootSumSquare * (1 - 1e-12));
        expect(linear).toBeLessThanOrEqual(Math.sqrt(parts.length) * rootSumSquare * (1 + 1e-12));
        expect(shares.reduce((sum, { share }) => sum + share, 0)).toBeCloseTo(1, 12);
        expect(allowed).toBeLessThanOrEqual(budget.finalThickness / 10);
        expect(governedBy === "via protrusion").toBe(
          budget.viaProtrusion !== undefined && budget.viaProtrusion < budget.finalThickness / 10,
        );
        expect(relative(linearShare * allowed, linear)).toBeLessThan(1e-12);
        expect(relative(rootSumSquareShare * allowed, rootSumSquare)).toBeLessThan(1e-12);
      }),
    );
  });
});

describe("a die", () => {
  const curvatures = fc.oneof(between(-10, 10), fc.constant(0));
  const edges = between(1e-3, 30e-3);

  it("its warp is that of a fine grid of heights", () => {
    fc.assert(
      fc.property(curvatures, curvatures, curvatures, edges, edges, (curvatureX, curvatureY, twist, length, width) => {
        const { warp } = dieShape({ curvatureX, curvatureY, twist }, length, width);
        let [low, high] = [0, 0];
        for (let n = -40; n <= 40; n += 1) {
          for (let k = -40; k <= 40; k += 1) {
            const [x, y] = [(n * length) / 80, (k * width) / 80];
            const z = (curvatureX * x * x + curvatureY * y * y) / 2 + twist * x * y;
            [low, high] = [Math.min(low, z), Math.max(high, z)];
          }
        }
        const size = (Math.abs(curvatureX) + Math.abs(curvatureY) + Math.abs(twist)) * Math.max(length, width) ** 2;
        expect(warp).toBeGreaterThanOrEqual(high - low - 1e-12 * size);
        // A parabola between two points of the grid rises by (step/2)² κ/2.
        expect(warp).toBeLessThanOrEqual(high - low + (size / 80 ** 2) * 0.26 + 1e-12 * size);
      }),
    );
  });

  it("grows with the square of its edge, and its share of the critical load too", () => {
    fc.assert(
      fc.property(
        siliconLayer,
        anyLayer,
        edges,
        between(1.1, 2),
        between(300, 530),
        (wafer, film, edge, factor, temperature) => {
          const layers = [wafer, film];
          const at = (length: number) =>
            dieAfterDicing({ layers, length, width: length, temperatures: [temperature] }).worst;
          const [one, larger] = [at(edge), at(edge * factor)];
          fc.pre(one.warp > 0);
          expect(relative(larger.warp, factor ** 2 * one.warp)).toBeLessThan(1e-9);
          expect(relative(larger.criticalShare, factor ** 2 * one.criticalShare)).toBeLessThan(1e-9);
          expect(relative(larger.criticalEdge ?? NaN, one.criticalEdge ?? NaN)).toBeLessThan(1e-12);
        },
      ),
    );
  });

  it("of bare silicon is flat at any temperature, and has no critical size", () => {
    const { worst } = dieAfterDicing({
      layers: [{ thickness: 1e-4, silicon: { direction: "110" } }],
      length: 0.01,
      width: 0.01,
    });
    expect(worst).toMatchObject({ warp: 0, criticalEdge: null, criticalShare: 0, linearValid: true });
  });
});
