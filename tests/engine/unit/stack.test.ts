/*
 * What a stack comes to.
 *
 *   h, h_f  silicon and film thickness  m
 *   N       film force                  N/m
 *   R       wafer radius                m
 */
import { describe, expect, it } from "vitest";
import { EngineInputError } from "#app/engine/errors.ts";
import { criticalFilmForce } from "#app/engine/plate/critical-load.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { siliconPlateConstants } from "#app/engine/silicon/plane-constants.ts";
import { estimateStack } from "#app/engine/stack/estimate-stack.ts";
import { withThickness, type StackFilm, type StackInput } from "#app/engine/stack/model.ts";
import { stackSupport } from "#app/engine/stack/stack-support.ts";
import { curlingThickness, thicknessSweep } from "#app/engine/stack/thickness-sweep.ts";
import { stackWorking } from "#app/engine/stack/working.ts";
import { relative } from "../relative.ts";

const COPPER: StackFilm = {
  side: "front",
  thickness: 5e-6,
  stress: 200e6,
  youngsModulus: 117e9,
  poissonsRatio: 0.34,
  expansion: 16.7e-6,
  coverage: 0.35,
};
const NO_FILM = { diameter: 0.2, orientation: "100" as const, thickness: 725e-6 };
const stackOf = (films: StackFilm[], wafer: Partial<StackInput["wafer"]> = {}): StackInput => ({
  wafer: { ...NO_FILM, ...wafer },
  films,
});
const limits = defaultLimits();

describe("estimateStack", () => {
  it("gives a bare wafer no bow, no force and no load", () => {
    const { stoney, laminate, shape, filmForce } = estimateStack(stackOf([]));
    expect([stoney.sagitta, laminate.sagitta, shape.warp, shape.stabilityRatio]).toEqual([0, 0, 0, 0]);
    expect(filmForce).toEqual({ front: 0, back: 0, films: [] });
  });

  it("adds the forces of each side, covered area counted", () => {
    const back: StackFilm = { ...COPPER, side: "back", thickness: 1e-6, coverage: undefined };
    const { filmForce } = estimateStack(stackOf([COPPER, { ...COPPER, thickness: 2e-6 }, back]));
    expect(relative(filmForce.front, 7e-6 * 200e6 * 0.35)).toBeLessThan(1e-12);
    expect(relative(filmForce.back, 200)).toBeLessThan(1e-12);
    expect(filmForce.films).toHaveLength(3);
    expect(relative((filmForce.films[0] ?? 0) + (filmForce.films[1] ?? 0), filmForce.front)).toBeLessThan(1e-12);
    expect(filmForce.films[2]).toBe(filmForce.back);
  });

  it("lets Stoney and the laminate agree on a thin film at another temperature as well", () => {
    const thin = { ...COPPER, thickness: 10e-9 };
    for (const temperature of [298.15, 400, 520]) {
      const { stoney, laminate } = estimateStack({ ...stackOf([thin]), temperature });
      // Three film thicknesses over the wafer's is 4e-5; the laminate's silicon expands as Stoney's does.
      expect(relative(stoney.curvature, laminate.curvature)).toBeLessThan(1e-4);
    }
  });
});

describe("curlingThickness", () => {
  it("is where a thin film's force is the critical one", () => {
    const film = { ...COPPER, thickness: 1e-9, stress: 5e9, coverage: 1 };
    const found = curlingThickness(stackOf([film]), 2e-3) ?? NaN;
    const critical = criticalFilmForce({
      ...siliconPlateConstants("100"),
      radius: 0.1,
      thickness: found,
      crystal: "100",
    });
    expect(relative(critical, 5)).toBeLessThan(1e-4);
  });

  it("is the limit from the thick end where balanced films leave a flat stretch further down", () => {
    const front = { ...COPPER, thickness: 2e-6, coverage: 1 };
    const back: StackFilm = {
      side: "back",
      thickness: 20e-6,
      stress: 15e6,
      youngsModulus: 3e9,
      poissonsRatio: 0.35,
    };
    const stack = stackOf([front, back], { diameter: 0.3 });
    const regime = (thickness: number) => estimateStack(withThickness(stack, thickness)).shape.regime;
    expect(regime(61.5e-6)).not.toBe("curled");
    expect(regime(100e-6)).toBe("curled");
    const limit = curlingThickness(stack, 2e-3) ?? NaN;
    expect(limit).toBeGreaterThan(200e-6);
    expect(regime(limit * 0.9999)).toBe("curled");
    expect(regime(limit * 1.0001)).not.toBe("curled");
  });

  it("is null for a wafer that never rolls, and the thick end for one that always does", () => {
    expect(curlingThickness(stackOf([]), 2e-3)).toBeNull();
    expect(curlingThickness(stackOf([{ ...COPPER, thickness: 500e-6, stress: 1e9 }]), 2e-3)).toBe(2e-3);
  });
});

