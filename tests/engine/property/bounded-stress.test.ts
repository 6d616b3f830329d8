/*
 * Layers whose mean stress is limited, inside a laminate.
 *
 *   σ_i      mean stress of layer i                       Pa
 *   f_i h_i  coverage times thickness                     m
 *   z_i      height of its middle over the neutral plane  m
 *   M_i      biaxial modulus                              Pa
 *   κ        curvature                                    1/m
 *
 * The energy of the problem is convex, so a state that keeps every limit, balances forces and moments, and flows only at a limit
 * and towards it is the one answer: that is what is checked. Tolerance 1e-12 of the sum of absolute parts (stiffness times each strain, times its arm): rounding of sums.
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { flowStrains } from "#app/engine/laminate/bounded-stress.ts";
import { checkLayer, type Layer } from "#app/engine/laminate/layer.ts";
import { letFlow, placeLayers } from "#app/engine/laminate/placed-layers.ts";
import { balanceLayers } from "#app/engine/laminate/solve-laminate.ts";
import { layerRows } from "../placed.ts";
import { anyLayer, between, logarithmic, siliconLayer } from "./arbitraries.ts";

const bounded = fc.record({ layer: anyLayer, low: logarithmic(1e5, 1e9), high: logarithmic(1e5, 1e9) });

function solve(
  films: { layer: Layer; low: number; high: number }[],
  silicon: Layer,
  temperature: number,
  heldFlat: boolean,
) {
  const stated = [...films.map(({ layer }) => layer), silicon];
  const placed = placeLayers(
    stated.map((layer) => ({ layer: checkLayer(layer, "layer"), field: "layer" })),
    temperature,
  );
  const bounds = {
    low: new Float64Array(placed.count).fill(-Infinity),
    high: new Float64Array(placed.count).fill(Infinity),
  };
  films.forEach(({ low, high }, n) => {
    bounds.low[n] = -low;
    bounds.high[n] = high;
  });
  const strains = flowStrains(placed, bounds, balanceLayers(placed), { heldFlat }) ?? new Float64Array(placed.count);
  strains.forEach((strain, at) => letFlow(placed, at, strain));
  const balance = balanceLayers(placed);
  const layers = layerRows(placed);
  const stress = layers.map((l) => {
    const z = heldFlat ? balance.neutralPlane : l.centre;
    return l.biaxialModulus * (balance.midplaneStrain - balance.curvature * z - l.freeStrain);
  });
  return { layers, strains, balance, stress };
}

const cases = [
  fc.array(bounded, { minLength: 1, maxLength: 60 }),
  siliconLayer,
  between(250, 700),
  fc.boolean(),
] as const;

describe("layers that flow at a limit", () => {
  it("keep every limit, and flow only at one and towards it", () => {
    fc.assert(
      fc.property(...cases, (films, silicon, temperature, heldFlat) => {
        const { strains, stress } = solve(films, silicon, temperature, heldFlat);
        const largest = Math.max(...stress.map(Math.abs), 1);
        expect(strains[films.length]).toBe(0);
        films.forEach(({ low, high }, n) => {
          const [at, flowed] = [stress[n] ?? NaN, strains[n] ?? NaN];
          expect(at).toBeGreaterThanOrEqual(-low - 1e-9 * largest);
          expect(at).toBeLessThanOrEqual(high + 1e-9 * largest);
          if (flowed > 0) expect(Math.abs(at - high)).toBeLessThan(1e-9 * largest);
          if (flowed < 0) expect(Math.abs(at + low)).toBeLessThan(1e-9 * largest);
        });
      }),
    );
  });

  it("leave forces and moments in balance", () => {
    fc.assert(
      fc.property(...cases, (films, silicon, temperature, heldFlat) => {
        const { layers, balance, stress } = solve(films, silicon, temperature, heldFlat);
        const force = layers.map((l, n) => (l.stiffness / l.biaxialModulus) * (stress[n] ?? 0));
        const { midplaneStrain, curvature } = balance;
        const parts = layers.map(
          (l) => l.stiffness * (Math.abs(midplaneStrain) + Math.abs(curvature * l.centre) + Math.abs(l.freeStrain)),
        );
        const size = parts.reduce((sum, part) => sum + part, 0);
        expect(Math.abs(force.reduce((sum, part) => sum + part, 0))).toBeLessThanOrEqual(1e-12 * size);
        if (heldFlat) return;
        const moment = layers.flatMap((l, n) => [
          (force[n] ?? 0) * (l.centre - balance.neutralPlane),
          (-balance.curvature * l.stiffness * l.thickness ** 2) / 12,
        ]);
        const arms = layers.map((l, n) => (parts[n] ?? 0) * (Math.abs(l.centre - balance.neutralPlane) + l.thickness));
        const whole = arms.reduce((sum, part) => sum + part, 0);
        expect(Math.abs(moment.reduce((sum, part) => sum + part, 0))).toBeLessThanOrEqual(1e-12 * whole);
      }),
    );
  });

  it("are left alone where no limit is passed", () => {
    fc.assert(
      fc.property(fc.array(anyLayer, { minLength: 1, maxLength: 12 }), siliconLayer, (layers, silicon) => {
        const films = layers.map((layer) => ({ layer, low: 1e13, high: 1e13 }));
        expect(solve(films, silicon, 298.15, false).strains.every((strain) => strain === 0)).toBe(true);
      }),
    );
  });
});
