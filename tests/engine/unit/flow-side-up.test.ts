import { describe, expect, it } from "vitest";
import type { StepInput } from "#app/engine/flow/model.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import {
  addition,
  bondStep,
  debondStep,
  exact,
  findings,
  flow,
  frameStep,
  grindStep,
  step,
  tapeStep,
  tool,
  um,
} from "./flow-samples.ts";

const sides = (steps: StepInput[]) => walkFlow(flow(steps), defaultLimits()).steps.map(({ after }) => after.faceUp);
const DEVICE = "device side";
const BACK = "back side";

/** A tensile film on the device side: a bowl, edges up with the device side up. */
const bowl = step({ adds: [addition({ thickness: exact(um(2)), stress: exact(150e6) })] });

describe("the side that is up", () => {
  it("is turned by bond, debond, tape and frame as is usual, where nobody says otherwise", () => {
    expect(sides([step(), bondStep(), step({ planned: "carrier" }), debondStep(), step()])).toEqual([
      DEVICE,
      BACK,
      BACK,
      DEVICE,
      DEVICE,
    ]);
    expect(sides([tapeStep(), grindStep(300, null), frameStep()])).toEqual([BACK, BACK, DEVICE]);
  });

  it("is as stated, and stays so until something turns it", () => {
    const turned = step({ sideUp: BACK });
    expect(sides([step(), turned, step(), step({ sideUp: DEVICE }), step()])).toEqual([
      DEVICE,
      BACK,
      BACK,
      DEVICE,
      DEVICE,
    ]);
    expect(
      sides([turned, step(), bondStep(), step({ planned: "carrier", sideUp: DEVICE }), step({ planned: "carrier" })]),
    ).toEqual([BACK, BACK, BACK, DEVICE, DEVICE]);
    expect(sides([turned, frameStep()])).toEqual([BACK, DEVICE]);
    expect(sides([turned, tapeStep({ sideUp: DEVICE }), grindStep(300, null)])).toEqual([BACK, DEVICE, DEVICE]);
  });

  it("decides which of the tool's limits holds, as it is loaded and as it leaves", () => {
    const onlyUp = tool({ warpLimitEdgesUp: exact(um(1)), warpLimitEdgesDown: exact(um(5000)) });
    const at = (overrides: Partial<StepInput>) => findings(flow([bowl, step({ equipment: onlyUp, ...overrides })]), 2);
    expect(at({})).toMatchObject([{ outcome: "do not run", limit: { label: "Tool, edges up" } }]);
    expect(at({ sideUp: BACK })).toMatchObject([{ outcome: "clear", limit: { label: "Tool, edges down" } }]);
  });

  it("says how it lies by the side that is up", () => {
    const lies = (steps: StepInput[]) => walkFlow(flow(steps), defaultLimits()).steps.map(({ lies }) => lies);
    expect(lies([bowl, step(), step({ sideUp: BACK }), step()])).toEqual([
      "edges up",
      "edges up",
      "edges down",
      "edges down",
    ]);
  });

  it("is that of the step before where the step itself turns the wafer", () => {
    // Loaded into the bonder device side up, whatever is up when the pair leaves it.
    const bonder = tool({ warpLimitEdgesUp: exact(um(1)), warpLimitEdgesDown: exact(um(5000)) });
    const found = findings(flow([bowl, bondStep({ equipment: bonder, sideUp: BACK })]), 2);
    expect(found).toMatchObject([{ outcome: "do not run", limit: { label: "Tool, edges up" } }]);
  });
});
