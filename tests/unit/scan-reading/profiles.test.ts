import { describe, expect, it } from "vitest";
import type { Reading } from "#app/lib/scan-reading/reading.ts";
import { readScanFile, scanReader } from "#app/lib/scan-reading/scan-reader.ts";
import type { ImportProfile } from "#app/schemas/import-profile.ts";
import {
  encoded,
  PLAIN,
  scanFile,
  scanText,
  trueScan,
  type FileStyle,
  type TruePoint,
} from "#tests/fixtures/scan-files.ts";
import { profilesOf } from "./read.ts";

const SCAN = trueScan();

function expectTruth(
  { x, z }: { x: Float64Array; z: Float64Array },
  truth: readonly TruePoint[],
  errors: { positionError: number; heightError: number },
) {
  expect(x).toHaveLength(truth.length);
  truth.forEach((point, n) => {
    expect(Math.abs((x[n] ?? NaN) - point.x)).toBeLessThanOrEqual(errors.positionError);
    expect(Math.abs((z[n] ?? NaN) - point.z)).toBeLessThanOrEqual(errors.heightError);
  });
}

type Case = [
  name: string,
  style: Partial<FileStyle>,
  expected: Partial<Reading>,
  profile?: ImportProfile,
  scan?: TruePoint[],
];
const German = { delimiter: ";", decimalComma: true, lines: ["Position [mm];Höhe [µm]"] };

