/* Quantities as people type them. Values are SI: m, Pa, K, 1/K, N/m, 1/m, s, kg/m3, rad. */
import { describe, expect, it } from "vitest";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { parseQuantity } from "#app/engine/units/parse-quantity.ts";

const nbsp = "\u00A0";

function value(text: string, dimension: Dimension, decimalMark?: "point" | "comma" | "either"): number {
  const read = parseQuantity(text, dimension, { decimalMark });
  if (!read.ok) throw new Error(read.message);
  return read.value;
}

function message(text: string, dimension: Dimension, decimalMark?: "point" | "comma" | "either"): string {
  const read = parseQuantity(text, dimension, { decimalMark });
  return read.ok ? `read as ${read.understood}` : read.message;
}

describe("what is read", () => {
  it.each<[string, Dimension, number]>([
    ["0.7 mm", "length", 0.7e-3],
    ["700um", "length", 700e-6],
    ["700 \u00B5m", "length", 700e-6],
    ["700 \u03BCm", "length", 700e-6],
    ["1 200 µm", "length", 1200e-6],
    ["1\u00A0200\u202Fµm", "length", 1200e-6],
    ["  12 nm ", "length", 12e-9],
    ["2 kÅ", "length", 2e-7],
    ["2 k\u212B", "length", 2e-7],
    ["500 Å", "length", 5e-8],
    ["8 inch", "length", 0.2032],
    ["1 mil", "length", 25.4e-6],
    ["30 cm", "length", 0.3],
    [".5 mm", "length", 0.5e-3],
    ["5. µm", "length", 5e-6],
    ["5,2 GPa", "stress", 5.2e9],
    ["-80 MPa", "stress", -80e6],
    ["\u221280 MPa", "stress", -80e6],
    ["+80 MPa", "stress", 80e6],
    ["1E9 dyn/cm2", "stress", 1e8],
    ["1e9 dyn/cm²", "stress", 1e8],
    ["250 N/mm²", "stress", 250e6],
    ["25 °C", "temperature", 298.15],
    ["25C", "temperature", 298.15],
    ["-40 degC", "temperature", 233.15],
    ["300 K", "temperature", 300],
    ["20 K", "temperatureDifference", 20],
    ["20 °C", "temperatureDifference", 20],
    ["1e-6 /K", "expansion", 1e-6],
    ["3 ppm/K", "expansion", 3e-6],
    ["2.6 ppm/°C", "expansion", 2.6e-6],
    ["3.3E-6 1/K", "expansion", 3.3e-6],
    ["38 %", "fraction", 0.38],
    ["38%", "fraction", 0.38],
    ["0.38", "fraction", 0.38],
    ["300 N/m", "forcePerLength", 300],
    ["0.3 kN/m", "forcePerLength", 300],
    ["0.01 1/m", "curvature", 0.01],
    ["-0.01/m", "curvature", -0.01],
    ["10 1/km", "curvature", 0.01],
    ["90 s", "time", 90],
    ["30 min", "time", 1800],
    ["24 h", "time", 86400],
    ["2 d", "time", 172800],
    ["2329 kg/m3", "density", 2329],
    ["2.329 g/cm³", "density", 2329],
    ["45°", "angle", Math.PI / 4],
    ["2 mrad", "angle", 0.002],
    ["12", "number", 12],
    ["-0 µm", "length", 0],
  ])("%s as %s", (text, dimension, expected) => {
    // Exact but for one rounding of the factor.
    expect(Math.abs(value(text, dimension) - expected)).toBeLessThanOrEqual(2.3e-16 * Math.abs(expected));
  });

  it("77 °F within the rounding of its offset", () => {
    expect(value("77 °F", "temperature")).toBeCloseTo(298.15, 12);
  });

  it("psi, from the pound-force and the inch", () => {
    expect(value("1 psi", "stress")).toBeCloseTo(6894.757293168, 8);
  });

  it("the same length however it is written", () => {
    const spellings = ["0.7 mm", "700 um", "700 µm", "7e-4 m", "700000 nm", "0,7 mm", "700 000 nm"];
    expect(new Set(spellings.map((text) => value(text, "length")))).toEqual(new Set([0.0007]));
  });

  it("says what it understood", () => {
    expect(parseQuantity("5,20 gigapascal".replace("gigapascal", "GPa"), "stress")).toEqual({
      ok: true,
      value: 5.2e9,
      understood: `5.2${nbsp}GPa`,
      unit: "GPa",
    });
    expect(parseQuantity("-80 um", "length")).toMatchObject({ understood: `\u221280${nbsp}µm`, unit: "µm" });
  });
});

