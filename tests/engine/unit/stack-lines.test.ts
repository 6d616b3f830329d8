/*
 * A stack with a film cut in lines.
 *
 *   σ, h_f  stress and thickness of the film   Pa, m
 *   f       area fraction covered              1
 *   N_x     force along the notch axis         N/m
 *   φ       direction of the lines from x      rad
 */
import { describe, expect, it } from "vitest";
import { EngineInputError } from "#app/engine/errors.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { linesPattern } from "#app/engine/patterned/pattern.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { estimateStack, pullOf } from "#app/engine/stack/estimate-stack.ts";
import type { StackFilm, StackInput } from "#app/engine/stack/model.ts";
import { curlingThickness, thicknessSweep } from "#app/engine/stack/thickness-sweep.ts";
import { warpUncertainty } from "#app/engine/stack/warp-uncertainty.ts";
import { stackWorking } from "#app/engine/stack/working.ts";
import { relative } from "../relative.ts";
import { addition, exact, film as flowFilm, flow, step, um } from "./flow-samples.ts";

const film = (width: number, direction = 0, more: Partial<StackFilm> = {}): StackFilm => ({
  side: "front",
  thickness: 5e-6,
  stress: 200e6,
  youngsModulus: 117e9,
  poissonsRatio: 0.34,
  expansion: 16.7e-6,
  coverage: 0.4,
  lines: { width, direction },
  ...more,
});
const stack = (films: StackFilm[], thickness = 300e-6): StackInput => ({
  wafer: { diameter: 0.2, orientation: "100", thickness },
  films,
});
const shapeOf = (input: StackInput) => estimateStack(input).shape;

describe("the limits of lines", () => {
  const blanket = 0.4 * 200e6 * 5e-6;

  it("wide ones pull with their coverage in both directions", () => {
    const { x, y } = pullOf(film(0.05));
    // Of 50 mm the edges of some micrometres relieve less than a part in a thousand.
    expect(relative(x, blanket)).toBeLessThan(1e-3);
    expect(relative(y, blanket)).toBeLessThan(1e-3);
    const alike = { ...film(0.05), lines: undefined };
    expect(relative(shapeOf(stack([film(0.05)], 725e-6)).warp, shapeOf(stack([alike], 725e-6)).warp)).toBeLessThan(
      1e-3,
    );
  });

  it("narrow tall ones pull along their length alone", () => {
    const { x, y } = pullOf(film(1e-9));
    expect(relative(x, blanket * (1 - 0.34))).toBeLessThan(1e-6);
    expect(Math.abs(y)).toBeLessThan(1e-6 * blanket);
    const saddle = shapeOf(stack([film(1e-9)], 725e-6));
    expect(saddle.bowMajor * saddle.bowMinor).toBeLessThan(0);
  });
});

describe("lines", () => {
  it("turned by 90° turn the axis and nothing else", () => {
    const along = estimateStack(stack([film(10e-6)]));
    const across = estimateStack(stack([film(10e-6, Math.PI / 2)]));
    expect(relative(across.shape.warp, along.shape.warp)).toBeLessThan(1e-9);
    expect(relative(across.stoney.curvature, along.stoney.curvature)).toBeLessThan(1e-9);
    const [first, second] = [along, across].map(({ unequal }) => unequal?.principal.angle ?? NaN);
    expect(Math.abs(Math.cos((first ?? 0) - (second ?? 0)))).toBeLessThan(1e-9);
  });

  it("of the same film along and across cancel the difference", () => {
    const { unequal } = estimateStack(
      stack([film(10e-6, 0, { coverage: 0.2 }), film(10e-6, Math.PI / 2, { coverage: 0.2 })], 725e-6),
    );
    // Only that one lies over the other is left.
    expect(relative(unequal?.principal.major ?? 0, unequal?.principal.minor ?? 1)).toBeLessThan(0.02);
  });

  it("agree with the same film put down by the first step of a flow", () => {
    const made = film(8e-6, 0.3);
    const material = flowFilm({
      kind: "inorganic",
      youngsModulus: exact(made.youngsModulus),
      poissonsRatio: exact(made.poissonsRatio),
      expansion: exact(made.expansion ?? 0),
    });
    const adds = [
      addition({
        film: material,
        thickness: exact(made.thickness),
        stress: exact(made.stress),
        coverage: 0.4,
        pattern: linesPattern({ width: 8e-6, direction: 0.3 }, 0.4),
      }),
    ];
    const flowed = flow([step({ adds })]);
    const [state] = walkFlow(flowed, defaultLimits()).steps;
    const { diameter, orientation, thickness } = flowed.wafer;
    const estimate = estimateStack({ wafer: { diameter, orientation, thickness: thickness.value }, films: [made] });
    expect(relative(estimate.shape.bowMajor, state?.released.sagitta ?? NaN)).toBeLessThan(1e-9);
    expect(relative(estimate.shape.bowMinor, state?.released.sagittaMinor ?? NaN)).toBeLessThan(1e-9);
  });

  it("have a curve that is the estimate at each point, and a curling limit on either side of which it differs", () => {
    const input = stack([film(20e-6)]);
    for (const point of thicknessSweep(input, { from: um(60), to: um(700), points: 5 })) {
      const { shape } = estimateStack(stack([film(20e-6)], point.thickness));
      expect(point).toMatchObject({ warp: shape.warp, regime: shape.regime });
    }
    const curls = curlingThickness(input, 2e-3) ?? NaN;
    expect(shapeOf(stack([film(20e-6)], curls * 0.999)).regime).toBe("curled");
    expect(shapeOf(stack([film(20e-6)], curls * 1.001)).regime).not.toBe("curled");
  });

  it("carry their tolerance into the warp, and show both curvatures in the working", () => {
    const input = stack([film(20e-6, 0, { stressTolerance: 20e6 })], 725e-6);
    const uncertainty = warpUncertainty(input)?.standardUncertainty ?? NaN;
    // The warp is proportional to the stress; a rectangle of ± 10 % has a standard uncertainty of 10 %/√3.
    expect(relative(uncertainty, (shapeOf(input).warp * 0.1) / Math.sqrt(3))).toBeLessThan(0.02);
    const { shape, stoney, filmForces } = stackWorking(input, estimateStack(input));
    expect(shape.from?.slice(0, 2).map(({ equation }) => equation)).toEqual([
      "directional-laminate",
      "directional-laminate",
    ]);
    expect(stoney.from?.map(({ equation }) => equation)).toEqual(["directional-stoney"]);
    expect(filmForces.map(({ equation }) => equation)).toEqual(["patterned-film"]);
  });

  it("of no width are refused by the place of the film", () => {
    expect(() => estimateStack(stack([film(0)]))).toThrow(EngineInputError);
    expect(() => estimateStack(stack([film(0)]))).toThrow(/layers\[1\]\.lineWidth/);
  });
});
