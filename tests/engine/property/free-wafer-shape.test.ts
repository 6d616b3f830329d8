/*
 * What must hold for the shape of any free wafer.
 *
 *   S     curvature by small-deflection theory times R²/(4h)
 *   A, B  mean and half difference of the two curvatures averaged over the area, times R²/(4h)
 *   Π     energy less the work of the load, in units of 16π (M h³/12) (h/R)²
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { criticalFilmForce, criticalLinearCurvature } from "#app/engine/plate/critical-load.ts";
import { freeWaferShape, type FreeWaferShape } from "#app/engine/plate/free-wafer-shape.ts";
import { loadVector, uniformShape } from "#app/engine/plate/generator/equilibrium.ts";
import { internalEnergy, ritzPlate, ritzSpace } from "#app/engine/plate/generator/ritz-plate.ts";
import { seededRandom } from "#app/engine/plate/generator/random.ts";
import { reachedState, snappedState } from "#app/engine/plate/load-path.ts";
import { isotropicPlate, siliconPlates } from "#app/engine/plate/plate.ts";
import { plateShape } from "#app/engine/plate/shape-model.ts";
import { isotropicRatios } from "#app/engine/plate/shear-ratios.ts";
import { totalEnergy } from "#app/engine/plate/stable-state.ts";
import { stoneyCurvature } from "#app/engine/stoney/stoney.ts";
import { relative } from "../relative.ts";
import { between, logarithmic } from "./arbitraries.ts";

const wafers = fc.record({
  radius: logarithmic(0.02, 0.3),
  thickness: logarithmic(5e-6, 1e-3),
  youngsModulus: logarithmic(1e9, 400e9),
  poissonsRatio: between(0, 0.45),
  crystal: fc.constantFrom(undefined, "100" as const, "111" as const),
  axes: fc.constantFrom(undefined, "100" as const, "110" as const),
});

fc.configureGlobal({ ...fc.readConfigureGlobal(), seed: 20 });

describe("energy", () => {
  const loads = fc.record({ mean: between(0, 40), halfDifference: between(0, 40) });
  const plates = fc.oneof(
    between(0, 0.45).map((poissonsRatio) => isotropicPlate(poissonsRatio)),
    fc.constantFrom("soft" as const, "hard" as const).map((direction) => siliconPlates()[direction]),
  );
  const size = ({ mean, halfDifference }: { mean: number; halfDifference: number }) => mean + halfDifference;

  it("is nowhere lower than at the reported shape, for mean curvatures of any size and either sign", () => {
    const trials = fc.array(fc.tuple(between(-2, 2), between(-2, 2)), { minLength: 20, maxLength: 20 });
    fc.assert(
      fc.property(loads, plates, trials, (load, plate, around) => {
        const state = reachedState(plate, load);
        expect(state.stable).toBe(true);
        const here = totalEnergy(plate.energy, state, load);
        // Rounding of a difference of terms of the size of the load's work.
        const rounding = 1e-11 * (1 + size(state) * size(load));
        for (const [dA, dB] of around) {
          for (const reach of [1e-3, 0.1, 1]) {
            const trial = {
              mean: state.mean + dA * reach * size(state),
              halfDifference: state.halfDifference + dB * reach * size(state),
            };
            expect(totalEnergy(plate.energy, trial, load)).toBeGreaterThan(here - rounding);
          }
        }
      }),
    );
  });

  it("is lower at the shape that the load leads to than at one that has snapped through", () => {
    let found = 0;
    fc.assert(
      fc.property(between(0, 5), between(2, 40), plates, (mean, halfDifference, plate) => {
        const load = { mean, halfDifference };
        const state = reachedState(plate, load);
        const other = snappedState(plate, load, state);
        if (!other) return;
        found += 1;
        const snapped = totalEnergy(plate.energy, { ...other, mean: -other.mean }, load);
        expect(totalEnergy(plate.energy, state, load)).toBeLessThanOrEqual(snapped + 1e-12 * Math.abs(snapped));
      }),
    );
    expect(found).toBeGreaterThan(10);
  });

  it("of any other deflection of the disc is not lower than at the reported shape", () => {
    const space = ritzSpace("even", 12);
    const random = seededRandom(3);
    const cases = fc.record({ load: loads, poissonsRatio: between(0, 0.45), roughness: logarithmic(1e-3, 1) });
    fc.assert(
      fc.property(cases, ({ load, poissonsRatio, roughness }) => {
        const ritz = ritzPlate(space, isotropicRatios(poissonsRatio));
        const plate = isotropicPlate(poissonsRatio);
        const state = reachedState(plate, load);
        const here = totalEnergy(plate.energy, state, load);
        const trial = uniformShape(ritz, state);
        const forces = loadVector(ritz, load);
        for (let attempt = 0; attempt < 5; attempt += 1) {
          for (let n = 0; n < ritz.size; n += 1) trial[n] = (trial[n] ?? 0) + roughness * (random() - 0.5);
          const work = trial.reduce((sum, value, n) => sum + value * (forces[n] ?? 0), 0);
          // The table's energy is good to 1e-3 of the stretching, which is less than the work.
          expect(internalEnergy(ritz, trial) - work).toBeGreaterThan(here - 1e-3 * (1 + size(state) * size(load)));
        }
      }),
      { numRuns: 40 },
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
        expect(down.threePointBow + up.threePointBow).toBe(0);
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
        const at = (load: number) => freeWaferShape({ ...thin, linearCurvature: load * unit });
        const [less, bent] = [at(ratio), at(ratio + more)];
        expect(bent.parabolaCurvatureMajor).toBeGreaterThan(less.parabolaCurvatureMajor);
        expect(bent.bowMajor).toBeGreaterThan(less.bowMajor);
        expect(bent.warp).toBeGreaterThan(less.warp);
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
      axes: fc.constantFrom(undefined, "100" as const, "110" as const),
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
        // A closed roll is lower the tighter it is.
        if (Math.abs(result.parabolaCurvatureMajor) * wafer.radius < Math.PI / 2) {
          expect(Math.abs(result.bowMajor)).toBeGreaterThanOrEqual(Math.abs(result.bowMinor) * (1 - 1e-12));
        }
        expect(result.warp).toBeGreaterThanOrEqual(Math.abs(result.bowMajor) * (1 - 1e-12));
        expect(Math.abs(result.majorAngle)).toBeLessThanOrEqual(Math.PI / 2);
      }),
      { numRuns: 500 },
    );
  });

  it("tends to a cylinder of the load's moment along the roll", () => {
    fc.assert(
      fc.property(between(0, 0.45), between(-1, 1), logarithmic(1e3, 1e12), (poissonsRatio, ratio, times) => {
        const x = times;
        const shape = plateShape(
          { mean: (x * (1 + ratio)) / 2, halfDifference: (x * (1 - ratio)) / 2 },
          { poissonsRatio },
        );
        // The bent rim keeps a share of the order of the inverse square root of the curvature.
        const cylinder = x * (1 + poissonsRatio * ratio);
        const { bow, centre, parabola } = shape;
        for (const { mean, halfDifference } of [bow, centre, parabola]) {
          expect(relative(mean + halfDifference, cylinder)).toBeLessThan(1 / Math.sqrt(cylinder));
        }
      }),
    );
  });

  it("turns a roll of silicon (100) from <100> to <110> without a jump as loads along <110> come apart", () => {
    fc.assert(
      fc.property(between(1.6, 20), between(0.01, 1), (mean, share) => {
        const kind = { poissonsRatio: 0.28, crystal: "100" as const, axes: "110" as const };
        const at = (halfDifference: number) => plateShape({ mean, halfDifference }, kind);
        const [here, next] = [at(share * 0.4 * mean), at(share * 0.4 * mean * (1 + 1e-9))];
        // Where it reaches <110> the angle goes as the square root of what is left.
        expect(Math.abs(here.turn - next.turn)).toBeLessThan(1e-3);
        expect(relative(next.bow.mean + next.bow.halfDifference, here.bow.mean + here.bow.halfDifference)).toBeLessThan(
          1e-4,
        );
        expect(here.turn).toBeGreaterThanOrEqual(0);
        expect(here.turn).toBeLessThanOrEqual(Math.PI / 4);
      }),
    );
    // Equal loads leave it along <100>.
    const equal = plateShape({ mean: 4, halfDifference: 0 }, { poissonsRatio: 0.28, crystal: "100", axes: "110" });
    const along = plateShape({ mean: 4, halfDifference: 0 }, { poissonsRatio: 0.28, crystal: "100" });
    expect(equal.turn).toBe(Math.PI / 4);
    expect(equal.bow).toEqual(along.bow);
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