describe("the same scan, written in different ways", () => {
  it.each<Case>([
    ["commas and points", {}, { delimiter: ",", decimalMark: "point", headerRow: 1, firstRow: 2, encoding: "utf-8" }],
    ["semicolons and decimal commas", German, { delimiter: ";", decimalMark: "comma" }],
    ["tabs and decimal commas", { ...German, delimiter: "\t", lines: ["x (mm)\tz (µm)"] }, { delimiter: "\t" }],
    ["several blanks", { delimiter: "    ", lines: ["x (mm)    z (µm)"] }, { delimiter: " " }],
    [
      "blanks and decimal commas",
      { delimiter: "  ", decimalComma: true, lines: ["x/mm z/µm"] },
      { decimalMark: "comma" },
    ],
    ["upright bars", { delimiter: "|", lines: ["x (mm)|z (µm)"] }, { delimiter: "|" }],
    [
      "a first line that names the delimiter",
      { ...German, lines: ["sep=;", "x (mm);z (µm)"] },
      { delimiterNamed: true, headerRow: 2 },
    ],
    [
      "a delimiter named that is none of the usual",
      { delimiter: "^", lines: ["sep=^", "x (mm)^z (µm)"] },
      { delimiter: "^" },
    ],
    ["line ends of another system", { lineEnd: "\r\n" }, { firstRow: 2 }],
    ["line ends of an old system", { lineEnd: "\r" }, { firstRow: 2 }],
    ["all cells in quotes", { quoted: true, lines: ['"x (mm)","z (µm)"'] }, { delimiter: "," }],
    ["one head of two in quotes", { lines: ['"x (mm)",z (µm)'] }, { delimiter: "," }],
    [
      "decimal commas in quotes between commas",
      { quoted: true, decimalComma: true, lines: ['"x (mm)","z (µm)"'] },
      { delimiter: ",", decimalMark: "comma" },
    ],
    [
      "thousands by commas, in quotes",
      { quoted: true, groups: ",", heightUnit: "nm", heightDecimals: 1, lines: ['"x (mm)","z (nm)"'] },
      { thousands: "comma", decimalMark: "point" },
    ],
    [
      "thousands by points",
      { ...German, groups: ".", heightUnit: "nm", heightDecimals: 1, lines: ["x (mm);z (nm)"] },
      { thousands: "point", decimalMark: "comma" },
    ],
    [
      "thousands by blanks",
      { ...German, groups: " ", heightUnit: "nm", heightDecimals: 1, lines: ["x (mm);z (nm)"] },
      { thousands: "blank" },
    ],
    [
      "thousands by no-break blanks",
      { ...German, groups: "\u00A0", heightUnit: "nm", heightDecimals: 1, lines: ["x (mm);z (nm)"] },
      { thousands: "blank" },
    ],
    [
      "thousands by apostrophes",
      { delimiter: ";", groups: "'", heightUnit: "nm", heightDecimals: 1, lines: ["x (mm);z (nm)"] },
      { thousands: "apostrophe" },
    ],
    [
      "powers of ten",
      {
        power: "E",
        positionUnit: "m",
        heightUnit: "m",
        positionDecimals: 6,
        heightDecimals: 6,
        lines: ["x (m),z (m)"],
      },
      {},
    ],
    [
      "powers of ten with a D",
      {
        power: "D",
        positionUnit: "m",
        heightUnit: "m",
        positionDecimals: 6,
        heightDecimals: 6,
        lines: ["x (m),z (m)"],
      },
      {},
    ],
    [
      "powers of ten and decimal commas",
      {
        power: "E",
        decimalComma: true,
        delimiter: ";",
        positionDecimals: 5,
        heightDecimals: 5,
        lines: ["x (mm);z (µm)"],
      },
      {},
    ],
    ["a row of units", { lines: ["Position,Height", "mm,um"] }, { headerRow: 1, unitsRow: 2, firstRow: 3 }],
    ["a row of units in brackets", { lines: ["Position,Height", "[mm],[um]"] }, { unitsRow: 2 }],
    ["a row of units without heads", { lines: ["mm,µm"] }, { headerRow: null, unitsRow: 1 }],
    [
      "lines of remarks above the head",
      {
        lines: [
          "# Stylus, recipe 12",
          "Points,96",
          "",
          "Operator;J. Okafor",
          "Date: 2026-03-04 14:22",
          "x (mm),z (µm)",
        ],
      },
      { headerRow: 6, date: { row: 5, text: "Date: 2026-03-04 14:22", day: "2026-03-04" } },
    ],
    ["a head behind a sign for remarks", { lines: ["# x (mm),z (µm)"] }, { headerRow: 1 }],
    ["lines below the data", { footer: ["", "End of scan", "Mean,12.5"] }, {}],
    [
      "rows that are numbered",
      { counted: true, lines: ["No,x (mm),z (µm)"] },
      { pairs: [{ position: 1, height: 2, name: "z (µm)", along: "position" }] },
    ],
    [
      "no head, units stated",
      { lines: [] },
      { headerRow: null, firstRow: 1 },
      { units: { position: "mm", height: "µm" } },
    ],
    [
      "no head, rows numbered, units stated",
      { lines: [], counted: true },
      {},
      { units: { position: "mm", height: "µm" } },
    ],
    ["descending", {}, {}, {}, [...SCAN].reverse()],
    ["unequal spacing", {}, {}, {}, trueScan({ uneven: true })],
    [
      "from the centre outwards",
      { lines: ["Radius (mm),Profile (µm)"] },
      { pairs: [{ position: 0, height: 1, name: "Profile (µm)", along: "radius" }] },
      {},
      trueScan({ from: 0 }),
    ],
    ["UTF-8 with a mark", { encoding: "utf-8 with mark" }, { encoding: "utf-8" }],
    ["UTF-16, little end first, with a mark", { encoding: "utf-16le with mark" }, { encoding: "utf-16le" }],
    ["UTF-16, big end first, with a mark", { encoding: "utf-16be with mark" }, { encoding: "utf-16be" }],
    ["UTF-16 without a mark", { encoding: "utf-16le" }, { encoding: "utf-16le" }],
    ["windows-1252", { encoding: "windows-1252" }, { encoding: "windows-1252" }],
  ])("%s", (_, style, expected, profile = {}, scan = SCAN) => {
    const file = scanFile(scan, style);
    const { reading, content } = profilesOf(readScanFile(file.bytes, "M-0388.csv", profile));
    expect(reading).toMatchObject(expected);
    expect(reading.ambiguities).toEqual([]);
    expect(content.faults).toEqual([]);
    expect(content.profiles).toHaveLength(1);
    content.profiles.forEach((found) => expectTruth(found, scan, file));
  });

  it.each([
    ["m", 5, 9],
    ["cm", 3, 7],
    ["mm", 2, 6],
    ["µm", 0, 3],
    ["nm", 0, 0],
    ["Å", 0, 0],
    ["inch", 4, 8],
    ["mil", 2, 5],
  ] as const)("positions and heights in %s", (unit, positionDecimals, heightDecimals) => {
    const style = {
      positionUnit: unit,
      heightUnit: unit,
      positionDecimals,
      heightDecimals,
      delimiter: ";",
      lines: [`x (${unit});z (${unit})`],
    };
    const file = scanFile(SCAN, style);
    const { content } = profilesOf(readScanFile(file.bytes, "M-0388.csv"));
    content.profiles.forEach((found) => expectTruth(found, SCAN, file));
  });
});

describe("units by other names", () => {
  it.each([
    ["um", "µm"],
    ["\u03BCm", "µm"],
    ["micron", "µm"],
    ["microns", "µm"],
    ["Angstrom", "Å"],
    ["\u212B", "Å"],
    ["in", "inch"],
    ["inches", "inch"],
    ["mils", "mil"],
    ["millimeter", "mm"],
  ] as const)("'%s' is %s, in a head and in a row of its own", (name, unit) => {
    for (const lines of [[`x (${name});z (${name})`], ["x;z", `${name};${name}`]]) {
      const file = scanFile(SCAN, {
        delimiter: ";",
        positionUnit: unit,
        heightUnit: unit,
        positionDecimals: 5,
        heightDecimals: 7,
        lines,
      });
      const { reading, content } = profilesOf(readScanFile(file.bytes, "M-0388.csv"));
      expect(reading.columns.map((column) => column.unit)).toEqual([unit, unit]);
      content.profiles.forEach((found) => expectTruth(found, SCAN, file));
    }
  });
});

