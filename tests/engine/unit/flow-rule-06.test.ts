import { describe, expect, it } from "vitest";
import type { BondingMaterialInput, StepInput } from "#app/engine/flow/model.ts";
import {
  adhesive,
  bondStep,
  celsius,
  debondStep,
  exact,
  findings,
  flow,
  frameStep,
  outcomes,
  step,
} from "./flow-samples.ts";

const onCarrier = (peak: number, material: Partial<BondingMaterialInput> = {}, more: Partial<StepInput> = {}) =>
  flow([
    bondStep({}, adhesive({ temperatureLimit: exact(celsius(250)), ...material })),
    step({ kind: "cure", planned: "carrier", peakTemperature: celsius(peak), ...more }),
  ]);

describe("rule 6, bonding material and temperature", () => {
  it.each([
    { peak: 229, outcome: "clear" },
    { peak: 230, outcome: "caution" },
    { peak: 249, outcome: "caution" },
    { peak: 250, outcome: "caution" },
    { peak: 251, outcome: "do not run" },
  ])("$peak °C under a limit of 250 °C with its margin of 20 K: $outcome", ({ peak, outcome }) => {
    expect(outcomes(onCarrier(peak), 6)).toEqual([outcome]);
  });

  it("names the limit, where it comes from, and what would clear it", () => {
    const [found] = findings(onCarrier(251), 6);
    expect(found?.limit).toMatchObject({ label: "Adhesive, temperature limit", source: "measured here" });
    expect(found?.remedy).toContain("Lower the peak to less than 230\u00a0°C");
  });

  const thermoplastic = { softening: exact(celsius(120)), flows: true };
  const crossLinked = { softening: exact(celsius(120)), flows: false };

  it("says nothing of softening below that point", () => {
    expect(outcomes(onCarrier(119, thermoplastic), 6)).toEqual(["clear"]);
  });

  it("is a caution where a thermoplastic flows, at its softening point and above", () => {
    expect(outcomes(onCarrier(120, thermoplastic), 6)).toEqual(["clear", "caution"]);
    expect(outcomes(onCarrier(150, thermoplastic), 6)).toEqual(["clear", "caution"]);
  });

  it("stops where it flows in vacuum", () => {
    const inVacuum = onCarrier(150, thermoplastic, { exposures: ["vacuum"] });
    expect(outcomes(inVacuum, 6)).toEqual(["clear", "do not run", "clear"]);
    expect(findings(inVacuum, 6)[1]?.reason).toContain("in vacuum the thin wafer blisters or floats");
  });

  it("never says that a cross-linked material flows", () => {
    const found = findings(onCarrier(150, crossLinked, { exposures: ["vacuum"] }), 6);
    expect(found.map(({ outcome }) => outcome)).toEqual(["clear", "clear", "clear"]);
    expect(found[1]?.reason).toContain("cross-linked, stays coupled and does not flow");
  });

  it("has no say at the bond itself, at the debond, or after it", () => {
    const steps = [
      bondStep({ peakTemperature: celsius(300) }),
      frameStep({ planned: "carrier" }),
      debondStep({ peakTemperature: celsius(300) }),
      step({ planned: "film frame", peakTemperature: celsius(300) }),
    ];
    expect([1, 2, 3, 4].map((at) => outcomes(flow(steps), 6, { at }).length)).toEqual([0, 1, 0, 0]);
  });
});
