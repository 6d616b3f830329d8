import { describe, expect, it } from "vitest";
import type { ContactInput } from "#app/engine/flow/handling-inputs.ts";
import type { StepInput } from "#app/engine/flow/model.ts";
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
  tapeStep,
  tool,
  um,
} from "./flow-samples.ts";

const bumped = step({ kind: "reflow", bumps: { height: exact(um(30)) } });
const coated = step({ kind: "deposit", adds: [addition()] });
const touching = (contact: ContactInput | null, more: Partial<StepInput> = {}) => step({ contact, ...more });

describe("rule 18, contact", () => {
  it.each([
    { means: "pad", outcome: ["do not run"] },
    { means: "pin", outcome: ["do not run"] },
    { means: "full area", outcome: ["do not run"] },
    { means: "vacuum cup", outcome: ["do not run"] },
    { means: "edge grip", outcome: ["clear"] },
  ] as const)("a $means on a device side with bumps: $outcome", ({ means, outcome }) => {
    expect(outcomes(flow([bumped, touching({ face: "front", means })]), 18)).toEqual(outcome);
  });

  it("is a caution on open films, and nothing on bare silicon or the back side", () => {
    expect(outcomes(flow([coated, touching({ face: "front", means: "pad" })]), 18)).toEqual(["caution"]);
    expect(outcomes(flow([step(), touching({ face: "front", means: "pad" })]), 18)).toEqual([]);
    expect(outcomes(flow([bumped, touching({ face: "back", means: "pad" })]), 18)).toEqual([]);
    expect(outcomes(flow([bumped, touching(null)]), 18)).toEqual([]);
  });

  it("takes the tool's contact where the step names none, and the step's own first", () => {
    const pads = tool({ contact: { face: "front", means: "pad" } });
    expect(outcomes(flow([bumped, step({ equipment: pads })]), 18)).toEqual(["do not run"]);
    expect(outcomes(flow([bumped, touching({ face: "back", means: "pad" }, { equipment: pads })]), 18)).toEqual([]);
  });

  it("lets tape and carrier be touched", () => {
    const full = touching({ face: "front", means: "full area" }, { planned: "grinding tape" });
    expect(outcomes(flow([bumped, tapeStep(), full]), 18)).toEqual([]);
    const onCarrier = touching({ face: "front", means: "full area" }, { planned: "carrier" });
    expect(outcomes(flow([bumped, bondStep(), onCarrier]), 18)).toEqual([]);
  });
});

describe("rule 18, charge", () => {
  const peeled = (ioniser: boolean | null) =>
    flow([
      bondStep({}, adhesive({ release: "mechanical peel" })),
      frameStep({ planned: "carrier" }),
      debondStep({ equipment: tool({ ioniser }) }),
    ]);

  it.each([
    { ioniser: true, outcome: "clear" },
    { ioniser: false, outcome: "caution" },
    { ioniser: null, outcome: "clear" },
  ])("a peel debond with an ioniser stated $ioniser: $outcome", ({ ioniser, outcome }) => {
    expect(outcomes(peeled(ioniser), 18)).toEqual([outcome]);
  });

  it("is said at the peel of grinding tape, and not at a release by light", () => {
    expect(findings(flow([tapeStep(), frameStep()]), 18)[0]?.reason).toContain("ioniser on");
    expect(outcomes(flow([bondStep(), frameStep({ planned: "carrier" }), debondStep()]), 18)).toEqual([]);
  });
});
