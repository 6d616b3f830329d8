import { describe, expect, it } from "vitest";
import { readScanFile } from "#app/lib/scan-reading/scan-reader.ts";
import { encoded, PLAIN, scanFile, scanText, trueScan } from "#tests/fixtures/scan-files.ts";
import { profilesOf } from "./read.ts";

const SCAN = trueScan();

describe("rows that cannot be used", () => {
  it("are grouped by cause, with the first five places and the count", () => {
    const instead = Object.fromEntries([
      ...[3, 5, 7, 9, 11, 13, 15].map((n) => [n, { height: "NaN" }] as const),
      [20, { height: "" }],
      [30, { position: "12,5" }],
      [31, { height: "oops" }],
    ]);
    const { content } = profilesOf(
      readScanFile(scanFile(SCAN, { instead, delimiter: ";", lines: ["x (mm);z (µm)"] }).bytes, "a.csv", {
        decimalMark: "point",
      }),
    );
    expect(content.rows).toBe(96);
    expect(content.faulty).toBe(10);
    expect(content.faults).toEqual([
      { cause: "no value", count: 7, places: [5, 7, 9, 11, 13].map((row) => ({ row, column: 1, text: "NaN" })) },
      { cause: "empty cell", count: 1, places: [{ row: 22, column: 1, text: "" }] },
      { cause: "not a number with a decimal point", count: 1, places: [{ row: 32, column: 0, text: "12,5" }] },
      { cause: "not a number", count: 1, places: [{ row: 33, column: 1, text: "oops" }] },
    ]);
  });

  it("words between data are faults, words below them a footer", () => {
    const lines = scanText([SCAN], PLAIN).split("\n");
    lines.splice(40, 0, "paused");
    const { content } = profilesOf(readScanFile(encoded(lines.join("\n") + "done\n", "utf-8"), "a.csv"));
    expect(content.faults).toEqual([
      { cause: "not a number", count: 1, places: [{ row: 41, column: 0, text: "paused" }] },
    ]);
    expect(content.footer).toEqual({ lines: 1, first: { row: 99, column: 0, text: "done" } });
  });

  it("rows without values at the very beginning belong to the data", () => {
    const { reading, content } = profilesOf(
      readScanFile(scanFile(SCAN, { instead: { 0: { height: "NaN" }, 1: { height: "---" } } }).bytes, "a.csv"),
    );
    expect(reading.firstRow).toBe(2);
    expect(content.faulty).toBe(2);
  });
});
