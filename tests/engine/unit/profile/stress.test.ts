/*
 *   σ    film stress                     Pa    tension positive
 *   κ    curvature                       1/m   bowl positive
 *   u    standard uncertainty, ν its degrees of freedom
 */
import { describe, expect, it } from "vitest";
import { solveLaminate } from "#app/engine/laminate/solve-laminate.ts";
import { directionalStoneyCurvature } from "#app/engine/patterned/directional-stoney.ts";
import { freeWaferShape } from "#app/engine/plate/free-wafer-shape.ts";
import { directionalFilmStress } from "#app/engine/profile/stress/directional-stress.ts";
import { stressBothWays } from "#app/engine/profile/stress/full-model.ts";
import { gravityRemark } from "#app/engine/profile/stress/gravity-remark.ts";
import { stressBudget, type StressBudgetInput } from "#app/engine/profile/stress/stress-budget.ts";
import { referenceCheck, repeatabilityStudy } from "#app/engine/profile/tool/repeatability.ts";
import { siliconBiaxialModulus } from "#app/engine/silicon/biaxial-modulus.ts";
import { siliconDirectionalConstants, siliconPlateConstants } from "#app/engine/silicon/plane-constants.ts";
import { stoneyStress } from "#app/engine/stoney/stoney.ts";
import { relative } from "../../relative.ts";

/** Curvature that a scan of a coated free wafer would show. */
function scanned(
  wafer: { radius: number; thickness: number },
  film: { thickness: number; stress: number; youngsModulus: number; poissonsRatio: number },
) {
  const silicon = siliconPlateConstants("100");
  const stack = solveLaminate([{ ...silicon, thickness: wafer.thickness }, film]);
  return freeWaferShape({
    radius: wafer.radius,
    thickness: stack.effectiveThickness,
    ...silicon,
    crystal: "100",
    linearCurvature: stack.curvature,
  }).parabolaCurvatureMajor;
}

