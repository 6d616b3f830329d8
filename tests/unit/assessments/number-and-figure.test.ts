import { describe, expect, it } from "vitest";
import { celsius, figureText, micrometres } from "#app/lib/assessment-figure.ts";
import { readRecordNumber, recordNumber } from "#app/lib/record-number.ts";

const nb = (text: string) => text.replaceAll(" ", "\u00A0").replaceAll("\u00A0±\u00A0", " ± ");

describe("a document number", () => {
  it("names the program and counts in it", () => {
    expect(recordNumber("assessment", "tern", 3)).toBe("TERN-A003");
    expect(recordNumber("assessment", "petrel", 1204)).toBe("PETREL-A1204");
  });

  it.each(["assessment", "sheet", "incident"] as const)("of each kind, %s, is read as it is written", (kind) => {
    for (const number of [3, 999, 12_345])
      expect(readRecordNumber(kind, recordNumber(kind, "tern", number))).toEqual({ slug: "tern", number });
    expect(readRecordNumber(kind, "tern t-2")).toBeNull();
  });

  it("is read with a revision behind it, and not as another kind", () => {
    expect(readRecordNumber("sheet", " tern-h003 B")).toEqual({ slug: "tern", number: 3 });
    expect(readRecordNumber("incident", "TERN-H003")).toBeNull();
  });
});

describe("a stored figure", () => {
  it("stands in µm up to 10 mm, with its expanded uncertainty where it has one", () => {
    expect(figureText({ value: 228e-6, unit: "m", standardUncertainty: 10e-6 })).toBe(nb("228 ± 20 µm"));
    expect(figureText({ value: 9.4e-3, unit: "m" })).toBe(nb("9400 µm"));
    expect(figureText({ value: 47e-3, unit: "m" })).toBe(nb("47 mm"));
  });

  it("keeps a thickness that is not whole, and rounds a warp that nobody knows to a tenth", () => {
    expect(micrometres(12.5e-6)).toBe(nb("12.5 µm"));
    expect(micrometres(100e-6)).toBe(nb("100 µm"));
    expect(micrometres(231.4e-6)).toBe(nb("231 µm"));
  });

  it("is zero, never a minus zero or a power of ten, when the wafer is flat", () => {
    expect(micrometres(1e-19)).toBe(nb("0 µm"));
    expect(micrometres(-1e-19)).toBe(nb("0 µm"));
  });

  it("tells a temperature from a difference of temperatures", () => {
    expect(figureText({ value: 353.15, unit: "K", temperaturePoint: true })).toBe(nb("80 °C"));
    expect(figureText({ value: 20, unit: "K" })).toBe(nb("20 K"));
    expect(celsius(298.15)).toBe(nb("25 °C"));
  });
});
