import { describe, expect, it } from "vitest";
import { firstStep, selectedStep, stepAskedFor } from "#app/lib/assessment-selected.ts";
import { demoResult, HEAD, PLACE } from "#tests/fixtures/demo-assessment.ts";

const selected = (flow: string, number: number) => {
  const step = selectedStep(PLACE, demoResult(flow), number);
  if (!step) throw new Error(`${flow} has no step ${number}`);
  return step;
};
const plain = (text: string | undefined) => text?.replaceAll("\u00A0", " ");

describe("the step to look at first", () => {
  it("is the one that stops the flow", () => {
    expect(firstStep(demoResult("Petrel, glass 3.3 ppm"))).toBe(10);
    expect(firstStep(demoResult("Fulmar A"))).toBe(12);
  });

  it("is the one nearest its tool's limit when nothing stops it, cautions or not", () => {
    expect(firstStep(demoResult("Tern"))).toBe(12);
    expect(firstStep(demoResult("Petrel"))).toBe(15);
  });

  it("is the first step of a flow in which nothing has a limit", () => {
    expect(firstStep({ ...demoResult("Tern"), findings: [] })).toBe(1);
  });

  it("gives way to the one that the address asks for, if there is such a step", () => {
    const result = demoResult("Tern");
    expect(stepAskedFor(result, "3")).toBe(3);
    for (const asked of [null, "", "0", "-3", "20", "3.5", "1e1", "12 parsecs", "99999999999"])
      expect(stepAskedFor(result, asked)).toBe(12);
  });
});

describe("a step in full", () => {
  it("says how it lies with the standard bow second, and where that is computed", () => {
    const { lies, released, open, clear } = selected("Tern", 12);
    expect(plain(lies.text)).toMatch(/^Edges up \d+(\.\d)? ± [\d.]+ µm at 25 °C, device side up\. Standard bow −\d/);
    expect(lies.working).toBe(`/assessments/${HEAD.id}/working?step=12&shape=loaded`);
    expect(released).toBeNull();
    expect(open).toEqual([]);
    expect(clear.map(({ rule }) => rule)).toEqual([1, 2, 4, 10]);
  });

  it("says whose side is up where the standard bow is not the one that is seen", () => {
    expect(plain(selected("Petrel", 12).lies.text)).toMatch(/back side up\. Standard bow [^−]*, device side up\.$/);
  });

  it("says what its figures rest on that nobody stated, and nothing in results of before that was kept", () => {
    const result = demoResult("Petrel");
    const said = (remarks: string[] | undefined) => {
      const steps = result.steps.map(({ remarks: _kept, ...step }) => (remarks ? { ...step, remarks } : step));
      return selectedStep(PLACE, { ...result, steps }, 1)?.remarks;
    };
    expect(said(["All of it is taken as film."])).toEqual(["All of it is taken as film."]);
    expect(said(undefined)).toEqual([]);
  });

  it("says what a wafer on tape or carrier would do if let go", () => {
    const tape = selected("Tern", 15);
    expect(tape.lies).toEqual({ text: "Held flat by grinding tape, back side up.", working: null });
    expect(plain(tape.released?.text)).toMatch(/^At 100 µm it rolls up, radius about 0\.3\d m, edges lift \d+ mm\./);
    expect(tape.released?.working).toContain("shape=released");
    expect(tape.budget).toEqual([]);
    expect(tape.budgetNote).toBe("Held flat by grinding tape: it has no bow of its own here.");
    expect(plain(selected("Petrel", 10).released?.text)).toMatch(/^At 775 µm it lies edges up/);
  });

  it("puts what is not clear first, worst first, with figures, limit with its source, and remedy", () => {
    const { open } = selected("Fulmar A", 13);
    expect(open.map(({ outcome }) => outcome)).toEqual(["do not run", "do not run", "caution"]);
    const [warp] = selected("Petrel, glass 3.3 ppm", 10).open;
    expect(warp).toMatchObject({ rule: 2, outcome: "do not run" });
    expect(warp?.figures[0]?.working).toMatch(/^\/assessments\/.*\/working\?finding=\d+&figure=0$/);
    expect(plain(warp?.limit ?? undefined)).toMatch(/: 300 µm \(supplier\)$/);
    expect(warp?.remedy).toBeTruthy();
  });

  it("lists the inputs that move its bow most, largest first", () => {
    const sizes = selected("Petrel", 15).budget.map(({ text }) => Number(text));
    expect(sizes.length).toBeGreaterThan(0);
    expect(sizes).toEqual([...sizes].sort((a, b) => b - a));
  });

  it("is nothing for a step that is not there", () => {
    expect(selectedStep(PLACE, demoResult("Tern"), 20)).toBeNull();
  });
});
