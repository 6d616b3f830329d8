/*
 * Locked-in modulus and carrier expansion from measured bows of pairs.
 *
 *   E      locked-in modulus of the bonding material       Pa
 *   α      mean expansion of the carrier                   1/K
 *   s      sagitta of the pair, curvature's sign           m
 *   u      standard uncertainty                            as its quantity
 *
 * Bows are made by the model itself with known values, noise by a generator with a fixed seed: what is tested is the fit, not
 * the physics.
 */
import { describe, expect, it } from "vitest";
import { calibratePair, type Calibration } from "#app/engine/calibration/calibrate-pair.ts";
import { withCalibration, type Calibrated, type PairMeasurement } from "#app/engine/calibration/pair-model.ts";
import { factorSymmetric, invertSymmetric } from "#app/engine/calibration/symmetric.ts";
import { sagittasAfter } from "#app/engine/inverse/flow-questions.ts";
import { relative } from "../relative.ts";
import { adhesive, addition, bondStep, carrier, exact, flow, grindStep, step, tapeStep, um } from "./flow-samples.ts";

const TRUE = [
  { quantity: "lockedInModulus", value: 0.12e9 },
  { quantity: "carrierExpansion", value: 3.1e-6 },
] as const;
const BOTH: Calibrated[] = ["lockedInModulus", "carrierExpansion"];

const glass = carrier({
  material: "glass",
  youngsModulus: exact(74e9),
  poissonsRatio: exact(0.2),
  expansion: exact(3.4e-6),
  thickness: exact(um(700)),
});
const glue = adhesive({ effectiveModulus: exact(0.3e9), expansionBelow: exact(65e-6) });
const pair = flow(
  [
    step({ adds: [addition({ thickness: exact(um(4)) })] }),
    bondStep({}, glue, glass),
    ...[300, 100, 50].map((left) =>
      grindStep(left, null, { title: `Grind to ${left}`, planned: "carrier", groundFaceForce: exact(0) }),
    ),
    tapeStep(),
  ],
  { diameter: 0.3, thickness: 775 },
);
const truth = sagittasAfter(withCalibration(pair, TRUE));
const measured = (number: number, noise = 0, u = um(3)): PairMeasurement => ({
  flow: pair,
  step: number,
  sagitta: (truth[number - 1] ?? NaN) + noise,
  standardUncertainty: u,
});

/** Numbers between 0 and 1 and normal deviates, the same on every machine. */
function deviates(seed: number) {
  let state = seed;
  const uniform = () => {
    state = (Math.imul(state, 1664525) + 1013904223) >>> 0;
    return (state + 0.5) / 2 ** 32;
  };
  return () => Math.sqrt(-2 * Math.log(uniform())) * Math.cos(2 * Math.PI * uniform());
}

function fitted(result: Calibration) {
  if (result.kind !== "fitted") throw new Error(result.reason);
  return result;
}

