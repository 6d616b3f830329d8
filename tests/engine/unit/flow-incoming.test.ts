/*
 * A wafer that comes in with a shape.
 *
 *   κ_x, κ_y  curvature along and across the notch, bowl positive      1/m
 *   h         silicon thickness                                        m
 *
 * The moments of both parts are exact, so tolerances are those of rounding.
 */
import { describe, expect, it } from "vitest";
import type { FlowInput, IncomingShape, StepInput } from "#app/engine/flow/model.ts";
import { incomingFromBows } from "#app/engine/flow/silicon.ts";
import { flowUncertainty } from "#app/engine/flow/uncertainty.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { warpWorking } from "#app/engine/rules/warp-working.ts";
import { relative } from "../relative.ts";
import { addition, bondStep, debondStep, exact, flow, grindStep, step, um } from "./flow-samples.ts";

const limits = defaultLimits();
const shape = (x: number, y: number, filmShare: number | null): IncomingShape => ({
  curvature: { x: exact(x), y: exact(y) },
  filmShare: filmShare === null ? null : exact(filmShare),
});
const coming = (incoming: IncomingShape, steps: StepInput[]): FlowInput => {
  const plain = flow(steps);
  return { ...plain, wafer: { ...plain.wafer, incoming } };
};
const last = (input: FlowInput) => {
  const found = walkFlow(input, limits).steps.at(-1);
  if (!found) throw new Error("the flow has a step");
  return found;
};
const curvature = (input: FlowInput) => last(input).released.linearCurvature;
const thinned = (micrometres: number) => [
  step(),
  grindStep(micrometres, null, { planned: "bare", groundFaceForce: exact(0) }),
];

describe("incoming shape", () => {
  it.each([0, 0.4, 1])("is what was measured, whatever its parts: film share %s", (share) => {
    expect(relative(curvature(coming(shape(3e-3, 3e-3, share), [step()])), 3e-3)).toBeLessThan(1e-9);
  });

  it("grows as 1/h^2 where films cause it, and stays where the crystal does", () => {
    const film = curvature(coming(shape(1e-3, 1e-3, 1), thinned(100)));
    expect(relative(film, 1e-3 * (725 / 100) ** 2)).toBeLessThan(1e-9);
    const crystal = curvature(coming(shape(1e-3, 1e-3, 0), thinned(100)));
    expect(relative(crystal, 1e-3)).toBeLessThan(1e-9);
    const both = curvature(coming(shape(1e-3, 1e-3, 0.25), thinned(100)));
    expect(relative(both, 0.25 * film + 0.75 * crystal)).toBeLessThan(1e-9);
  });

  it("keeps both directions apart", () => {
    const found = last(coming(shape(3e-3, -1e-3, 0.5), [step()])).released;
    expect(relative(found.unequal?.curvatureX ?? 0, 3e-3)).toBeLessThan(1e-9);
    expect(relative(found.unequal?.curvatureY ?? 0, -1e-3)).toBeLessThan(1e-9);
    expect(found.sagitta).toBeGreaterThan(0);
    expect(found.sagittaMinor).toBeLessThan(0);
    expect(last(coming(shape(0.02, -0.02, 0.5), [step()])).lies).toBe("saddle");
  });

  it("shows the working of both directions", () => {
    const { from } = warpWorking(last(coming(shape(3e-3, 1e-3, 0.5), [step()])).released);
    expect(from?.map(({ equation }) => equation)).toEqual(["directional-laminate", "directional-laminate"]);
    expect(relative(from?.[0]?.result.value ?? 0, 3e-3)).toBeLessThan(1e-9);
  });

  it("adds to that of films", () => {
    const thin = [step({ adds: [addition({ thickness: exact(10e-9) })] })];
    const films = curvature(flow(thin));
    expect(relative(curvature(coming(shape(1e-3, 1e-3, 1), thin)), films + 1e-3)).toBeLessThan(1e-4);
  });

  it("comes back after bonding, thinning and debonding as after thinning alone", () => {
    const through = [
      step(),
      bondStep(),
      grindStep(100, null, { planned: "carrier", groundFaceForce: exact(0) }),
      debondStep({ planned: "bare" }),
    ];
    const [direct, bonded] = [thinned(100), through].map(
      (steps) => last(coming(shape(2e-3, 1e-3, 0.6), steps)).released.unequal,
    );
    expect(relative(bonded?.curvatureX ?? 0, direct?.curvatureX ?? 1)).toBeLessThan(1e-9);
    expect(relative(bonded?.curvatureY ?? 0, direct?.curvatureY ?? 1)).toBeLessThan(1e-9);
  });

  it("is taken as film where nobody knows, and the first step says so", () => {
    const unknown = coming(shape(1e-3, 1e-3, null), thinned(100));
    expect(curvature(unknown)).toBe(curvature(coming(shape(1e-3, 1e-3, 1), thinned(100))));
    const [first, second] = walkFlow(unknown, limits).steps;
    expect(first?.remarks).toEqual([expect.stringContaining("taken as film")]);
    expect(second?.remarks).toEqual([]);
  });

  it("carries its uncertainty", () => {
    const measured: IncomingShape = {
      curvature: { x: exact(1e-3, 1e-4), y: exact(1e-3, 1e-4) },
      filmShare: exact(0.5, 0.2),
    };
    const names = flowUncertainty(coming(measured, thinned(300)), limits)
      .at(-1)
      ?.budget.map(({ input }) => input);
    expect(names).toEqual(expect.arrayContaining(["Incoming curvature along x", "Film part of the incoming shape"]));
  });

  it("is read from standard bows: centre up is a dome", () => {
    const { curvature: found } = incomingFromBows({
      radius: 0.15,
      bowX: exact(um(90), um(9)),
      bowY: exact(um(-45)),
      filmShare: null,
    });
    expect(relative(found.x.value, (-2 * um(90)) / 0.15 ** 2)).toBeLessThan(1e-12);
    expect(relative(found.x.tolerance ?? 0, (2 * um(9)) / 0.15 ** 2)).toBeLessThan(1e-12);
    expect(found.y.value).toBeGreaterThan(0);
  });

  it.each([shape(NaN, 0, 1), shape(1e-3, 1e-3, 1.2), shape(1e-3, 1e-3, -0.1)])("is refused out of range", (bad) => {
    expect(() => last(coming(bad, [step()]))).toThrow(/wafer\.incoming/);
  });
});
