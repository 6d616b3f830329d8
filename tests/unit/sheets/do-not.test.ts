import { describe, expect, it } from "vitest";
import { doNotLines } from "#app/lib/sheet-do-not.ts";
import { sheetGroups } from "#app/lib/sheet-groups.ts";
import type { AssessmentResult } from "#app/schemas/assessment-result.ts";
import { demoFlow } from "#tests/fixtures/demo-flow-input.ts";
import { assessed, DEMO_FLOWS, demoResult } from "#tests/fixtures/demo-assessment.ts";

/** What not to do in each group of a result, in order. */
function lines(result: AssessmentResult): string[][] {
  const { steps, findings, bonds, tapeTemperature } = result;
  return sheetGroups(steps).map((group) =>
    doNotLines(group, { flow: steps, findings, bonds, tapeTemperature }).map((line) => line.replaceAll("\u00A0", " ")),
  );
}

describe("what not to do", () => {
  it("while the wafer is thick and bare is to touch its device side", () => {
    expect(lines(demoResult("Tern"))[0]).toEqual(["Do not touch the device side"]);
  });

  it("on tape is to lift, release, heat, put into vacuum or trim it", () => {
    expect(lines(demoResult("Tern"))[1]).toEqual([
      "Do not lift bare",
      "Do not release: rolls to about 0.3 m",
      "Do not heat above 80 °C on tape",
      "Do not put into vacuum on tape",
      "Do not trim after grinding",
    ]);
  });

  it("takes the temperature on tape from the site", () => {
    const [, tape] = lines({ ...demoResult("Tern"), tapeTemperature: 333.15 });
    expect(tape).toContain("Do not heat above 60 °C on tape");
  });

  it("on a carrier follows from the bonding material", () => {
    expect(lines(demoResult("Petrel"))[1]).toEqual([
      "Do not lift bare",
      "Do not release: rolls to about 0.2 m",
      "Do not heat above 280 °C: the bond",
      "Do not trim after grinding",
    ]);
    const fulmar = demoResult("Fulmar A");
    const runs = { ...fulmar, findings: fulmar.findings.filter(({ outcome }) => outcome !== "do not run") };
    expect(lines(runs)[1]).toContain("Do not put into vacuum above 120 °C: the bond flows");
  });

  it("begins with what the assessment stops, the same reason said once", () => {
    expect(lines(demoResult("Petrel, glass 3.3 ppm"))[1]?.[0]).toBe(
      "Do not run step 10: it bows more than the tool takes",
    );
    expect(lines(demoResult("Petrel, glass 7.2 ppm"))[1]?.[0]).toBe(
      "Do not run steps 10 to 17: it bows more than the tool takes",
    );
    expect(lines(demoResult("Fulmar A"))[1]?.slice(0, 2)).toEqual([
      "Do not run step 12: its thickness varies too much, or its bumps stand out",
      "Do not run steps 13 and 18: it is too hot for the bond",
    ]);
    expect(lines(demoResult("Fulmar A"))[2]?.[0]).toBe("Do not run step 21: it is too hot for the tape");
  });

  it("says of a thin wafer that is planned bare that it needs more support", () => {
    const { flow } = demoFlow("Tern");
    const bare = flow.steps.map((step, index) => (index >= 15 ? { ...step, planned: "bare" as const } : step));
    const last = lines(assessed({ ...flow, steps: bare })).at(-1);
    expect(last?.slice(0, 2)).toEqual(["Do not run steps 16 to 19: it needs more support", "Do not lift bare"]);
  });

  it("says nothing of rolling once the wafer is diced: it is dies on tape", () => {
    const result = demoResult("Tern");
    const diced = result.steps.map((step) => (step.number >= 18 ? { ...step, plannedName: "film frame 2" } : step));
    const last = lines({ ...result, steps: diced }).at(-1);
    expect(last?.some((line) => line.startsWith("Do not release") || line.startsWith("Do not trim"))).toBe(false);
  });

  it("is at most five lines, each a whole 'Do not', without any sign of a model", () => {
    for (const flow of DEMO_FLOWS)
      for (const group of lines(demoResult(flow))) {
        expect(group.length).toBeLessThanOrEqual(5);
        for (const line of group) {
          expect(line).toMatch(/^Do not /);
          expect(line).not.toMatch(/±|MPa|GPa|κ|N\/m|Weibull|rule \d/);
        }
      }
  });
});
