import { describe, expect, it } from "vitest";
import { paperAskedFor } from "#app/lib/paper-size.ts";
import { sheetPlan } from "#app/lib/sheet/sheet-plan.ts";
import type { SheetDocument } from "#app/schemas/sheet-document.ts";
import { DEMO_FLOWS } from "#tests/fixtures/demo-assessment.ts";
import { demoSheet, releasedFacts } from "#tests/fixtures/sheet-documents.ts";

const PAPERS = ["a4", "letter"] as const;

function plan(document: SheetDocument, paper: (typeof PAPERS)[number]) {
  const pages = sheetPlan(document, paper);
  return {
    hands: pages.flatMap((page) => (page.kind === "hands" ? [page] : [])),
    engineers: pages.flatMap((page) => (page.kind === "engineers" ? [page] : [])),
  };
}

describe("pages of a sheet", () => {
  it("are one for hands and one for engineers for the Tern flow on A4", () => {
    for (const document of [demoSheet("Tern"), demoSheet("Tern", releasedFacts())])
      expect(sheetPlan(document, "a4").map(({ kind }) => kind)).toEqual(["hands", "engineers"]);
  });

  it("are at most two of each for any demo flow on any paper", () => {
    for (const flow of DEMO_FLOWS)
      for (const paper of PAPERS) {
        const { hands, engineers } = plan(demoSheet(flow), paper);
        expect(hands.length).toBeLessThanOrEqual(2);
        expect(engineers.length).toBeLessThanOrEqual(2);
      }
  });

  it("keep groups whole and in order, and put what follows them on the last page for hands", () => {
    const document = demoSheet("Petrel");
    const groups = Array.from({ length: 7 }, () => document.hands.groups).flat();
    const { hands } = plan({ ...document, hands: { ...document.hands, groups } }, "letter");
    expect(hands.length).toBeGreaterThan(3);
    expect(hands.flatMap((page) => page.groups)).toEqual(groups);
    expect(hands.map(({ foot }) => foot)).toEqual(hands.map((_, index) => index === hands.length - 1));
    expect(hands.map(({ first }) => first)).toEqual(hands.map((_, index) => index === 0));
    for (const page of hands.slice(0, -1)) expect(page.groups.length).toBeGreaterThan(0);
  });

  it("end even when a single group is taller than a page", () => {
    const document = demoSheet("Petrel");
    const groups = document.hands.groups.map((group) => ({
      ...group,
      doNot: Array.from({ length: 90 }, () => "Do not"),
    }));
    const { hands } = plan({ ...document, hands: { ...document.hands, groups } }, "a4");
    expect(hands.flatMap((page) => page.groups)).toHaveLength(3);
  });

  it("go on with the step table where it does not end, every step once", () => {
    const document = demoSheet("Fulmar A");
    const engineers = document.engineers;
    if (!engineers) throw new Error("a whole sheet has a part for engineers");
    const steps = [...engineers.steps, ...engineers.steps].map((step, index) => ({ ...step, number: index + 1 }));
    const pages = plan({ ...document, engineers: { ...engineers, steps } }, "a4").engineers;
    expect(pages.length).toBeGreaterThan(1);
    expect(pages.flatMap((page) => page.steps.map(({ number }) => number))).toEqual(steps.map(({ number }) => number));
    expect(pages.map(({ basis }) => basis)).toEqual(pages.map((_, index) => index === pages.length - 1));
  });

  it("leave room to write measurements down only where it is free", () => {
    for (const flow of DEMO_FLOWS)
      for (const paper of PAPERS)
        for (const page of plan(demoSheet(flow), paper).hands) if (page.groups.length > 1) expect(page.record).toBe(0);
    expect(plan(demoSheet("Petrel"), "a4").hands.at(-1)?.record).toBeGreaterThan(5);
  });

  it("are of the paper that the address asks for, none for anything else", () => {
    for (const asked of ["letter", "Letter"]) expect(paperAskedFor(asked)).toBe("letter");
    for (const asked of ["a4", "A4"]) expect(paperAskedFor(asked)).toBe("a4");
    for (const asked of [null, "", "a3", "../letter"]) expect(paperAskedFor(asked)).toBeNull();
  });
});
