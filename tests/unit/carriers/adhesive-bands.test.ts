import { describe, expect, it } from "vitest";
import type { StepState } from "#app/engine/flow/walk.ts";
import { adhesiveRule } from "#app/engine/rules/rule-06-adhesive.ts";
import type { RuleContext } from "#app/engine/rules/finding.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { outcomeRank, type Exposure, type Outcome } from "#app/engine/vocabulary.ts";
import { adhesiveBands, type AdhesiveTemperatures } from "#app/lib/adhesive-bands.ts";

/** Temperatures in K; the bands are drawn in °C. */
const celsius = (temperature: number) => temperature + 273.15;
const stated = (value: number) => ({ value, tolerance: null, source: "supplier" as const });

const SLIDE: AdhesiveTemperatures = { softening: celsius(120), flows: true, limit: celsius(200), margin: 20 };
const LASER: AdhesiveTemperatures = { softening: celsius(150), flows: false, limit: celsius(280), margin: 20 };
const WAX: AdhesiveTemperatures = { softening: celsius(75), flows: true, limit: celsius(80), margin: 20 };
const PEEL: AdhesiveTemperatures = { softening: null, flows: false, limit: celsius(250), margin: 20 };

/** What the rule itself finds at a peak temperature: the worst of its findings. */
function judged(material: AdhesiveTemperatures, peakTemperature: number, exposures: Exposure[]): Outcome {
  const limits = { ...defaultLimits(), adhesiveMargin: { value: material.margin, source: "test" } };
  const bond = {
    material: {
      name: "Adhesive",
      flows: material.flows,
      softening: material.softening === null ? null : stated(material.softening),
      temperatureLimit: stated(material.limit),
      resistances: { vacuum: { word: "resists" } },
    },
    carrier: { material: "glass" },
  };
  const wafer = { bonds: [bond] };
  const state = { number: 1, step: { kind: "cure", peakTemperature, exposures }, before: wafer, after: wafer };
  const findings = adhesiveRule.judge({ limits } as RuleContext, state as unknown as StepState);
  return findings.reduce<Outcome>(
    (worst, { outcome }) => (outcomeRank(outcome) > outcomeRank(worst) ? outcome : worst),
    "clear",
  );
}

describe("bands of a bonding material", () => {
  it.each([
    ["a slide adhesive", SLIDE],
    ["a laser-release adhesive", LASER],
    ["a wax whose margin begins below its softening point", WAX],
    ["a peel adhesive without a softening point", PEEL],
  ])("say what the rule says of %s, in air and in vacuum", (_, material) => {
    for (const vacuum of [false, true]) {
      const bands = adhesiveBands(material, { from: celsius(0), to: celsius(300), vacuum });
      for (const { from, to, outcome } of bands)
        for (const share of [0.001, 0.5, 0.999])
          expect(judged(material, from + share * (to - from), vacuum ? ["vacuum"] : [])).toBe(outcome);
    }
  });

  it("cover the scale without gaps, and no two neighbours are the same", () => {
    for (const material of [SLIDE, LASER, WAX, PEEL]) {
      const bands = adhesiveBands(material, { from: celsius(0), to: celsius(300), vacuum: false });
      expect(bands[0]?.from).toBe(celsius(0));
      expect(bands.at(-1)?.to).toBe(celsius(300));
      bands.slice(1).forEach((band, index) => {
        expect(band.from).toBe(bands[index]?.to);
        expect(band.outcome).not.toBe(bands[index]?.outcome);
      });
    }
  });

  it("keep a thermoplastic out of vacuum from its softening point on", () => {
    const bands = adhesiveBands(SLIDE, { from: celsius(0), to: celsius(250), vacuum: true });
    expect(bands).toEqual([
      { from: celsius(0), to: celsius(120), outcome: "clear" },
      { from: celsius(120), to: celsius(250), outcome: "do not run" },
    ]);
  });

  it("leave a limit beyond the scale out", () => {
    expect(adhesiveBands(PEEL, { from: celsius(0), to: celsius(200), vacuum: false })).toEqual([
      { from: celsius(0), to: celsius(200), outcome: "clear" },
    ]);
  });
});
