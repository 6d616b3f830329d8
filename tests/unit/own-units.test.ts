import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { toSi } from "#app/engine/units/convert.ts";
import { findUnit, type Dimension } from "#app/engine/units/dimensions.ts";
import { formatQuantity, formatWithUncertainty } from "#app/engine/units/format.ts";
import { bareInOwnUnits, DELIVERED_UNITS, inOwnUnits, ownHead, type OwnUnits } from "#app/lib/own-units.ts";

const OWN: OwnUnits = { length: "mil", stress: "ksi", temperature: "°F" };
const N = "\u00A0";
const own = (text: string) => inOwnUnits(text.replace(/_/g, N), OWN).replaceAll(N, "_");

describe("inOwnUnits", () => {
  it.each([
    ["775_µm", "30.51_mil"],
    ["50_µm", "1.97_mil"],
    ["1_µm", "0.0394_mil"],
    ["0_µm", "0_mil"],
    ["725 ± 15_µm", "28.54 ± 0.59_mil"],
    ["725_±_15_µm", "28.54_±_0.59_mil"],
    ["−12.3_µm", "−0.484_mil"],
    ["+22_µm", "+0.866_mil"],
    ["230_°C", "446_°F"],
    ["−40_°C", "−40_°F"],
    ["0_°C", "32_°F"],
    ["25_°C", "77_°F"],
    ["230 ± 5_°C", "446 ± 9_°F"],
    ["±_5_°C", "±_9_°F"],
    ["150_MPa", "21.8_ksi"],
    ["130_GPa", "18.9_Msi"],
    ["500_kPa", "72.5_psi"],
    ["10 to 40_µm", "0.394 to 1.57_mil"],
  ])("shows %s as %s", (text, expected) => expect(own(text)).toBe(expected));

  it("rewrites every quantity of a sentence and nothing else", () => {
    expect(
      own("Clear as planned: carrier from step 12 to 50_µm; edges up 343 ± 120_µm, the sputterer takes 400_µm."),
    ).toBe(
      "Clear as planned: carrier from step 12 to 1.97_mil; edges up 13.50 ± 4.72_mil, the sputterer takes 15.75_mil.",
    );
  });

  it.each([
    "Polish to 50 µm",
    "a film of 50\uFEFF_µm",
    "300_mm",
    "100_nm",
    "205_K",
    "3.2_ppm/K",
    "5_µm/m",
    "5_°C/min",
    "12_µm²",
    "150_N/m",
    "2·10⁻⁶_µm",
  ])("leaves %s", (text) => expect(own(text)).toBe(text));

  it("leaves all as it is for who reads what is delivered", () => {
    expect(inOwnUnits(`775${N}µm at 230${N}°C`, DELIVERED_UNITS)).toBe(`775${N}µm at 230${N}°C`);
  });

  it("rewrites only the units that were chosen", () => {
    const text = `775${N}µm at 230${N}°C`;
    expect(inOwnUnits(text, { ...DELIVERED_UNITS, temperature: "°F" })).toBe(`775${N}µm at 446${N}°F`);
  });
});

const CASES: readonly [Dimension, string, string, number][] = [
  ["length", "µm", "mil", 1e-6],
  ["stress", "MPa", "ksi", 1e6],
  ["stress", "GPa", "Msi", 1e9],
  ["temperature", "°C", "°F", 1],
];

const inSi = (text: string, dimension: Dimension, symbol: string) => {
  const unit = findUnit(dimension, symbol);
  if (!unit) throw new Error(symbol);
  return toSi(Number(text.replace("−", "-")), unit, dimension);
};

describe.each(CASES)("%s in %s", (dimension, from, to, size) => {
  const figure = fc.tuple(fc.double({ min: -900, max: 2000, noNaN: true }), fc.integer({ min: 0, max: 3 }));
  const offset = dimension === "temperature" ? 1200 : 0;

  it("leads back to the figure that was shown", () => {
    fc.assert(
      fc.property(figure, ([value, decimals]) => {
        const shown = formatQuantity(value * size + offset, dimension, { unit: from, decimals });
        const rewritten = inOwnUnits(shown, OWN);
        expect(rewritten.endsWith(`${N}${to}`)).toBe(true);
        const [number = ""] = shown.split(N);
        const [ownNumber = ""] = rewritten.split(N);
        const half = 0.5 * 10 ** -decimals * size;
        const off = Math.abs(inSi(ownNumber, dimension, to) - inSi(number, dimension, from));
        expect(off).toBeLessThanOrEqual(half * (1 + 1e-6));
      }),
    );
  });

  it("rewrites nothing twice", () => {
    fc.assert(
      fc.property(figure, ([value, decimals]) => {
        const once = inOwnUnits(formatQuantity(value * size + offset, dimension, { unit: from, decimals }), OWN);
        expect(inOwnUnits(once, OWN)).toBe(once);
      }),
    );
  });

  it("takes what follows ± for a difference", () => {
    fc.assert(
      fc.property(
        fc.double({ min: 1, max: 2000, noNaN: true }),
        fc.double({ min: 0.01, max: 100, noNaN: true }),
        (value, spread) => {
          const shown = formatWithUncertainty(value * size + offset, spread * size, dimension, { unit: from });
          const [, rewritten = ""] = / ± (.*)\u00A0/.exec(inOwnUnits(shown, OWN)) ?? [];
          const [, before = "", decimals = ""] = / ± (\d+(?:\.(\d+))?)/.exec(shown) ?? [];
          const width = (text: string, unit: string) => inSi(text, dimension, unit) - inSi("0", dimension, unit);
          const off = Math.abs(width(rewritten, to) - width(before, from));
          expect(off).toBeLessThanOrEqual(0.5 * 10 ** -decimals.length * size * (1 + 1e-6));
        },
      ),
    );
  });
});

describe("columns whose head names the unit", () => {
  it.each([
    ["343 ± 120", "µm", "13.50 ± 4.72"],
    ["10 to 40", "µm", "0.394 to 1.57"],
    ["–", "µm", "–"],
    ["clear below 200", "°C", "clear below 392"],
    ["8 mm", "µm", "8 mm"],
    ["0 ± 200", "MPa", "0.0 ± 29.0"],
  ])("shows %s of %s as %s", (text, symbol, expected) =>
    expect(bareInOwnUnits(text.replace(" mm", `${N}mm`), symbol, OWN).replace(N, " ")).toBe(expected),
  );

  it.each([
    ["µm", "mil"],
    ["µm, k = 2", "mil, k = 2"],
    [`GPa, 25${N}°C`, `Msi, 77${N}°F`],
    ["ppm/K", "ppm/K"],
    ["times", "times"],
  ])("heads %s by %s", (head, expected) => expect(ownHead(head, OWN)).toBe(expected));
});
