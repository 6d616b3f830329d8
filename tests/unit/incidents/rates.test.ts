import { describe, expect, it } from "vitest";
import { bandOf, incidentRates, type StepPassed } from "#app/lib/incident-rates.ts";
import { against, percentWords, ratesSentence, rateWords } from "#app/lib/rate-words.ts";

const step = (changed: Partial<StepPassed> = {}): StepPassed => ({
  stepKind: "grind",
  support: "tape or ring",
  silicon: 100e-6,
  films: "device side: Plated copper A",
  through: 25,
  incidents: 0,
  affected: 0,
  broken: 0,
  ...changed,
});
const crack = { incidents: 1, affected: 2, broken: 1 };

describe("rates of breakage", () => {
  it.each([
    [20e-6, "up to 30 µm"],
    [30e-6, "up to 30 µm"],
    [30.1e-6, "30 to 60 µm"],
    [100e-6, "60 to 120 µm"],
    [300e-6, "120 to 300 µm"],
    [775e-6, "over 300 µm"],
  ])("%d m is in its band", (silicon, band) => {
    expect(bandOf(silicon)).toBe(band);
  });

  it("counts wafers that went through without an incident too", () => {
    const { all } = incidentRates([step(crack), step(), step({ through: 50 })]);
    expect(all).toMatchObject({ incidents: 1, affected: 2, broken: 1, through: 100, brokenOfThrough: 1, uncounted: 0 });
    expect(all.rate?.share).toBe(0.01);
    expect(rateWords(all)).toBe("1.0\u00A0% (0.025 to 5.4\u00A0%)");
  });

  it("leaves what nobody counted out of the rate, and says so", () => {
    const { all } = incidentRates([step({ ...crack, through: null }), step()]);
    expect(all).toMatchObject({ incidents: 1, broken: 1, through: 25, brokenOfThrough: 0, uncounted: 1 });
    expect(all.rate?.share).toBe(0);
    const none = incidentRates([step({ ...crack, through: null })]).all;
    expect(none.rate).toBeNull();
    expect(ratesSentence(none)).toContain("Nobody has counted");
  });

  it("never counts more broken wafers than went through", () => {
    const { all } = incidentRates([step({ incidents: 3, affected: 30, broken: 30, through: 25 })]);
    expect(all.rate).toMatchObject({ share: 1, high: 1 });
  });

  it("parts by what steps have in common, bands and classes in their own order", () => {
    const rates = incidentRates([
      step({ support: "carrier", silicon: 20e-6, ...crack, films: "no film" }),
      step({ support: "bare", silicon: 725e-6, stepKind: "coat", through: 250 }),
      step(),
    ]);
    expect(rates.bySupport.map(({ name }) => name)).toEqual(["bare", "tape or ring", "carrier"]);
    expect(rates.byThickness.map(({ name }) => name)).toEqual(["up to 30 µm", "60 to 120 µm", "over 300 µm"]);
    expect(rates.byStep.map(({ name, broken }) => `${name} ${broken}`)).toEqual(["grind 1", "coat 0"]);
    expect(rates.byFilms[0]).toMatchObject({ name: "no film", broken: 1 });
    expect(rates.map.supports).toEqual(["bare", "tape or ring", "carrier"]);
    expect(rates.map.rows[0]?.cells.map((cell) => cell?.through ?? null)).toEqual([null, null, 25]);
  });

  it("tells what stands out only where its whole interval does", () => {
    const rates = incidentRates([
      step({ support: "carrier", incidents: 6, affected: 6, broken: 6 }),
      step({ support: "bare", through: 4000, incidents: 4, affected: 4, broken: 4 }),
      step({ through: 50, incidents: 1, affected: 1, broken: 1 }),
    ]);
    expect(rates.bySupport.map((row) => `${row.name}: ${against(row, rates.all)}`)).toEqual([
      "bare: below",
      "tape or ring: null",
      "carrier: above",
    ]);
  });

  it("says that nothing is known where nothing is", () => {
    expect(ratesSentence(incidentRates([]).all)).toContain("Nothing is known yet");
  });

  it.each([
    [0, "0\u00A0%"],
    [0.5, "50\u00A0%"],
    [0.0123, "1.2\u00A0%"],
    [0.00345, "0.34\u00A0%"],
    [0.000253, "0.025\u00A0%"],
  ])("%d as a percentage", (share, words) => {
    expect(percentWords(share)).toBe(words);
  });
});
