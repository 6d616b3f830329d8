import { describe, expect, it } from "vitest";
import type { BondingMaterialInput, CarrierInput, EquipmentInput, StepInput } from "#app/engine/flow/model.ts";
import {
  addition,
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
  tool,
  trimStep,
  um,
} from "./flow-samples.ts";

const glass = (overrides: Partial<CarrierInput> = {}) =>
  carrier({
    name: "Glass",
    material: "glass",
    expansion: exact(3e-6),
    passesUltraviolet: true,
    perforated: false,
    ...overrides,
  });

const released = (onto: CarrierInput, material: Partial<BondingMaterialInput> = {}) =>
  flow([bondStep({}, adhesive(material), onto), frameStep({ planned: "carrier" }), debondStep()]);

describe("rule 7, carrier: what lets it go", () => {
  it.each([
    { what: "glass that passes it", onto: glass(), outcome: "clear" },
    { what: "glass that does not", onto: glass({ passesUltraviolet: false }), outcome: "do not run" },
    { what: "glass of which it is not known", onto: glass({ passesUltraviolet: null }), outcome: "cannot judge" },
    { what: "metal in the way", onto: glass({ metalInLight: true }), outcome: "do not run" },
    { what: "silicon, whatever is stated", onto: carrier({ passesUltraviolet: true }), outcome: "do not run" },
  ])("ultraviolet light and $what: $outcome", ({ onto, outcome }) => {
    const [found] = findings(released(onto), 7);
    expect(found).toMatchObject({ outcome });
    expect(found?.remedy === null).toBe(outcome === "clear");
  });

  it.each([
    { passesInfrared: true, outcome: "clear" },
    { passesInfrared: false, outcome: "do not run" },
    { passesInfrared: null, outcome: "cannot judge" },
  ])("infrared light through silicon, stated $passesInfrared: $outcome", ({ passesInfrared, outcome }) => {
    expect(outcomes(released(carrier({ passesInfrared }), { releaseLight: "infrared" }), 7)).toEqual([outcome]);
  });

  it.each([
    { perforated: true, outcome: "clear" },
    { perforated: false, outcome: "do not run" },
    { perforated: null, outcome: "cannot judge" },
  ])("solvent and openings stated $perforated: $outcome", ({ perforated, outcome }) => {
    const solvent = { release: "solvent through perforated carrier" as const };
    expect(outcomes(released(glass({ perforated }), solvent), 7)).toEqual([outcome]);
  });

  it("asks nothing of a slide or a peel", () => {
    expect(outcomes(released(carrier(), { release: "mechanical peel" }), 7)).toEqual([]);
    expect(outcomes(released(carrier(), { release: "thermal slide" }), 7)).toEqual([]);
  });
});

