/* SI values as text. */
import { describe, expect, it } from "vitest";
import { EngineInputError } from "#app/engine/errors.ts";
import type { Dimension } from "#app/engine/units/dimensions.ts";
import { formatQuantity, formatWithUncertainty, type QuantityStyle } from "#app/engine/units/format.ts";
import { formatNumber } from "#app/engine/units/format-number.ts";

/** No-break spaces as ordinary ones, to read the table below. */
const shown = (text: string) => text.replaceAll("\u00A0", " ");

describe("formatQuantity", () => {
  it.each<[number, Dimension, QuantityStyle, string]>([
    [50e-6, "length", {}, "50 µm"],
    [725e-6, "length", { unit: "µm" }, "725 µm"],
    [0.3e-6, "length", {}, "300 nm"],
    [0.3e-6, "length", { unit: "µm" }, "0.3 µm"],
    [0.2, "length", {}, "200 mm"],
    [0.32412, "length", { unit: "m", significant: 2 }, "0.32 m"],
    [1.5, "length", {}, "1.5 m"],
    [0, "length", {}, "0 µm"],
    [-89.6e-6, "length", { decimals: 0 }, "−90 µm"],
    [-0.4e-6, "length", { unit: "µm", decimals: 0 }, "0 µm"],
    [89.6e-6, "length", { decimals: 0, sign: true }, "+90 µm"],
    [0, "length", { sign: true, decimals: 1 }, "0.0 µm"],
    [999.96e-9, "length", {}, "1 µm"],
    [180.216e9, "stress", {}, "180.2 GPa"],
    [-80e6, "stress", { significant: 3 }, "−80.0 MPa"],
    [1e8, "stress", { unit: "dyn/cm2" }, "1000000000 dyn/cm²"],
    [298.15, "temperature", {}, "25 °C"],
    [298.15, "temperature", { unit: "K" }, "298.1 K"],
    [523.15, "temperature", { unit: "°C", decimals: 0 }, "250 °C"],
    [20, "temperatureDifference", {}, "20 K"],
    [3e-6, "expansion", {}, "3 ppm/K"],
    [0.38, "fraction", {}, "38 %"],
    [300, "forcePerLength", {}, "300 N/m"],
    [0.01, "curvature", {}, "0.01 1/m"],
    [5400, "time", {}, "1.5 h"],
    [2329, "density", {}, "2329 kg/m³"],
    [Math.PI / 4, "angle", {}, "45°"],
    [12, "number", {}, "12"],
    [1234567, "number", { significant: 3 }, "1230000"],
    [1234, "number", { decimals: -2 }, "1200"],
    [1e-25, "number", { significant: 3 }, "1.00e-25"],
  ])("%d as %s with %o", (value, dimension, style, text) => {
    expect(shown(formatQuantity(value, dimension, style))).toBe(text);
  });

  it("joins number and unit by a no-break space", () => {
    expect(formatQuantity(5e-5, "length")).toBe("50\u00A0µm");
  });

  it("refuses what cannot be shown", () => {
    expect(() => formatQuantity(Number.NaN, "length")).toThrow(EngineInputError);
    expect(() => formatQuantity(1, "length", { unit: "MPa" })).toThrow(/not a unit of length/);
    expect(() => formatNumber(Number.POSITIVE_INFINITY)).toThrow(EngineInputError);
  });
});

describe("formatWithUncertainty: JCGM 100:2008, 7.2.6", () => {
  it.each<[number, number, Dimension, { unit?: string; sign?: boolean }, string]>([
    [157.877e6, 5.035e6, "stress", {}, "157.9 ± 5.0 MPa"],
    [157.877e6, 15.035e6, "stress", {}, "158 ± 15 MPa"],
    [157.877e6, 150.35e6, "stress", {}, "160 ± 150 MPa"],
    [-80.4e6, 0.996e6, "stress", {}, "−80.4 ± 1.0 MPa"],
    [231e-6, 12.3e-6, "length", { unit: "µm", sign: true }, "+231 ± 12 µm"],
    [0, 5e-9, "length", {}, "0.0 ± 5.0 nm"],
    [298.15, 2, "temperature", {}, "25.0 ± 2.0 °C"],
    [298.15, 2, "temperature", { unit: "°F" }, "77.0 ± 3.6 °F"],
    [5e-6, 0, "length", {}, "5 µm"],
    [-0.2e-6, 12e-6, "length", {}, "0 ± 12 µm"],
  ])("%d with %d as %s", (value, uncertainty, dimension, style, text) => {
    expect(shown(formatWithUncertainty(value, uncertainty, dimension, style))).toBe(text);
  });

  it("refuses a negative uncertainty", () => {
    expect(() => formatWithUncertainty(1, -1, "length")).toThrow(EngineInputError);
  });
});
