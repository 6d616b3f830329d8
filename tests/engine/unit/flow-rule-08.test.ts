import { describe, expect, it } from "vitest";
import type { StepInput } from "#app/engine/flow/model.ts";
import {
  adhesive,
  bondStep,
  celsius,
  debondStep,
  exact,
  findings,
  flow,
  frameStep,
  outcomes,
  step,
  tapeStep,
  um,
} from "./flow-samples.ts";

const thin = (micrometres = 100): StepInput =>
  step({ kind: "grind", planned: "carrier", siliconAfter: exact(um(micrometres), um(3)) });
const onFrame = frameStep({ planned: "carrier" });

describe("rule 8, debond on tape or ring", () => {
  it("is clear when the wafer is on its frame before the debond", () => {
    const steps = [bondStep(), thin(), onFrame, debondStep()];
    expect(outcomes(flow(steps), 8, { at: 3 })).toEqual(["clear"]);
    expect(outcomes(flow(steps), 8)).toEqual(["clear", "clear"]);
  });

  it("stops a thin wafer that would leave its carrier free", () => {
    const [found] = findings(flow([bondStep(), thin(), debondStep({ planned: "bare" })]), 8);
    expect(found).toMatchObject({ outcome: "do not run" });
    expect(found?.reason).toContain("leave its carrier free at 97");
  });

  it("stops it also when the frame comes only afterwards", () => {
    expect(outcomes(flow([bondStep(), thin(), debondStep(), frameStep()]), 8, { at: 3 })).toContain("do not run");
  });

  it("lets a wafer that is thick enough leave without tape", () => {
    expect(outcomes(flow([bondStep(), debondStep({ planned: "bare" })]), 8)).toEqual(["clear"]);
  });

  it.each([
    { peak: 79, outcome: "clear" },
    { peak: 80, outcome: "caution" },
    { peak: 81, outcome: "do not run" },
  ])("a debond at $peak °C on tape that takes 80 °C: $outcome", ({ peak, outcome }) => {
    const steps = [bondStep(), thin(), onFrame, debondStep({ peakTemperature: celsius(peak) })];
    const [, heat] = findings(flow(steps), 8);
    expect(heat).toMatchObject({ outcome, limit: { value: celsius(80) } });
  });

  it("never passes a peel in silence", () => {
    const steps = [bondStep({}, adhesive({ release: "mechanical peel" })), thin(), onFrame, debondStep()];
    expect(outcomes(flow(steps), 8)).toEqual(["clear", "clear", "caution"]);
  });

  it("warns of the remover on tape, after a debond only and with solvent only", () => {
    const before = [bondStep(), thin(), onFrame, debondStep()];
    const clean = (exposures: StepInput["exposures"], planned: StepInput["planned"] = "film frame") =>
      step({ kind: "clean", planned, exposures });
    expect(outcomes(flow([...before, clean(["solvent"])]), 8)).toEqual(["caution"]);
    expect(outcomes(flow([...before, clean(["water"])]), 8)).toEqual([]);
    expect(outcomes(flow([clean(["solvent"], "bare")]), 8)).toEqual([]);
  });

  it("finds the way from grinding tape to frame in line clear", () => {
    const [found] = findings(flow([tapeStep(), frameStep()]), 8);
    expect(found).toMatchObject({ outcome: "clear" });
    expect(found?.reason).toContain("never free between the two");
  });

  it("says nothing of a debond of what is not bonded: that is the order rule's", () => {
    expect(findings(flow([debondStep({ planned: "bare" })]), 8)).toEqual([]);
  });
});
