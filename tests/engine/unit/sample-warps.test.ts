/*
 * Wafers drawn within the tolerances of a flow and carried through its steps.
 *
 *   w      warp, positive with the edges up on the tool     m
 *   σ      film stress                                      Pa
 *   t      half-width of a tolerance                        as its quantity
 *   p      share of wafers beyond a limit                   1
 */
import { describe, expect, it } from "vitest";
import { sampledWarps, type SampledWarps } from "#app/engine/flow/sample-warps.ts";
import { moved, unknowns } from "#app/engine/flow/unknowns.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { warpResponses } from "#app/engine/flow/warp-response.ts";
import type { FlowInput } from "#app/engine/flow/model.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { relative } from "../relative.ts";
import { addition, adhesive, bondStep, carrier, celsius, exact, film, flow, step, tool, um } from "./flow-samples.ts";

const limits = defaultLimits();

function drawn(input: FlowInput, draws = 20_000, seed = 1): SampledWarps {
  const run = sampledWarps(input, limits, { draws, seed });
  for (;;) {
    const next = run.next();
    if (next.done) return next.value;
    expect(next.value.of).toBe(draws);
  }
}

const warpAt = (found: SampledWarps, index: number) => {
  const warp = found.steps[index]?.warps[0];
  if (!warp) throw new Error("the step has a warp");
  return warp;
};

/** A film of a small force: warp is a straight function of its stress. */
const pulling = (stress: number, tolerance: number | null) =>
  addition({ thickness: exact(um(0.1)), stress: exact(stress, tolerance) });

describe("the spread of a warp from one stress alone", () => {
  const at = (limit: number) => tool({ warpLimitEdgesUp: exact(limit) });
  const planned = flow([step({ adds: [pulling(100e6, 20e6)], equipment: at(um(1000)) })]);
  const { nominal, band, standardErrors, firstOrder } = warpAt(drawn(planned), 0);

  it("has 5 % beyond each end of nine tenths of a rectangular interval", () => {
    expect(nominal).toBeGreaterThan(0);
    for (const [n, end] of [0.82, 1.18].entries()) {
      expect(Math.abs((band[n] ?? 0) - end * nominal)).toBeLessThan(4 * (standardErrors[n] ?? 0) + 1e-3 * nominal);
      expect(standardErrors[n]).toBeLessThan(0.003 * nominal);
    }
  });

  it("has first-order ends 1.645 t/√3 from the nominal value", () => {
    const apart = (1.6448536 * 0.2) / Math.sqrt(3);
    expect(relative(firstOrder[0], nominal * (1 - apart))).toBeLessThan(1e-3);
    expect(relative(firstOrder[1], nominal * (1 + apart))).toBeLessThan(1e-3);
  });

  it.each([
    ["its nominal value", 1, 0.5],
    ["a tenth above it", 1.1, 0.25],
    ["more than any wafer has", 1.3, 0],
  ])("puts the share beyond a limit at %s where the interval has it", (_, times, share) => {
    const limited = flow([step({ adds: [pulling(100e6, 20e6)], equipment: at(times * nominal) })]);
    const leaving = drawn(limited).steps[0]?.beyond.find(
      ({ edges, when }) => edges === "up" && when === "as it leaves",
    );
    const { probability = -1, standardError = 0 } = leaving?.chance ?? {};
    expect(Math.abs(probability - share)).toBeLessThan(4 * standardError + 0.002);
    expect(standardError).toBeGreaterThan(0);
    expect(standardError).toBeLessThan(0.004);
  });

  it("is that of the next step's tool as it is loaded", () => {
    const two = flow([step({ adds: [pulling(100e6, 20e6)] }), step({ equipment: at(nominal) })]);
    const loaded = drawn(two).steps[1]?.beyond.find(({ edges, when }) => edges === "up" && when === "as it is loaded");
    expect(Math.abs((loaded?.chance.probability ?? 0) - 0.5)).toBeLessThan(0.02);
  });
});

