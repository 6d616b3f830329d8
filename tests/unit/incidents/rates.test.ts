import { describe, expect, it } from "vitest";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { bandOf, incidentRates, type StepPassed } from "#app/lib/incident-rates.ts";
import { limitEvidence } from "#app/lib/limit-evidence.ts";
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

describe("limits against what happened", () => {
  const limits = defaultLimits();
  const bare = (silicon: number, changed: Partial<StepPassed> = {}) => ({
    ...step({ support: "bare", silicon, ...changed }),
    diameter: 0.2,
  });
  const evidence = (passed: ReturnType<typeof bare>[]) => limitEvidence(passed, limits, incidentRates(passed).all);

  it("speaks for a limit below which more break, the limit itself on its safe side", () => {
    const found = evidence([
      bare(limits.bareFrom200.value, { through: 1000 }),
      bare(200e-6, { through: 50, broken: 5 }),
    ]);
    expect(found).toMatchObject([
      { key: "bareFrom200", speaks: "for it", from: { through: 1000 }, below: { through: 50, brokenOfThrough: 5 } },
    ]);
  });

  it("speaks against one below which fewer break, and calls one too low from which on many do", () => {
    const many = { through: 200, incidents: 4, affected: 4, broken: 4 };
    const against = evidence([bare(725e-6, many), bare(200e-6, { through: 1000 })]);
    expect(against.map(({ speaks }) => speaks)).toEqual(["against it"]);
    const elsewhere = { ...step({ through: 5000 }), diameter: 0.2 };
    expect(evidence([bare(725e-6, many), elsewhere]).map(({ speaks }) => speaks)).toEqual(["too low"]);
  });

  it("says nothing from few, and leaves out limits of which nothing is known", () => {
    expect(evidence([bare(725e-6), bare(200e-6, { broken: 1 })]).map(({ speaks }) => speaks)).toEqual([
      "too few to say",
    ]);
    expect(evidence([bare(725e-6)]).map(({ key, speaks }) => `${key} ${speaks}`)).toEqual([
      "bareFrom200 too few to say",
    ]);
    expect(limitEvidence([{ ...step(), diameter: 0.3 }], limits, { rate: null })).toEqual([]);
  });
});
