/*
 *   sag       highest less lowest place under its own weight, m
 *   least     of large deflections; most: of small ones, an upper bound
 */
import { describe, expect, it } from "vitest";
import { assessFlow } from "#app/engine/flow/assess.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { bondStep, carrier, exact, findings, flow, frameStep, outcomes, step, tool, um } from "./flow-samples.ts";

const limits = defaultLimits();
const stored = (thickness: number, equipment = tool()) =>
  flow([step({ kind: "store", equipment })], { thickness, diameter: 0.3 });
const most = (thickness: number) => findings(stored(thickness), 5)[0]?.figures[2]?.value ?? 0;

describe("rule 5, sag and clearance", () => {
  it.each([
    { times: 1.26, outcome: "clear" },
    { times: 1.25, outcome: "caution" },
    { times: 1, outcome: "caution" },
  ])("a clearance of $times the sag plus warp: $outcome", ({ times, outcome }) => {
    const box = tool({ slotClearance: exact(times * most(775)) });
    expect(outcomes(stored(775, box), 5)).toEqual([outcome]);
  });

  it("needs support beyond it", () => {
    const box = tool({ slotClearance: exact(0.5 * most(775)) });
    const [found] = findings(stored(775, box), 5);
    expect(found).toMatchObject({ outcome: "needs support" });
    expect(found?.remedy).toContain("Plan tape, ring or carrier");
  });

  it("is a caution between the bounds of large deflections", () => {
    const [found] = findings(stored(200), 5);
    const sag = found?.figures[0]?.value ?? 0;
    const box = tool({ slotClearance: exact(0.9 * sag) });
    expect(outcomes(stored(200, box), 5)).toEqual(["caution"]);
    expect(outcomes(stored(200, tool({ slotClearance: exact(0.5 * sag) })), 5)).toEqual(["needs support"]);
  });

  it("takes the site's slots by diameter, and raises the support that the step needs", () => {
    const input = flow([step({ kind: "store", equipment: tool() })], { thickness: 60, diameter: 0.2 });
    expect(findings(input, 5)[0]).toMatchObject({ outcome: "needs support", limit: { value: 1.5e-3 } });
    const loose = {
      ...limits,
      bareFrom300: { value: um(100), source: "site" },
      gripperFrom300: { value: um(90), source: "site" },
    };
    expect(assessFlow(stored(150), loose).steps[0]?.required).toBe("tape or ring");
    expect(assessFlow(stored(775), loose).steps[0]?.required).toBe("bare");
  });

  it("has no say on a tool without clearance, and on what is held flat", () => {
    expect(outcomes(flow([step()]), 5)).toEqual([]);
    expect(outcomes(flow([frameStep(), step({ kind: "store", planned: "film frame" })]), 5)).toEqual([]);
  });

  const pair = (equipment: Parameters<typeof tool>[0], onto = carrier()) =>
    flow([bondStep({ equipment: tool(equipment) }, undefined, onto)]);
  const weight = findings(pair({ weightLimit: exact(1) }), 5)[0]?.figures[0]?.value ?? 0;

  it.each([
    { times: 1.01, outcome: "clear" },
    { times: 1, outcome: "caution" },
    { times: 0.99, outcome: "do not run" },
  ])("a robot that takes $times the pair's weight: $outcome", ({ times, outcome }) => {
    // Two silicon discs of 725 µm and 200 mm weigh 106 g.
    expect(weight).toBeCloseTo(0.107, 2);
    expect(outcomes(pair({ weightLimit: exact(times * weight) }), 5)).toEqual([outcome]);
  });

  it.each([
    { micrometres: 1491, outcome: "clear" },
    { micrometres: 1490, outcome: "caution" },
    { micrometres: 1489, outcome: "do not run" },
  ])("an aligner that takes $micrometres µm of a pair of 1490 µm: $outcome", ({ micrometres, outcome }) => {
    expect(outcomes(pair({ totalThicknessLimit: exact(um(micrometres)) }), 5)).toEqual([outcome]);
  });

  it("cannot judge the weight on glass of unknown density", () => {
    const glass = carrier({ name: "Glass", material: "glass", expansion: exact(3e-6) });
    const [found] = findings(pair({ weightLimit: exact(1) }, glass), 5);
    expect(found).toMatchObject({ outcome: "cannot judge" });
    expect(found?.remedy).toContain("density of Glass");
    expect(outcomes(pair({ weightLimit: exact(1) }, { ...glass, density: exact(2450) }), 5)).toEqual(["clear"]);
  });

  it("stops a pair that does not fit its slot", () => {
    const stored = flow([
      bondStep(),
      step({ kind: "store", planned: "carrier", equipment: tool({ slotClearance: exact(um(1)) }) }),
    ]);
    expect(outcomes(stored, 5)).toEqual(["do not run"]);
  });
});
