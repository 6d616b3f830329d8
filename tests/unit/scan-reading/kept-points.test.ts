/*
 *   κ   curvature   1/m
 */
import { describe, expect, it } from "vitest";
import { fitScan } from "#app/engine/profile/fit-scan.ts";
import { profilesCsv } from "#app/lib/reading-csv.ts";
import { readingFigures } from "#app/lib/reading-figures.ts";
import { readScanFile } from "#app/lib/scan-reading/scan-reader.ts";
import type { ReadProfileFigures } from "#app/schemas/scan-reading.ts";
import { PLAIN, encoded, scanText, trueScan, type TruePoint } from "#tests/fixtures/scan-files.ts";
import { profilesOf } from "./read.ts";

const EDGE = 5e-3;
/** Waves that share no period with the scan stand for noise of 50 nm. */
const noisy = (count: number) =>
  trueScan({ count }).map(({ x, z }, n) => ({ x, z: z + 70e-9 * Math.sin(12.9898 * n * n) }));

function figures(bytes: Uint8Array): ReadProfileFigures[] {
  const { content } = readingFigures("scan.csv", readScanFile(bytes, "scan.csv"), EDGE);
  if (content.kind !== "profiles") throw new Error(content.kind);
  return content.profiles;
}
const fileOf = (scans: TruePoint[][], lines = PLAIN.lines) => encoded(scanText(scans, { ...PLAIN, lines }), "utf-8");

describe("a profile longer than what is kept of it", () => {
  const file = fileOf([noisy(60_000)]);
  const [kept] = figures(file);

  it("is fitted with every point, and what is kept are means", () => {
    const [all] = profilesOf(readScanFile(file, "scan.csv")).content.profiles;
    if (!all || !kept?.fit) throw new Error("nothing was read");
    const fit = fitScan(all, { edgeExclusion: EDGE, robust: true });
    expect(kept.fit).toMatchObject({ curvature: fit.curvature, used: fit.used, rejected: fit.rejected.length });
    expect(fit.used).toBeGreaterThan(50_000);
    expect([kept.points, kept.x.length, kept.z.length]).toEqual([60_000, 10_000, 10_000]);
  });

  it("comes as CSV that says so, and that reads back without a change", () => {
    if (!kept) throw new Error("nothing was read");
    const text = profilesCsv([kept]);
    expect(text).toMatch(/^# Profile 1: 10000 means of equal stretches; .* all 60000 points\r\nPosition 1 \[m\],/);
    const [again] = figures(encoded(text, "utf-8"));
    expect(again).toMatchObject({ x: kept.x, z: kept.z, points: 10_000 });
  });
});

describe("profiles that are kept whole", () => {
  it("come as CSV that reads back with the same points and the same fit", () => {
    const kept = figures(fileOf([noisy(300), trueScan({ count: 120, times: 2 })], ["x (mm),z (µm),x (mm),z (µm)"]));
    const again = figures(encoded(profilesCsv(kept), "utf-8"));
    expect(again.map(({ x, z, fit }) => ({ x, z, fit }))).toEqual(kept.map(({ x, z, fit }) => ({ x, z, fit })));
  });

  it("take none of the file's own words into their CSV, so none that a spreadsheet would run", () => {
    const kept = figures(fileOf([noisy(40)], ["\"=cmd|' /C calc'!A0 x (mm)\",@SUM(A1) z (µm)"]));
    const cells = profilesCsv(kept).split(/[,\r\n]+/);
    expect(cells.filter((cell) => /^[=+@\t]|^-(?!\d)/.test(cell))).toEqual([]);
  });
});