describe("stressBothWays", () => {
  it.each([
    [100e6, 1e-6, 775e-6],
    [-250e6, 5e-6, 400e-6],
    [15e6, 10e-6, 200e-6],
  ])("leads the scan back to %d Pa of a film of %d m on %d m", (stress, thickness, substrateThickness) => {
    const film = { youngsModulus: 110e9, poissonsRatio: 0.35 };
    const after = scanned({ radius: 0.075, thickness: substrateThickness }, { ...film, thickness, stress });
    const found = stressBothWays({
      before: 0,
      after,
      radius: 0.075,
      substrateThickness,
      orientation: "100",
      filmThickness: thickness,
      film,
    });
    expect(relative(found.full ?? 0, stress)).toBeLessThan(1e-9);
  });

  it("agrees with Stoney for a thin film and a small bow, and says when not", () => {
    const common = { before: 0, radius: 0.1, orientation: "100" as const };
    const thin = stressBothWays({ ...common, after: 0.001, substrateThickness: 725e-6, filmThickness: 100e-9 });
    expect(thin.differs).toBe(false);
    expect(Math.abs(thin.difference ?? 1)).toBeLessThan(1e-3);
    const thick = stressBothWays({ ...common, after: 0.01, substrateThickness: 300e-6, filmThickness: 10e-6 });
    expect(thick.differs).toBe(true);
    // As stiff as the wafer: (1 + η)³ of Stoney's, less what the larger thickness adds to the plate.
    expect(relative(thick.byThickness ?? 0, (1 + 10 / 300) ** 3 - 1)).toBeLessThan(0.01);
    expect(thick.sentence).toMatch(/further towards tension: .* The film's stiffness is not given/);
    expect(stressBothWays({ ...common, after: 0, substrateThickness: 300e-6, filmThickness: 10e-6 })).toMatchObject({
      stoney: 0,
      full: 0,
    });
  });

  it("gives none when the wafer has rolled", () => {
    const rolled = stressBothWays({
      before: 0,
      after: 1,
      radius: 0.1,
      substrateThickness: 100e-6,
      orientation: "100",
      filmThickness: 1e-6,
    });
    expect(rolled.full).toBeNull();
    expect(rolled.sentence).toMatch(/has rolled/);
  });
});

describe("directionalFilmStress", () => {
  const film = { filmThickness: 1e-6, substrateThickness: 725e-6, orientation: "100" as const };

  it("with equal curvatures it is Stoney's", () => {
    const { stress, principal } = directionalFilmStress({ ...film, change: { x: 0.01, y: 0.01, twist: 0 } });
    const expected = stoneyStress({ ...film, curvatureChange: 0.01, biaxialModulus: siliconBiaxialModulus("100") });
    expect(relative(stress.x, expected)).toBeLessThan(1e-12);
    expect(relative(principal.low, expected)).toBeLessThan(1e-12);
  });

  it("undoes the directional thin-film relation along <110>", () => {
    const change = directionalStoneyCurvature({
      force: { x: 150, y: 40 },
      substrateThickness: 725e-6,
      ...siliconDirectionalConstants("110"),
    });
    const { stress } = directionalFilmStress({ ...film, change: { ...change, twist: 0 } });
    expect(relative(stress.x, 150e6)).toBeLessThan(1e-9);
    expect(relative(stress.y, 40e6)).toBeLessThan(1e-9);
  });

  it("finds a pull at 45° to the notch from the twist", () => {
    const { principal } = directionalFilmStress({
      ...film,
      orientation: "111",
      change: { x: 0.01, y: 0.01, twist: 0.004 },
    });
    expect(principal.angle).toBeCloseTo(Math.PI / 4, 12);
    expect(principal.high).toBeGreaterThan(principal.low);
  });
});

describe("stressBudget", () => {
  const exact = { standardUncertainty: 0 };
  const monitor: StressBudgetInput = {
    before: 0.02,
    after: 0.03,
    filmThickness: 1e-6,
    substrateThickness: 725e-6,
    biaxialModulus: siliconBiaxialModulus("100"),
    fit: { standardUncertainty: 0.000282855 },
    uncertainties: {
      substrateThickness: { standardUncertainty: 1.5e-6 },
      biaxialModulus: { standardUncertainty: 0.01 * siliconBiaxialModulus("100") },
      filmThickness: { standardUncertainty: 1e-8 },
    },
  };
  const quiet = { substrateThickness: exact, biaxialModulus: exact, filmThickness: exact };
  const line = (input: string, i: StressBudgetInput) => stressBudget(i).lines.find((l) => l.input === input);

  it("meets the worked example: 157.88 MPa, u 5.035 MPa, U 10.07 MPa", () => {
    const { stress, standardUncertainty, expandedUncertainty, coverageFactor } = stressBudget(monitor);
    // Four digits written down.
    expect(relative(stress, 157.877e6)).toBeLessThan(1e-5);
    expect(relative(standardUncertainty, 5.035e6)).toBeLessThan(2e-4);
    expect(relative(expandedUncertainty, 10.07e6)).toBeLessThan(2e-4);
    expect(coverageFactor).toBeCloseTo(2, 5);
  });

  it("the reference's curvature cancels on one tool and not on two", () => {
    const tool = { offset: { standardUncertainty: 1e-3 } };
    const one = line("curvature of the tool's reference", { ...monitor, tool });
    expect(one).toMatchObject({ contribution: 0, shared: "common, cancels" });
    expect(stressBudget({ ...monitor, tool }).standardUncertainty).toBe(stressBudget(monitor).standardUncertainty);
    const two = line("curvature of the tool's reference", { ...monitor, tool, sameTool: false });
    // 1e-3 of 0.01 1/m, for two scans.
    expect(relative(two?.contribution, Math.SQRT2 * 0.1 * 157.877e6)).toBeLessThan(1e-4);
  });

  it("a calibration scales the change, not each large curvature, and positions count twice", () => {
    const tool = {
      heightCalibration: { standardUncertainty: 0.01 },
      positionCalibration: { standardUncertainty: 0.01 },
    };
    const alone = { ...monitor, uncertainties: quiet, fit: exact, tool };
    expect(relative(line("height calibration", alone)?.contribution, 1.57877e6)).toBeLessThan(1e-5);
    expect(relative(line("position calibration", alone)?.contribution, 2 * 1.57877e6)).toBeLessThan(1e-5);
    const two = line("height calibration", { ...alone, sameTool: false });
    expect(relative(two?.contribution, (Math.hypot(0.02, 0.03) / 0.01) * 1.57877e6)).toBeLessThan(1e-5);
  });

  it("repeatability holds the scatter: the larger counts", () => {
    const repeats = (u: number) => ({
      ...monitor,
      tool: { repeatability: { standardUncertainty: u, degreesOfFreedom: 9 } },
    });
    expect(line("repeatability of the tool", repeats(4e-4))?.standardUncertainty).toBeCloseTo(Math.SQRT2 * 4e-4, 12);
    expect(line("scatter of the scans", repeats(1e-5))?.standardUncertainty).toBe(0.000282855);
  });

  it("few repeats widen the expanded uncertainty by Welch and Satterthwaite", () => {
    const { degreesOfFreedom, coverageFactor } = stressBudget({
      ...monitor,
      uncertainties: quiet,
      tool: { repeatability: { standardUncertainty: 4e-4, degreesOfFreedom: 5 } },
    });
    expect(degreesOfFreedom).toBeCloseTo(5, 9);
    // JCGM 100, table G.2: 2.65 at 95.45 %.
    expect(coverageFactor).toBeCloseTo(2.65, 2);
  });
});

describe("tool", () => {
  it("repeats: pooled standard deviation and its degrees of freedom", () => {
    const study = repeatabilityStudy([[1, 2, 3], [11, 13], [7]]);
    expect(study.degreesOfFreedom).toBe(3);
    expect(study.standardUncertainty).toBeCloseTo(Math.sqrt((2 + 2) / 3), 12);
    expect(study.fewRepeats).toBeCloseTo(3.307 / 2, 3);
    expect(study.remark).toMatch(/3 degrees of freedom/);
    expect(() => repeatabilityStudy([[1], [2]])).toThrow(/no wafer was read twice/);
  });

  it("reference wafer: bias, drift, and readings that fail", () => {
    const day = 86400;
    const check = referenceCheck({
      known: { value: -62e-6, standardUncertainty: 0.2e-6 },
      readings: [0, 1, 2, 3, 4].map((n) => ({ at: n * day, value: -62e-6 + n * 0.5e-6 })),
      toolUncertainty: 0.3e-6,
    });
    expect(check.bias).toBeCloseTo(1e-6, 12);
    expect(check.biased).toBe(true);
    expect(check.drift?.told).toBe(true);
    expect(relative((check.drift?.perSecond ?? 0) * day, 0.5e-6)).toBeLessThan(1e-9);
    expect(check.readings.map(({ passes }) => passes)).toEqual([true, true, false, false, false]);
  });
});

describe("gravityRemark", () => {
  const pins = { kind: "points", count: 3, radius: 0.15 } as const;
  const wafer = { radius: 0.15, orientation: "100", support: pins } as const;
  it("says whether the sag is in the figure", () => {
    const one = gravityRemark({ ...wafer, thickness: 775e-6, taken: "one scan" });
    expect(one.included).toBe(true);
    expect(one.sentence).toMatch(/sags 170.µm on points: that is in this figure/);
    expect(gravityRemark({ ...wafer, thickness: 775e-6, taken: "two scans on the same support" }).included).toBe(false);
    expect(gravityRemark({ ...wafer, thickness: 100e-6, taken: "two scans on the same support" }).sentence).toMatch(
      /do not add/,
    );
  });
});
