import { createRoutesStub } from "react-router";
import { describe, expect, it } from "vitest";
import { ScanView } from "#app/components/scans/ScanView.tsx";
import { stoneyStressWorking } from "#app/engine/stoney/working.ts";
import { readOneProfile } from "#app/lib/scan-reading/one-profile.ts";
import { shownWorking } from "#app/lib/shown-working.ts";
import type { ScanDetail } from "#app/schemas/scan-view.ts";
import { scanResult } from "#app/services/scan-result-of.ts";
import { render, words } from "#tests/components/drawings/render.ts";
import { strangeCharacters } from "#tests/components/glyphs.ts";
import { MONITOR, MONITOR_PARAMETERS, monitorProfile, profileCsv } from "#app/db/seeders/demo-monitor.ts";

const PARAMETERS = { ...MONITOR_PARAMETERS, filmThicknessTolerance: null };

function detail(tail: string): ScanDetail {
  const read = (which: "before" | "after") =>
    readOneProfile(new TextEncoder().encode(profileCsv(monitorProfile(which)) + tail), `${which}.csv`, PARAMETERS);
  const values = { program: "", label: "M-0388", film: null, ...PARAMETERS };
  const file = (name: string) => ({ id: `id-${name}`, name, size: 5342, hash: "0".repeat(64) });
  const result = scanResult(values, read("before"), read("after"));
  return {
    id: "1",
    label: "M-0388",
    analysis: null,
    program: { id: "1", name: "Tern", slug: "tern" },
    film: { id: "1", name: "Polymer dielectric A", stress: 30e6, stressTolerance: 3e6, source: "measured here" },
    files: { before: file("before.csv"), after: file("after.csv") },
    placed: null,
    undo: { may: false, use: null },
    parameters: PARAMETERS,
    result,
    working: shownWorking(
      stoneyStressWorking({ ...MONITOR, curvatureChange: result.curvatureChange, biaxialModulus: 180e9 }),
    ),
    engineVersion: "0.2.0",
    createdAt: "2026-12-01T08:00:00.000Z",
    createdBy: "Jude Okafor",
  };
}

function shown(scan: ScanDetail): string {
  const Stub = createRoutesStub([{ path: "/", Component: () => <ScanView scan={scan} /> }]);
  return render(<Stub initialEntries={["/"]} />);
}

describe("a scan on its page", () => {
  const markup = shown(detail("12.5,broken\n"));
  const text = words(markup).replaceAll("\u00A0", " ");

  it("answers first, with the expanded uncertainty and the library's value", () => {
    expect(text).toMatch(
      /Polymer dielectric A: 31\.\d+ ± 0\.\d+ MPa, tension\. The library uses 30\.0 ± 3\.0 MPa: the two agree\./,
    );
  });

  it("gives the bow its word", () =>
    expect(text).toMatch(/Bow change, k = 2 −4\d\.\d+ ± 0\.\d+ µm centre low, device side up/));

  it("says where a tolerance is missing, in the budget and as a caution", () => {
    expect(text).toMatch(/Film thickness, by its tolerance no tolerance given/);
    expect(text).toMatch(/Caution\. No tolerance was given for the film thickness/);
  });

  it("names rows left out and links both raw files", () => {
    expect(text).toMatch(/1 row left out .* 383 height broken/);
    expect(markup).toContain('href="/scans/files/id-before.csv"');
    expect(markup).toContain('href="/scans/files/id-after.csv"');
  });

  it("uses only characters for which a font is shipped", () => expect(strangeCharacters(markup)).toEqual([]));

  it("gives a rolled wafer a radius and an edge lift, and no bow", () => {
    const scan = detail("");
    const rolled = { ...scan.result, curled: { rollRadius: 0.31, edgeLift: 0.015 }, understatedBy: null };
    const rolledText = words(shown({ ...scan, result: rolled })).replaceAll("\u00A0", " ");
    expect(rolledText).toMatch(/Rolls up, radius 0\.31 m edges lift 15 mm; do not release/);
    expect(rolledText).toContain("so these scans give no film stress");
    expect(rolledText).not.toMatch(/Bow change|Where the ±/);
  });
});
