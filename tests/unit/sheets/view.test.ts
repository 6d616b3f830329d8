import { describe, expect, it } from "vitest";
import { sheetView, type SheetView } from "#app/lib/sheet-view.ts";
import { DEMO_FLOWS, demoResult, HEAD } from "#tests/fixtures/demo-assessment.ts";

const view = (flow: string): SheetView => sheetView(HEAD, demoResult(flow));
const plain = (text: string) => text.replaceAll("\u00A0", " ");
const texts = (sheet: SheetView) => plain(JSON.stringify({ ...sheet, support: null }));

describe("the page for hands", () => {
  it("carries no uncertainty, stress, curvature, model name or film recipe", () => {
    for (const flow of DEMO_FLOWS) {
      const result = demoResult(flow);
      const text = texts(sheetView(HEAD, result));
      expect(text).not.toMatch(/±|[MG]Pa|κ|N\/m|Weibull|laminate|Stoney|Karman|NaN|Infinity/i);
      expect(text).not.toMatch(/Polymer dielectric|Plated copper|Passivation|Back-side metal A/);
    }
  });

  it("says in one sentence which steps need support", () => {
    expect(plain(view("Tern").answer)).toBe(
      "Clear as planned: tape or ring from step 14, grind to 110 um, to step 19.",
    );
    expect(view("Tern").blocked).toBe(false);
    expect(view("Petrel").blocked).toBe(false);
    expect(view("Fulmar A")).toMatchObject({ blocked: true, outcome: "do not run", where: "first at step 12" });
  });

  it("says the support over all steps in words", () => {
    expect(view("Tern").support.label).toBe("Support needed: bare at steps 1 to 13, tape or ring at steps 14 to 19.");
    expect(view("Petrel").support.label).toContain("carrier at steps 12 to 17");
  });

  it("gives each group its face, silicon, heat and shape, in words and rounded", () => {
    const groups = view("Tern").groups.map((group) => ({ ...group, hottest: plain(group.hottest) }));
    expect(groups.map(({ steps, heldBy, sideUp }) => [steps, heldBy, sideUp])).toEqual([
      ["1 to 12", null, "Device side up"],
      ["13 to 15", "Grinding tape", "Back side up"],
      ["16 to 19", "Film frame", "Device side up"],
    ]);
    expect(groups.map(({ silicon }) => plain(silicon))).toEqual(["725 µm", "725 to 100 µm", "100 µm"]);
    expect(groups.map(({ shape }) => shape.map(plain))).toEqual([["edges up 230 µm"], ["held flat"], ["held flat"]]);
    expect(groups[0]?.hottest).toMatch(/^245 °C/);
    expect(groups[0]?.hottest).toContain("step 10");
    expect(view("Petrel").groups[2]?.hottest).toMatch(/^\d+ °C|room temperature/);
  });

  it("gives the worst shape of both directions where the wafer lies in both", () => {
    const [bare, carrier] = view("Petrel").groups;
    expect(bare?.shape.map(plain)).toEqual(["edges up 130 µm", "edges down 90 µm"]);
    expect(carrier).toMatchObject({ heldBy: "Glass carrier 3.0 ppm", sideUp: "Back side up" });
    expect(carrier?.shape.map(plain)).toEqual(["edges up 340 µm", "edges down 40 µm"]);
  });

  it("says the reading that means stop, and how it is taken", () => {
    const [bare, tape] = view("Tern").groups;
    expect(bare?.stop.lines.map(plain)).toEqual(["Over 400 µm edges up or down"]);
    expect(bare?.stop.how).toBe("on the tool, as loaded");
    expect(tape?.stop).toEqual({ lines: ["An edge off the tape, or a crack"], how: "by eye" });
  });

  it("says of a group whose tools have no limit that somebody has to be asked", () => {
    const result = demoResult("Tern");
    const steps = result.steps.map((step) => ({ ...step, equipment: null }));
    expect(sheetView(HEAD, { ...result, steps }).groups[0]?.stop.how).toBe("ask before loading");
  });

  it("never lets a rolled pair pass as bowed", () => {
    const result = demoResult("Petrel");
    const steps = result.steps.map((step) =>
      step.number === 15 && step.atRoom
        ? {
            ...step,
            lies: "rolls up" as const,
            atRoom: { ...step.atRoom, regime: "curled" as const, rollRadius: 0.31 },
          }
        : step,
    );
    const [, carrier] = sheetView(HEAD, { ...result, steps }).groups;
    expect(carrier?.shape.map(plain)).toEqual(["rolls up, radius about 0.3 m"]);
  });

  it("names carrier, bonding material and debond, and the tapes to write in", () => {
    expect(view("Petrel").bonds).toEqual([
      {
        steps: "steps 10 to 17",
        face: null,
        carrier: "Glass carrier 3.0 ppm",
        material: "Laser-release adhesive B",
        debond: "step 18, laser through the glass",
      },
    ]);
    expect(view("Petrel").tapes).toEqual(["Film frame"]);
    expect(view("Tern").tapes).toEqual(["Grinding tape", "Film frame"]);
    expect(view("Tern").bonds).toEqual([]);
  });

  it("is a draft in its title block", () => {
    expect(view("Tern").titleBlock).toMatchObject({
      documentType: "Handling-risk sheet",
      number: "TERN-A003",
      status: "Draft",
      released: "not yet",
    });
  });
});