describe("decimal marks", () => {
  it("1,234 can be read two ways and is refused, 0,234 and 1234,5 cannot", () => {
    expect(parseQuantity("1,234 µm", "length")).toMatchObject({ ok: false, code: "ambiguous" });
    expect(message("1,234 µm", "length")).toBe("“1,234 µm” can be read as 1234 or as 1.234; type one of these.");
    expect(value("0,234 µm", "length")).toBe(0.234e-6);
    expect(value("1234,5 µm", "length")).toBe(1234.5e-6);
    expect(value("1.234 µm", "length")).toBe(1.234e-6);
    expect(value("1,234.5 µm", "length")).toBe(1234.5e-6);
    expect(value("1.234,5 µm", "length")).toBe(1234.5e-6);
    expect(value("1,234,567 nm", "length")).toBe(1234567e-9);
  });

  it("an agreed mark settles it", () => {
    expect(value("1,234 µm", "length", "comma")).toBe(1.234e-6);
    expect(value("1,234 µm", "length", "point")).toBe(1234e-6);
    expect(value("1.234 µm", "length", "comma")).toBe(1234e-6);
    expect(message("1,5 µm", "length", "point")).toBe("“1,5 µm” does not fit: the decimal mark here is a point.");
    expect(message("1.5 µm", "length", "comma")).toBe("“1.5 µm” does not fit: the decimal mark here is a comma.");
    expect(parseQuantity("1,234,567 nm", "length", { decimalMark: "comma" })).toMatchObject({ code: "decimal-mark" });
  });

  it.each(["1 2 µm", "12 34 µm", "1,23,456 µm", "1.2.3 µm", "1 234 56 µm", "1.5 000 µm", "1,2345.6 µm"])(
    "%s is no number",
    (text) => {
      expect(parseQuantity(text, "length")).toMatchObject({ ok: false, code: "not-a-number" });
    },
  );
});

describe("what is refused, with what to type", () => {
  it("blank is missing, not zero", () => {
    expect(parseQuantity("", "length")).toMatchObject({ ok: false, code: "blank" });
    expect(parseQuantity(" \u00A0 ", "number")).toMatchObject({ ok: false, code: "blank" });
  });

  it.each<[string, Dimension, string]>([
    ["12", "length", "12 what? Type 12 µm or 12 nm."],
    ["180", "stress", "180 what? Type 180 MPa or 180 GPa."],
    ["25", "temperature", "25 what? Type 25 °C or 25 K."],
    [
      "12 parsecs",
      "length",
      "“12 parsecs”: parsecs is not a unit of length used here. Use nm, µm, um, mm, Å, inch or mil.",
    ],
    ["12 MPa", "length", "“12 MPa”: MPa is a unit of stress, not of length. Use nm, µm, um, mm, Å, inch or mil."],
    ["5 mPa", "stress", "“5 mPa”: mPa is millipascal; did you mean MPa?"],
    ["5 mpa", "stress", "“5 mpa”: mpa is not a unit with these capitals; did you mean MPa?"],
    ["3 Mm", "length", "“3 Mm”: Mm is megametre; did you mean mm?"],
    ["-300 °C", "temperature", "“-300 °C”: the lowest temperature is −273.15 °C."],
    ["-1 K", "temperature", "“-1 K”: the lowest temperature is 0 K."],
    [
      "38 °F",
      "temperatureDifference",
      "“38 °F”: °F is a unit of temperature, not of temperature difference. Use K or °C.",
    ],
    ["abc", "length", "“abc” is not a number. Type for example 12 µm."],
    ["µm", "length", "“µm” is not a number. Type for example 12 µm."],
    ["1e999 m", "length", "“1e999 m” is too large a number. Type for example 12 µm."],
    ["12 %", "number", "“12 %”: % is a unit of fraction, not of number. Use no unit."],
  ])("%s as %s", (text, dimension, sentence) => {
    expect(message(text, dimension).replaceAll(nbsp, " ")).toBe(sentence);
  });

  it("evaluates nothing", () => {
    for (const text of [
      "2*3 µm",
      "sqrt(4) mm",
      "1/2 mm",
      "1e3 + 1 mm",
      "(5) mm",
      "12 mm; 3",
      "0x10 mm",
      "Infinity m",
    ]) {
      expect(parseQuantity(text, "length").ok).toBe(false);
    }
  });

  it("every dimension reads each of its own spellings and no empty unit by accident", async () => {
    const { DIMENSIONS } = await import("#app/engine/units/dimensions.ts");
    for (const [dimension, { units }] of Object.entries(DIMENSIONS) as [Dimension, (typeof DIMENSIONS)[Dimension]][]) {
      const seen = new Set<string>();
      for (const { symbol, spellings } of units) {
        for (const spelling of [symbol, ...spellings] as string[]) {
          expect(seen.has(spelling)).toBe(false);
          seen.add(spelling);
          expect(parseQuantity(`400 ${spelling}`, dimension)).toMatchObject({ ok: true, unit: symbol });
          // Without a blank '4001/K' is four thousand and one per kelvin.
          if (spelling.startsWith("1/")) continue;
          expect(parseQuantity(`400${spelling}`, dimension)).toMatchObject({ ok: true, unit: symbol });
        }
      }
    }
  });
});
