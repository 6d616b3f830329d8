import { readFileSync } from "node:fs";
import { describe, expect, it } from "vitest";
import { readProfile, type ProfileFormat } from "#app/lib/profile-csv.ts";
import { ProfileFileError } from "#app/lib/profile-text.ts";
import { monitorProfile, profileCsv, type CsvStyle } from "#app/db/seeders/demo-monitor.ts";

const POINT: ProfileFormat = { positionUnit: "mm", heightUnit: "µm", decimalMark: "point" };
const COMMA: ProfileFormat = { ...POINT, decimalMark: "comma" };
const POINTS = monitorProfile("after");

const bytes = (text: string) => new TextEncoder().encode(text);
const read = (text: string, format = POINT) => readProfile(bytes(text), "M-0388.csv", format);
const styled = (style: CsvStyle) => profileCsv(POINTS, style);

/** The sentence with which a file is turned down. */
function refusal(content: string | Uint8Array, format = POINT): string {
  try {
    readProfile(typeof content === "string" ? bytes(content) : content, "M-0388.csv", format);
  } catch (error) {
    if (error instanceof ProfileFileError) return error.message;
    throw error;
  }
  throw new Error("the file was read");
}

/** A few rows of plain numbers, from position 0 on. */
const rows = (count: number, row = (n: number) => `${n}.5,${n}.25`) =>
  Array.from({ length: count }, (_, n) => row(n)).join("\n");

describe("the same profile, written in different ways", () => {
  it.each<[name: string, text: string, format: ProfileFormat, delimiter: string]>([
    ["commas and points", styled({}), POINT, ","],
    ["semicolons and decimal commas", styled({ delimiter: ";", decimalComma: true }), COMMA, ";"],
    ["tabs and decimal commas", styled({ delimiter: "\t", decimalComma: true }), COMMA, "\t"],
    ["blanks, several of them", styled({ delimiter: "   " }), POINT, " "],
    ["upright bars", styled({ delimiter: "|" }), POINT, "|"],
    ["line ends of another system", styled({ lineEnd: "\r\n" }), POINT, ","],
    ["line ends of an old system", styled({ lineEnd: "\r" }), POINT, ","],
    ["a delimiter at the end of every row", styled({ tail: "," }), POINT, ","],
    ["no heading", styled({ head: [] }), POINT, ","],
    ["a first line that names the delimiter", styled({ head: ["sep=;", "x;z"], delimiter: ";" }), POINT, ";"],
    [
      "lines of remarks above the heading",
      styled({ head: ["# Instrument: stylus, recipe 12", "Points,381", "", "Operator;J. Okafor", "x (mm),z (µm)"] }),
      POINT,
      ",",
    ],
    ["a row of units", styled({ head: ["x,z", "mm,µm"] }), POINT, ","],
  ])("%s", (_, text, format, delimiter) => {
    const { points, reading } = read(text, format);
    expect(points).toHaveLength(381);
    expect(reading).toMatchObject({ rows: 381, used: 381, skippedInAll: 0, delimiter });
    expect(reading.from).toBeCloseTo(-0.095, 12);
    expect(reading.to).toBeCloseTo(0.095, 12);
    // Written with four decimals of a micrometre.
    points.forEach(({ z }, n) => expect(Math.abs(z - (POINTS[n]?.z ?? 0))).toBeLessThan(0.51e-10));
  });

  it("cells in quotes", () => {
    const { points } = read(`"x","z"\n${rows(8, (n) => `"${n}.5","${n}.25"`)}`);
    expect(points[3]).toEqual({ x: 0.0035, z: 3.25e-6 });
  });

  it("other units", () => {
    const format: ProfileFormat = { positionUnit: "µm", heightUnit: "nm", decimalMark: "point" };
    const { points } = read(styled({ head: ["x (um),z (nm)"], positionPerMetre: 1e6, heightPerMetre: 1e9 }), format);
    expect(points[0]?.x).toBeCloseTo(-0.095, 12);
    expect(points[0]?.z).toBeCloseTo(POINTS[0]?.z ?? 0, 12);
  });

  it("the trade's minus sign, powers of ten and plus signs", () => {
    const { points } = read(rows(8, (n) => `\u2212${n}.5e0,+${n}E-1`));
    expect(points[2]).toEqual({ x: -0.0025, z: 0.2 / 1e6 });
  });

  it.each(["utf-16le", "windows-1252", "utf-8 with a mark"])("encoded as %s", (encoding) => {
    const text = styled({ head: ["x (mm);z (µm)"], delimiter: ";" });
    const encoded =
      encoding === "utf-16le"
        ? new Uint8Array([0xff, 0xfe, ...Buffer.from(text, "utf16le")])
        : encoding === "windows-1252"
          ? new Uint8Array(Buffer.from(text, "latin1"))
          : new Uint8Array([0xef, 0xbb, 0xbf, ...bytes(text)]);
    const { points, reading } = readProfile(encoded, "M-0388.csv", POINT);
    expect(points).toHaveLength(381);
    expect(reading.heading).toBe("x (mm), z (µm)");
  });
});

