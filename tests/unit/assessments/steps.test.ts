import { describe, expect, it } from "vitest";
import { stepRows } from "#app/lib/assessment-steps.ts";
import { STEP_KINDS } from "#app/engine/flow/model.ts";
import { DEMO_FLOWS, demoResult } from "#tests/fixtures/demo-assessment.ts";

const row = (flow: string, number: number) => {
  const found = stepRows(demoResult(flow))[number - 1];
  if (!found) throw new Error(`${flow} has no step ${number}`);
  return found;
};

describe("rows of an assessment", () => {
  it("have every step in order, with a name for the strip of at most 12 characters", () => {
    for (const flow of DEMO_FLOWS) {
      const rows = stepRows(demoResult(flow));
      expect(rows.map(({ number }) => number)).toEqual(rows.map((_, index) => index + 1));
      for (const { shortName } of rows) expect(shortName.length).toBeLessThanOrEqual(12);
    }
    const result = demoResult("Tern");
    const [first] = result.steps;
    if (!first) throw new Error("Tern has no step");
    const every = stepRows({ ...result, steps: STEP_KINDS.map((kind) => ({ ...first, kind })), findings: [] });
    expect(new Set(every.map(({ shortName }) => shortName)).size).toBe(STEP_KINDS.length);
  });

  it("draw a wafer that is free as it lies, and one on tape as held", () => {
    expect(row("Tern", 12)).toMatchObject({ bow: { deviceSideUp: true, holding: "bare" }, liesAs: "edges up" });
    expect(row("Tern", 12).bow.shape).toMatchObject({ kind: "bowed" });
    expect(row("Tern", 15)).toMatchObject({
      bow: { shape: { kind: "held" }, holding: "grinding tape" },
      warp: null,
      warpText: "–",
      limitText: "–",
      liesAs: "held",
    });
  });

  it("draw a bonded pair back side up, and name carrier and bonding material", () => {
    expect(row("Petrel", 12)).toMatchObject({
      bow: { deviceSideUp: false, holding: "carrier" },
      planned: "Glass carrier 3.0 ppm, Laser-release adhesive B",
      heldBy: "Carrier",
    });
    expect(row("Petrel", 1).planned).toBeNull();
  });

  it("set the warp against the tool's own limit as the finding does", () => {
    const result = demoResult("Petrel, glass 3.3 ppm");
    for (const { number, warp } of stepRows(result)) {
      const finding = result.findings.find(({ rule, step, limit }) => rule === 2 && step === number && limit);
      const [figure] = finding?.figures ?? [];
      if (!finding?.limit || !figure) expect(warp).toBeNull();
      else expect(warp?.fraction).toBeCloseTo(figure.value / finding.limit.value, 12);
    }
    expect(row("Petrel, glass 3.3 ppm", 10).warp?.fraction).toBeGreaterThan(1);
  });

  it("say in a few words what is not clear, and how much more there is", () => {
    expect(row("Petrel", 15).note?.replaceAll("\u00A0", " ")).toMatch(/^rule 2, 8\d % of limit$/);
    expect(row("Fulmar A", 13)).toMatchObject({ outcome: "do not run", more: 2 });
    expect(row("Fulmar A", 13).note).toContain("bonding material");
    expect(row("Tern", 3)).toMatchObject({ outcome: "clear", note: null, more: 0 });
  });

  it("never give a rolled wafer a warp in µm: it has a radius and an edge lift", () => {
    const result = demoResult("Petrel");
    const step = result.steps[16];
    if (!step?.atRoom) throw new Error("Petrel's step 17 has no shape");
    step.atRoom = { ...step.atRoom, regime: "curled", rollRadius: 0.26, warp: 0.04 };
    const rolled = stepRows(result)[16];
    expect(rolled).toMatchObject({ warpText: "–", bow: { shape: { kind: "rolled", radius: 0.26 } } });
    expect(rolled?.liesAs.replaceAll("\u00A0", " ")).toBe("rolls up, radius about 0.26 m, edges lift 40 mm");
  });
});
