import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { monitorProfile, profileCsv, type CsvStyle } from "#app/db/seeders/demo-monitor.ts";
import { readOneProfile } from "#app/lib/scan-reading/one-profile.ts";
import type { FileFormat } from "#app/schemas/scan-result.ts";
import { ScanFileError } from "#app/lib/scan-reading/refusal.ts";

const POINT: FileFormat = { positionUnit: "mm", heightUnit: "µm", decimalMark: "point" };
const COMMA: FileFormat = { ...POINT, decimalMark: "comma" };
const POINTS = monitorProfile("after");

const bytes = (text: string) => new TextEncoder().encode(text);
const read = (text: string, format = POINT) => readOneProfile(bytes(text), "M-0388.csv", format);
const styled = (style: CsvStyle) => profileCsv(POINTS, style);

/** The sentence with which a file is turned down. */
function refusal(content: string, format = POINT): string {
  try {
    read(content, format);
  } catch (error) {
    if (error instanceof ScanFileError) return error.message;
    throw error;
  }
  throw new Error("the file was read");
}

/** A few rows of plain numbers, from position 0 on. */
const rows = (count: number, row = (n: number) => `${n}.5,${n}.25`) =>
  Array.from({ length: count }, (_, n) => row(n)).join("\n");

describe("a file of one profile, units and decimal mark stated", () => {
  it.each<[name: string, text: string, format: FileFormat, delimiter: string]>([
    ["commas and points", styled({}), POINT, ","],
    ["semicolons and decimal commas", styled({ delimiter: ";", decimalComma: true }), COMMA, ";"],
    ["tabs and decimal commas", styled({ delimiter: "\t", decimalComma: true }), COMMA, "\t"],
    ["blanks, several of them", styled({ delimiter: "   " }), POINT, " "],
    ["a delimiter at the end of every row", styled({ tail: "," }), POINT, ","],
    ["no heading", styled({ head: [] }), POINT, ","],
    ["a row of units", styled({ head: ["x,z", "mm,µm"] }), POINT, ","],
  ])("%s", (_, text, format, delimiter) => {
    const { points, reading } = read(text, format);
    expect(points.x).toHaveLength(381);
    expect(reading).toMatchObject({ rows: 381, used: 381, skippedInAll: 0, delimiter, readColumns: [0, 1] });
    expect(reading.from).toBeCloseTo(-0.095, 12);
    expect(reading.to).toBeCloseTo(0.095, 12);
    // Written with four decimals of a micrometre.
    points.z.forEach((z, n) => expect(Math.abs(z - (POINTS[n]?.z ?? 0))).toBeLessThan(0.51e-10));
  });

  it("other units, Å and inch too", () => {
    const format: FileFormat = { positionUnit: "inch", heightUnit: "Å", decimalMark: "point" };
    const { points } = read(
      styled({ head: ["x (in),z (A)"], positionPerMetre: 1e4 / 254, heightPerMetre: 1e10 }),
      format,
    );
    expect(points.x[0]).toBeCloseTo(-0.095, 4);
    expect(points.z[0]).toBeCloseTo(POINTS[0]?.z ?? 0, 12);
  });

  it("the trade's minus sign, powers of ten and plus signs", () => {
    const { points } = read(rows(8, (n) => `\u2212${n}.5e0,+${n}E-1`));
    expect([points.x[2], points.z[2]]).toEqual([-0.0025, 0.2 / 1e6]);
  });

  it("columns by their heads, wherever they stand", () => {
    const { points, reading } = read(`Height (µm),No,Position (mm)\n${rows(9, (n) => `${n}.25,${n + 1},${n}.5`)}`);
    expect([points.x[3], points.z[3]]).toEqual([0.0035, 3.25e-6]);
    expect(reading).toMatchObject({ columns: 3, readColumns: [2, 0], heading: "Position (mm), Height (µm)" });
  });

  it("without heads the first two columns, when nothing else tells them", () => {
    const { reading } = read(rows(9, (n) => `${n}.5,${n}.25,7,ok`));
    expect(reading).toMatchObject({ columns: 4, readColumns: [0, 1], heading: null });
  });

  it("all points of a long scan, each as it stands there", () => {
    const { points, reading } = read(rows(25_000, (n) => `${(n / 200).toFixed(4)},${(n % 7) + 0.25}`));
    expect([points.x.length, points.z.length]).toEqual([25_000, 25_000]);
    expect([points.x[24_999], points.z[24_999]]).toEqual([124.995 / 1e3, 2.25e-6]);
    expect(reading).toMatchObject({ rows: 25_000, used: 25_000 });
    expect(reading.averagedTo).toBeUndefined();
  });
});

describe("rows that are no pair of numbers", () => {
  it("are left out and named by row, column and what stands there", () => {
    const { points, reading } = read(`x,z\n${rows(10)}\n4.5,NaN\n,7.1\n# end of scan\nchecked,yes\n11.5,3.2\n`);
    expect(points.x).toHaveLength(11);
    expect(reading.rows).toBe(14);
    expect(reading.skippedInAll).toBe(3);
    expect(reading.skipped).toEqual([
      { row: 12, column: "height", text: "NaN" },
      { row: 13, column: "position", text: "" },
      { row: 15, column: "position", text: "checked" },
    ]);
  });

  it("are listed up to five of a cause and counted in all", () => {
    const { reading } = read(`${rows(40)}\n${rows(30, () => "1,oops")}`);
    expect(reading.skipped).toHaveLength(5);
    expect(reading.skippedInAll).toBe(30);
  });

  it("keep no half of a character and no control character", () => {
    const { reading } = read(`${rows(9)}\n1.5,${"😀".repeat(60)}\u0007`);
    expect(reading.skipped[0]?.text).toBe(`${"😀".repeat(39)}…`);
  });
});

