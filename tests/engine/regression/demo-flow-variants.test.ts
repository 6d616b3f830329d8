/*
 * The demo flows with one thing changed, and what an expert expects then (the fixture's 'variants worth a test').
 *
 *   sag       highest less lowest place under its own weight, m
 */
import { describe, expect, it } from "vitest";
import { assessFlow } from "#app/engine/flow/assess.ts";
import { worstOutcome } from "#app/engine/flow/judge.ts";
import type { FlowInput, StepInput } from "#app/engine/flow/model.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { requiredSupport } from "#app/engine/rules/required-support.ts";
import { carrier as fixtureCarrier, bondingMaterial, demoFlow } from "../../fixtures/demo-flow-input.ts";

const limits = defaultLimits();

/** A flow with some of its steps changed; `change` gets the step's number from 1. */
function changed(name: string, change: (step: StepInput, number: number) => StepInput): FlowInput {
  const { flow } = demoFlow(name);
  return { ...flow, steps: flow.steps.map((step, index) => change(step, index + 1)) };
}

const without = (name: string, number: number): FlowInput => {
  const { flow } = demoFlow(name);
  return { ...flow, steps: flow.steps.filter((_, index) => index + 1 !== number) };
};

function find(flow: FlowInput, step: number, rule: number) {
  return assessFlow(flow, limits).findings.filter((finding) => finding.step === step && finding.rule === rule);
}

const stopped = (flow: FlowInput, rule: number) => [
  ...new Set(
    assessFlow(flow, limits)
      .findings.filter((finding) => finding.rule === rule && finding.outcome === "do not run")
      .map(({ step }) => step),
  ),
];

describe("Tern, frame omitted at step 16", () => {
  const bare = changed("Tern", (step, number) =>
    number >= 16 ? { ...step, planned: "bare", kind: number === 16 ? "move" : step.kind } : step,
  );

  it("needs support, tape or ring", () => {
    expect(find(bare, 16, 1)[0]).toMatchObject({ outcome: "needs support" });
    expect(find(bare, 16, 1)[0]?.reason).toContain("Needs tape or ring");
  });

  it("rolls up to a radius of about 0.32 m, edges lifting about 15 mm", () => {
    const [found] = find(bare, 16, 3);
    expect(found).toMatchObject({ outcome: "do not run" });
    expect(found?.reason.replaceAll("\u00a0", " ")).toMatch(/radius of about 0\.32 m, edges lifting 15\.\d mm/);
  });

  it("sags more in a cassette than its slots have", () => {
    const [found] = find(bare, 19, 5);
    expect(found).toMatchObject({ outcome: "needs support", limit: { value: 1.5e-3 } });
    // The fixture's 3.7 mm are of an isotropic plate; silicon's <110> across the ledges is a fifth stiffer.
    const sag = found?.figures[0]?.value ?? 0;
    expect(sag).toBeGreaterThan(2.2e-3);
    expect(sag).toBeLessThan(3.7e-3);
  });
});

describe("Tern, edge trim omitted", () => {
  const untrimmed = (final: number, tolerance: number): FlowInput => {
    const flow = without("Tern", 12);
    const exact = (value: number) => ({
      value: value * 1e-6,
      tolerance: tolerance * 1e-6,
      source: "supplier" as const,
    });
    return {
      ...flow,
      steps: flow.steps.map((step) =>
        step.kind === "grind"
          ? { ...step, siliconAfter: exact(110) }
          : step.kind === "stress relief"
            ? { ...step, siliconAfter: exact(final) }
            : step,
      ),
    };
  };
  const edge = (flow: FlowInput, step: number) =>
    find(flow, step, 10).filter(({ reason }) => reason.includes("without an edge trim"));

  it("is a caution at 110 µm and at exactly 100 µm", () => {
    expect(edge(untrimmed(100, 0), 13).map(({ outcome }) => outcome)).toEqual(["caution"]);
    expect(edge(untrimmed(100, 0), 14).map(({ outcome }) => outcome)).toEqual(["caution"]);
  });

  it("does not run at 99 µm", () => {
    expect(edge(untrimmed(99, 0), 14).map(({ outcome }) => outcome)).toEqual(["do not run"]);
  });

  it("does not run at 100 ± 3 µm either: thickness is judged at nominal minus tolerance", () => {
    expect(edge(untrimmed(100, 3), 14).map(({ outcome }) => outcome)).toEqual(["do not run"]);
  });
});

