import { describe, expect, it } from "vitest";
import { readScanFile } from "#app/lib/scan-reading/scan-reader.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import { encoded, PLAIN, scanText, trueScan } from "#tests/fixtures/scan-files.ts";
import { profilesOf, questionsOf } from "./read.ts";

const rows = (row: (n: number) => string, count = 12) => Array.from({ length: count }, (_, n) => row(n)).join("\n");
const read = (text: string, profile: ImportProfile = {}) =>
  profilesOf(readScanFile(encoded(text, "utf-8"), "M-0388.csv", profile)).content.profiles;

describe("'1,234' may be 1.234 or 1234", () => {
  const text = `x (µm);z (µm)\n${rows((n) => `${n + 1},${100 + n};${3 + n},50${n % 10}`)}`;

  it("is asked, and nothing is read", () => {
    expect(questionsOf(text)).toMatchObject([
      {
        what: "decimal mark",
        choices: ["point", "comma"],
        chosen: null,
        sentence: "row 2 holds “1,100”: it may be 1.100 or 1100, and no number of the file says which.",
      },
    ]);
  });

  it("follows the answer either way", () => {
    expect(read(text, { decimalMark: "comma" })[0]?.x[0]).toBeCloseTo(1.1e-6, 15);
    expect(read(text, { decimalMark: "point", thousands: "comma" })[0]?.x[0]).toBeCloseTo(1.1e-3, 12);
  });

  it("a decimal point alone does not make its commas thousands", () => {
    expect(questionsOf(text, { decimalMark: "point" })).toMatchObject([{ what: "decimal mark" }]);
  });

  it.each([
    ["a number with fewer digits behind its comma", "0,5;3,500"],
    ["a zero before the comma", "0,500;3,500"],
    ["four digits before the comma", "1234,500;3,500"],
    ["a power of ten", "1,500E1;3,500"],
    ["both marks in one number", "1.234,500;3,500"],
  ])("is not asked after %s", (_, line) => {
    expect(read(`${text}\n${line}`)[0]?.x[0]).toBeCloseTo(1.1e-6, 15);
  });

  it("is thousands where a number has a decimal point too", () => {
    expect(read(`${text}\n0.5;3,500`, {})[0]?.x[0]).toBeCloseTo(1.1e-3, 12);
  });

  it("is asked with points as well, where commas could be decimal", () => {
    const points = text.replaceAll(",", ".");
    expect(questionsOf(points)).toMatchObject([{ what: "decimal mark" }]);
    expect(read(points.replaceAll(";", ","))[0]?.x[0]).toBeCloseTo(1.1e-6, 15);
  });

  it("marks of both kinds are asked with both rows", () => {
    expect(questionsOf(`x (mm);z (µm)\n${rows((n) => (n === 3 ? "3,5;1,5" : `${n}.5;${n}.25`))}`)[0]?.sentence).toMatch(
      /^row 2 holds “0\.5” and row 5 “3,5”: the file has both/,
    );
  });

  it("a mark that first appears far below whole numbers is no number", () => {
    const whole = `x (µm);z (nm)\n${rows((n) => `${n};${n * 3}`, 40_000)}\n40000,5;12`;
    const { content } = profilesOf(readScanFile(encoded(whole, "utf-8"), "a.csv"));
    expect(content.faults).toMatchObject([{ cause: "decimal mark not known", count: 1, places: [{ row: 40_002 }] }]);
  });
});

describe("commas between and within columns", () => {
  it.each([
    [
      "four whole numbers",
      rows((n) => `-${n + 20},00,${n},23`),
      /^every row holds four whole numbers, such as “-20,00,0,23”/,
    ],
    ["two whole numbers", rows((n) => `${n},25`), /^every row holds two whole numbers, such as “0,25”/],
  ])("%s are asked about", (_, text, says) => {
    const [question] = questionsOf(text);
    expect(question?.what).toBe("delimiter");
    expect(question?.sentence).toMatch(says);
  });

  it("the answer, or heads over every column, settle it", () => {
    const text = rows((n) => `${n * 2},${(n * 7) % 5}`);
    const units = { position: "mm", height: "µm" } as const;
    expect(read(text, { delimiter: ",", units })).toHaveLength(1);
    expect(read(`x,z\n${text}`, { units })).toHaveLength(1);
  });
});

