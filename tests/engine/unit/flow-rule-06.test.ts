import { describe, expect, it } from "vitest";
import type { BondingMaterialInput, StepInput } from "#app/engine/flow/model.ts";
import {
  adhesive,
  bondStep,
  carrier,
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

const resists = { word: "resists" } as const;

describe("rule 6, chemicals, vacuum and light", () => {
  it.each([
    { word: "resists", outcome: ["clear", "clear"] },
    { word: "attacked", outcome: ["clear", "do not run"] },
    { word: "unknown", outcome: ["clear", "cannot judge"] },
    { word: null, outcome: ["clear", "cannot judge"] },
  ] as const)("acid on a material that is stated $word: $outcome", ({ word, outcome }) => {
    const resistances = word && { acid: { word } };
    expect(outcomes(onCarrier(25, { resistances }, { exposures: ["acid"] }), 6)).toEqual(outcome);
  });

  it.each([
    { minutes: 29, outcome: "clear" },
    { minutes: 30, outcome: "caution" },
    { minutes: 31, outcome: "do not run" },
    { minutes: null, outcome: "cannot judge" },
  ])("base for $minutes min on a material that stands 30 min: $outcome", ({ minutes, outcome }) => {
    const resistances = { base: { ...resists, longest: 1800 } };
    const holdTime = minutes === null ? null : minutes * 60;
    expect(outcomes(onCarrier(25, { resistances }, { exposures: ["base"], holdTime }), 6)).toEqual(["clear", outcome]);
  });

  it("takes the time of the exposure before that of the step", () => {
    const resistances = { base: { ...resists, longest: 1800 } };
    const more = { exposures: ["base"] as StepInput["exposures"], holdTime: 3600, exposureTimes: { base: 600 } };
    expect(outcomes(onCarrier(25, { resistances }, more), 6)).toEqual(["clear", "clear"]);
  });

  it.each([
    { solvent: "ketone", outcome: "do not run" },
    { solvent: "alcohol", outcome: "clear" },
    { solvent: null, outcome: "caution" },
  ] as const)("$solvent on a material that ketones attack: $outcome", ({ solvent, outcome }) => {
    const resistances = { solvent: resists, attackedBy: ["ketone" as const] };
    expect(outcomes(onCarrier(25, { resistances }, { exposures: ["solvent"], solvent }), 6)).toEqual([
      "clear",
      outcome,
    ]);
  });

  const inVacuum = (peak: number, material: Partial<BondingMaterialInput>) =>
    outcomes(onCarrier(peak, material, { exposures: ["vacuum"] }), 6).slice(2);

  it.each([
    { peak: 179, outcome: [] },
    { peak: 180, outcome: ["caution"] },
    { peak: 181, outcome: ["do not run"] },
  ])("$peak °C in vacuum, where it takes 180 °C: $outcome", ({ peak, outcome }) => {
    expect(inVacuum(peak, { vacuumTemperatureLimit: exact(celsius(180)) })).toEqual(outcome);
  });

  it.each([
    { percent: 0.49, outcome: [] },
    { percent: 0.5, outcome: ["caution"] },
    { percent: 1, outcome: ["caution"] },
    { percent: 1.1, outcome: ["do not run"] },
  ])("a weight loss of $percent % in vacuum: $outcome", ({ percent, outcome }) => {
    expect(inVacuum(100, { weightLoss: exact(percent / 100) })).toEqual(outcome);
  });

  it("asks for light only through glass, and for plasma only where its data say something", () => {
    const lit = (onto = carrier()) =>
      flow([
        bondStep({}, adhesive({ resistances: null }), onto),
        step({ planned: "carrier", exposures: ["ultraviolet light", "plasma"] }),
      ]);
    expect(outcomes(lit(), 6)).toEqual(["clear"]);
    expect(outcomes(lit(carrier({ material: "glass", expansion: exact(3e-6) })), 6)).toEqual(["clear", "cannot judge"]);
  });
});

describe("rule 6, heat added up", () => {
  const heatedTimes = (count: number, material: Partial<BondingMaterialInput>, hold: number | null = 600, peak = 150) =>
    flow([
      bondStep({}, adhesive(material)),
      ...Array.from({ length: count }, () =>
        step({ kind: "cure", planned: "carrier", peakTemperature: celsius(peak), holdTime: hold }),
      ),
    ]);

  it.each([
    { count: 2, outcome: ["clear"] },
    { count: 3, outcome: ["clear", "caution"] },
    { count: 4, outcome: ["clear", "do not run"] },
  ])("$count heatings of a material that stands 3: $outcome", ({ count, outcome }) => {
    expect(outcomes(heatedTimes(count, { thermalCycles: exact(3) }), 6)).toEqual(outcome);
  });

  it("counts from 100 °C up, that included", () => {
    expect(outcomes(heatedTimes(4, { thermalCycles: exact(3) }, 600, 99), 6)).toEqual(["clear"]);
    expect(outcomes(heatedTimes(4, { thermalCycles: exact(3) }, 600, 100), 6)).toEqual(["clear", "do not run"]);
  });

  it.each([
    { count: 2, outcome: ["clear"] },
    { count: 3, outcome: ["clear", "caution"] },
    { count: 4, outcome: ["clear", "do not run"] },
  ])("$count times 10 min of a material that stands 30 min: $outcome", ({ count, outcome }) => {
    expect(outcomes(heatedTimes(count, { thermalTime: exact(1800) }), 6)).toEqual(outcome);
  });

  it("cannot judge the time hot while a hold time is missing", () => {
    expect(outcomes(heatedTimes(2, { thermalTime: exact(1800) }, null), 6)).toEqual(["clear", "cannot judge"]);
  });

  it.each([
    { minutes: 10, outcome: ["caution"] },
    { minutes: 11, outcome: ["caution", "do not run"] },
  ])("$minutes min within the margin of a limit that holds for 10 min: $outcome", ({ minutes, outcome }) => {
    const near = onCarrier(240, { limitTime: exact(600) }, { holdTime: minutes * 60 });
    expect(outcomes(near, 6)).toEqual(outcome);
  });
});

describe("rule 6, thickness of the bond", () => {
  const range = { leastThickness: 20e-6, mostThickness: 80e-6 };
  const bonded = (thickness: number, material: Partial<BondingMaterialInput>) => {
    const made = bondStep({}, adhesive(material));
    return flow([{ ...made, bond: made.bond && { ...made.bond, thickness: exact(thickness * 1e-6) } }]);
  };

  it.each([
    { thickness: 19, outcome: ["caution"] },
    { thickness: 20, outcome: [] },
    { thickness: 50, outcome: [] },
    { thickness: 80, outcome: [] },
    { thickness: 81, outcome: ["caution"] },
  ])("$thickness µm of a material made for 20 to 80 µm: $outcome", ({ thickness, outcome }) => {
    expect(outcomes(bonded(thickness, range), 6, { at: 1 })).toEqual(outcome);
  });

  it("names the end that is passed and what would clear it", () => {
    const [found] = findings(bonded(10, range), 6, { at: 1 });
    expect(found?.reason).toContain("10\u00a0µm thick; Adhesive is made for bonds from 20\u00a0µm up");
    expect(found?.limit).toMatchObject({ label: "Adhesive, thinnest bond", value: 20e-6 });
  });

  it("finds no fault where nobody says what it is made for", () => {
    expect(outcomes(bonded(500, {}), 6, { at: 1 })).toEqual([]);
  });
});