describe("Petrel, no carrier, on tape from step 11", () => {
  const exact50 = { value: 50e-6, tolerance: 0, source: "supplier" as const };
  const base = changed("Petrel", (step, number) => {
    if (number === 10)
      return {
        ...step,
        kind: "laminate tape",
        bond: null,
        planned: "grinding tape",
        peakTemperature: 298.15,
        exposures: [],
        tape: null,
      };
    if (number >= 11 && number <= 16)
      return { ...step, planned: "grinding tape", siliconAfter: number === 12 ? exact50 : step.siliconAfter };
    return number === 17 ? { ...step, planned: "film frame" } : step;
  });

  it("does not run steps 14 and 15: heat, vacuum and plasma on tape", () => {
    for (const step of [14, 15]) {
      expect(worstOutcome(find(base, step, 12))).toBe("do not run");
      expect(worstOutcome(find(base, step, 16))).toBe("do not run");
    }
    expect(find(base, 14, 16).map(({ outcome }) => outcome)).toEqual(["do not run", "do not run", "do not run"]);
  });

  it("is stopped by what the steps do to it: thickness alone would pass at exactly 50 µm", () => {
    const still = { kind: "store" as const, planned: "grinding tape" as const, peakTemperature: 298.15, exposures: [] };
    expect(requiredSupport(50e-6, 0.3, still, "grinding tape", limits)?.support).toBe("tape or ring");
    expect(find(base, 14, 1)[0]?.reason).toContain("needs a carrier");
  });
});

describe("Petrel, debond before mount", () => {
  it("does not run: it leaves the carrier free at 50 µm", () => {
    const { flow } = demoFlow("Petrel");
    const steps = [...flow.steps];
    const [mount, debond] = [steps[16], steps[17]];
    if (!mount || !debond) throw new Error("Petrel has 21 steps");
    steps[16] = { ...debond, planned: "bare" };
    steps[17] = { ...mount, planned: "film frame" };
    const [found] = find({ ...flow, steps }, 17, 8);
    expect(found).toMatchObject({ outcome: "do not run" });
    expect(found?.reason).toContain("leave its carrier free at 47");
  });
});

describe("Petrel, silicon carrier with ultraviolet laser release", () => {
  it("does not run: light does not pass silicon", () => {
    const flow = changed("Petrel", (step) =>
      step.bond ? { ...step, bond: { ...step.bond, carrier: fixtureCarrier("Silicon carrier 775 um") } } : step,
    );
    const found = find(flow, 18, 7).find(({ reason }) => reason.includes("light"));
    expect(found).toMatchObject({ outcome: "do not run" });
    expect(found?.reason).toContain("does not pass Silicon carrier");
  });
});

describe("Fulmar A, adhesive of 30 µm", () => {
  const flow = changed("Fulmar A", (step) =>
    step.bond
      ? { ...step, bond: { ...step.bond, thickness: { value: 30e-6, tolerance: null, source: "supplier" } } }
      : step,
  );

  it("covers the bumps at 80 %: a caution, over 70 %", () => {
    const [found] = find(flow, 9, 9);
    expect(found).toMatchObject({ outcome: "caution" });
    expect(found?.figures[0]?.value).toBeCloseTo(0.8, 12);
  });

  it("lets the thickness variation fall to 3.5 µm linear", () => {
    expect(find(flow, 12, 9)[0]?.figures[0]?.value).toBeCloseTo(3.5e-6, 12);
  });
});

describe("Fulmar on glass with the laser-release adhesive", () => {
  const onGlass = (name: string) =>
    changed("Fulmar A", (step) => {
      const released = step.kind === "debond" ? { ...step, peakTemperature: 298.15 } : step;
      return released.bond
        ? {
            ...released,
            bond: {
              ...released.bond,
              carrier: fixtureCarrier(name),
              material: bondingMaterial("Laser-release adhesive B"),
            },
          }
        : released;
    });

  it("3.0 ppm: temperatures pass, warp fails at 11, 14 and 16, and as it arrives at 12 to 16", () => {
    const flow = onGlass("Glass carrier 3.0 ppm");
    const heat = (step: number) => find(flow, step, 6).filter(({ limit }) => limit?.temperaturePoint);
    for (let step = 10; step <= 20; step++) expect(worstOutcome(heat(step))).toBe("clear");
    const stops = stopped(flow, 2);
    expect(stops).toEqual(expect.arrayContaining([11, 14, 16]));
    // The fixture looks at each step as it leaves; a wafer that is too bowed to be loaded stops there as well.
    expect(
      stops
        .filter((step) => ![11, 14, 16].includes(step))
        .every((step) => find(flow, step, 2)[0]?.reason.includes("as it is loaded")),
    ).toBe(true);
  });

  it("3.3 ppm: warp fails at step 9 only, edges down", () => {
    const flow = onGlass("Glass carrier 3.3 ppm");
    expect(stopped(flow, 2)).toContain(9);
    expect(find(flow, 9, 2)[0]?.reason).toContain("Edges down");
    expect(stopped(flow, 2)).toEqual([9]);
  });
});
