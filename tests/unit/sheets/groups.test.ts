import { describe, expect, it } from "vitest";
import { sheetGroups } from "#app/lib/sheet-groups.ts";
import { stepNumbers, stepsInWords } from "#app/lib/step-numbers.ts";
import { DEMO_FLOWS, demoResult } from "#tests/fixtures/demo-assessment.ts";

const spans = (flow: string) =>
  sheetGroups(demoResult(flow).steps).map(({ heldBy, steps }) => [
    heldBy,
    steps[0]?.number ?? 0,
    steps.at(-1)?.number ?? 0,
  ]);

describe("groups of a sheet", () => {
  it("are consecutive steps with the same holding", () => {
    expect(spans("Tern")).toEqual([
      ["bare", 1, 12],
      ["grinding tape", 13, 15],
      ["film frame", 16, 19],
    ]);
    expect(spans("Petrel")).toEqual([
      ["bare", 1, 9],
      ["Glass carrier 3.0 ppm", 10, 17],
      ["film frame", 18, 21],
    ]);
  });

  it("hold every step once, in order", () => {
    for (const flow of DEMO_FLOWS) {
      const { steps } = demoResult(flow);
      expect(sheetGroups(steps).flatMap((group) => group.steps)).toEqual(steps);
    }
    expect(sheetGroups([])).toEqual([]);
  });

  it("begin anew with another carrier, and when the same holding comes back", () => {
    const { steps } = demoResult("Petrel");
    const renamed = steps.map((step) =>
      step.number >= 14 && step.number <= 17 ? { ...step, plannedName: "B" } : step,
    );
    expect(sheetGroups(renamed).map(({ heldBy }) => heldBy)).toEqual([
      "bare",
      "Glass carrier 3.0 ppm",
      "B",
      "film frame",
    ]);
    const back = steps.map((step) =>
      step.number === 21 ? { ...step, planned: "bare" as const, plannedName: "bare" } : step,
    );
    expect(sheetGroups(back).map(({ holding }) => holding)).toEqual(["bare", "carrier", "film frame", "bare"]);
  });
});

describe("step numbers", () => {
  it.each([
    [[7], "7", "step 7"],
    [[3, 8], "3 and 8", "steps 3 and 8"],
    [[3, 4], "3 and 4", "steps 3 and 4"],
    [[1, 2, 3, 4], "1 to 4", "steps 1 to 4"],
    [[3, 8, 10, 11, 12], "3, 8 and 10 to 12", "steps 3, 8 and 10 to 12"],
    [[1, 2, 3, 5, 6, 9], "1 to 3, 5, 6 and 9", "steps 1 to 3, 5, 6 and 9"],
  ])("%j join what runs on", (numbers, text, words) => {
    expect(stepNumbers(numbers)).toBe(text);
    expect(stepsInWords(numbers)).toBe(words);
  });
});