describe("which way the edges point", () => {
  it("is down for a film that pushes, and its share counts against the limit for that", () => {
    const limited = tool({ warpLimitEdgesUp: exact(um(0.1)), warpLimitEdgesDown: exact(um(0.1)) });
    const found = drawn(flow([step({ adds: [pulling(-100e6, 20e6)], equipment: limited })]));
    expect(warpAt(found, 0).band[1]).toBeLessThan(0);
    const leaving = (edges: string) =>
      found.steps[0]?.beyond.find((each) => each.edges === edges && each.when === "as it leaves")?.chance.probability;
    expect(leaving("up")).toBe(0);
    expect(leaving("down")).toBe(1);
  });

  it("turns with the pair that lies on its carrier", () => {
    const bonded = bondStep({}, adhesive(), carrier({ expansion: exact(5e-6, 0.5e-6) }));
    const planned = flow([bonded]);
    const shape = walkFlow(planned, limits).steps[0]?.atRoom;
    const { nominal, band } = warpAt(drawn(planned), 0);
    expect(Math.sign(nominal)).toBe(-Math.sign(shape?.sagitta ?? 0));
    expect(band[0]).toBeLessThan(nominal);
    expect(band[1]).toBeGreaterThan(nominal);
  });
});

describe("a flow with a metal that yields, a polymer and a thin wafer", () => {
  const copper = film({
    id: "copper",
    name: "Copper",
    kind: "metal",
    youngsModulus: exact(110e9, 8e9),
    expansion: exact(17e-6, 0.5e-6),
    yieldStress: exact(200e6, 30e6),
  });
  const planned = flow([
    step({
      adds: [addition({ film: copper, thickness: exact(um(4), um(0.3)), stress: exact(30e6, 15e6), coverage: 0.4 })],
    }),
    step({ peakTemperature: celsius(250) }),
    step({ siliconAfter: exact(um(150), um(4)) }),
    step({ adds: [addition({ side: "back", stress: exact(-120e6, 30e6) })] }),
  ]);
  const varied = unknowns(planned);
  const responses = warpResponses(planned, varied);

  it("comes within 2 % of the band of the walk itself, wafer by wafer", () => {
    const bands = drawn(planned).steps.map(({ warps }) => (warps[0]?.band[1] ?? 0) - (warps[0]?.band[0] ?? 0));
    // Deviations spread over the intervals by multiples of irrational numbers, so that any number of them is even.
    for (let n = 1; n <= 60; n += 1) {
      const deviations = varied.map(({ measured }, k) => {
        const turn = (n * Math.sqrt(2 + 3 * k)) % 1;
        return (2 * turn - 1) * (measured.tolerance ?? 0);
      });
      const wafer = varied.reduce((input, unknown, k) => moved(input, unknown, deviations[k] ?? 0), planned);
      for (const [index, { atRoom }] of walkFlow(wafer, limits).steps.entries()) {
        const response = responses[index]?.atRoom;
        if (!atRoom || !response) throw new Error("every step has a shape");
        const out = new Float64Array(1);
        response.model.evaluate(
          Float64Array.from(response.uses, (place) => deviations[place] ?? 0),
          1,
          out,
        );
        const off = Math.abs((out[0] ?? 0) - Math.sign(atRoom.sagitta) * atRoom.warp);
        expect(off / (bands[index] ?? 0), `step ${index + 1}`).toBeLessThan(0.06);
      }
    }
  });

  it("gives the same figures for the same seed, and others for another", () => {
    expect(drawn(planned, 2000)).toEqual(drawn(planned, 2000));
    expect(drawn(planned, 2000, 2)).not.toEqual(drawn(planned, 2000));
  });

  it("can be left between two lots of wafers", () => {
    const run = sampledWarps(planned, limits, { draws: 2000, seed: 1 });
    expect(run.next().value).toEqual({ done: 128, of: 2000 });
    expect(run.return({ draws: 0, inputs: 0, steps: [] }).done).toBe(true);
  });
});

describe("what has no spread", () => {
  it("is where it is held flat: no warp, and no share of that tool as it leaves", () => {
    const [held] = drawn(flow([step({ planned: "film frame", adds: [pulling(100e6, 20e6)] })])).steps;
    expect(held).toEqual({ step: 1, warps: [], beyond: [] });
  });

  it("is exact without any tolerance", () => {
    const planned = flow([step({ adds: [pulling(100e6, null)] })]);
    const exactly = { ...planned, wafer: { ...planned.wafer, thickness: exact(um(775)) } };
    const found = drawn(exactly);
    expect(found.inputs).toBe(0);
    const { nominal, band } = warpAt(found, 0);
    expect(relative(band[0], nominal)).toBeLessThan(1e-4);
    expect(relative(band[1], nominal)).toBeLessThan(1e-4);
  });
});
