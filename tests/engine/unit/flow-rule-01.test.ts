import { describe, expect, it } from "vitest";
import type { StepInput } from "#app/engine/flow/model.ts";
import { requiredAt } from "#app/engine/rules/rule-01-thickness.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { exact, findings, flow, frameStep, grindStep, outcomes, step, tapeStep, tool, um } from "./flow-samples.ts";

describe("rule 1, thickness and support", () => {
  it("is clear when what is planned is at least what is needed", () => {
    expect(outcomes(flow([step()]), 1)).toEqual(["clear"]);
    expect(outcomes(flow([tapeStep(), grindStep(100, 3)]), 1)).toEqual(["clear"]);
    expect(outcomes(flow([tapeStep(), grindStep(100, 3), frameStep()]), 1)).toEqual(["clear"]);
  });

  it("needs support when the plan is weaker, and says which and how", () => {
    const [found] = findings(flow([tapeStep(), grindStep(100, 3), step()]), 1);
    expect(found).toMatchObject({ outcome: "needs support", limit: { value: um(180) } });
    expect(found?.reason).toContain("Needs tape or ring, planned bare: at 97");
    expect(found?.remedy).toContain("Plan tape or ring");
  });

  it("judges at nominal minus tolerance and shows both", () => {
    expect(outcomes(flow([step()], { thickness: 310, tolerance: 15 }), 1)).toEqual(["needs support"]);
    const [found] = findings(flow([step()], { thickness: 310, tolerance: 15 }), 1);
    expect(found?.figures.map(({ value }) => Math.round(value * 1e6))).toEqual([310, 295]);
  });

  it("is a caution where only the tolerance asks for the stronger support that is planned", () => {
    const onTape = flow([tapeStep(), grindStep(182, 3)]);
    const [found] = findings(onTape, 1);
    expect(found).toMatchObject({ outcome: "caution" });
    expect(found?.reason).toContain("the tolerance reaches 179");
  });

  it("passes with caution at the limit, fails beyond it", () => {
    expect(outcomes(flow([step()], { thickness: 300 }), 1)).toEqual(["caution"]);
    expect(outcomes(flow([step()], { thickness: 299.9 }), 1)).toEqual(["needs support"]);
    expect(outcomes(flow([step()], { thickness: 300.1 }), 1)).toEqual(["clear"]);
  });

  it("lets a gripper hold it with caution, and not below its own limit", () => {
    const gripped = (thickness: number) => outcomes(flow([step({ planned: "thin-wafer gripper" })], { thickness }), 1);
    expect(gripped(250)).toEqual(["caution"]);
    expect(gripped(180)).toEqual(["caution"]);
    expect(gripped(179)).toEqual(["needs support"]);
    expect(gripped(500)).toEqual(["clear"]);
  });

  it("takes an edge ring instead of a carrier, with caution below 75 µm", () => {
    const onRing = (micrometres: number) =>
      outcomes(
        flow([
          tapeStep(),
          grindStep(micrometres, 0),
          frameStep({ planned: "edge ring" }),
          step({ kind: "deposit", planned: "edge ring", exposures: ["vacuum"] }),
        ]),
        1,
      );
    expect(onRing(100)).toEqual(["clear"]);
    expect(onRing(75)).toEqual(["clear"]);
    expect(onRing(74)).toEqual(["caution"]);
    expect(onRing(50)).toEqual(["caution"]);
    expect(onRing(49)).toEqual(["needs support"]);
  });

  it("allows thin silicon on tape in line, at 25 µm with caution", () => {
    const inLine = (micrometres: number) => outcomes(flow([tapeStep(), grindStep(micrometres, 0)]), 1);
    expect(inLine(30)).toEqual(["clear"]);
    expect(inLine(25)).toEqual(["caution"]);
    expect(inLine(24)).toEqual(["needs support"]);
  });

  it("asks for the tolerance where one is missing, once, at the step that sets the thickness", () => {
    const steps = [tapeStep(), grindStep(100, null), frameStep()];
    expect(outcomes(flow(steps), 1, { at: 2 })).toEqual(["clear", "caution"]);
    expect(outcomes(flow(steps), 1, { at: 3 })).toEqual(["clear"]);
    expect(findings(flow([step()], { tolerance: null }), 1)[1]?.reason).toContain("no tolerance");
  });

  it("stops where the tolerance eats all the silicon", () => {
    expect(outcomes(flow([tapeStep(), grindStep(20, 20)]), 1)).toEqual(["do not run"]);
  });

  it("cannot judge a diameter that it has no limits for", () => {
    const large = flow([step({ equipment: tool({ largestDiameter: exact(0.45) }) })], { diameter: 0.45 });
    expect(outcomes(large, 1)).toEqual(["cannot judge"]);
  });

  it("holds a bare wafer against the tool's own least thickness", () => {
    const at = (least: number, planned: "bare" | "thin-wafer gripper" = "bare") =>
      outcomes(flow([step({ planned, equipment: tool({ leastUnsupportedThickness: exact(um(least)) }) })]), 1);
    expect(at(724)).toEqual(["clear"]);
    expect(at(725)).toEqual(["caution"]);
    expect(at(726)).toEqual(["needs support"]);
    expect(at(726, "thin-wafer gripper")).toEqual(["clear"]);
  });

  it("judges a step by the silicon that it leaves", () => {
    const input = flow([tapeStep(), grindStep(100, 3)]);
    const [, ground] = walkFlow(input, defaultLimits()).steps;
    if (!ground) throw new Error("two steps were walked");
    expect(requiredAt({ flow: input, limits: defaultLimits() }, ground)?.support).toBe("tape or ring");
  });

  it("takes no edge ring for lithography, over which it stands", () => {
    const ring = (kind: StepInput["kind"]) =>
      outcomes(
        flow([
          tapeStep(),
          grindStep(100, 0),
          frameStep({ planned: "edge ring" }),
          step({ kind, planned: "edge ring" }),
        ]),
        1,
      );
    expect(ring("pattern")).toEqual(["needs support"]);
    expect(ring("plate")).toEqual(["clear"]);
  });

  it("takes thin silicon on tape only in line", () => {
    const mounted = (inLine: boolean | null) =>
      outcomes(flow([tapeStep(), grindStep(30, 0), frameStep({ inLine })]), 1);
    expect(mounted(null)).toEqual(["clear"]);
    expect(mounted(true)).toEqual(["clear"]);
  });
});
