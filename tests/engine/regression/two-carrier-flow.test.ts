/*
 * The demo flow of a wafer thinned on glass, carried on as a transfer: bonded by its back side to silicon, let go by its device
 * side, worked on there, framed and peeled off. What is found was computed here: regression values, no validation.
 *
 *   bow     standard bow at 25 °C after the step, device side up, m
 */
import { describe, expect, it } from "vitest";
import { answerSentences } from "#app/engine/flow/answer.ts";
import { assessFlow } from "#app/engine/flow/assess.ts";
import type { FlowInput, StepInput } from "#app/engine/flow/model.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { standardBow } from "#app/engine/stoney/bow.ts";
import { bondingMaterial, carrier, demoFlow } from "../../fixtures/demo-flow-input.ts";

const { flow: petrel } = demoFlow("Petrel");
const at = (number: number): StepInput => {
  const found = petrel.steps[number - 1];
  if (!found) throw new Error("Petrel has 21 steps");
  return found;
};

/** `metal`: with the back-side metal, which bends the pair. */
function transfer(metal: boolean): FlowInput {
  const second: StepInput = {
    ...at(10),
    title: "Bond the back side to silicon",
    peakTemperature: 273.15 + 150,
    bond: {
      face: "back",
      carrier: carrier("Silicon carrier 775 um"),
      material: bondingMaterial("Peel adhesive C with release layer"),
      thickness: { value: 40e-6, tolerance: null, source: "supplier" },
    },
  };
  const steps = [
    ...petrel.steps.slice(0, metal ? 15 : 14),
    second,
    { ...at(18), title: "Laser debond of the device side", planned: "carrier" as const, debondFace: "front" as const },
    { ...at(19), title: "Clean the device side", planned: "carrier" as const, equipment: at(13).equipment },
    { ...at(5), planned: "carrier" as const },
    { ...at(6), planned: "carrier" as const },
    at(17),
    { ...at(18), title: "Peel off the silicon", debondFace: "back" as const },
    ...petrel.steps.slice(18),
  ];
  return { ...petrel, name: "Transfer", steps };
}

const limits = defaultLimits();
const assessed = assessFlow(transfer(false), limits);
const barring = (findings: typeof assessed.findings) =>
  findings.filter(({ outcome }) => outcome !== "clear" && outcome !== "caution");

describe("Petrel without its back-side metal, carried on as a transfer", () => {
  it("runs with cautions, and says so", () => {
    expect(barring(assessed.findings)).toEqual([]);
    expect(assessed.verdict.outcome).toBe("caution");
    expect(answerSentences(transfer(false), assessed)[0]).toMatch(/^Runs with cautions: /);
  });

  it("bends as it did when this was written", () => {
    const bows = assessed.steps.slice(13, 19).map(({ state: { atRoom } }) => standardBow(atRoom?.sagitta ?? NaN) * 1e6);
    expect(bows.map((bow) => Math.round(bow))).toEqual([157, -71, -105, -105, -105, -119]);
  });

  it("lies with the back side up, then the device side, and on a frame by its device side with the back side up again", () => {
    expect(assessed.steps.slice(13, 21).map(({ state }) => state.after.faceUp)).toEqual([
      "back side",
      ...Array<string>(6).fill("device side"),
      "back side",
    ]);
  });

  it("asks at the first debond what the bond that stays stands, at the second what lets the last one go", () => {
    const found = (step: number, rule: number) =>
      assessed.findings.filter((each) => each.step === step && each.rule === rule).map(({ reason }) => reason);
    expect(found(16, 6)[0]).toContain("Peel adhesive C");
    expect(found(16, 8)).toEqual([expect.stringMatching(/^It stays on Silicon carrier/)]);
    expect(found(21, 6)).toEqual([]);
    expect(found(21, 8).join(" ")).toContain("It is peeled off");
  });
});

describe("with its back-side metal", () => {
  const { findings, verdict } = assessFlow(transfer(true), limits);

  it("does not go into the bonder again: the pair is bent beyond its limit as it is loaded", () => {
    expect(verdict).toMatchObject({ outcome: "do not run", step: 16, rule: 2 });
    expect(barring(findings)).toHaveLength(1);
  });
});
