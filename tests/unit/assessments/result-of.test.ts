import { describe, expect, it } from "vitest";
import { statedInputs } from "#app/engine/flow/stated-inputs.ts";
import { demoFlow } from "#tests/fixtures/demo-flow-input.ts";
import { demoResult } from "#tests/fixtures/demo-assessment.ts";

const step = (flow: string, number: number) => {
  const found = demoResult(flow).steps[number - 1];
  if (!found) throw new Error(`${flow} has no step ${number}`);
  return found;
};

describe("a stored result", () => {
  it("has the standard bow: a bowl is negative, and its edges are up with the device side up", () => {
    const { atRoom } = step("Tern", 12);
    expect(atRoom?.bow).toBeLessThan(0);
    expect(atRoom?.edgesUp).toBe(true);
    expect(atRoom?.warp).toBeCloseTo(Math.abs(atRoom?.bow ?? 0), 12);
  });

  it("keeps the working of every shape that can be looked at, and of a free wafer let go none", () => {
    expect(step("Tern", 12).atRoom?.working?.equation).toBe("free-wafer-bowl");
    expect(step("Tern", 10).atPeak?.working).not.toBeNull();
    expect(step("Tern", 12).released.working).toBeNull();
    expect(step("Tern", 15).released.working?.equation).toBe("free-wafer-curled");
    expect(step("Tern", 15).atRoom).toBeNull();
  });

  it("keeps thickness with its tolerance, and the limits that a sheet repeats", () => {
    const { silicon, siliconTolerance, siliconLeast } = step("Tern", 15);
    expect(silicon).toBeCloseTo(100e-6, 12);
    expect(siliconTolerance).toBe(3e-6);
    expect(siliconLeast).toBeCloseTo(97e-6, 12);
    expect(demoResult("Tern").tapeTemperature).toBe(353.15);
  });

  it("says from where a bond flows, and of one that does not, nothing", () => {
    expect(demoResult("Fulmar A").bonds).toMatchObject([{ fromStep: 9, toStep: 20, flowsFrom: 393.15 }]);
    expect(demoResult("Petrel").bonds).toMatchObject([{ fromStep: 10, toStep: 17, flowsFrom: null }]);
  });
});

describe("stated inputs", () => {
  it("count what is used twice once, and as assumed if any of its uses is", () => {
    const { flow } = demoFlow("Tern");
    const before = statedInputs(flow);
    expect(new Set(before.map(({ what }) => what)).size).toBe(before.length);
    const last = flow.steps[7]?.adds[0];
    if (!last) throw new Error("Tern's step 8 adds nothing");
    last.stress = { ...last.stress, source: "assumed" };
    const after = statedInputs(flow);
    expect(after).toHaveLength(before.length);
    expect(after.find(({ what }) => what === `${last.film.name}: stress`)).toMatchObject({
      step: 8,
      source: "assumed",
    });
  });
});