describe("thicknessSweep", () => {
  it("ends exactly where it was asked to and agrees with the estimate at each point", () => {
    const back: StackFilm = { ...COPPER, side: "back", thickness: 1e-6, stress: -80e6 };
    const stack = { ...stackOf([COPPER, back]), temperature: 400 };
    const points = thicknessSweep(stack, { from: 20e-6, to: 725e-6, points: 60 });
    expect(points.map(({ thickness }) => thickness).at(0)).toBe(20e-6);
    expect(points.map(({ thickness }) => thickness).at(-1)).toBe(725e-6);
    for (const { thickness, warp, linearWarp, regime } of points) {
      const { shape, stoney } = estimateStack(withThickness(stack, thickness));
      // What `shapeCurve` states of itself; the thin-film formula to rounding.
      expect(relative(warp, shape.warp)).toBeLessThan(1e-4);
      expect(relative(linearWarp, Math.abs(stoney.sagitta))).toBeLessThan(1e-12);
      expect(regime).toBe(shape.regime);
    }
  });

  it.each([
    [{ from: 0, to: 1e-4, points: 5 }, "sweep"],
    [{ from: 1e-4, to: 1e-4, points: 5 }, "sweep"],
    [{ from: 1e-5, to: 1e-4, points: 1 }, "sweep.points"],
    [{ from: 1e-5, to: 1e-4, points: 2.5 }, "sweep.points"],
    [{ from: 1e-5, to: 1e-4, points: 501 }, "sweep.points"],
  ])("refuses %o", (range, field) => {
    expect(() => thicknessSweep(stackOf([COPPER]), range)).toThrowError(expect.objectContaining({ field }));
  });
});

describe("stackSupport", () => {
  /** Diameter, silicon, tolerance (µm) and the support by thickness alone: at each limit and just below it. */
  it.each([
    [0.15, 250, 0, "bare"],
    [0.15, 249.999, 0, "thin-wafer gripper"],
    [0.2, 300, 0, "bare"],
    [0.2, 299.999, 0, "thin-wafer gripper"],
    [0.2, 180, 0, "thin-wafer gripper"],
    [0.2, 179.999, 0, "tape or ring"],
    [0.3, 450, 0, "bare"],
    [0.3, 449.999, 0, "thin-wafer gripper"],
    [0.3, 250, 0, "thin-wafer gripper"],
    [0.3, 249.999, 0, "tape or ring"],
    [0.3, 50, 0, "tape or ring"],
    [0.3, 49.999, 0, "carrier"],
    // Nominal minus tolerance counts, and a subtraction's rounding does not.
    [0.2, 303, 3, "bare"],
    [0.2, 302.999, 3, "thin-wafer gripper"],
    [0.15, 251, 1, "bare"],
    [0.2, 185, 5, "thin-wafer gripper"],
    [0.3, 52, 2, "tape or ring"],
    [0.3, 54, 4, "tape or ring"],
  ])("of a %f m wafer of %f ± %f µm without films is %s", (diameter, thickness, tolerance, support) => {
    const wafer = { diameter, thickness: thickness * 1e-6, thicknessTolerance: tolerance * 1e-6 };
    expect(stackSupport(stackOf([], wafer), limits)?.class).toBe(support);
  });

  it("is raised to tape or ring where the free wafer rolls, at its thinnest", () => {
    const film: StackFilm = { ...COPPER, coverage: 1 };
    const limit = curlingThickness(stackOf([film]), 2e-3) ?? NaN;
    expect(limit).toBeGreaterThan(300e-6);
    expect(stackSupport(stackOf([film], { thickness: limit * 1.001 }), limits)?.class).toBe("bare");
    expect(stackSupport(stackOf([film], { thickness: limit * 0.999 }), limits)).toEqual({
      class: "tape or ring",
      because: "free, it would roll about one axis",
    });
    const reaching = { thickness: limit * 1.001, thicknessTolerance: limit * 0.002 };
    expect(stackSupport(stackOf([film], reaching), limits)?.class).toBe("tape or ring");
  });

  it("is raised where it rolls at the temperature asked for only, and says so", () => {
    const stack = stackOf([{ ...COPPER, stress: 0, coverage: 1 }], { thickness: 400e-6 });
    expect(stackSupport(stack, limits)?.class).toBe("bare");
    expect(stackSupport({ ...stack, temperature: 518.15 }, limits)).toEqual({
      class: "tape or ring",
      because: "free at 245\u00A0°C, it would roll about one axis",
    });
  });

  it("is unknown above 300 mm", () => {
    expect(stackSupport(stackOf([], { diameter: 0.45 }), limits)).toBeNull();
  });

  it("refuses a tolerance that leaves no silicon", () => {
    const wafer = { thickness: 100e-6, thicknessTolerance: 100e-6 };
    expect(() => stackSupport(stackOf([], wafer), limits)).toThrow(EngineInputError);
  });
});

describe("stackWorking", () => {
  const stack = stackOf([COPPER, { ...COPPER, side: "back", thickness: 1e-6 }], { thickness: 200e-6 });
  const estimate = estimateStack(stack);
  const working = stackWorking(stack, estimate);

  it("ends in the figures of the estimate", () => {
    expect(working.shape.result.value).toBe(estimate.shape.bowMajor);
    expect(working.stoney.result.value).toBe(estimate.stoney.sagitta);
  });

  it("adds up film by film, a back film against the others", () => {
    const curvatures = (working.stoney.from ?? []).map(({ result }) => result.value);
    expect(curvatures.map(Math.sign)).toEqual([1, -1]);
    const sum = curvatures.reduce((total, value) => total + value, 0);
    expect(relative(sum, estimate.stoney.curvature)).toBeLessThan(1e-12);
  });

  it("gives every film's force, tension positive on either side", () => {
    expect(working.filmForces.map(({ result }) => Math.round(result.value))).toEqual([350, 70]);
  });

  it("rests on the laminate and on the onset of rolling", () => {
    expect((working.shape.from ?? []).map(({ equation }) => equation)).toEqual(["laminate", "critical-curvature"]);
  });
});
