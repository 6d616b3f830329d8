import { describe, expect, it } from "vitest";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { inputChanges } from "#app/lib/input-changes.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import { demoFlow } from "#tests/fixtures/demo-flow-input.ts";

const input = (name = "Petrel"): AssessmentInput => ({ flow: demoFlow(name).flow, limits: defaultLimits() });

/** What is said of an input that was changed in some way. */
function changesAfter(change: (input: AssessmentInput) => void, name?: string) {
  const after = structuredClone(input(name));
  change(after);
  return inputChanges(input(name), after).map((each) => ({
    ...each,
    from: each.from.replaceAll("\u00A0", " "),
    to: each.to.replaceAll("\u00A0", " "),
  }));
}

/** Something of the fixture that a test relies on. */
function there<T>(value: T | null | undefined): T {
  if (value === null || value === undefined) throw new Error("the demo flow has no such thing");
  return value;
}

const stepOf = ({ flow }: AssessmentInput, number: number) => there(flow.steps[number - 1]);
const filmOf = (input: AssessmentInput, number: number) => there(stepOf(input, number).adds[0]);

describe("what differs between two inputs", () => {
  it("nothing between an input and itself, as the database gives it back", () => {
    expect(inputChanges(input(), JSON.parse(JSON.stringify(input())) as AssessmentInput)).toEqual([]);
  });

  it("the slots that take a step, which are all of them where none are named", () => {
    const changes = changesAfter((now) => {
      stepOf(now, 3).slots = [1, 2, 3, 7];
    });
    expect(changes).toHaveLength(1);
    expect(changes[0]).toMatchObject({ property: "Slots", from: "all", to: "1 to 3 and 7", steps: [3] });
  });

  it("a film's stress with both values and units, once for all steps that put it down", () => {
    const changes = changesAfter((now) => {
      for (const { film, stress } of now.flow.steps.flatMap(({ adds }) => adds))
        if (film.name === filmOf(now, 3).film.name) stress.value = 35e6;
    });
    expect(changes).toHaveLength(1);
    expect(changes[0]).toMatchObject({
      subject: filmOf(input(), 3).film.name,
      to: "+35 MPa",
      record: { kind: "film" },
    });
    expect(there(changes[0]).property).toContain("Stress");
    expect(there(changes[0]).steps).toContain(3);
  });

  it("a property of carrier, bonding material and tool under their own names", () => {
    const changes = changesAfter((now) => {
      const bond = there(stepOf(now, 10).bond);
      there(bond.carrier.expansion).value = 3.2e-6;
      bond.material.effectiveModulus.value = 120e6;
      there(there(stepOf(now, 15).equipment).warpLimitEdgesUp).value = 300e-6;
    });
    expect(changes.map(({ subject, property, from, to }) => [subject, property, from, to])).toEqual([
      ["Glass carrier 3.0 ppm", "Thermal expansion", "3 ppm/K", "3.2 ppm/K"],
      ["Laser-release adhesive B", "Locked-in modulus", expect.stringMatching(/MPa$/), "120 MPa"],
      [there(stepOf(input(), 15).equipment).name, "Warp limit, edges up", "400 µm", "300 µm"],
    ]);
  });

  it("what belongs to a step alone: temperature, time, support, silicon, exposure", () => {
    const changes = changesAfter((now) => {
      Object.assign(stepOf(now, 3), { peakTemperature: 473.15, holdTime: 5400, planned: "carrier" });
      stepOf(now, 3).exposures = ["vacuum", "plasma"];
      there(stepOf(now, 12).siliconAfter).value = 60e-6;
    });
    expect(changes.map(({ property, to, steps }) => [property, to, steps])).toEqual([
      ["Peak temperature", "200 °C", [3]],
      ["Time at peak", "90 min", [3]],
      ["Exposed to", "vacuum, plasma", [3]],
      ["Support planned", "carrier", [3]],
      ["Silicon after it", expect.stringMatching(/^60/), [12]],
    ]);
  });

  it("a step put in, a step taken out, and another tool, carrier or bonding material", () => {
    const changes = changesAfter((now) => {
      now.flow.steps.splice(1, 1);
      now.flow.steps.push({ ...stepOf(now, 1), kind: "hold", title: "Hold over the weekend" });
      there(stepOf(now, 9).bond).carrier.name = "Glass carrier 7.2 ppm";
    });
    expect(changes.map(({ subject, property, to }) => [subject, property, to])).toEqual([
      [`Step 2, ${stepOf(input(), 2).title}`, "Step", "taken out"],
      [`Step 9, ${stepOf(input(), 10).title}`, "Carrier", "Glass carrier 7.2 ppm"],
      ["Step 21, Hold over the weekend", "Step", "put in"],
    ]);
  });

  it("a film that a step adds no more", () => {
    const changes = changesAfter((now) => void (stepOf(now, 3).adds = []));
    expect(changes).toMatchObject([{ property: "Adds", to: "none", steps: [3] }]);
  });

  it("a limit by its title, value or source", () => {
    const changes = changesAfter((now) => {
      now.limits.warpMargin.value = 0.3;
      now.limits.flatWithin.source = "site trial";
    });
    expect(changes).toMatchObject([
      { subject: "Site limit", from: "20 %", to: "30 %", record: { kind: "limit", id: "warpMargin" } },
      { property: "Called flat up to", to: "15 µm, site trial" },
    ]);
  });

  it("tolerance, source and note of a value that itself stayed", () => {
    const changes = changesAfter((now) => {
      const { stress, thickness, film } = filmOf(now, 3);
      stress.tolerance = 2e6;
      thickness.source = "assumed";
      film.youngsModulus.note = "scan 12";
    });
    expect(changes.map(({ property, to }) => `${property}: ${to}`)).toEqual([
      "Young’s modulus: 3 GPa, scan 12",
      expect.stringMatching(/^Thickness: .*, assumed$/),
      expect.stringMatching(/^Stress.*± 2.0 MPa$/),
    ]);
  });

  it("not the last digit of a number that went through a form, nor the words it was typed in", () => {
    const changes = changesAfter((now) => {
      const { stress } = filmOf(now, 3);
      stress.value *= 1 + 1e-12;
      stress.text = "thirty";
    });
    expect(changes).toEqual([]);
  });

  it("not what an earlier version did not know, but whatever a later one changes of it", () => {
    const [before, after] = [input(), input()];
    Object.assign(stepOf(after, 3), { sideUp: "back side" });
    expect(inputChanges(before, after)).toEqual([]);
    Object.assign(stepOf(before, 3), { sideUp: "device side" });
    expect(inputChanges(before, after)).toMatchObject([{ property: "Side up", from: "device side", to: "back side" }]);
  });
});