describe("units and columns", () => {
  const text = scanText([trueScan()], { ...PLAIN, lines: ["x,z"] });

  it("units that no head names are asked, with the range of the numbers", () => {
    expect(questionsOf(text).map(({ what, column, sentence }) => [what, column, sentence])).toEqual([
      ["unit", 0, "the position column, “x”, names no unit; its numbers run from -95 to 95."],
      [
        "unit",
        1,
        expect.stringMatching(/^the height column, “z”, names no unit; its numbers run from -0\.\d+ to 5\d\.\d+\.$/),
      ],
    ]);
  });

  it.each([
    ["height first", "Height (µm),Position (mm)", [1, 0]],
    ["x and y", "X (mm),Y (µm)", [0, 1]],
    ["a head that says nothing beside a position", "x (mm),Channel 1 (µm)", [0, 1]],
  ] as const)("%s", (_, head, columns) => {
    const body = scanText([trueScan()], { ...PLAIN, lines: [] });
    const swapped = columns[0] === 1 ? body.replace(/^(.+),(.+)$/gm, "$2,$1") : body;
    expect(read(`${head}\n${swapped}`)[0]).toMatchObject({ position: columns[0], height: columns[1] });
  });

  it.each([
    [
      "three columns without heads",
      rows((n) => `${n}.5,${(n * 7) % 5}.25,${(n * 3) % 4}.5`),
      /^nothing tells which column is the position and which the height: row 1 holds 3 numbers and no head/,
    ],
    ["two that both run steadily", rows((n) => `${n}.5,${n}.25`), /^nothing tells which column is the position/],
    [
      "a slope and no height",
      `x (mm),slope\n${rows((n) => `${n}.5,${(n * 7) % 5}.25`)}`,
      /“slope” is a slope, and no column holds the height as it was measured/,
    ],
    [
      "a height that was levelled",
      `x (mm),Levelled height (nm)\n${rows((n) => `${n}.5,${(n * 7) % 5}.25`)}`,
      /is a height that was levelled already/,
    ],
    [
      "two axes that both change",
      `x (mm),y (mm),z (um)\n${rows((n) => `${n}.5,${n}.5,${(n * 7) % 5}.25`)}`,
      /both “x \(mm\)” and “y \(mm\)” change/,
    ],
  ])("%s are asked about", (_, content, says) => {
    const question = questionsOf(content).find(({ what }) => what === "columns");
    expect(question?.sentence).toMatch(says);
  });

  it("an axis that stays the same is left out", () => {
    expect(read(`x (mm),y (mm),z (um)\n${rows((n) => `${n}.5,3.0,${(n * 7) % 5}.25`)}`)[0]).toMatchObject({
      position: 0,
      height: 2,
    });
  });

  it("a raw height goes before a levelled one", () => {
    expect(
      read(`x (mm),Levelled height (um),Raw height (um)\n${rows((n) => `${n}.5,0.1,${(n * 7) % 5}.25`)}`)[0],
    ).toMatchObject({ height: 2 });
  });

  it.each(["um", "μm", "µm", "microns", "Âµm"])("'z (%s)' is µm", (unit) => {
    expect(read(`x (mm),z (${unit})\n${rows((n) => `${n}.5,2.25`)}`)[0]?.z[0]).toBeCloseTo(2.25e-6, 15);
  });

  it.each([
    ["x_mm, z_nm", "   "],
    ["Position mm Height nm", "  "],
    ["x_mm, z_nm", ";"],
  ])("heads '%s' over columns parted otherwise", (head, delimiter) => {
    expect(read(`${head}\n${rows((n) => `${n}.5${delimiter}${(n * 7) % 5}.25`)}`)[0]?.z[0]).toBeCloseTo(0.25e-9, 18);
  });

  it.each(["lead in", "z_m", "z from a"])("'%s' names no unit", (head) => {
    expect(questionsOf(`x (mm),${head}\n${rows((n) => `${n}.5,${(n * 7) % 5}.25`)}`)).toMatchObject([
      { what: "unit", column: 1 },
    ]);
  });
});

describe("dates", () => {
  const dated = (line: string) => `${line}\n${scanText([trueScan()], PLAIN)}`;
  const dateOf = (line: string, profile: ImportProfile = {}) =>
    profilesOf(readScanFile(encoded(dated(line), "utf-8"), "a.csv", profile)).reading;

  it.each([
    ["Date: 2026-03-04", "2026-03-04"],
    ["Measured 14.03.2026 10:22", "2026-03-14"],
    ["03/14/2026", "2026-03-14"],
    ["04-Mar-2026", "2026-03-04"],
    ["March 4, 2026", "2026-03-04"],
    ["05/05/2026", "2026-05-05"],
  ])("%s", (line, day) => expect(dateOf(line).date?.day).toBe(day));

  it("day and month either way round are asked, and hold nothing up", () => {
    expect(dateOf("Date: 03/04/2026")).toMatchObject({
      date: { row: 1, day: null },
      ambiguities: [{ what: "date order", blocks: false }],
    });
    expect(dateOf("Date: 03/04/2026", { dateOrder: "dmy" }).date?.day).toBe("2026-04-03");
    expect(dateOf("Date: 03/04/2026", { dateOrder: "mdy" }).date?.day).toBe("2026-03-04");
  });
});