describe("files that are no single profile", () => {
  it.each<[name: string, content: string, says: RegExp]>([
    ["words only", "Dear all,\nthe scans are late.\n", /has no row of numbers.*its first line is “Dear all,”/],
    ["three rows", rows(3), /has 3 usable rows; a curvature needs at least 7/],
    ["one row", "1,2", /has 1 usable row;/],
    ["one column", rows(20, (n) => `${n}.25`), /has one column only: row 1 holds “0\.25”\. It needs two/],
    ["one column and a delimiter", rows(20, (n) => `${n}.25;`), /has one column only: row 1 holds “0\.25”/],
    [
      "half of it no numbers",
      `x,z\n${rows(8)}\n${rows(9, () => "1.5,oops")}`,
      /9 of 17 rows are no pair of numbers\. Row 10, height: “oops” is not a number with a decimal point/,
    ],
    [
      "half of it without values",
      `x,z\n${rows(8)}\n${rows(9, () => "1.5,--")}`,
      /Row 10, height: “--” stands for no value/,
    ],
    ["empty cells", rows(20, (n) => (n < 8 ? `${n},1` : `${n},`)), /Row 9, height: the cell is empty/],
    [
      "two profiles",
      `x,z1,z2\n${rows(9, (n) => `${n}.5,${n}.25,${n}.75`)}`,
      /holds 2 profiles: “z1”, “z2”\. Export the one/,
    ],
    ["a summary", "Slot,Bow (um),Warp (um)\n1,-30.5,60.1\n2,-31.5,61.2\n", /is a summary, not a profile/],
    ["a slope", `x (mm),Slope\n${rows(9)}`, /“Slope” is a slope, and no column holds the height/],
  ])("%s", (_, content, says) => expect(refusal(content)).toMatch(says));
});

describe("the decimal mark", () => {
  it("comma in the file, point chosen", () => {
    const text = styled({ delimiter: ";", decimalComma: true });
    expect(refusal(text)).toMatch(
      /^M-0388\.csv has two columns of numbers only with a decimal comma: row 2 holds “-95,00;51,\d+”\. A decimal point is chosen/,
    );
  });

  it("point in the file, comma chosen", () => {
    expect(refusal(styled({}), COMMA)).toMatch(/only with a decimal point: row 2 holds “-95\.00,51\.\d+”/);
  });

  it("one column of decimal commas is one column, not two", () => {
    const text = rows(20, (n) => `${n},25`);
    expect(refusal(text, COMMA)).toMatch(
      /Read with a decimal comma, M-0388\.csv has one column only: row 1 holds “0,25”.*choose a decimal point/,
    );
  });

  it("commas for decimals and between columns are not guessed at", () => {
    const text = styled({ head: ["x,z"], decimalComma: true });
    expect(refusal(text)).toMatch(/every row holds four whole numbers, such as “-95,00,51,\d+”/);
    expect(refusal(text, COMMA)).toMatch(/M-0388\.csv/);
  });

  it("four columns of whole numbers with four heads are read", () => {
    expect(read(`x,z,force,flag\n${rows(9, (n) => `${n},${n},3,0`)}`).points.x).toHaveLength(9);
  });

  it("thousands are not taken for decimals, nor the other way round, unasked", () => {
    const text = `x;z\n${rows(9, (n) => `${n + 1},250;${n + 2},125`)}`;
    const { x, z } = read(text, COMMA).points;
    expect([x[0], z[0]]).toEqual([0.00125, 2.125e-6]);
    expect(refusal(text)).toMatch(
      /row 2 holds “1,250”: it may be 1\.250 or 1250.*A decimal point is chosen; choose comma/,
    );
  });
});

describe("the heading", () => {
  it.each(["z (nm)", "z [nm]", "z / nm", "z_nm", "height, nm"])(
    "'%s' against µm is refused with both named",
    (head) => {
      expect(refusal(styled({ head: ["# stylus", `x,"${head}"`] }))).toContain(
        `row 2: the height column is headed “${head}”, in nm, but µm is chosen. Choose nm,`,
      );
    },
  );

  it.each([
    ["a row of units counts", ["x,z", "µm,µm"], ",", /row 2: the position column is headed “µm”.*but mm is chosen/],
    ["a unit that is read, but not chosen", ["x (mm),z (Å)"], ",", /in Å, but µm is chosen. Choose Å/],
    ["a unit that is not read", ["x (mm),z (pm)"], ",", /in pm, but µm is chosen. pm is not read here/],
    ["split like the data", ["x (mm)   z (nm)"], "   ", /height column is headed “z ?\(nm\)”, in nm, but µm/],
    ["split otherwise", ["x_mm, z_nm"], ";", /height column is headed “z_nm”, in nm, but µm/],
    [
      "words with units between them",
      ["Position mm Height nm"],
      "  ",
      /height column is headed “Height nm”, in nm, but µm/,
    ],
  ])("%s", (_, head, delimiter, says) => expect(refusal(styled({ head, delimiter }))).toMatch(says));
});

describe("the files in fixtures/scans", () => {
  it.each([
    ["before", "monitor-200mm-725um-before-film-seed-7.csv"],
    ["after", "monitor-200mm-725um-after-5um-film-31MPa-seed-7.csv"],
  ] as const)("%s is what the formula gives", (which, file) => {
    const content = readFileSync(new URL(`../../../fixtures/scans/${file}`, import.meta.url), "utf8");
    expect(content).toBe(profileCsv(monitorProfile(which)));
  });
});
