/*
 *   times     s; waits are from the end of one step to the start of the next
 */
import { describe, expect, it } from "vitest";
import type { StepInput } from "#app/engine/flow/model.ts";
import {
  addition,
  adhesive,
  bondStep,
  celsius,
  debondStep,
  exact,
  film,
  findings,
  flow,
  frameStep,
  grindStep,
  outcomes,
  reliefStep,
  step,
  tapeStep,
} from "./flow-samples.ts";

const HOUR = 3600;
const waits = (hours: number) => ({ timeSincePrevious: hours * HOUR });

describe("rule 17, clocks", () => {
  it.each([
    { hours: 19, outcome: "clear" },
    { hours: 19.2, outcome: "caution" },
    { hours: 24, outcome: "caution" },
    { hours: 24.1, outcome: "do not run" },
  ])("relieved $hours h after the grind: $outcome", ({ hours, outcome }) => {
    const steps = [tapeStep(), grindStep(100, 0), reliefStep(waits(hours))];
    expect(findings(flow(steps), 17)[0]).toMatchObject({ outcome });
  });

  it.each([
    { days: 5, outcome: "clear" },
    { days: 7, outcome: "caution" },
    { days: 8, outcome: "do not run" },
  ])("ground $days days after the bond: $outcome", ({ days, outcome }) => {
    const ground = step({ kind: "grind", planned: "carrier", ...waits(24 * days) });
    expect(outcomes(flow([bondStep(), ground]), 17)).toEqual([outcome]);
  });

  it.each([
    { hours: 10, outcome: "clear" },
    { hours: 24, outcome: "caution" },
    { hours: 30, outcome: "do not run" },
  ])("cleaned $hours h after the debond: $outcome", ({ hours, outcome }) => {
    const clean = step({ kind: "clean", planned: "film frame", ...waits(hours) });
    const steps = [bondStep(), frameStep({ planned: "carrier" }), debondStep(), clean, step({ planned: "film frame" })];
    expect(outcomes(flow(steps), 17, { at: 4 })).toEqual([outcome]);
  });

  it("adds waits and holds of the steps in between", () => {
    const steps = [
      tapeStep(),
      grindStep(100, 0),
      step({ planned: "grinding tape", holdTime: 2 * HOUR, ...waits(12) }),
      reliefStep(waits(11)),
    ];
    expect(findings(flow(steps), 17)[0]).toMatchObject({ outcome: "do not run", figures: [{ value: 25 * HOUR }] });
  });

  it("says the red line where no times are planned, and stops when the known ones are too much", () => {
    const [said] = findings(flow([tapeStep(), grindStep(100, 0), reliefStep()]), 17);
    expect(said).toMatchObject({ outcome: "clear", limit: { value: 24 * HOUR } });
    expect(said?.reason).toContain("no times are planned");
    const partly = [tapeStep(), grindStep(100, 0), step({ planned: "grinding tape" }), reliefStep(waits(30))];
    expect(findings(flow(partly), 17)[0]).toMatchObject({ outcome: "do not run" });
  });

  it("counts days on tape to the last step on it, by the tape's own limit where it has one", () => {
    const stored = (days: number, longestTime: number | null = null) =>
      flow([
        frameStep({
          tape: { name: "Frame tape", longestTime: longestTime === null ? null : exact(longestTime * 24 * HOUR) },
        }),
        step({ planned: "film frame", ...waits(1) }),
        step({ kind: "store", planned: "film frame", ...waits(24 * days) }),
      ]);
    expect(outcomes(stored(4), 17)).toEqual(["clear"]);
    expect(outcomes(stored(4), 17, { at: 2 })).toEqual([]);
    expect(outcomes(stored(8), 17)).toEqual(["do not run"]);
    expect(outcomes(stored(8, 30), 17)).toEqual(["clear"]);
    expect(outcomes(stored(4, 3), 17)).toEqual(["do not run"]);
  });
});

describe("rule 17, moisture", () => {
  const coated = step({
    kind: "cure",
    peakTemperature: celsius(230),
    adds: [addition({ film: film({ kind: "polymer" }) })],
  });
  const rinsed = step({ kind: "clean", exposures: ["water"] });
  const sputter = (more: Partial<StepInput> = {}): StepInput =>
    step({ kind: "deposit", exposures: ["vacuum"], ...more });

  it.each([
    { dehydrationBake: true, outcome: "clear" },
    { dehydrationBake: null, outcome: "caution" },
    { dehydrationBake: false, outcome: "do not run" },
  ])("a wet polymer into vacuum, bake stated $dehydrationBake: $outcome", ({ dehydrationBake, outcome }) => {
    const [found] = findings(flow([coated, rinsed, sputter({ dehydrationBake })]), 17);
    expect(found).toMatchObject({ outcome });
    expect(found?.remedy === null).toBe(outcome === "clear");
  });

  it.each([
    { hours: 4, outcome: [] },
    { hours: 4.1, outcome: ["caution"] },
  ])("dry $hours h after the cure: $outcome", ({ hours, outcome }) => {
    expect(outcomes(flow([coated, sputter(waits(hours))]), 17)).toEqual(outcome);
  });

  it("counts a vacuum as drying, and a store as wet", () => {
    expect(outcomes(flow([coated, rinsed, sputter({ dehydrationBake: true }), sputter()]), 17)).toEqual([]);
    expect(outcomes(flow([coated, step({ kind: "store" }), sputter()]), 17)).toEqual(["caution"]);
  });

  it("asks of a pair as well, and nothing of bare silicon", () => {
    const pair = [
      bondStep({}, adhesive()),
      step({ kind: "clean", planned: "carrier", exposures: ["water"] }),
      sputter({ planned: "carrier" }),
    ];
    expect(outcomes(flow(pair), 17)).toEqual(["caution"]);
    expect(outcomes(flow([rinsed, sputter()]), 17)).toEqual([]);
  });
});