describe("rows that are no pair of numbers", () => {
  it("are left out and named by row, column and what stands there", () => {
    const { points, reading } = read(`x,z\n${rows(10)}\n4.5,NaN\n,7.1\n# end of scan\n11.5,3.2\nchecked,yes`);
    expect(points).toHaveLength(11);
    expect(reading.rows).toBe(14);
    expect(reading.skipped).toEqual([
      { row: 12, column: "height", text: "NaN" },
      { row: 13, column: "position", text: "" },
      { row: 16, column: "position", text: "checked" },
    ]);
  });

  it("count as data where an instrument wrote a word for a missing value", () => {
    const { reading } = read(`NaN,1.5\n${rows(9)}`);
    expect(reading.skipped).toEqual([{ row: 1, column: "position", text: "NaN" }]);
  });

  it("are listed up to the twentieth and counted in all", () => {
    const { reading } = read(`${rows(40)}\n${rows(30, () => "1,oops")}`);
    expect(reading.skipped).toHaveLength(20);
    expect(reading.skippedInAll).toBe(30);
  });

  it("keep no half of a character and no control character", () => {
    const { reading } = read(`${rows(9)}\n${"😀".repeat(60)}\u0007,1`);
    expect(reading.skipped[0]?.text).toBe(`${"😀".repeat(39)}…`);
  });
});

it("more than two columns: the first two are read, and the count is kept", () => {
  expect(read(rows(9, (n) => `${n}.5,${n}.25,7,ok`)).reading.columns).toBe(4);
});

describe("files that are no profile", () => {
  it.each<[name: string, content: string | Uint8Array, says: RegExp]>([
    ["an empty file", "", /^M-0388\.csv is empty\./],
    ["blanks", " \n\n  ", /holds nothing but blanks/],
    ["a zip", new Uint8Array([0x50, 0x4b, 3, 4, 0, 0]), /is a zip archive .* not a text file/],
    ["a PDF", bytes("%PDF-1.7\n1 0 obj"), /is a PDF, not a text file/],
    ["other bytes", new Uint8Array([0x7f, 0x45, 0x4c, 0x46, 0, 1]), /is not a text file/],
    ["zero bytes far into the file", bytes(`${rows(4000)}\0`), /is not a text file/],
    ["words only", "Dear all,\nthe scans are late.\n", /has no row of numbers.*its first line is “Dear all,”/],
    ["three rows", rows(3), /has 3 usable rows; a curvature needs at least 7/],
    ["one row", "1,2", /has 1 usable row;/],
    ["one column", rows(20, (n) => `${n}.25`), /has one column only: row 1 holds “0\.25”\. It needs two/],
    ["one column and a delimiter", rows(20, (n) => `${n}.25;`), /has one column only: row 1 holds “0\.25”/],
    [
      "half of it no numbers",
      `x,z\n${rows(8)}\n${rows(9, () => "1.5,--")}`,
      /9 of 17 rows are no pair of numbers\. Row 10, height: “--” is not a number with a decimal point/,
    ],
    [
      "more lines than anything needs",
      rows(100_003),
      /has 100002 lines; up to 50000 are read\. Export one point in 3\./,
    ],
    ["empty cells", rows(20, (n) => (n < 8 ? `${n},1` : `${n},`)), /Row 9, height: the cell is empty/],
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
    expect(
      refusal(
        rows(20, (n) => `${n},25`),
        COMMA,
      ),
    ).toMatch(/Read with a decimal comma, M-0388\.csv has one column only: row 1 holds “0,25”.*choose a decimal point/);
  });

  it("commas for decimals and between columns are not guessed at", () => {
    const text = styled({ head: ["x,z"], decimalComma: true });
    expect(refusal(text)).toMatch(/every row holds four whole numbers, such as “-95,00,51,\d+”/);
    expect(refusal(text, COMMA)).toMatch(/M-0388\.csv/);
  });

  it("four columns of whole numbers with four heads are read", () => {
    expect(read(`x,z,force,flag\n${rows(9, (n) => `${n},${n},3,0`)}`).points).toHaveLength(9);
  });
});

describe("the heading", () => {
  it.each([
    ["z (nm)", "nm"],
    ["z [nm]", "nm"],
    ["z / nm", "nm"],
    ["z_nm", "nm"],
    ["height, nm", "nm"],
    ["nm", "nm"],
  ])("'%s' against µm is refused with both named", (head, unit) => {
    const says = refusal(styled({ head: ["# stylus", `x,"${head}"`] }));
    expect(says).toContain(
      `row 2: the height column is headed “${head}”, in ${unit}, but µm is chosen. Choose ${unit},`,
    );
  });

  it("a row of units counts as heading", () => {
    expect(refusal(styled({ head: ["x,z", "µm,µm"] }))).toMatch(
      /row 2: the position column is headed “µm”.*but mm is chosen/,
    );
  });

  it("a unit that is not read here says so", () => {
    expect(refusal(styled({ head: ["x (mm),z (Å)"] }))).toMatch(
      /Å is not read here: export the column in m, mm, µm or nm/,
    );
  });

  it("height before position is refused", () => {
    expect(refusal(styled({ head: ["Height (µm),Position (mm)"] }))).toMatch(/Position must come first, then height/);
  });

  it.each(["um", "μm", "microns", "µm"])("'z (%s)' is µm", (unit) => {
    expect(read(styled({ head: [`x (mm),z (${unit})`] })).points).toHaveLength(381);
  });

  it.each([
    ["split like the data", "x (mm)   z (nm)", "   "],
    ["split otherwise", "x_mm, z_nm", ";"],
  ])("%s is read as well", (_, head, delimiter) => {
    expect(refusal(styled({ head: [head], delimiter }))).toMatch(/height column is headed “.*nm.*”, in nm, but µm/);
  });

  it("says nothing where its words cannot be told apart", () => {
    expect(read(styled({ head: ["Position mm Height nm"], delimiter: "  " })).points).toHaveLength(381);
  });

  it.each(["lead in", "z_m", "z from a"])("'%s' names no unit", (head) => {
    expect(read(styled({ head: [`x,${head}`] })).points).toHaveLength(381);
  });
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
