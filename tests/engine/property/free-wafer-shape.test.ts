/*
 * What must hold for the shape of any free wafer.
 *
 *   S     curvature by small-deflection theory times R²/(4h)
 *   A, D  mean and half difference of the two curvatures times R²/(4h)
 *   α, β  coefficients of A (1 + α P) = A_0, D (1 − β P) = D_0, P = A² − D²
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { criticalFilmForce, criticalLinearCurvature } from "#app/engine/plate/critical-load.ts";
import { freeWaferShape, type FreeWaferShape } from "#app/engine/plate/free-wafer-shape.ts";
import { uniformCoefficients } from "#app/engine/plate/shape-model.ts";
import {
  snappedState,
  stableState,
  type CurvaturePair,
  type PlateCoefficients,
} from "#app/engine/plate/uniform-curvature.ts";
import { stoneyCurvature } from "#app/engine/stoney/stoney.ts";
import { relative } from "../relative.ts";
import { between, logarithmic } from "./arbitraries.ts";

const wafers = fc.record({
  radius: logarithmic(0.02, 0.3),
  thickness: logarithmic(5e-6, 1e-3),
  youngsModulus: logarithmic(1e9, 400e9),
  poissonsRatio: between(0, 0.45),
  crystal: fc.constantFrom(undefined, "100" as const, "111" as const),
});

/** Energy of uniform curvatures, up to a constant factor, with their half difference turned by the angle 2 `turn` from the load. */
function energy(
  { mean, halfDifference }: CurvaturePair,
  load: CurvaturePair,
  { alpha, beta }: PlateCoefficients,
  turn = 0,
) {
  const product = mean ** 2 - halfDifference ** 2;
  return (
    (mean ** 2 - 2 * mean * load.mean) / alpha +
    (halfDifference ** 2 - 2 * halfDifference * Math.cos(turn) * load.halfDifference) / beta +
    product ** 2 / 2
  );
}

describe("uniform curvature", () => {
  const loads = fc.record({ mean: between(-20, 20), halfDifference: between(-20, 20) });
  const plates = between(0, 0.45).map((poissonsRatio) => uniformCoefficients({ poissonsRatio }));

  it("rests in a minimum of its energy against every small change and turn", () => {
    fc.assert(
      fc.property(loads, plates, (load, plate) => {
        for (const state of [stableState(load, plate), snappedState(load, plate)]) {
          if (!state) continue;
          const here = energy(state, load, plate);
          const size = Math.abs(state.mean) + Math.abs(state.halfDifference) + 1e-3;
          const rounding =
            1e-13 * (size ** 2 + size ** 4 + size * (Math.abs(load.mean) + Math.abs(load.halfDifference)));
          for (let n = 0; n < 8; n += 1) {
            const step = 1e-4 * size;
            const moved = {
              mean: state.mean + step * Math.cos((n * Math.PI) / 4),
              halfDifference: state.halfDifference + step * Math.sin((n * Math.PI) / 4),
            };
            expect(energy(moved, load, plate)).toBeGreaterThan(here - rounding);
          }
          expect(energy(state, load, plate, 1e-3)).toBeGreaterThan(here - rounding);
        }
      }),
    );
  });

  it("never lies above the snapped shape in energy", () => {
    fc.assert(
      fc.property(loads, plates, (load, plate) => {
        const other = snappedState(load, plate);
        if (!other) return;
        const [main, snapped] = [energy(stableState(load, plate), load, plate), energy(other, load, plate)];
        expect(main).toBeLessThanOrEqual(snapped + 1e-9 * Math.abs(snapped));
      }),
    );
  });
});

