import { describe, expect, it } from "vitest";
import { outcomeRank } from "#app/engine/vocabulary.ts";
import { assessmentView } from "#app/lib/assessment-view.ts";
import { demoFlow } from "#tests/fixtures/demo-flow-input.ts";
import { assessed, DEMO_FLOWS, demoResult, HEAD } from "#tests/fixtures/demo-assessment.ts";

const view = (flow: string, asked: string | null = null) => assessmentView(HEAD, demoResult(flow), asked);
const plain = (text: string | undefined) => text?.replaceAll("\u00A0", " ");

describe("an assessment for its page", () => {
  it("carries no working, whatever step is looked at", () => {
    for (const flow of DEMO_FLOWS) {
      const text = JSON.stringify(view(flow, "10"));
      expect(text).not.toContain('"equation"');
      expect(text).not.toMatch(/NaN|Infinity|undefined/);
      expect(text.length).toBeLessThan(30_000);
    }
  });

  it("says where the verdict arises, and nothing where all is clear", () => {
    expect(view("Tern")).toMatchObject({ outcome: "clear", where: null });
    expect(view("Fulmar A")).toMatchObject({ outcome: "do not run", where: "first at step 12" });
  });

  it("puts four figures beside the answer: tightest, its limit, thinnest, assumed", () => {
    const figures = view("Petrel").figures;
    expect(figures.map(({ label }) => label)).toEqual([
      "Tightest, step 15",
      "Its tool takes",
      "Thinnest silicon",
      "Inputs assumed",
    ]);
    expect(plain(figures[0]?.value)).toMatch(/^34\d ± [\d.]+ µm$/);
    expect(figures[0]?.link).toMatchObject({ text: "Working" });
    expect(figures[1]).toMatchObject({ value: "400\u00A0µm", link: { to: { step: 15 } } });
    expect(plain(figures[2]?.value)).toBe("50.0 ± 3.0 µm");
    expect(figures[2]?.link).toEqual({ text: "From step 12", to: { step: 12 } });
    expect(figures[3]?.value).toBe(`0 of ${demoResult("Petrel").inputs}`);
    expect(figures[3]?.link).toBeNull();
  });

  it("leaves out what is not there: no limit, no tightest", () => {
    const figures = assessmentView(HEAD, { ...demoResult("Tern"), findings: [] }, null).figures;
    expect(figures.map(({ label }) => label)).toEqual(["Thinnest silicon", "Inputs assumed"]);
  });

  it("counts what nobody measured or looked up, among all inputs", () => {
    const { flow } = demoFlow("Petrel");
    const first = flow.steps[2]?.adds[0];
    if (!first) throw new Error("Petrel's step 3 adds nothing");
    first.stress = { ...first.stress, source: "assumed" };
    const { assumed, inputs, figures } = assessmentView(HEAD, assessed(flow), null);
    expect(assumed).toEqual([{ step: 3, what: `${first.film.name}: stress` }]);
    expect(inputs).toBeGreaterThan(20);
    expect(figures.at(-1)).toMatchObject({ value: `1 of ${inputs}`, link: { to: "#assumed" } });
  });

  it("says once what clears several steps, worst first, steps in order", () => {
    const remedies = view("Fulmar A").remedies;
    const ranks = remedies.map(({ outcome }) => outcomeRank(outcome));
    expect(ranks).toEqual([...ranks].sort((a, b) => b - a));
    expect(new Set(remedies.map(({ text }) => text)).size).toBe(remedies.length);
    expect(remedies.find(({ text }) => text.startsWith("Lower the peak"))?.steps).toEqual([13, 18]);
    expect(view("Tern").remedies).toEqual([]);
  });

  it("names each bond with the steps over which it lasts", () => {
    expect(view("Petrel").bonds).toEqual([
      {
        steps: "step 10 to 17",
        face: null,
        carrier: "Glass carrier 3.0 ppm",
        material: "Laser-release adhesive B",
        thickness: "50\u00A0µm",
        limit: "280\u00A0°C",
        release: "laser through glass",
      },
    ]);
    expect(view("Tern").bonds).toEqual([]);
  });

  it("fills the title block of a draft that nobody has checked", () => {
    expect(view("Tern").titleBlock).toEqual({
      owner: "Kestrel Ridge Packaging, pilot line",
      documentType: "Assessment",
      title: "Tern T-2, to 100 µm on tape",
      prepared: "Ines Varga",
      checked: "not yet",
      released: "not yet",
      number: "TERN-A003",
      revision: "B",
      status: "Draft",
      date: "2026-12-01",
      language: "en",
      page: "1 of 1",
    });
  });
});
