import { describe, expect, it } from "vitest";
import { createRoutesStub } from "react-router";
import { AssessmentPage } from "#app/components/assessments/AssessmentPage.tsx";
import { assessmentView, type AssessmentHead } from "#app/lib/assessment-view.ts";
import { movementOf } from "#app/lib/result-comparison.ts";
import type { OutOfDate } from "#app/schemas/assessment-changes.ts";
import { attributes, render, words } from "#tests/components/drawings/render.ts";
import { flow, grindStep, step } from "#tests/engine/unit/flow-samples.ts";
import { assessed, demoResult, HEAD } from "#tests/fixtures/demo-assessment.ts";

interface Shown {
  flow?: string;
  step?: string;
  head?: Partial<AssessmentHead>;
  changed?: OutOfDate;
  refused?: { step: number | null; reason: string };
}

/** An assessment of a flow that parts by slot, as the server sends it at an address. */
function partedPage(address: string): string {
  const result = assessed(
    flow([
      step({ title: "Look" }),
      grindStep(100, 1, { title: "Grind", planned: "bare", slots: [24, 25] }),
      step({ title: "Look again" }),
    ]),
  );
  const search = new URLSearchParams(address.split("?")[1]);
  const view = assessmentView(HEAD, result, search.get("step"), search.get("leg"));
  const Stub = createRoutesStub([
    { path: "/", Component: () => <AssessmentPage view={view} changed={null} refused={undefined} /> },
  ]);
  return render(<Stub initialEntries={[address]} />);
}

/** The page as the server sends it. */
function page({ flow: name = "Petrel", step: number, head, changed, refused }: Shown = {}): string {
  const view = assessmentView({ ...HEAD, ...head }, demoResult(name), number ?? null);
  const Stub = createRoutesStub([
    { path: "/", Component: () => <AssessmentPage view={view} changed={changed ?? null} refused={refused} /> },
  ]);
  return render(<Stub initialEntries={["/"]} />);
}

const count = (markup: string, text: string | RegExp) => markup.split(text).length - 1;

describe("the assessment page", () => {
  it("puts the answer first: outcome, then the sentences as its only first heading", () => {
    const markup = page();
    expect(count(markup, "<h1")).toBe(1);
    expect(words(markup)).toMatch(/Caution first at step \d+ Runs with cautions: /);
    expect(markup.indexOf("<h1")).toBeLessThan(markup.indexOf("Steps on one axis"));
  });

  it("shows every step as a link that works without scripts", () => {
    const links = attributes(page(), "href");
    for (let step = 1; step <= 21; step += 1) expect(links).toContain(`?step=${step}#step-${step}`);
  });

  it("opens the step that is asked for, in strip, table and list", () => {
    const markup = page({ step: "12" });
    expect(count(markup, 'aria-current="step"')).toBe(3);
    expect(markup).toMatch(/<tr id="step-12"[^>]*aria-current="true"/);
    expect(words(markup)).toContain("Inputs that matter most at step 12");
  });

  it("gives why, figures with their working, limit with its source, remedy, and what happens if let go", () => {
    const markup = page();
    const text = words(markup);
    for (const term of ["Why", "Figures", "Limit", "Clears with", "Lies as", "When hot", "If let go"])
      expect(text).toContain(term);
    expect(text).toContain("400 µm (supplier)");
    expect(attributes(markup, "href").filter((path) => path.includes("/working?")).length).toBeGreaterThan(4);
    expect(markup).toContain("<details>");
    expect(text).toMatch(/\d clear findings?/);
  });

  it("offers to run again and to change the flow to those only who may", () => {
    expect(words(page())).toMatch(/Change the flow Compare Review Run again Print the sheet/);
    const reader = words(page({ head: { mayAssess: false } }));
    expect(reader).not.toMatch(/Run again|Change the flow/);
    expect(reader).toContain("Print the sheet");
  });

  it("says when it is out of date, and makes running again the one filled button", () => {
    const markup = page({ head: { outOfDate: true } });
    expect(words(markup)).toContain("Out of date: the flow, or something that it uses, has changed since 2026-12-01");
    expect(count(markup, "btn-primary")).toBe(1);
    expect(markup).toMatch(/btn-primary[^>]*>Run again/);
    // A technician can only read that it is old.
    expect(page({ head: { outOfDate: true, mayAssess: false } })).not.toContain("Run again");
  });

  it("says what has changed, from what to what, who saved it and which steps it reaches", () => {
    const changed: OutOfDate = {
      engine: { from: "0.1.0", to: "0.2.0" },
      changes: [
        {
          subject: "Polyimide",
          property: "Stress at 25 °C",
          from: "+31 MPa",
          to: "+35 MPa",
          steps: [3, 8],
          record: { kind: "film", id: null },
          by: "Ines Varga",
          at: "2026-12-02T07:30:00.000Z",
        },
      ],
      movement: movementOf(demoResult("Fulmar A"), demoResult("Fulmar B")),
    };
    const text = words(page({ head: { outOfDate: true }, changed }));
    expect(text).toContain("one input has changed since 2026-12-01, and engine 0.2.0 has come in place of 0.1.0");
    expect(text).toMatch(/Polyimide Stress at 25 °C \+31 MPa \+35 MPa 3 and 8 Ines Varga 2026-12-02 07:30 UTC/);
    expect(text).toContain("Steps whose finding or support changes");
    expect(text).toMatch(/13 Back-side nitride .* Do not run rule 6, bonding material/);
  });

  it("draws the warp along the flow, and says where there is none", () => {
    const markup = page();
    expect(markup).toContain('aria-label="Warp along the flow, as it lies on each tool"');
    expect(words(markup)).toContain("No line where tape or frame holds the wafer flat.");
  });

  it("says why a flow could not be computed, at the step that stops it", () => {
    const text = words(page({ refused: { step: 4, reason: "no silicon would be left after this step" } }));
    expect(text).toContain(
      "cannot be computed, so nothing was stored Step 4: no silicon would be left after this step",
    );
  });

  it("says of a clear flow that there is nothing to clear, and folds a long list of remedies", () => {
    expect(words(page({ flow: "Tern" }))).toContain("Nothing to clear: every step is clear as planned.");
    expect(words(page({ flow: "Petrel, glass 7.2 ppm" }))).not.toContain("Nothing to clear");
  });

  it("carries title block, cautions, engine and time of the inputs", () => {
    const text = words(page());
    expect(text).toContain("Number TERN-A003");
    expect(text).toContain("razor-sharp");
    expect(text).toContain("Engine 0.2.0, inputs of 2026-12-01 11:10 UTC");
  });
});

describe("the page of an assessment whose flow parts by slot", () => {
  it("lists the legs with their verdicts and marks the one that is looked at, the worst by itself", () => {
    expect(words(partedPage("/"))).toContain("What follows is of slots 24 and 25");
    expect(words(partedPage("/?leg=1"))).toContain("What follows is of slots 1 to 23");
    expect(partedPage("/?leg=1")).toMatch(/aria-current="true"[^>]*>Slots 1 to 23</);
  });

  it("stays with the leg from step to step, and on the way to its sheet", () => {
    const html = partedPage("/?leg=1&step=2");
    expect(html).toContain("?step=3&amp;leg=1#step-3");
    expect(html).toContain(`/sheets/${HEAD.id}?leg=1`);
    expect(words(html)).toContain("Only slots 24 and 25 take this step: here the wafer is left as it is.");
  });
});
