/*
 * What must hold for any stack whose two directions differ.
 *
 *   κ_x, κ_y  curvatures, bowl positive               1/m
 *   t         twist, w_xy                             1/m
 *   ε, γ      strains; engineering shear strain       1
 *   σ, τ      stresses in a layer                     Pa
 *   N, Q      force and moment per width              N/m, N
 *   f         area fraction
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { DirectionalFilm, DirectionalLayer, DirectionalSilicon } from "#app/engine/directional/layer.ts";
import type { PlaneTensor } from "#app/engine/directional/plane-stiffness.ts";
import {
  solveDirectionalLaminate,
  type DirectionalLaminateResult,
} from "#app/engine/directional/solve-directional-laminate.ts";
import type { Layer } from "#app/engine/laminate/layer.ts";
import { solveLaminate } from "#app/engine/laminate/solve-laminate.ts";
import type { FilmPattern } from "#app/engine/patterned/pattern.ts";
import { anyLayer, between, logarithmic, siliconLayer } from "./arbitraries.ts";

const temperatures = between(260, 600);
const angles = between(-Math.PI, Math.PI);
const coverage = between(0.05, 1);

const patterns: fc.Arbitrary<FilmPattern> = fc.oneof(
  fc.constant<FilmPattern>({ kind: "full" }),
  fc.record({ kind: fc.constant("lines" as const), coverage, lineWidth: logarithmic(1e-7, 1e-2), direction: angles }),
  fc.record({ kind: fc.constant("islands" as const), coverage, size: logarithmic(1e-7, 1e-2) }),
  fc.record({ kind: fc.constant("random" as const), coverage }),
);
const film: fc.Arbitrary<DirectionalFilm> = fc
  .tuple(anyLayer, patterns, between(-1e9, 1e9), between(-1e9, 1e9))
  .map(([{ coverage: _, ...layer }, pattern, x, y]) => ({ ...layer, pattern, stress: { x, y } }));
const wafer: fc.Arbitrary<DirectionalSilicon> = fc.record({
  thickness: logarithmic(10e-6, 1e-3),
  silicon: fc.record({ direction: fc.constantFrom("100" as const, "110" as const), angle: angles }),
});
const stacks: fc.Arbitrary<DirectionalLayer[]> = fc
  .tuple(fc.array(film, { maxLength: 3 }), wafer, fc.array(film, { maxLength: 3 }))
  .map(([below, silicon, above]) => [...below, silicon, ...above]);
const plainStacks = fc
  .tuple(fc.array(anyLayer, { maxLength: 3 }), siliconLayer, fc.array(anyLayer, { maxLength: 3 }))
  .map(([below, silicon, above]): Layer[] => [...below, silicon, ...above]);

const PARTS = ["x", "y", "xy"] as const;

function thicknessOf(layers: readonly { thickness: number }[]): number {
  return layers.reduce((sum, { thickness }) => sum + thickness, 0);
}

/** Largest curvature that strains of this size could give the stack: what rounding is measured against. */
function curvatureScale(layers: readonly DirectionalLayer[], { freeStrain }: DirectionalLaminateResult): number {
  return Math.max(...freeStrain.flatMap(({ x, y, xy }) => [x, y, xy].map(Math.abs))) / thicknessOf(layers);
}

function coverageOf(layer: DirectionalLayer): number {
  if (layer.silicon !== undefined) return 1;
  if (layer.pattern === undefined) return layer.coverage ?? 1;
  return layer.pattern.kind === "full" ? 1 : layer.pattern.coverage;
}

/** Largest stiffness of any direction of the layer's own material, Pa. */
function stiffest(layer: DirectionalLayer): number {
  return layer.silicon === undefined ? layer.youngsModulus / (1 - layer.poissonsRatio) : 181e9;
}

