import { describe, expect, it } from "vitest";
import type { FilmInput, StepInput } from "#app/engine/flow/model.ts";
import { addition, celsius, exact, film, findings, flow, outcomes, step } from "./flow-samples.ts";

const polymer = film({ id: "polymer", name: "Polymer", kind: "polymer", temperatureLimit: exact(celsius(300)) });
const solder = film({ id: "solder", name: "Solder", kind: "solder", temperatureLimit: exact(celsius(220)) });
const heated = (what: FilmInput, peak: number, more: Partial<StepInput> = {}) => [
  step({ kind: "deposit", adds: [addition({ film: what })] }),
  step({ kind: "cure", peakTemperature: celsius(peak), ...more }),
];

describe("rule 11, films and heat", () => {
  it.each([
    { peak: 299, outcome: "clear" },
    { peak: 300, outcome: "caution" },
    { peak: 301, outcome: "do not run" },
  ])("$peak °C on a film that takes 300 °C: $outcome", ({ peak, outcome }) => {
    const [found] = findings(flow(heated(polymer, peak)), 11);
    expect(found).toMatchObject({ outcome, limit: { source: "measured here" } });
    expect(found?.remedy === null).toBe(outcome === "clear");
  });

  it("names the film that takes least", () => {
    const both = [
      step({
        adds: [
          addition({ film: polymer }),
          addition({ film: film({ id: "b", name: "Metal", temperatureLimit: exact(celsius(250)) }) }),
        ],
      }),
      step({ peakTemperature: celsius(260) }),
    ];
    expect(findings(flow(both), 11)[0]?.reason).toContain("Metal takes 250");
  });

  it("has no say at room temperature", () => {
    expect(outcomes(flow(heated(polymer, 25)), 11)).toEqual([]);
  });

  it("asks for the limit of a polymer once, at the hottest step that it sees", () => {
    const unknown = { ...polymer, temperatureLimit: null };
    const steps = [
      ...heated(unknown, 200),
      step({ peakTemperature: celsius(250) }),
      step({ peakTemperature: celsius(250) }),
    ];
    expect([2, 3, 4].map((at) => outcomes(flow(steps), 11, { at }))).toEqual([[], ["caution"], []]);
  });
});

describe("rule 11, solder", () => {
  const reflow = (peak: number): StepInput => step({ kind: "reflow", peakTemperature: celsius(peak) });

  it("is clear in the reflow that melts it on purpose", () => {
    const [found] = findings(flow([...heated(solder, 25), reflow(245)]), 11);
    expect(found).toMatchObject({ outcome: "clear" });
    expect(found?.reason).toContain("on purpose");
  });

  it("stops a reflow that does not melt it", () => {
    expect(outcomes(flow([...heated(solder, 25), reflow(219)]), 11)).toEqual(["do not run"]);
  });

  it.each([
    { peak: 219, outcome: [] },
    { peak: 220, outcome: ["caution"] },
    { peak: 221, outcome: ["caution"] },
  ])("another step at $peak °C over a melting of 220 °C: $outcome", ({ peak, outcome }) => {
    expect(outcomes(flow(heated(solder, peak)), 11)).toEqual(outcome);
  });

  it.each(["bond", "grind", "debond"] as const)(
    "does not run a %s that presses on the melt, nor a melt in vacuum",
    (kind) => {
      expect(outcomes(flow(heated(solder, 230, { kind })), 11)).toContain("do not run");
      expect(outcomes(flow(heated(solder, 230, { exposures: ["vacuum"] })), 11)).toContain("do not run");
    },
  );

  it("counts how often it melts: at the limit a caution, beyond it stops", () => {
    const times = (count: number) => flow([...heated(solder, 25), ...Array.from({ length: count }, () => reflow(245))]);
    expect(outcomes(times(2), 11)).toEqual(["clear"]);
    expect(outcomes(times(3), 11)).toEqual(["caution", "clear"]);
    expect(outcomes(times(4), 11)).toEqual(["do not run", "clear"]);
  });

  it("takes a pillar's cap as solder although the pillar is metal", () => {
    const pillar = film({ kind: "metal", temperatureLimit: exact(celsius(221)), solderMelting: exact(celsius(221)) });
    expect(outcomes(flow([...heated(pillar, 25), reflow(245)]), 11)).toEqual(["clear"]);
  });
});
