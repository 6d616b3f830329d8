import { createRoutesStub } from "react-router";
import { describe, expect, it } from "vitest";
import { TodayForGuest } from "#app/components/today/TodayForGuest.tsx";
import { TodayPage } from "#app/components/today/TodayPage.tsx";
import type { TodayAssessed, TodaySheet, TodayView } from "#app/schemas/today.ts";
import { render, words } from "#tests/components/drawings/render.ts";
import { strangeCharacters } from "#tests/components/glyphs.ts";

const none = { rows: [], total: 0 };
const SHEETS: TodayView["sheets"] = {
  toRelease: none,
  toSign: none,
  returned: none,
  asked: none,
  lapsing: none,
  lately: none,
  inForce: 0,
};
const PROGRAM = { id: "1", name: "Tern", slug: "tern", diameter: 0.2, purpose: "To 100 µm", flows: 1, stacks: 1 };
const EMPTY: TodayView = {
  now: "2026-12-01T07:40:00.000Z",
  works: true,
  mayAssess: true,
  mayUpload: true,
  decisions: none,
  outOfDate: none,
  notAssessed: none,
  scans: [],
  sheets: SHEETS,
  lots: { blocked: none, toMove: none, toTake: none },
  incidents: none,
  programs: [PROGRAM],
  kept: [],
  demo: null,
};
const ASSESSED: TodayAssessed = {
  id: "flow",
  name: "Tern T-2",
  program: "Tern",
  updatedAt: "2026-11-30T07:40:00.000Z",
  mayAssess: true,
  newest: { id: "assessment", number: 14, outcome: "do not run", at: "2026-11-30T08:00:00.000Z" },
  sentence: "Step 9, Coat: Edges up 313 ± 39 µm as it leaves; the coater takes 300 µm edges up.",
  diameter: 0.2,
  wafer: null,
};

function shown(view: TodayView): string {
  const Stub = createRoutesStub([
    {
      path: "/",
      Component: () => (view.works ? <TodayPage view={view} told={null} /> : <TodayForGuest view={view} />),
    },
  ]);
  return render(<Stub initialEntries={["/"]} />);
}
const text = (view: TodayView) => words(shown(view)).replaceAll("\u00A0", " ");

describe("Today", () => {
  it("says what waits, since when, and where to look", () => {
    const markup = shown({ ...EMPTY, decisions: { rows: [ASSESSED], total: 1 } });
    expect(words(markup)).toMatch(
      /^Today One flow needs a decision\. 2026-12-01, 07:40 UTC Needs a decision oldest first/,
    );
    expect(markup).toContain('href="/assessments/assessment"');
    expect(markup).toContain('aria-label="See why: Tern T-2, assessment N"');
    expect(strangeCharacters(markup)).toEqual([]);
  });

  it("puts first what waits for the reader, and leads a sheet in force to its page", () => {
    const row: TodaySheet = {
      id: "revision",
      revisionId: "revision",
      assessmentId: "assessment",
      name: "TERN-H003",
      released: false,
      state: "in review",
      title: "Tern T-2",
      program: "Tern",
      at: "2026-11-30T08:00:00.000Z",
      words: "For lot T-0412",
    };
    const released: TodaySheet = { ...row, name: "TERN-H002 B", released: true, state: "released", words: "" };
    const sheets = { ...SHEETS, toRelease: { rows: [row], total: 1 }, lately: { rows: [released], total: 1 } };
    const markup = shown({ ...EMPTY, sheets, decisions: { rows: [ASSESSED], total: 1 } });
    expect(words(markup)).toMatch(
      /For you to review oldest first TERN-H003, Tern T-2 For lot T-0412 Tern since 2026-11-30 Review .*Needs a decision .*Sheets of late/,
    );
    expect(markup).toContain('href="/assessments/assessment/review"');
    expect(markup).toContain('href="/sheets/revisions/revision"');
  });

  it("offers to run again only to those who may", () => {
    const stale = (mayAssess: boolean) =>
      text({ ...EMPTY, outOfDate: { rows: [{ ...ASSESSED, mayAssess }], total: 1 } });
    expect(stale(true)).toMatch(/Do not run before the change Run again/);
    expect(stale(false)).toMatch(/Do not run before the change See the flow/);
  });

  it("tells how many more there are", () => {
    const markup = shown({ ...EMPTY, decisions: { rows: [ASSESSED], total: 9 } });
    expect(words(markup)).toContain("Nine flows need a decision. ");
    expect(words(markup)).toContain("8 more");
  });

  it("begins with the scans for those who assess nothing", () => {
    const order = text({ ...EMPTY, mayAssess: false, decisions: { rows: [ASSESSED], total: 1 } });
    expect(order.indexOf("Latest scans")).toBeLessThan(order.indexOf("Needs a decision oldest"));
  });

  it("leads from films over the first stack to the first flow where nothing is set", () => {
    const programs = [{ ...PROGRAM, flows: 0, stacks: 0 }];
    const markup = shown({ ...EMPTY, programs });
    for (const to of ["/films", "/stacks/new", "/flows/new"]) expect(markup).toContain(`href="${to}"`);
    expect(text({ ...EMPTY, programs, mayAssess: false })).toMatch(/An engineer of your program starts/);
  });

  it("leads whoever may upload to the first scan, and leaves out what they may not do", () => {
    const programs = [{ ...PROGRAM, flows: 0, stacks: 0 }];
    expect(shown({ ...EMPTY, programs })).toContain('href="/scans/new"');
    const technician = shown({ ...EMPTY, programs, mayAssess: false });
    expect(technician).toContain('href="/scans/new"');
    for (const to of ["/stacks/new", "/flows/new"]) expect(technician).not.toContain(`href="${to}"`);
    expect(text({ ...EMPTY, programs: [{ ...PROGRAM, flows: 0, stacks: 2 }] })).toMatch(
      /First stack\. Done\. See the stacks/,
    );
  });

  it("shows what was marked and opened, to who sees no work too", () => {
    const row = { key: "1", name: "Polymer dielectric A", about: "film, polymer", path: "/films/1" };
    const kept = [{ kind: "favourite", title: "Favourites", rows: [row], total: 12, list: "/favourites" }];
    for (const works of [true, false])
      expect(text({ ...EMPTY, works, kept })).toContain(
        "Favourites Polymer dielectric A film, polymer All 12 in the list",
      );
  });

  it("shows a guest programs and no counts, and where sheets stand", () => {
    const guest = text({ ...EMPTY, works: false, mayAssess: false, mayUpload: false });
    expect(guest).toMatch(/^Today No sheet is in force for your programs\./);
    expect(guest).toMatch(/Tern To 100 µm 200 mm/);
    expect(guest).not.toMatch(/Flows|Stacks|scan/);
  });

  it("says so where somebody belongs to no program", () => {
    expect(text({ ...EMPTY, works: false, programs: [] })).toMatch(/You do not belong to a program yet/);
  });
});
