import { describe, expect, it } from "vitest";
import {
  exact,
  findings,
  flow,
  frameStep,
  grindStep,
  outcomes,
  reliefStep,
  step,
  tapeStep,
  trimStep,
  um,
} from "./flow-samples.ts";

const trimmed = (depth: number, depthTolerance: number | null = null) =>
  trimStep({ edgeTrim: { width: exact(7e-4), depth: exact(um(depth), depthTolerance) } });

describe("rule 10, edge trim", () => {
  it.each([
    { depth: 131, outcome: "clear" },
    { depth: 130, outcome: "caution" },
    { depth: 101, outcome: "caution" },
    { depth: 100, outcome: "do not run" },
    { depth: 99, outcome: "do not run" },
  ])("a trim of $depth µm for 100 µm of silicon: $outcome", ({ depth, outcome }) => {
    const [found] = findings(flow([trimmed(depth), tapeStep(), grindStep(100, 0), reliefStep()]), 10, { at: 1 });
    expect(found).toMatchObject({ outcome });
    expect(found?.remedy === null).toBe(outcome === "clear");
  });

  it("takes the shallowest trim and the thickest silicon", () => {
    expect(outcomes(flow([trimmed(134), tapeStep(), grindStep(100, 3)]), 10, { at: 1 })).toEqual(["clear"]);
    expect(outcomes(flow([trimmed(133), tapeStep(), grindStep(100, 3)]), 10, { at: 1 })).toEqual(["caution"]);
    expect(outcomes(flow([trimmed(134, um(2)), tapeStep(), grindStep(100, 3)]), 10, { at: 1 })).toEqual(["caution"]);
  });

  it.each([
    { final: 151, outcome: [] },
    { final: 150, outcome: ["caution"] },
    { final: 100, outcome: ["caution"] },
    { final: 99, outcome: ["do not run"] },
  ])("no trim at $final µm: $outcome", ({ final, outcome }) => {
    const steps = [tapeStep(), grindStep(200, 0), reliefStep({ siliconAfter: exact(um(final), 0) })];
    const found = findings(flow(steps), 10).filter(({ reason }) => reason.includes("without an edge trim"));
    expect(found.map((finding) => finding.outcome)).toEqual(outcome);
  });

  it("has nothing to say of a trim before no grind, or after one: that is the order rule's", () => {
    expect(outcomes(flow([trimmed(100)]), 10)).toEqual([]);
    const late = [tapeStep(), grindStep(100, 0), trimStep({ planned: "grinding tape" })];
    expect(outcomes(flow(late), 10)).toEqual([]);
    expect(outcomes(flow(late), 12)).toContain("do not run");
  });
});

describe("rule 10, stress relief", () => {
  it.each([
    { final: 151, outcome: [] },
    { final: 150, outcome: ["caution"] },
    { final: 100, outcome: ["caution"] },
    { final: 99, outcome: ["do not run"] },
  ])("ground to $final µm and never relieved: $outcome", ({ final, outcome }) => {
    const steps = [trimmed(300), tapeStep(), grindStep(final, 0), frameStep()];
    expect(outcomes(flow(steps), 10, { at: 3 })).toEqual(outcome);
  });

  it.each(["stress relief", "polish", "via reveal"] as const)("is done by a %s", (kind) => {
    const steps = [trimmed(300), tapeStep(), grindStep(99, 0), step({ kind, planned: "grinding tape" })];
    expect(outcomes(flow(steps), 10, { at: 3 })).toEqual([]);
    expect(findings(flow(steps), 10)[0]?.reason).toContain("Stress relief done at 99");
  });

  it("comes too late after dicing, and a second grind asks again", () => {
    const diced = [
      trimmed(300),
      tapeStep(),
      grindStep(99, 0),
      frameStep(),
      step({ kind: "dice", planned: "film frame" }),
      reliefStep(),
    ];
    expect(outcomes(flow(diced), 10, { at: 3 })).toEqual(["do not run"]);
    const twice = [trimmed(300), tapeStep(), grindStep(120, 0), reliefStep(), grindStep(99, 0)];
    expect(outcomes(flow(twice), 10)).toEqual(["do not run"]);
  });
});
