import { describe, expect, it } from "vitest";
import { createRoutesStub } from "react-router";
import { DraftList } from "#app/components/sheet/DraftList.tsx";
import { SheetPage } from "#app/components/sheet/SheetPage.tsx";
import type { Paper } from "#app/lib/paper-size.ts";
import { render, words } from "#tests/components/drawings/render.ts";
import { HEAD } from "#tests/fixtures/demo-assessment.ts";
import { demoSheet } from "#tests/fixtures/sheet-documents.ts";

function stub(Component: () => React.ReactNode): string {
  const Stub = createRoutesStub([{ path: "/", Component }]);
  return render(<Stub initialEntries={["/"]} />);
}

/** The sheet as the server sends it. */
function sheet(flow: string, paper: Paper = "a4"): string {
  const document = demoSheet(flow);
  return stub(() => (
    <SheetPage
      assessmentId={HEAD.id}
      document={document}
      legs={null}
      paper={paper}
      printedAt="2026-12-01T11:23:45.000Z"
    />
  ));
}

const count = (markup: string, text: string) => markup.split(text).length - 1;

describe("the printed sheet", () => {
  it("says first that it is a draft and not for the floor", () => {
    const text = words(sheet("Tern"));
    const start = text.indexOf("Draft, not released: not for the floor");
    expect(start).toBeGreaterThan(-1);
    expect(start).toBeLessThan(text.indexOf("Clear as planned"));
    expect(sheet("Tern")).toContain(">Draft, not for the floor</text>");
  });

  it("has its answer once as the first heading, and every group with its number, face and stop", () => {
    const markup = sheet("Tern");
    expect(count(markup, "<h1")).toBe(1);
    const text = words(markup);
    for (const words of ["Steps 1 to 12", "Steps 13 to 15", "Steps 16 to 19", "Back side up", "Do not release: rolls"])
      expect(text).toContain(words);
    expect(count(markup, 'role="rowheader" aria-colspan="4"')).toBe(3);
  });

  it("says before the answer that a blocked flow must not be run", () => {
    expect(words(sheet("Fulmar A"))).toMatch(/Do not run first at step 12 Needs carrier from step 10/);
    expect(words(sheet("Petrel"))).not.toContain("Do not run");
  });

  it("repeats number, draft, title block and page of pages on every page, and the tables' heads where they stand", () => {
    const markup = sheet("Petrel");
    const text = words(markup);
    for (const page of ["1 of 3", "2 of 3", "3 of 3"]) {
      expect(text).toContain(`Page ${page}`);
      expect(markup).toContain(`aria-label="Title block, page ${page}"`);
    }
    expect(text.match(/Draft, not released: not for the floor/g)?.length).toBeGreaterThanOrEqual(6);
    expect(count(markup, 'aria-label="Steps grouped by what holds the wafer"')).toBe(1);
    expect(count(markup, 'aria-label="Steps with their figures"')).toBe(1);
  });

  it("leaves room to write lot, wafers, carrier and tape, and whom to call", () => {
    const text = words(sheet("Petrel"));
    for (const label of [
      "Lot",
      "Wafers",
      "Carrier number",
      "on since",
      "days at most",
      "Call the shift lead",
      "process owner",
    ])
      expect(text).toContain(label);
  });

  it("says that paper is uncontrolled, and when it was printed", () => {
    expect(words(sheet("Tern"))).toContain("Uncontrolled when printed. Page 1 of 2 Printed 2026-12-01 11:23 UTC");
  });

  it("is made for the chosen paper", () => {
    expect(sheet("Tern")).toContain("sheet-page-a4");
    expect(sheet("Tern", "letter")).toContain("sheet-page-letter");
    expect(sheet("Tern", "letter")).toContain("width:215.9mm");
  });

  it("paints with tokens only and has no pattern, which would print as blocks", () => {
    const markup = sheet("Petrel, glass 7.2 ppm");
    expect(markup).not.toContain("<pattern");
    expect(markup).not.toMatch(/(?:fill|stroke)="(?:#|rgb|black|white)/);
  });

  it("uses only characters for which a font is shipped", () => {
    for (const flow of ["Tern", "Petrel, glass 7.2 ppm", "Fulmar A"])
      expect(words(sheet(flow))).not.toMatch(/[\u2080-\u2089\u2190-\u21FF\u2264\u2265\u207B\u2713]/);
  });
});

describe("the list of sheets", () => {
  const page = { rows: [], total: 0, params: { query: "", sort: "run", descending: false, page: 1, filters: {} } };

  it("tells an empty place from a search that finds nothing", () => {
    expect(words(stub(() => <DraftList page={page} programs={[]} />))).toContain("No draft yet");
    const searched = { ...page, params: { ...page.params, query: "zzz" } };
    expect(words(stub(() => <DraftList page={searched} programs={[]} />))).toContain("No draft fits");
  });
});
