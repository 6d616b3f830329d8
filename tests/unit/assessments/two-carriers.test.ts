import { describe, expect, it } from "vitest";
import type { StepInput } from "#app/engine/flow/model.ts";
import { assessmentView } from "#app/lib/assessment-view.ts";
import { sheetView } from "#app/lib/sheet-view.ts";
import { demoFlow, carrier, bondingMaterial } from "#tests/fixtures/demo-flow-input.ts";
import { assessed, demoResult, HEAD } from "#tests/fixtures/demo-assessment.ts";

const { flow } = demoFlow("Petrel");
const at = (number: number): StepInput => {
  const found = flow.steps[number - 1];
  if (!found) throw new Error("Petrel has 21 steps");
  return found;
};
const second: StepInput = {
  ...at(10),
  bond: {
    face: "back",
    carrier: carrier("Silicon carrier 775 um"),
    material: bondingMaterial("Peel adhesive C with release layer"),
    thickness: { value: 40e-6, tolerance: null, source: "supplier" },
  },
};
/** Steps 1 to 14 of Petrel, bonded by the back side at 15, let go by the device side at 17. */
const result = assessed({
  ...flow,
  steps: [
    ...flow.steps.slice(0, 14),
    second,
    { ...at(16) },
    { ...at(18), planned: "carrier", debondFace: "front" },
    { ...at(16) },
    { ...at(18), planned: "bare", debondFace: "back" },
  ],
});
const plain = (text: string) => text.replaceAll("\u00A0", " ");

describe("an assessment of a transfer", () => {
  it("keeps both bonds, each with its face and its steps", () => {
    expect(result.bonds.map(({ face, fromStep, toStep }) => [face, fromStep, toStep])).toEqual([
      ["front", 10, 16],
      ["back", 15, 18],
    ]);
  });

  it("says the faces, and what holds the wafer at each step", () => {
    const view = assessmentView(HEAD, result, null);
    expect(view.bonds.map(({ face, steps }) => [face, steps])).toEqual([
      ["device side", "step 10 to 16"],
      ["back side", "step 15 to 18"],
    ]);
    expect(view.steps.slice(13).map(({ planned }) => planned)).toEqual([
      "Glass carrier 3.0 ppm, Laser-release adhesive B",
      "Both carriers",
      "Both carriers",
      "Silicon carrier 775 um, Peel adhesive C with release layer",
      "Silicon carrier 775 um, Peel adhesive C with release layer",
      null,
    ]);
  });

  it("is one group of the sheet for each carrier and one for both, heated by what the weaker bond takes", () => {
    const sheet = sheetView(HEAD, result);
    const held = sheet.groups.filter(({ support }) => support === "carrier");
    expect(held.map(({ heldBy }) => heldBy)).toEqual([
      "Glass carrier 3.0 ppm",
      "Glass carrier 3.0 ppm and Silicon carrier 775 um",
      "Silicon carrier 775 um",
    ]);
    expect(held.map(({ sideUp }) => sideUp)).toEqual(["Back side up", "Device side up", "Device side up"]);
    const heat = held.map(({ doNot }) => doNot.filter((line) => line.includes("heat")).map(plain));
    expect(heat).toEqual([
      ["Do not heat above 280 °C: the bond"],
      ["Do not heat above 250 °C: the bond"],
      ["Do not heat above 250 °C: the bond"],
    ]);
    expect(sheet.bonds.map(({ face, debond }) => [face, debond])).toEqual([
      ["device side bonded", "step 17, laser through the glass"],
      ["back side bonded", "step 19, peel"],
    ]);
    expect(sheet.support.planned.slice(13, 16)).toEqual(["Glass carrier 3.0 ppm", "Both carriers", "Both carriers"]);
  });
});

describe("a result that was stored before faces were", () => {
  it("says nothing of the face, which was the device side", () => {
    const old = demoResult("Petrel");
    for (const bond of old.bonds) delete bond.face;
    expect(assessmentView(HEAD, old, null).bonds.map(({ face }) => face)).toEqual([null]);
    expect(sheetView(HEAD, old).bonds.map(({ face }) => face)).toEqual([null]);
  });
});
