import { describe, expect, it } from "vitest";
import { encoded, PLAIN, scanText, trueScan } from "#tests/fixtures/scan-files.ts";
import { readScanFile, scanReader } from "#app/lib/scan-reading/scan-reader.ts";
import { profilesOf, questionsOf, refusalOf } from "./read.ts";

const HEAD = "x (mm),z (µm)\n";
const SCAN = scanText([trueScan()], PLAIN);
const bytes = (text: string) => encoded(text, "utf-8");
/** Processor time, so that other work on the machine does not count. */
const SECONDS = 2;
const processorTime = () => {
  const { user, system } = process.cpuUsage();
  return (user + system) / 1e6;
};

describe("files that are none, or mean harm, are turned down at once", () => {
  it.each<[name: string, content: () => string | Uint8Array, says: RegExp]>([
    ["nothing", () => "", /^M-0388\.csv is empty\./],
    ["blanks", () => " \n\n  ", /holds nothing but blanks/],
    ["a zip", () => new Uint8Array([0x50, 0x4b, 3, 4, 0, 0]), /is a zip archive .* not a text file/],
    ["a PDF", () => "%PDF-1.7\n1 0 obj", /is a PDF, not a text file/],
    ["a picture", () => new Uint8Array([0x89, 0x50, 0x4e, 0x47, 13, 10]), /is a PNG picture/],
    ["a web page", () => "<!DOCTYPE html><html><body>1,2</body></html>", /is a web page, not a table/],
    ["other bytes", () => new Uint8Array([0x7f, 0x45, 0x4c, 0x46, 2, 1, 1, 3, 5]), /is not a text file/],
    ["a zero byte far into the file", () => `${SCAN.repeat(30)}\0`, /is not a text file/],
    [
      "50 MB in one line",
      () => new Uint8Array(50e6).fill(0x37),
      /row 1 has more than 1000000 characters and no line end/,
    ],
    ["50 MB of cells in one line", () => bytes("1.5,".repeat(12.5e6)), /row 1 has more than 1000000 characters/],
    ["a line that never ends below good ones", () => SCAN + "7".repeat(2e6), /row 98 has more than 1000000 characters/],
    ["a million columns", () => `${"1,".repeat(1e6)}\n`, /row 1 has more than 1000000 characters/],
    ["many columns", () => `${"1,".repeat(300_000)}\n`.repeat(3), /row 1 has 300001 columns; up to 512 are read/],
    [
      "many columns below good rows",
      () => SCAN + `${"oops,".repeat(1000)}\n`,
      /row 98 has 1001 columns; up to 512 are read/,
    ],
    [
      "a quote that is never closed",
      () => `${HEAD}1,"2\n${SCAN}`,
      /row 2: a quotation mark is opened and never closed/,
    ],
    [
      "quotes in quotes that are never closed",
      () => `${SCAN}1,"${'"",""'.repeat(800_000)}\n`,
      /row 98: a quotation mark is opened and never closed/,
    ],
    ["quotes in words", () => `${HEAD}${'"a"b"c '.repeat(100_000)}`, /M-0388\.csv/],
    [
      "missing values only",
      () => HEAD + "NaN,NaN\n".repeat(1_000_000),
      /rows hold words for missing values only, such as “NaN,NaN”/,
    ],
    [
      "heights that are all missing",
      () => HEAD + Array.from({ length: 100_000 }, (_, n) => `${n},NaN\n`).join(""),
      /100000 of 100000 rows are no pair of numbers\. Row 2, height: “NaN” stands for no value/,
    ],
    [
      "more rows than anything needs",
      () => HEAD + "1.5,2.25\n".repeat(2_100_000),
      /has more than 2000000 rows of data/,
    ],
    [
      "positions of no wafer",
      () => HEAD + Array.from({ length: 9 }, (_, n) => `${n}e9,1\n`).join(""),
      /the positions run from 0\.00 to 8\.00e\+6 m in mm, farther than any wafer/,
    ],
    [
      "heights of no wafer",
      () => HEAD + Array.from({ length: 9 }, (_, n) => `${n}.5,1e9\n`).join(""),
      /the heights run from 1\.00e\+3/,
    ],
    ["words", () => "Dear all,\nthe scans are late.\n", /has no row of numbers.*its first line is “Dear all,”/],
    [
      "one column",
      () => Array.from({ length: 20 }, (_, n) => `${n}.25\n`).join(""),
      /has one column only: row 1 holds “0\.25”\. It needs two/,
    ],
    ["three rows", () => `${HEAD}1,2.5\n3,4.5\n5,6.5\n`, /has 3 usable rows; a curvature needs at least 7/],
    ["a second table", () => SCAN + SCAN, /row 98: a second table begins here/],
    [
      "UTF-8 that stops being it",
      () => new Uint8Array([...bytes(SCAN + "1.5,2.5\n".repeat(50_000)), 0xb5, 0x0a]),
      /begins as UTF-8 but is not UTF-8 any more after byte \d+/,
    ],
  ])(
    "%s",
    (_, content, says) => {
      const given = content();
      const start = processorTime();
      expect(refusalOf(given)).toMatch(says);
      expect(processorTime() - start).toBeLessThan(SECONDS);
    },
    60_000,
  );
});

