import { describe, expect, it } from "vitest";
import {
  curveRangeWords,
  expansionRowsText,
  meanOfCurve,
  readExpansionRows,
  type ExpansionRecord,
} from "#app/lib/expansion-rows.ts";

const message = (text: string) => {
  const read = readExpansionRows(text);
  return read.ok ? "" : read.message.replaceAll("\u00A0", " ");
};
const points = (text: string) => {
  const read = readExpansionRows(text);
  if (!read.ok) throw new Error(read.message);
  const { temperatures, coefficients } = read.points;
  return temperatures.map((temperature, at) => [
    Number((temperature - 273.15).toFixed(6)),
    Number(((coefficients[at] ?? 0) * 1e6).toFixed(6)),
  ]);
};
const TWO = [
  [20, 3],
  [300, 3.4],
];

describe("rows of a curve", () => {
  it.each([
    ["semicolons", "20; 3.0\n300; 3.4"],
    ["semicolons and decimal commas", "20;3,0\r\n300;3,4\r\n"],
    ["a spreadsheet's tabs, with a heading", "Temperature\tExpansion\n20\t3.0\n300\t3.4"],
    ["commas", "20, 3.0\n300, 3.4"],
    ["blanks, with empty lines", "\n20   3.0\n\n300 3.4\n"],
    ["units typed along", "293.15 K; 3 ppm/K\n300 °C; 3.4e-6 1/K"],
  ])("are read with %s", (_, text) => expect(points(text)).toEqual(TWO));

  it("take temperatures below zero in either minus", () => {
    expect(points("-40; 2.8\n100; 3")).toEqual(points("−40; 2.8\n100; 3"));
  });

  it.each([
    ["20; 3\n300", "Row 2: type two columns"],
    ["20; 3\nabout 300; 3.4", "Row 2: "],
    ["20; 3\n\n300; 12 parsecs", "Row 3: “12 parsecs”: parsecs is not a unit of thermal expansion"],
    ["20; 3\n300; 9999", "Row 2: 9999 ppm/K is outside"],
    ["20; 3\n-500; 3", "Row 2: "],
    ["300; 3.4\n20; 3", "Row 2: 20 °C does not lie above 300 °C before it."],
    ["20; 3\n20; 3.4", "Row 2: 20 °C does not lie above 20 °C before it."],
    ["20,5, 3,1\n300, 3,4", "Row 1: more than two columns. Part them by a semicolon"],
    ["20; 3", "A curve has 2 to 200 rows, this one 1."],
    ["50; 3\n300; 3.4", "The curve runs from 50 °C to 300 °C: it has to hold 25 °C."],
  ])("%j are refused: %s", (text, says) => expect(message(text)).toContain(says));

  it("tell of three faults at once and how many more there are", () => {
    const told = message(`20; 3\n${"x; y\n".repeat(5)}`);
    expect(told.match(/Row \d/g)).toEqual(["Row 2", "Row 3", "Row 4"]);
    expect(told).toContain("2 more rows are wrong.");
  });

  it("come back as they were", () => {
    const read = readExpansionRows("-40; 2.85\n20; 3\n300; 3.4");
    if (!read.ok) throw new Error(read.message);
    expect(expansionRowsText(read.points)).toBe("-40; 2.85\n20; 3\n300; 3.4");
    expect(readExpansionRows(expansionRowsText(read.points))).toEqual(read);
  });

  it("of nothing are blank, not wrong", () => {
    expect(readExpansionRows(" \n")).toMatchObject({ ok: false, blank: true });
  });
});

describe("a curve", () => {
  const record: ExpansionRecord = {
    temperatures: [273.15, 373.15, 473.15],
    coefficients: [3e-6, 3.2e-6, 3.6e-6],
    tolerance: 0.1e-6,
    source: "supplier",
    note: "",
    on: null,
  };

  it("has the mean of its trapezia, with its tolerance and source", () => {
    expect(meanOfCurve(record).value).toBeCloseTo(3.25e-6, 14);
    expect(meanOfCurve(record)).toMatchObject({ tolerance: 0.1e-6, source: "supplier", note: "mean of its curve" });
    expect(curveRangeWords(record).replaceAll("\u00A0", " ")).toBe("0 to 200 °C");
  });
});
