import { describe, expect, it } from "vitest";
import { assessFlow } from "#app/engine/flow/assess.ts";
import { changedBy } from "#app/engine/remedy/try-change.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import type { FlowChange } from "#app/engine/trial/change.ts";
import { placeOfText, triedPath } from "#app/lib/tried-path.ts";
import { triedView } from "#app/lib/tried-view.ts";
import { demoCatalogue } from "../../fixtures/demo-catalogue.ts";
import { demoFlow } from "../../fixtures/demo-flow-input.ts";

const limits = defaultLimits();
const { flow } = demoFlow("Petrel, glass 3.3 ppm");
const before = assessFlow(flow, limits);

function tried(change: FlowChange, at: string | null = null) {
  const changed = changedBy(flow, [change], demoCatalogue);
  const after = assessFlow(changed.flow, limits);
  return { after, view: triedView(before.findings, after.findings, changed.origins, placeOfText(at)) };
}

describe("a change that was tried", () => {
  const change: FlowChange = {
    quantity: "bond",
    step: 10,
    carrier: "Glass carrier 3.0 ppm",
    material: "Laser-release adhesive B",
    thickness: 50e-6,
  };

  it("shows the figure that it clears before and after, with the working of both", () => {
    const { view } = tried(change, "10.2");
    const row = view.rows.find(({ step, rule }) => step === 10 && rule === 2);
    expect(row?.before?.outcome).not.toBe("clear");
    expect(row?.after?.outcome).toBe("clear");
    expect(row?.before?.figure).toContain("Warp");
    expect(row?.before?.limit).toContain("µm");
    expect(view.shown).toMatchObject({ step: 10, rule: 2 });
    for (const side of [view.shown?.before, view.shown?.after])
      expect(side?.working?.from?.[0]?.inputs.length).toBeGreaterThan(3);
    expect(view.shown?.before?.working).not.toEqual(view.shown?.after?.working);
  });

  it("lists what is judged otherwise, the worst first, and nothing else unless it is asked for", () => {
    const { view } = tried(change);
    for (const { before: was, after } of view.rows) expect(was?.outcome ?? "clear").not.toBe(after?.outcome ?? "clear");
    expect(view.rows[0]?.before?.outcome).toBe("do not run");
    expect(view.shown?.step).toBe(view.rows[0]?.step);
    const same = before.findings.find(
      ({ rule, step }) => !view.rows.some((row) => row.rule === rule && row.step === step),
    );
    const asked = tried(change, `${same?.step}.${same?.rule}`).view;
    expect(asked.rows).toHaveLength(view.rows.length + 1);
    expect(asked.shown).toMatchObject({ step: same?.step, rule: same?.rule });
  });

  it("counts steps as before the change", () => {
    const { view, after } = tried({ quantity: "place", step: 12, to: 14 });
    expect(after.steps).toHaveLength(flow.steps.length);
    expect(view.rows.every(({ step }) => step >= 1 && step <= flow.steps.length)).toBe(true);
  });
});

describe("its address", () => {
  it("carries the change and the finding, and reads back the place", () => {
    const url = new URL(
      triedPath({ id: "id", leg: null }, '[{"quantity":"silicon after"}]', { step: 12, rule: 2 }),
      "http://localhost",
    );
    expect(url.pathname).toBe("/assessments/id/tried");
    expect(url.searchParams.get("changes")).toBe('[{"quantity":"silicon after"}]');
    expect(placeOfText(url.searchParams.get("at"))).toEqual({ step: 12, rule: 2 });
  });

  it.each([null, "", "12", "12.", "x.2", "12.2.3", "-1.2", "1e3.2"])("reads no place from %s", (text) => {
    expect(placeOfText(text)).toBeNull();
  });
});
