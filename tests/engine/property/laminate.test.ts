/*
 * What must hold for any stack.
 *
 *   κ    curvature, bowl positive          1/m
 *   σ    stress in a layer                 Pa
 *   N, Q force and moment per width        N/m, N
 *   e    free strain                       1
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import type { Layer } from "#app/engine/laminate/layer.ts";
import { layerFreeStrain } from "#app/engine/laminate/free-strain.ts";
import { solveLaminate, type LaminateResult } from "#app/engine/laminate/solve-laminate.ts";
import { stoneyCurvature } from "#app/engine/stoney/stoney.ts";
import { relative } from "../relative.ts";
import { anyLayer, between, logarithmic, siliconLayer } from "./arbitraries.ts";

const stacks = fc
  .tuple(fc.array(anyLayer, { maxLength: 3 }), siliconLayer, fc.array(anyLayer, { maxLength: 3 }))
  .map(([below, wafer, above]) => [...below, wafer, ...above]);
const temperatures = between(260, 600);

/** Largest curvature that strains of this size could give the stack: what rounding is measured against. */
function curvatureScale(layers: readonly Layer[], temperature: number): number {
  const total = layers.reduce((sum, { thickness }) => sum + thickness, 0);
  const base = layers.find(({ cte }) => cte === "silicon") ?? layers[0];
  const strains = layers.map((layer) => (base ? Math.abs(layerFreeStrain(layer, base, temperature)) : 0));
  return Math.max(...strains) / total;
}

function biaxial({ youngsModulus, poissonsRatio }: Layer): number {
  return youngsModulus / (1 - poissonsRatio);
}