describe("freeWaferShape", () => {
  it("is the small-deflection bow while the load is small", () => {
    fc.assert(
      fc.property(wafers, logarithmic(1e-9, 1e-3), fc.boolean(), (wafer, ratio, up) => {
        const curvature = (up ? 1 : -1) * ratio * criticalLinearCurvature(wafer);
        const result = freeWaferShape({ ...wafer, linearCurvature: curvature });
        expect(result.regime).toBe("linear");
        // The cubic term is at most 1.5 S², S at most 0.002 here; the arc adds (κR)²/12.
        const linear = (curvature * wafer.radius ** 2) / 2;
        const arc = (curvature * wafer.radius) ** 2 / 12;
        expect(relative(result.bowMajor, linear)).toBeLessThan(1e-5 + arc);
        expect(result.stabilityRatio).toBeCloseTo(ratio, 12);
        expect(result.rollRadius).toBeNull();
      }),
    );
  });

  it("changes nothing but the sign when the load does", () => {
    fc.assert(
      fc.property(wafers, between(-50, 50), between(-50, 50), (wafer, x, y) => {
        const critical = criticalLinearCurvature(wafer);
        const load = { x: x * critical, y: y * critical };
        const [up, down] = [
          freeWaferShape({ ...wafer, linearCurvature: load }),
          freeWaferShape({ ...wafer, linearCurvature: { x: -load.x, y: -load.y } }),
        ];
        expect(down.bowMajor + up.bowMajor).toBe(0);
        expect(down.warp).toBe(up.warp);
        expect(down.regime).toBe(up.regime);
      }),
    );
  });

  it("bends more under more load, with equal loads", () => {
    fc.assert(
      fc.property(wafers, between(0, 60), between(0.001, 5), (wafer, ratio, more) => {
        const critical = criticalLinearCurvature(wafer);
        // Thin enough that the roll stays below a quarter turn, where an arc's sagitta still grows.
        const thin = { ...wafer, thickness: wafer.radius * 1e-4 };
        const unit = (critical * thin.thickness) / wafer.thickness;
        const curvature = (load: number) =>
          freeWaferShape({ ...thin, linearCurvature: load * unit }).parabolaCurvatureMajor;
        expect(curvature(ratio + more)).toBeGreaterThan(curvature(ratio));
      }),
    );
  });

  it("goes over from equal to slightly unequal loads, and through the onset, without a jump", () => {
    fc.assert(
      fc.property(wafers, between(0.01, 100), (wafer, ratio) => {
        const curvature = ratio * criticalLinearCurvature(wafer);
        const equal = freeWaferShape({ ...wafer, linearCurvature: curvature });
        const tilted = freeWaferShape({
          ...wafer,
          linearCurvature: { x: curvature * (1 + 1e-12), y: curvature * (1 - 1e-12) },
        });
        // At the onset itself the roll grows as the cube root of the difference: 1e-4 of the bow for 1e-12.
        expect(relative(tilted.bowMajor, equal.bowMajor)).toBeLessThan(1e-3);
      }),
    );
    fc.assert(
      fc.property(wafers, (wafer) => {
        const critical = criticalLinearCurvature(wafer);
        const at = (ratio: number) => freeWaferShape({ ...wafer, linearCurvature: ratio * critical });
        const [before, after] = [at(1 - 1e-9), at(1 + 1e-9)];
        expect(before.regime).toBe("nonlinear");
        expect(after.regime).toBe("curled");
        // The roll grows as the square root of the excess.
        expect(relative(after.bowMajor, before.bowMajor)).toBeLessThan(1e-3);
        expect(relative(after.centreCurvatureMajor, before.centreCurvatureMajor)).toBeLessThan(1e-3);
        expect(relative(after.parabolaCurvatureMajor, before.parabolaCurvatureMajor)).toBeLessThan(1e-3);
      }),
    );
  });

  it("stays within the height of its own roll and gives finite numbers for any legal wafer", () => {
    const wild = fc.record({
      radius: logarithmic(1e-4, 10),
      thinness: logarithmic(1e-9, 0.1999),
      youngsModulus: logarithmic(1, 5e12),
      poissonsRatio: between(0, 0.4999),
      crystal: fc.constantFrom(undefined, "100" as const, "111" as const),
    });
    const curvatures = fc.oneof(between(-1e7, 1e7), between(-1, 1), between(-1e-6, 1e-6));
    fc.assert(
      fc.property(wild, curvatures, curvatures, fc.boolean(), ({ thinness, ...wafer }, x, y, equal) => {
        const thickness = Math.min(0.1, Math.max(1e-10, wafer.radius * thinness));
        const result: FreeWaferShape = freeWaferShape({
          ...wafer,
          thickness,
          linearCurvature: equal ? x : { x, y },
        });
        const { regime, majorAxis, alternatives, rollRadius, ...numbers } = result;
        for (const value of Object.values(numbers)) expect(Number.isFinite(value)).toBe(true);
        for (const other of alternatives) expect(Number.isFinite(other.bowMajor)).toBe(true);
        if (rollRadius !== null) expect(Number.isFinite(rollRadius)).toBe(true);
        expect(["linear", "nonlinear", "curled"]).toContain(regime);
        expect(["x", "y", "any"]).toContain(majorAxis);
        expect(result.warp).toBeGreaterThanOrEqual(0);
        expect(Math.abs(result.bowMajor)).toBeLessThanOrEqual(wafer.radius);
        expect(Math.abs(result.bowMajor)).toBeGreaterThanOrEqual(Math.abs(result.bowMinor) * (1 - 1e-12));
      }),
      { numRuns: 500 },
    );
  });

  it("starts to roll at the critical film force", () => {
    fc.assert(
      fc.property(wafers, (wafer) => {
        const biaxialModulus = wafer.youngsModulus / (1 - wafer.poissonsRatio);
        const filmThickness = wafer.thickness;
        const curvature = stoneyCurvature({
          filmStress: criticalFilmForce(wafer) / filmThickness,
          filmThickness,
          substrateThickness: wafer.thickness,
          biaxialModulus,
        });
        expect(relative(curvature, criticalLinearCurvature(wafer))).toBeLessThan(1e-12);
      }),
    );
  });
});