describe("all of it at once", () => {
  const scan = trueScan({ uneven: true }).reverse();
  const style: Partial<FileStyle> = {
    delimiter: ";",
    decimalComma: true,
    power: "D",
    positionDecimals: 6,
    heightDecimals: 6,
    counted: true,
    lineEnd: "\r\n",
    lines: ["sep=;", "Stylus, recipe 12", "Date: 2026-03-04", "", "No;Position;Höhe", ";mm;nm"],
    heightUnit: "nm",
    footer: ["", "End of scan", "Mean;;12,5"],
    instead: { 12: { height: "NaN" }, 40: { position: "" }, 41: { height: "---" } },
  };

  it.each(["utf-8 with mark", "utf-16le with mark", "utf-16be with mark", "windows-1252"] as const)(
    "in %s: the values that are there are the true ones, the others are counted",
    (encoding) => {
      const file = scanFile(scan, { ...style, encoding });
      const { reading, content } = profilesOf(readScanFile(file.bytes, "M-0388.csv"));
      expect(reading).toMatchObject({ delimiterNamed: true, headerRow: 5, unitsRow: 6, decimalMark: "comma" });
      expect(content.faulty).toBe(3);
      expect(content.footer?.lines).toBe(2);
      const kept = scan.filter((_, n) => ![12, 40, 41].includes(n));
      content.profiles.forEach((found) => expectTruth(found, kept, file));
    },
  );
});

describe("several profiles in one file", () => {
  const after = trueScan({ times: 2, count: 60 });
  const pairsOf = (lines: string[], scans: TruePoint[][]) =>
    profilesOf(readScanFile(encoded(scanText(scans, { ...PLAIN, lines }), "utf-8"), "M-0388.csv")).content;

  it("side by side, each with its own positions and length", () => {
    const { profiles, faults } = pairsOf(["x1 (mm),z1 (um),x2 (mm),z2 (um)"], [SCAN, after]);
    expect(profiles.map(({ name }) => name)).toEqual(["z1 (um)", "z2 (um)"]);
    expect(profiles.map(({ x }) => x.length)).toEqual([96, 60]);
    expect(faults).toEqual([]);
    profiles.forEach((found, n) =>
      expectTruth(found, n === 0 ? SCAN : after, { positionError: 0.6e-6, heightError: 0.6e-10 }),
    );
  });

  it("on the same positions", () => {
    const text = [
      "x (mm);pre (µm);post (µm)",
      ...SCAN.map(({ x, z }) => `${(x * 1e3).toFixed(3)};${(z * 1e6).toFixed(4)};${(z * 2e6).toFixed(4)}`),
    ].join("\n");
    const { content } = profilesOf(readScanFile(encoded(text, "utf-8"), "M-0388.csv"));
    expect(content.profiles.map(({ position, height, name }) => [position, height, name])).toEqual([
      [0, 1, "pre (µm)"],
      [0, 2, "post (µm)"],
    ]);
  });
});

describe("in whatever pieces the bytes come", () => {
  it.each([1, 2, 7, 1000])("pieces of %i", (size) => {
    for (const encoding of ["utf-8", "utf-16be with mark", "windows-1252"] as const) {
      const file = scanFile(SCAN, {
        encoding,
        lineEnd: "\r\n",
        lines: ["# Höhe in µm", "", "Position (mm),Höhe (µm)"],
      });
      const whole = profilesOf(readScanFile(file.bytes, "a.csv"));
      const reader = scanReader("a.csv");
      for (let at = 0; at < file.bytes.length; at += size) reader.push(file.bytes.subarray(at, at + size));
      expect(profilesOf(reader.end())).toEqual(whole);
    }
  });

  it("a sign of windows-1252 far below plain letters", () => {
    const long = trueScan({ count: 20_000 });
    const file = scanFile(long, { footer: ["Gemessen bei 22 °C"], encoding: "windows-1252", lines: ["x (mm),z (um)"] });
    const { reading, content } = profilesOf(readScanFile(file.bytes, "a.csv"));
    expect(reading.encoding).toBe("windows-1252");
    expect(content.footer?.first.text).toBe("Gemessen bei 22 °C");
    content.profiles.forEach((found) => expectTruth(found, long, file));
  });
});