describe("solveLaminate", () => {
  it("balances force and moment to 1e-12 of their parts", () => {
    fc.assert(
      fc.property(stacks, temperatures, (layers, temperature) => {
        const solved = solveLaminate(layers, { temperature });
        const total = layers.reduce((sum, { thickness }) => sum + thickness, 0);
        let [force, moment, forces, moments, below] = [0, 0, 0, 0, -total / 2];
        layers.forEach(({ thickness, coverage = 1, ...rest }, n) => {
          const [bottom, top] = [solved.stressBottom[n] ?? NaN, solved.stressTop[n] ?? NaN];
          const centre = below + thickness / 2;
          below += thickness;
          const pull = (coverage * thickness * (bottom + top)) / 2;
          const turn = pull * centre + (coverage * thickness ** 2 * (top - bottom)) / 12;
          force += pull;
          moment += turn;
          // Rounding is measured against the force of each layer's whole free strain, of which its stress is the difference.
          const held = coverage * thickness * biaxial({ thickness, ...rest }) * Math.abs(solved.freeStrain[n] ?? NaN);
          forces += Math.abs(pull) + held;
          moments += (Math.abs(pull) + held) * total;
        });
        expect(Math.abs(force)).toBeLessThanOrEqual(1e-12 * forces);
        expect(Math.abs(moment)).toBeLessThanOrEqual(1e-12 * moments);
      }),
    );
  });

  it("leaves a mirror-symmetric stack flat", () => {
    fc.assert(
      fc.property(
        fc.array(anyLayer, { minLength: 1, maxLength: 3 }),
        siliconLayer,
        temperatures,
        (side, core, temperature) => {
          const layers = [...side].reverse().concat(core, side);
          const { curvature } = solveLaminate(layers, { temperature });
          expect(Math.abs(curvature)).toBeLessThanOrEqual(1e-11 * curvatureScale(layers, temperature));
        },
      ),
    );
  });

  it("leaves a stack without mismatch flat and without stress", () => {
    fc.assert(
      fc.property(stacks, temperatures, (stack, temperature) => {
        const layers = stack.map((layer) => ({ ...layer, cte: "silicon" as const, stress: 0 }));
        const { curvature, stressTop, stressBottom } = solveLaminate(layers, { temperature });
        expect(Math.abs(curvature)).toBeLessThanOrEqual(1e-11 * Math.max(curvatureScale(layers, temperature), 1e-12));
        for (const stress of [...stressTop, ...stressBottom]) expect(Math.abs(stress)).toBeLessThan(1);
      }),
    );
  });

  it("changes sign when the stack is turned over", () => {
    fc.assert(
      fc.property(stacks, temperatures, (layers, temperature) => {
        const [up, down] = [
          solveLaminate(layers, { temperature }),
          solveLaminate([...layers].reverse(), { temperature }),
        ];
        const tolerance = 1e-11 * curvatureScale(layers, temperature);
        expect(Math.abs(up.curvature + down.curvature)).toBeLessThanOrEqual(tolerance);
        expect(relative(down.bendingStiffness, up.bendingStiffness)).toBeLessThan(1e-12);
      }),
    );
  });

  it("does not notice a layer split in two", () => {
    fc.assert(
      fc.property(stacks, fc.nat(), between(0.1, 0.9), temperatures, (layers, which, part, temperature) => {
        const at = which % layers.length;
        const halves = layers.flatMap((layer, n) =>
          n === at
            ? [
                { ...layer, thickness: layer.thickness * part },
                { ...layer, thickness: layer.thickness * (1 - part) },
              ]
            : [layer],
        );
        const [whole, split] = [solveLaminate(layers, { temperature }), solveLaminate(halves, { temperature })];
        const tolerance = 1e-11 * curvatureScale(layers, temperature);
        expect(Math.abs(whole.curvature - split.curvature)).toBeLessThanOrEqual(tolerance);
        expect(relative(split.effectiveThickness, whole.effectiveThickness)).toBeLessThan(1e-12);
      }),
    );
  });

  it("tends to the thin-film formula as the film gets thin", () => {
    const film = fc.record({
      thickness: logarithmic(1e-9, 1e-7),
      youngsModulus: logarithmic(1e9, 400e9),
      poissonsRatio: between(0, 0.4),
      stress: fc.oneof(between(1e6, 1e9), between(-1e9, -1e6)),
    });
    fc.assert(
      fc.property(film, logarithmic(1e-4, 1e-3), (layer, thickness) => {
        const wafer: Layer = { thickness, youngsModulus: 130e9, poissonsRatio: 0.2786, cte: "silicon" };
        const thin = stoneyCurvature({
          filmStress: layer.stress,
          filmThickness: layer.thickness,
          substrateThickness: thickness,
          biaxialModulus: biaxial(wafer),
        });
        // First order in thickness ratio: the force moves out by half a film (+1) and the film stiffens the wafer (−4 M_f/M).
        const ratio = layer.thickness / thickness;
        const bound = ratio * (1 + (4 * biaxial(layer)) / biaxial(wafer));
        expect(relative(solveLaminate([wafer, layer]).curvature, thin)).toBeLessThan(1.01 * bound + 1e-12);
        // On the back side the same film bends the wafer the other way.
        expect(Math.sign(solveLaminate([layer, wafer]).curvature)).toBe(-Math.sign(layer.stress));
      }),
    );
  });

  it("bends more with more film stress, and the bend is linear in it", () => {
    fc.assert(
      fc.property(siliconLayer, anyLayer, between(0, 5e8), between(1e6, 5e8), (wafer, film, stress, more) => {
        const curvature = (value: number) =>
          solveLaminate([wafer, { ...film, cte: "silicon", stress: value }], { temperature: 298.15 }).curvature;
        expect(curvature(stress + more)).toBeGreaterThan(curvature(stress));
        expect(relative(curvature(2 * more), 2 * curvature(more))).toBeLessThan(1e-9);
      }),
    );
  });

  it("scales a covered fraction like stiffness and force together: a stack of equal coverage is as the full one", () => {
    fc.assert(
      fc.property(stacks, between(0.05, 1), temperatures, (stack, coverage, temperature) => {
        const full = stack.map((layer) => ({ ...layer, coverage: 1 }));
        const [one, part] = [
          solveLaminate(full, { temperature }),
          solveLaminate(
            full.map((layer) => ({ ...layer, coverage })),
            { temperature },
          ),
        ];
        const tolerance = 1e-11 * curvatureScale(full, temperature);
        expect(Math.abs(part.curvature - one.curvature)).toBeLessThanOrEqual(tolerance);
        expect(relative(part.bendingStiffness, coverage * one.bendingStiffness)).toBeLessThan(1e-12);
      }),
    );
  });

  it("gives finite numbers for any legal stack", () => {
    const wild: fc.Arbitrary<Layer> = fc.record({
      thickness: logarithmic(1e-10, 0.1),
      youngsModulus: logarithmic(1, 5e12),
      poissonsRatio: between(-0.9, 0.4999),
      stress: between(-1e11, 1e11),
      cte: between(-1e-3, 1e-2),
      referenceTemperature: between(1, 5000),
      coverage: between(1e-9, 1),
      plasticStrain: between(-1, 1),
    });
    fc.assert(
      fc.property(fc.array(wild, { minLength: 1, maxLength: 6 }), between(1, 5000), (layers, temperature) => {
        const solved: LaminateResult = solveLaminate(layers, { temperature });
        for (const value of Object.values(solved).flat()) expect(Number.isFinite(value)).toBe(true);
        expect(solved.effectiveThickness).toBeGreaterThan(0);
      }),
    );
  });
});