function expectSame(one: DirectionalLaminateResult, other: DirectionalLaminateResult, tolerance: number): void {
  expect(Math.abs(one.curvatureX - other.curvatureX)).toBeLessThanOrEqual(tolerance);
  expect(Math.abs(one.curvatureY - other.curvatureY)).toBeLessThanOrEqual(tolerance);
  expect(Math.abs(one.twist - other.twist)).toBeLessThanOrEqual(tolerance);
}

describe("solveDirectionalLaminate", () => {
  it("is the laminate of equal directions for isotropic layers of equal stress, to 1e-12", () => {
    fc.assert(
      fc.property(plainStacks, temperatures, (layers, temperature) => {
        const [plain, directional] = [
          solveLaminate(layers, { temperature }),
          solveDirectionalLaminate(layers, { temperature }),
        ];
        const scale = 1e-12 * curvatureScale(layers, directional);
        expect(Math.abs(directional.curvatureX - plain.curvature)).toBeLessThanOrEqual(scale);
        expect(Math.abs(directional.curvatureY - plain.curvature)).toBeLessThanOrEqual(scale);
        expect(directional.twist).toBe(0);
        const strains = 1e-12 * Math.max(...plain.freeStrain.map(Math.abs));
        expect(Math.abs(directional.midplaneStrain.x - plain.midplaneStrain)).toBeLessThanOrEqual(strains);
        expect(directional.midplaneStrain.xy).toBe(0);
        expect(Math.abs(directional.effectiveThickness / plain.effectiveThickness - 1)).toBeLessThan(1e-12);
        layers.forEach((layer, n) => {
          // A stress is a modulus times a difference of strains.
          const rounding = 2 * stiffest(layer) * strains;
          for (const face of ["stressBottom", "stressTop", "meanStress"] as const) {
            expect(Math.abs((directional[face][n]?.x ?? NaN) - (plain[face][n] ?? NaN))).toBeLessThanOrEqual(rounding);
            expect(directional[face][n]?.xy).toBe(0);
          }
        });
      }),
    );
  });

  it("balances force and moment in both directions and in shear, to 1e-12 of their parts", () => {
    fc.assert(
      fc.property(stacks, temperatures, (layers, temperature) => {
        const solved = solveDirectionalLaminate(layers, { temperature });
        const total = thicknessOf(layers);
        let [forces, moments, below] = [0, 0, -total / 2];
        const force: PlaneTensor = { x: 0, y: 0, xy: 0 };
        const moment: PlaneTensor = { x: 0, y: 0, xy: 0 };
        layers.forEach((layer, n) => {
          const { thickness } = layer;
          const [bottom, top, free] = [solved.stressBottom[n], solved.stressTop[n], solved.freeStrain[n]];
          if (!bottom || !top || !free) throw new Error("a layer is missing");
          const share = coverageOf(layer) * thickness;
          const centre = below + thickness / 2;
          below += thickness;
          const held = share * stiffest(layer) * Math.max(...PARTS.map((part) => Math.abs(free[part])));
          for (const part of PARTS) {
            const pull = (share * (bottom[part] + top[part])) / 2;
            force[part] += pull;
            moment[part] += pull * centre + (share * thickness * (top[part] - bottom[part])) / 12;
            // Rounding is measured against the force of each layer's whole free strain, of which its stress is the difference.
            forces += Math.abs(pull) + held;
            moments += (Math.abs(pull) + held) * total;
          }
        });
        for (const part of PARTS) {
          expect(Math.abs(force[part])).toBeLessThanOrEqual(1e-12 * forces);
          expect(Math.abs(moment[part])).toBeLessThanOrEqual(1e-12 * moments);
        }
      }),
    );
  });

  it("gives the same surface when everything is turned in the plane", () => {
    fc.assert(
      fc.property(wafer, anyLayer, patterns, between(-1e9, 1e9), angles, (silicon, layer, pattern, stress, turn) => {
        const { coverage: _, ...rest } = layer;
        const film = (by: number): DirectionalFilm => ({
          ...rest,
          stress,
          pattern: pattern.kind === "lines" ? { ...pattern, direction: wrap(pattern.direction + by) } : pattern,
        });
        const base = (by: number): DirectionalSilicon => ({
          ...silicon,
          silicon: { ...silicon.silicon, angle: wrap((silicon.silicon.angle ?? 0) + by) },
        });
        const one = solveDirectionalLaminate([base(0), film(0)], { temperature: 400 });
        const other = solveDirectionalLaminate([base(turn), film(turn)], { temperature: 400 });
        const tolerance = 1e-11 * curvatureScale([base(0), film(0)], one);
        // Curvature tensor of the first in the axes of the second.
        const [c, s] = [Math.cos(turn), Math.sin(turn)];
        const { curvatureX: x, curvatureY: y, twist: t } = one;
        expectSame(
          other,
          {
            ...one,
            curvatureX: c * c * x + s * s * y - 2 * c * s * t,
            curvatureY: s * s * x + c * c * y + 2 * c * s * t,
            twist: c * s * (x - y) + (c * c - s * s) * t,
          },
          tolerance,
        );
        expect(Math.abs(other.principal.major - one.principal.major)).toBeLessThanOrEqual(tolerance);
      }),
    );
  });

  it("swaps x and y with the stack's directions, and the sign when turned over", () => {
    fc.assert(
      fc.property(stacks, temperatures, (layers, temperature) => {
        const one = solveDirectionalLaminate(layers, { temperature });
        const tolerance = 1e-11 * curvatureScale(layers, one);
        const turnedOver = solveDirectionalLaminate([...layers].reverse(), { temperature });
        expectSame(
          turnedOver,
          { ...one, curvatureX: -one.curvatureX, curvatureY: -one.curvatureY, twist: -one.twist },
          tolerance,
        );
      }),
    );
  });

  it("principal curvatures keep trace and determinant, the larger first, at their angle", () => {
    fc.assert(
      fc.property(stacks, temperatures, (layers, temperature) => {
        const solved = solveDirectionalLaminate(layers, { temperature });
        const { curvatureX: x, curvatureY: y, twist: t, principal } = solved;
        const size = Math.max(Math.abs(x), Math.abs(y), Math.abs(t), 1e-300);
        expect(Math.abs(principal.major + principal.minor - x - y)).toBeLessThanOrEqual(1e-12 * size);
        expect(Math.abs(principal.major)).toBeGreaterThanOrEqual(Math.abs(principal.minor) - 1e-12 * size);
        const [c, s] = [Math.cos(principal.angle), Math.sin(principal.angle)];
        expect(Math.abs(c * c * x + s * s * y + 2 * c * s * t - principal.major)).toBeLessThanOrEqual(1e-12 * size);
      }),
    );
  });

  it("gives finite numbers for any legal stack on a wafer", () => {
    const wild: fc.Arbitrary<DirectionalLayer> = fc.record({
      thickness: logarithmic(1e-10, 0.1),
      youngsModulus: logarithmic(1, 5e12),
      poissonsRatio: between(-0.9, 0.4999),
      stress: fc.record({ x: between(-1e11, 1e11), y: between(-1e11, 1e11) }),
      cte: between(-1e-3, 1e-2),
      referenceTemperature: between(1, 5000),
      plasticStrain: between(-1, 1),
      pattern: patterns,
    });
    fc.assert(
      fc.property(fc.array(wild, { maxLength: 5 }), wafer, between(120, 1500), (layers, silicon, temperature) => {
        const legal = [silicon, ...layers.map((layer) => ({ ...layer, referenceTemperature: 300 }))];
        const solved = solveDirectionalLaminate(legal, { temperature });
        const numbers = JSON.stringify(solved).match(/null/g);
        expect(numbers).toBeNull();
        expect(solved.effectiveThickness).toBeGreaterThan(0);
      }),
    );
  });
});

function wrap(angle: number): number {
  return Math.atan2(Math.sin(angle), Math.cos(angle));
}
