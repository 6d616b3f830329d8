import { expect, it } from "vitest";
import { addedResults } from "#app/lib/scan-import/results.ts";

it("names a file that has waited with the scan that it has become part of", () => {
  const waits = addedResults(
    [],
    { file: "a.csv", key: "1" },
    {
      outcome: "placed",
      placed: [{ outcome: "waits", label: "M-1, 0°", waferScan: "w1" }],
    },
  );
  expect(waits).toMatchObject([{ words: "waits for its partner", path: "/scans/waiting/w1", files: ["a.csv"] }]);
  const whole = addedResults(
    waits,
    { file: "b.csv", key: "2" },
    {
      outcome: "placed",
      placed: [{ outcome: "scan", label: "M-1, 0°", scan: "s1", partner: "w1" }],
    },
  );
  expect(whole).toMatchObject([{ words: "is a scan", path: "/scans/s1", files: ["a.csv", "b.csv"] }]);
  expect(whole[0]?.undo).toEqual({ what: "scan", id: "s1" });
});

it("says of what was in already when it came, and by whom, and offers no undo of it", () => {
  const before = { by: "Jude Okafor", at: "2026-12-01T08:00:00.000Z" };
  const [placed] = addedResults(
    [],
    { file: "a.csv", key: "1" },
    {
      outcome: "placed",
      placed: [{ outcome: "already", label: "M-1, 0°", before, scan: "s1", waferScan: "w1" }],
    },
  );
  expect(placed).toMatchObject({ words: "was imported on 2026-12-01 by Jude Okafor", path: "/scans/s1", undo: null });
  const [table] = addedResults([], { file: "t.csv", key: "2" }, { outcome: "known table", reading: "r", before });
  expect(table).toMatchObject({ outcome: "already", undo: null });
});

it("says of a table how many wafers it tells of, and of which lot", () => {
  const measured = { outcome: "measured" as const, reading: "r1", lots: [{ id: "l1", name: "L1" }] };
  const added = (what: { kind: string; wafers: number; only: string | null }) =>
    addedResults([], { file: "t.csv", key: "2" }, { ...measured, ...what });
  expect(added({ kind: "summary", wafers: 8, only: null })).toMatchObject([
    { words: "is in, a summary of eight wafers, lot L1", path: "/lots/l1" },
  ]);
  expect(added({ kind: "thickness map", wafers: 1, only: "w1" })).toMatchObject([
    { words: "is in, a thickness map of one wafer, lot L1", path: "/wafers/w1" },
  ]);
});
