import { mkdtempSync, rmSync, writeFileSync } from "node:fs";
import { tmpdir } from "node:os";
import { join } from "node:path";
import { afterEach, beforeEach, describe, expect, it } from "vitest";

type Count = (reportFile: string, exitCode: number | null) => { passed: number; failed: number };

// The commands are plain scripts without type declarations.
const tally: string = new URL("../../app/cli/tally.mjs", import.meta.url).href;
const { tallyVitest, tallyPlaywright } = (await import(tally)) as { tallyVitest: Count; tallyPlaywright: Count };

let folder: string;
beforeEach(() => {
  folder = mkdtempSync(join(tmpdir(), "planeward-tally-"));
});
afterEach(() => rmSync(folder, { recursive: true }));

function reportOf(content: object): string {
  const file = join(folder, "report.json");
  writeFileSync(file, JSON.stringify(content));
  return file;
}

describe("tallyVitest", () => {
  const clean = { numPassedTests: 5, numFailedTests: 0, numPendingTests: 0, numTodoTests: 0, testResults: [] };

  it.each([
    ["tests that passed", {}, 0, { passed: 5, failed: 0 }],
    ["failed tests", { numFailedTests: 2 }, 1, { passed: 5, failed: 2 }],
    [
      "skipped tests and tests left to do as failed",
      { numPendingTests: 1, numTodoTests: 1 },
      0,
      { passed: 5, failed: 2 },
    ],
    [
      "a file that could not run",
      { testResults: [{ status: "failed", assertionResults: [] }] },
      1,
      { passed: 5, failed: 1 },
    ],
    ["an error outside every test", {}, 1, { passed: 5, failed: 1 }],
    ["a run ended by a signal", {}, null, { passed: 5, failed: 1 }],
    ["no test at all as a failure", { numPassedTests: 0 }, 0, { passed: 0, failed: 1 }],
  ])("counts %s", (_what, change, exitCode, expected) => {
    expect(tallyVitest(reportOf({ ...clean, ...change }), exitCode)).toEqual(expected);
  });

  it("counts a missing report as a failure", () => {
    expect(tallyVitest(join(folder, "none.json"), 0)).toEqual({ passed: 0, failed: 1 });
  });
});

describe("tallyPlaywright", () => {
  const clean = { expected: 3, unexpected: 0, flaky: 0, skipped: 0 };

  it.each([
    ["tests that passed", {}, [], 0, { passed: 3, failed: 0 }],
    ["failed tests", { unexpected: 1 }, [], 1, { passed: 3, failed: 1 }],
    ["skipped and flaky tests as failed", { skipped: 1, flaky: 1 }, [], 0, { passed: 3, failed: 2 }],
    ["errors outside every test", {}, [{ message: "no such file" }], 1, { passed: 3, failed: 1 }],
    ["no test at all as a failure", { expected: 0 }, [], 0, { passed: 0, failed: 1 }],
  ])("counts %s", (_what, change, errors, exitCode, expected) => {
    expect(tallyPlaywright(reportOf({ stats: { ...clean, ...change }, errors }), exitCode)).toEqual(expected);
  });
});
