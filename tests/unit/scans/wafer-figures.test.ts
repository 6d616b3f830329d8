import { describe, expect, it } from "vitest";
import { ageWords } from "#app/lib/age-words.ts";
import { runBackwards } from "#app/lib/run-backwards.ts";
import type { ReadProfile } from "#app/lib/scan-reading/one-profile.ts";
import { contentByWafer } from "#app/lib/table-by-wafer.ts";
import { newestFigures, type DatedContent } from "#app/lib/wafer-figures.ts";
import { azimuthText, waferLabel } from "#app/lib/wafer-label.ts";

const figure = (quantity: "bow" | "thickness", statistic: "centre" | "spread" | null, value: number | null) => ({
  column: 0,
  heading: "",
  quantity,
  statistic,
  reference: null,
  edgeExclusion: quantity === "bow" ? 3e-3 : null,
  value,
});
const summary = (on: string, ...figures: ReturnType<typeof figure>[]): DatedContent => ({
  content: { kind: "summary", figures, measured: null },
  on,
});

describe("the figures of a wafer", () => {
  it("are the newest of each, with how they were measured; a spread is no thickness", () => {
    const { bow, thickness, warp } = newestFigures(
      [
        summary("2026-11-02", figure("bow", null, -40e-6), figure("thickness", "spread", 1e-6)),
        summary("2026-11-01", figure("bow", null, -50e-6), figure("thickness", "centre", 725e-6)),
      ],
      [],
    );
    expect(bow).toMatchObject({ value: -40e-6, on: "2026-11-02", how: "not said how, 3\u00A0mm left out at the edge" });
    expect(thickness).toMatchObject({ value: 725e-6, on: "2026-11-01", how: "at the centre" });
    expect(warp).toBeUndefined();
  });

  it("of a map are its mean and its spread over the sites", () => {
    const sites = [50, 51, 49].map((thickness, n) => ({ row: n, x: n * 0.01, y: 0, thickness: thickness * 1e-6 }));
    const content = { kind: "thickness map", sites, underneath: "tape" } as const;
    const { thickness, "thickness variation": ttv } = newestFigures([{ content, on: "2026-11-01" }], []);
    expect(thickness?.value).toBeCloseTo(50e-6, 12);
    expect(ttv?.value).toBeCloseTo(2e-6, 12);
    expect(thickness?.how).toBe("mean over 3 sites, tape under it, as read");
  });

  it("take a stress from scans or from the tool, whichever is newer", () => {
    const tool = { stress: 20e6, modulus: null, filmThickness: null, substrateThickness: null, row: 2 };
    const content = {
      kind: "reduced stress" as const,
      stresses: [{ ...tool, curvatureBefore: null, curvatureAfter: null }],
    };
    const scan = { stress: 30e6, stressUncertainty: 1e6, on: "2026-11-02", how: "from scans along 0°" };
    const figures = newestFigures([{ content, on: "2026-11-01" }], [scan]);
    expect(figures.stress).toEqual({ value: 30e6, uncertainty: 1e6, on: "2026-11-02", how: "from scans along 0°" });
    expect(newestFigures([{ content, on: "2026-11-03" }], [scan]).stress?.value).toBe(20e6);
  });
});

describe("a table by wafer", () => {
  it("puts sites of several wafers apart, and gives those of none to the one that is named", () => {
    const site = (wafer: string | null, thickness: number) => ({ row: 1, wafer, x: 0, y: 0, thickness });
    const content = {
      kind: "thickness map" as const,
      sites: [site("A", 1), site("B", 2), site("a", 3), site(null, 4)],
      polar: false,
      underneath: null,
      faults: [],
      footerLines: 0,
    };
    const parts = contentByWafer(content, { lot: "L1", wafer: "C", slot: null });
    expect(
      parts.map(({ named, content: { kind, ...rest } }) => [
        named.lot,
        named.wafer,
        kind,
        "sites" in rest ? rest.sites.length : 0,
      ]),
    ).toEqual([
      ["L1", "A", "thickness map", 2],
      ["L1", "B", "thickness map", 1],
      ["L1", "C", "thickness map", 1],
    ]);
  });
});

it.each([
  [-0.1, 0.09, -0.09, 0.1],
  [0, 0.19, 0, 0.19],
])("a line from %s to %s run the other way goes from %s to %s", (from, to, newFrom, newTo) => {
  const points = { x: Float64Array.of(from, to), z: Float64Array.of(1, 2) };
  const turned = runBackwards({ points, reading: { from, to } as ReadProfile["reading"] });
  expect(turned.reading).toMatchObject({ from: newFrom, to: newTo });
  expect([...turned.points.z]).toEqual([2, 1]);
  expect(turned.points.x[0]).toBeCloseTo(newFrom, 12);
});

it.each([
  ["2026-12-01T11:30:00Z", "under an hour"],
  ["2026-12-01T09:00:00Z", "3 hours"],
  ["2026-11-30T12:00:00Z", "1 day"],
  ["2026-12-02T00:00:00Z", "under an hour"],
])("what came at %s has waited %s", (since, words) =>
  expect(ageWords(since, new Date("2026-12-01T12:00:00Z"))).toBe(words),
);

it("a wafer is named by its name, lot and slot, or by its slot alone", () => {
  expect(waferLabel({ name: "M-1", lot: "L2", slot: 3 })).toBe("M-1, lot L2, slot 3");
  expect(waferLabel({ name: "slot 3", lot: "L2", slot: 3 })).toBe("lot L2, slot 3");
  expect(azimuthText(Math.PI / 8)).toBe("22.5°");
});
