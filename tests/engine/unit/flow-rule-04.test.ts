/*
 *   gap       height of rim or centre over the chuck as it is loaded, m
 *   stress    bending stress at the outer face, Pa: E' h/(2 ρ)
 */
import { describe, expect, it } from "vitest";
import type { EquipmentInput, StepInput } from "#app/engine/flow/model.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { minimumBendRadius } from "#app/engine/strength/bending.ts";
import {
  addition,
  adhesive,
  bondStep,
  debondStep,
  exact,
  findings,
  flow,
  frameStep,
  outcomes,
  step,
  tool,
  um,
} from "./flow-samples.ts";

const limits = defaultLimits();
const bowed: StepInput = step({ kind: "deposit", adds: [addition({ stress: exact(400e6), thickness: exact(um(2)) })] });
const gap = walkFlow(flow([bowed]), limits).steps[0]?.atRoom?.warp ?? 0;
const onto = (equipment: Partial<EquipmentInput>) => flow([bowed, step({ equipment: tool(equipment) })]);

describe("rule 4, holding flat: the seal", () => {
  it.each([
    { clear: 1.01, most: 3, outcome: "clear" },
    { clear: 1, most: 3, outcome: "caution" },
    { clear: 0.5, most: 1, outcome: "caution" },
    { clear: 0.5, most: 0.99, outcome: "do not run" },
  ])("a gap against $clear and $most times itself: $outcome", ({ clear, most, outcome }) => {
    const site = {
      ...limits,
      sealGapPlainClear: { value: clear * gap, source: "site" },
      sealGapPlain: { value: most * gap, source: "site" },
    };
    expect(gap).toBeGreaterThan(um(100));
    expect(outcomes(onto({ clamping: "vacuum" }), 4, { limits: site })).toEqual([outcome]);
  });

  it.each([
    { times: 1.26, outcome: "clear" },
    { times: 1.25, outcome: "caution" },
    { times: 1, outcome: "caution" },
    { times: 0.99, outcome: "do not run" },
  ])("takes the tool's own gap, here $times of it: $outcome", ({ times, outcome }) => {
    expect(outcomes(onto({ clamping: "vacuum", sealGap: exact(times * gap) }), 4)).toEqual([outcome]);
  });

  it("gives a compliant seal more, and says that force is never the limit", () => {
    const [found] = findings(onto({ clamping: "vacuum", seal: "compliant" }), 4);
    expect(found).toMatchObject({ outcome: "clear", limit: { value: 5e-3 } });
    expect(found?.reason).toContain("Once it seals, the force is enough");
  });

  it("has no say without a seal, on a full-area chuck without data, and on what comes held", () => {
    for (const clamping of ["electrostatic", "pins", "full-area vacuum", null] as const)
      expect(outcomes(onto({ clamping }), 4)).toEqual([]);
    const held = [frameStep(), step({ planned: "film frame", equipment: tool({ clamping: "vacuum" }) })];
    expect(outcomes(flow(held), 4)).toEqual([]);
    expect(outcomes(flow([step({ equipment: tool({ clamping: "vacuum" }) })]), 4)).toEqual([]);
  });
});

describe("rule 4, holding flat: the peel front", () => {
  const peeled = (radius: number | null, edge: "ground" | "trimmed") =>
    flow([
      ...(edge === "trimmed"
        ? [step({ kind: "edge trim", edgeTrim: { width: exact(7e-4), depth: exact(um(200)) } })]
        : []),
      bondStep({}, adhesive({ release: "mechanical peel", peelRadius: radius === null ? null : exact(radius) })),
      step({ kind: "grind", planned: "carrier", siliconAfter: exact(um(100), 0) }),
      ...(edge === "trimmed" ? [step({ kind: "stress relief", planned: "carrier" })] : []),
      frameStep({ planned: "carrier" }),
      debondStep(),
    ]);
  const radius = (stress: number) => minimumBendRadius({ thickness: um(100), stress, direction: "110" });

  it.each([
    { edge: "ground", megapascals: 49, outcome: "clear" },
    { edge: "ground", megapascals: 50, outcome: "caution" },
    { edge: "ground", megapascals: 100, outcome: "caution" },
    { edge: "ground", megapascals: 101, outcome: "do not run" },
    { edge: "trimmed", megapascals: 149, outcome: "clear" },
    { edge: "trimmed", megapascals: 150, outcome: "caution" },
    { edge: "trimmed", megapascals: 151, outcome: "do not run" },
  ] as const)("$edge edge at $megapascals MPa: $outcome", ({ edge, megapascals, outcome }) => {
    const [found] = findings(peeled(radius(megapascals * 1e6), edge), 4);
    expect(found).toMatchObject({ outcome, figures: [{ unit: "Pa" }] });
    expect(found?.remedy === null).toBe(outcome === "clear");
  });

  it("has no say where the radius is not given: the debond rule asks for it", () => {
    expect(outcomes(peeled(null, "ground"), 4)).toEqual([]);
  });
});

describe("rule 4, holding flat: gripper and chuck", () => {
  it("says nothing of a full-thickness wafer, whose flattening stress is a few MPa", () => {
    expect(outcomes(onto({ clamping: "electrostatic" }), 4)).toEqual([]);
  });

  it("stops a strongly rolled wafer of half thickness that is forced flat", () => {
    const rolled = step({ kind: "deposit", adds: [addition({ stress: exact(5e9), thickness: exact(um(3)) })] });
    const forced = flow([rolled, step({ planned: "thin-wafer gripper" })], { thickness: 100 });
    const [found] = findings(forced, 4);
    expect(found).toMatchObject({ outcome: "do not run" });
    expect(found?.reason).toContain("In the gripper");
  });
});