describe("rule 7, carrier: on the tool", () => {
  const onTool = (onto: CarrierInput, equipment: Partial<EquipmentInput>, more: Partial<StepInput> = {}) =>
    flow([bondStep({}, adhesive(), onto), step({ planned: "carrier", equipment: tool(equipment), ...more })]);

  it.each([
    { conductiveCoating: true, outcome: ["clear"] },
    { conductiveCoating: false, outcome: ["do not run"] },
    { conductiveCoating: null, outcome: ["caution"] },
  ])(
    "an electrostatic chuck and glass, coating stated $conductiveCoating: $outcome",
    ({ conductiveCoating, outcome }) => {
      expect(outcomes(onTool(glass({ conductiveCoating }), { clamping: "electrostatic" }), 7)).toEqual(outcome);
      expect(outcomes(onTool(glass({ conductiveCoating }), { clamping: "clamp ring" }), 7)).toEqual([]);
    },
  );

  it("holds silicon electrostatically", () => {
    expect(outcomes(onTool(carrier(), { clamping: "electrostatic" }), 7)).toEqual([]);
  });

  it("says that glass cools badly in plasma", () => {
    const plasma = onTool(glass(), { clamping: "electrostatic" }, { exposures: ["plasma"] });
    expect(findings(plasma, 7)[0]?.reason).toContain("Glass also cools badly");
  });

  it.each([
    { seenBySensors: true, outcome: [] },
    { seenBySensors: false, outcome: ["do not run"] },
    { seenBySensors: null, outcome: ["caution"] },
  ])("optical sensing and glass seen $seenBySensors: $outcome", ({ seenBySensors, outcome }) => {
    expect(outcomes(onTool(glass({ seenBySensors }), { sensesOptically: true }), 7)).toEqual(outcome);
  });

  it.each([
    { peak: 399, outcome: [] },
    { peak: 400, outcome: ["caution"] },
    { peak: 401, outcome: ["do not run"] },
  ])("$peak °C on a carrier that takes 400 °C: $outcome", ({ peak, outcome }) => {
    expect(outcomes(onTool(carrier(), {}, { peakTemperature: celsius(peak) }), 7)).toEqual(outcome);
  });

  it.each([
    { micrometres: 101, outcome: [] },
    { micrometres: 100, outcome: ["caution"] },
    { micrometres: 60, outcome: ["caution"] },
  ])("openings under $micrometres µm that is polished: $outcome", ({ micrometres, outcome }) => {
    const polished = { kind: "polish" as const, siliconAfter: exact(um(micrometres), 0) };
    expect(outcomes(onTool(glass({ perforated: true }), {}, polished), 7)).toEqual(outcome);
    expect(outcomes(onTool(glass(), {}, polished), 7)).toEqual([]);
  });
});

describe("rule 7, carrier: at the bond", () => {
  const bonded = (onto: CarrierInput, equipment: Partial<EquipmentInput> = {}, before: StepInput[] = []) =>
    flow([...before, bondStep({ equipment: tool(equipment) }, adhesive(), onto)]);
  const mismatched = glass({ expansion: exact(5e-6) });
  const bow = findings(bonded(mismatched), 7)[0]?.figures[0]?.value ?? 0;

  it.each([
    { times: 1.26, outcome: "clear" },
    { times: 1.25, outcome: "caution" },
    { times: 1, outcome: "caution" },
    { times: 0.99, outcome: "do not run" },
  ])("a bonder that takes $times the bow of the pair: $outcome", ({ times, outcome }) => {
    expect(bow).toBeGreaterThan(um(100));
    const limit = exact(times * bow);
    expect(outcomes(bonded(mismatched, { warpLimitEdgesUp: limit, warpLimitEdgesDown: limit }), 7)).toEqual([outcome]);
  });

  it.each([
    { uses: 18, outcome: "clear" },
    { uses: 19, outcome: "caution" },
    { uses: 20, outcome: "do not run" },
  ])("used $uses times before, of 20: $outcome", ({ uses, outcome }) => {
    const found = findings(bonded(carrier({ uses, useLimit: 20, identity: "C-17" })), 7);
    expect(found.at(-1)).toMatchObject({ outcome });
    expect(found.at(-1)?.reason).toContain("C-17");
  });

  it("says nothing of uses while no piece is chosen", () => {
    expect(outcomes(bonded(carrier({ useLimit: 20 })), 7)).toEqual(["clear"]);
  });

  it("takes a carrier smaller than the wafer where the trim takes the overhang off, with caution", () => {
    const small = carrier({ diameter: 0.199 });
    expect(outcomes(bonded(small, {}, [trimStep()]), 7)).toEqual(["clear", "caution"]);
    expect(outcomes(bonded(small, {}, [trimStep()]), 12)).toEqual(["clear"]);
    expect(outcomes(bonded(small), 12)).toContain("do not run");
    expect(outcomes(bonded(carrier({ diameter: 0.198 }), {}, [trimStep()]), 12)).toContain("do not run");
  });

  it("judges a match by the bow, films included, not by expansions", () => {
    const film = step({ kind: "deposit", adds: [addition({ stress: exact(1e9), thickness: exact(um(3)) })] });
    expect(findings(bonded(carrier(), {}, [film]), 7)[0]?.figures[0]?.working).toBeTruthy();
  });
});