describe("calibration of a pair", () => {
  it("gives back the values that exact bows were made with", () => {
    const { values, chiSquare, degreesOfFreedom, residuals, correlation } = fitted(
      calibratePair(
        [2, 3, 4, 5].map((number) => measured(number)),
        BOTH,
      ),
    );
    values.forEach(({ value, quantity }, n) => {
      expect(quantity).toBe(TRUE[n]?.quantity);
      expect(relative(value, TRUE[n]?.value ?? 0)).toBeLessThan(1e-3);
    });
    expect(chiSquare).toBeLessThan(1e-3);
    expect(degreesOfFreedom).toBe(2);
    residuals.forEach((residual) => expect(Math.abs(residual)).toBeLessThan(um(0.1)));
    expect(correlation[0]?.[0]).toBeCloseTo(1, 12);
    expect(Math.abs(correlation[0]?.[1] ?? 2)).toBeLessThan(0.999);
  });

  it("fits one value alone, and then knows it better", () => {
    const both = fitted(calibratePair([measured(2), measured(5)], BOTH));
    const right = withCalibration(pair, [TRUE[0]]);
    const alone = fitted(
      calibratePair(
        [2, 5].map((number) => ({ ...measured(number), flow: right })),
        ["carrierExpansion"],
      ),
    );
    expect(relative(alone.values[0]?.value ?? 0, TRUE[1].value)).toBeLessThan(1e-3);
    expect(alone.values[0]?.standardUncertainty ?? 1).toBeLessThan(both.values[1]?.standardUncertainty ?? 0);
  });

  it("states uncertainties that hold: within twice of them in 95 % of noisy repeats", () => {
    const u = um(3);
    const repeats = 40;
    const next = deviates(20260101);
    const inside = [0, 0];
    for (let repeat = 0; repeat < repeats; repeat += 1) {
      const { values } = fitted(
        calibratePair(
          [2, 3, 4, 5].map((number) => measured(number, u * next(), u)),
          BOTH,
        ),
      );
      values.forEach(({ value, standardUncertainty }, n) => {
        if (Math.abs(value - (TRUE[n]?.value ?? 0)) <= 2 * standardUncertainty) inside[n] = (inside[n] ?? 0) + 1;
      });
    }
    // 95.4 % of 40 is 38.2 with a standard deviation of 1.3: three of those below.
    for (const count of inside) expect(count).toBeGreaterThanOrEqual(34);
  }, 30_000);

  it("takes twice the uncertainty from bows measured half as well", () => {
    const at = (u: number) =>
      fitted(
        calibratePair(
          [2, 3, 4, 5].map((number) => measured(number, 0, u)),
          BOTH,
        ),
      ).values[1];
    expect(relative(at(um(4))?.standardUncertainty ?? 0, 2 * (at(um(2))?.standardUncertainty ?? 1))).toBeLessThan(1e-3);
  });
});

describe("a calibration that the bows cannot give", () => {
  it("is refused with too few of them, and names the bow that would help most", () => {
    const refused = calibratePair([measured(2)], BOTH);
    expect(refused).toMatchObject({ kind: "refused", reason: "1 measured bow cannot give 2 values." });
    expect(refused.kind === "refused" ? refused.wouldHelp : "").toMatch(/after step 5, Grind to 50/);
  });

  it("is refused where two bows tell the same", () => {
    expect(calibratePair([measured(2), measured(2)], BOTH)).toMatchObject({
      kind: "refused",
      reason: expect.stringContaining("not tell"),
    });
  });

  it("is refused where they were measured too badly to be of use", () => {
    const rough = [2, 3, 4, 5].map((number) => measured(number, 0, 0.01));
    expect(calibratePair(rough, BOTH)).toMatchObject({ kind: "refused", reason: expect.stringContaining("open") });
  });

  it.each<[string, PairMeasurement[], Calibrated[], RegExp]>([
    ["nothing to fit", [measured(2)], [], /name nothing/],
    ["no bows", [], BOTH, /measurements/],
    ["a step before the bond", [measured(1), measured(2)], BOTH, /before anything is bonded/],
    ["a step held flat", [measured(2), { ...measured(2), step: 6 }], BOTH, /held flat/],
    ["no uncertainty", [measured(2), measured(3, 0, 0)], BOTH, /standardUncertainty/],
    [
      "a silicon carrier's expansion",
      [{ ...measured(2), flow: flow([bondStep(), bondStep()]), step: 1 }],
      ["carrierExpansion"],
      /expands as silicon/,
    ],
  ])("is refused: %s", (_, bows, quantities, reason) => {
    expect(() => calibratePair(bows, quantities)).toThrow(reason);
  });
});

describe("small symmetric systems", () => {
  it("are solved, and refused when singular", () => {
    const matrix = [
      [4, 2, 0.4],
      [2, 3, 0.5],
      [0.4, 0.5, 2],
    ];
    const solved = factorSymmetric(matrix)?.([1, 2, 3]) ?? [];
    matrix.forEach((row, n) => expect(row.reduce((sum, v, m) => sum + v * (solved[m] ?? 0), 0)).toBeCloseTo(n + 1, 12));
    expect(invertSymmetric([[2]])).toEqual([[0.5]]);
    expect(
      invertSymmetric([
        [1, 1],
        [1, 1],
      ]),
    ).toBeNull();
    expect(factorSymmetric([[0]])).toBeNull();
  });
});
