import { describe, expect, it } from "vitest";
import type { WaferState } from "#app/engine/flow/state.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { requiredSupport, thicknessLimits, type SupportQuestion } from "#app/engine/rules/required-support.ts";
import { celsius, um } from "./flow-samples.ts";

const limits = defaultLimits();

function need(
  micrometres: number,
  diameter: number,
  question: Partial<SupportQuestion> = {},
  mount: WaferState["mount"] = null,
) {
  const asked: SupportQuestion = {
    kind: "measure",
    planned: "bare",
    peakTemperature: celsius(25),
    exposures: [],
    ...question,
  };
  return requiredSupport(um(micrometres), diameter, asked, mount, limits)?.support;
}

describe("support by diameter and thickness", () => {
  it.each([
    { diameter: 0.15, bare: 250, gripper: 120 },
    { diameter: 0.2, bare: 300, gripper: 180 },
    { diameter: 0.3, bare: 450, gripper: 250 },
  ])("$diameter m: bare from $bare µm, gripper from $gripper µm", ({ diameter, bare, gripper }) => {
    expect(need(bare, diameter)).toBe("bare");
    expect(need(bare - 0.1, diameter)).toBe("thin-wafer gripper");
    expect(need(gripper, diameter)).toBe("thin-wafer gripper");
    expect(need(gripper - 0.1, diameter)).toBe("tape or ring");
    expect(need(50, diameter)).toBe("tape or ring");
    expect(need(49.9, diameter)).toBe("carrier");
  });

  it("takes smaller wafers as 150 mm and knows none above 300 mm", () => {
    expect(thicknessLimits(0.1)).toEqual(thicknessLimits(0.15));
    expect(thicknessLimits(0.2)?.bare).toBe("bareFrom200");
    expect(thicknessLimits(0.45)).toBeNull();
    expect(need(700, 0.45)).toBeUndefined();
  });
});

describe("what the step does to thin silicon", () => {
  it.each<{ what: string; question: Partial<SupportQuestion> }>([
    { what: "lithography", question: { kind: "pattern" } },
    { what: "plating", question: { kind: "plate" } },
    { what: "polishing", question: { kind: "polish" } },
    { what: "heat above 80 °C", question: { peakTemperature: celsius(81) } },
    { what: "vacuum", question: { exposures: ["vacuum"] } },
    { what: "plasma", question: { exposures: ["plasma"] } },
  ])("$what needs a carrier below 150 µm and not from there", ({ question }) => {
    expect(need(149.9, 0.2, question)).toBe("carrier");
    expect(need(150, 0.2, question)).toBe("tape or ring");
  });

  it("asks for the carrier also where a small wafer's gripper would reach below 150 µm", () => {
    expect(need(130, 0.15)).toBe("thin-wafer gripper");
    expect(need(130, 0.15, { peakTemperature: celsius(120) })).toBe("carrier");
  });

  it("leaves 80 °C itself to the tape, and the heat of a debond to its own rule", () => {
    expect(need(100, 0.2, { peakTemperature: celsius(80) })).toBe("tape or ring");
    expect(need(100, 0.2, { kind: "debond", peakTemperature: celsius(200) }, "film frame")).toBe("tape or ring");
  });

  it("does not take the vacuum of a bonder for a process on a free wafer", () => {
    expect(need(100, 0.2, { kind: "bond", exposures: ["vacuum"] })).toBe("tape or ring");
  });

  it("takes an edge ring instead of a carrier down to 50 µm", () => {
    const onRing: Partial<SupportQuestion> = { planned: "edge ring", exposures: ["vacuum"] };
    expect(need(100, 0.2, onRing, "edge ring")).toBe("tape or ring");
    expect(need(50, 0.2, onRing, "edge ring")).toBe("tape or ring");
    expect(need(49.9, 0.2, onRing, "edge ring")).toBe("carrier");
  });
});

describe("below 50 µm", () => {
  it.each(["debond", "clean", "dice", "measure", "store", "move", "hold"] as const)("on its frame may %s", (kind) => {
    expect(need(20, 0.3, { kind, planned: "film frame" }, "film frame")).toBe("tape or ring");
    expect(need(20, 0.3, { kind })).toBe("carrier");
  });

  it.each(["grind", "stress relief", "mount on frame"] as const)("in line on tape may %s down to 25 µm", (kind) => {
    expect(need(25, 0.3, { kind, planned: "grinding tape" }, "grinding tape")).toBe("tape or ring");
    expect(need(24.9, 0.3, { kind, planned: "grinding tape" }, "grinding tape")).toBe("carrier");
    expect(need(25, 0.3, { kind, planned: "grinding tape" })).toBe("carrier");
  });
});