describe("reading stops", () => {
  const PIECE = new Uint8Array(64 * 1024).fill(0x37);

  it("after the first megabyte of a line without end", () => {
    const reader = scanReader("M-0388.csv");
    const pushed = Array.from({ length: 800 }).findIndex(() => {
      try {
        reader.push(PIECE);
        return false;
      } catch {
        return true;
      }
    });
    expect(pushed).toBeGreaterThan(0);
    expect(pushed).toBeLessThan(20);
  });

  it("as soon as a person has to answer, however much follows", () => {
    const reader = scanReader("M-0388.csv");
    const more = bytes(scanText([trueScan({ count: 20_000 })], { ...PLAIN, lines: ["x,z"] }));
    expect(reader.push(more)).toBe(false);
    expect(reader.push(more)).toBe(false);
    expect(reader.end().outcome).toBe("question");
  });
});

describe("formulas", () => {
  it.each(["=1+1", '=HYPERLINK("a")', "@SUM(A1)", "+cmd|' /C calc'!A0", "-A1", "-2+3*cmd|'a'!A0", "=A1"])(
    "%s in the data is turned down with its place",
    (cell) => {
      const lines = SCAN.split("\n");
      lines[7] = `1.5,"${cell.replaceAll('"', '""')}"`;
      expect(refusalOf(lines.join("\n"))).toMatch(
        /^M-0388\.csv, row 8, column 2 holds “.*”, a formula\. Export the values\.$/,
      );
    },
  );

  it.each(["-1.5", "+2.5E-03", "-", "--", "\u22123.5"])("'%s' is none", (cell) => {
    const lines = SCAN.split("\n");
    lines[7] = `1.5,${cell}`;
    expect(profilesOf(readScanFile(bytes(lines.join("\n")), "a.csv")).content.profiles[0]?.x.length).toBeGreaterThan(
      90,
    );
  });
});

describe("heads that name the insides of a program", () => {
  it.each(["__proto__", "constructor", "toString", "hasOwnProperty"])("'%s' is a head like others", (head) => {
    const text = SCAN.replace("x (mm),z (µm)", `x (mm),z (µm),${head}`).replace(/^(-?\d.*)$/gm, "$1,3");
    const { reading } = profilesOf(readScanFile(bytes(text), "a.csv"));
    expect(reading.columns[2]).toMatchObject({ heading: head, role: "not read" });
    expect(questionsOf(SCAN.replace("z (µm)", head)).map(({ what }) => what)).toEqual(["unit"]);
  });
});
