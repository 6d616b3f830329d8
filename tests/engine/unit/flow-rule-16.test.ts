import { describe, expect, it } from "vitest";
import type { StepInput } from "#app/engine/flow/model.ts";
import type { TapeInput } from "#app/engine/flow/handling-inputs.ts";
import {
  bondStep,
  celsius,
  debondStep,
  exact,
  findings,
  flow,
  frameStep,
  outcomes,
  step,
  tapeStep,
} from "./flow-samples.ts";

const onTape = (more: Partial<StepInput>, tape: Partial<TapeInput> | null = null) =>
  flow([tapeStep({ tape: tape && { name: "Hard tape", ...tape } }), step({ planned: "grinding tape", ...more })]);

describe("rule 16, what the tape stands", () => {
  it.each([
    { peak: 25, outcome: [] },
    { peak: 79, outcome: ["clear"] },
    { peak: 80, outcome: ["caution"] },
    { peak: 81, outcome: ["do not run"] },
  ])("$peak °C on tape of the site's 80 °C: $outcome", ({ peak, outcome }) => {
    expect(outcomes(onTape({ peakTemperature: celsius(peak) }), 16)).toEqual(outcome);
  });

  it("takes the tape's own limit, in the order rule as well", () => {
    const hot = onTape({ peakTemperature: celsius(100) }, { temperatureLimit: exact(celsius(120)) });
    expect(outcomes(hot, 16)).toEqual(["clear"]);
    expect(outcomes(hot, 12)).toEqual([]);
    const weak = onTape({ peakTemperature: celsius(70) }, { temperatureLimit: exact(celsius(60)) });
    expect(outcomes(weak, 16)).toEqual(["do not run"]);
    expect(outcomes(weak, 12)).toEqual(["do not run"]);
  });

  const vacuum = { exposures: ["vacuum"] as StepInput["exposures"] };

  it("goes into no vacuum, unless its own data say so", () => {
    expect(outcomes(onTape(vacuum), 16)).toEqual(["do not run"]);
    const made = { resistances: { vacuum: { word: "resists" as const } } };
    expect(outcomes(onTape(vacuum, made), 16)).toEqual(["clear"]);
    expect(outcomes(onTape(vacuum, made), 12)).toEqual([]);
  });

  it.each([
    { word: "resists", outcome: "clear" },
    { word: "attacked", outcome: "do not run" },
    { word: "unknown", outcome: "caution" },
    { word: null, outcome: "caution" },
  ] as const)("acid on tape that is stated $word: $outcome", ({ word, outcome }) => {
    const tape = { resistances: word && { acid: { word } } };
    expect(outcomes(onTape({ exposures: ["acid"] }, tape), 16)).toEqual([outcome]);
  });

  it.each([
    { minutes: 9, outcome: "clear" },
    { minutes: 10, outcome: "caution" },
    { minutes: 11, outcome: "do not run" },
    { minutes: null, outcome: "caution" },
  ])("solvent for $minutes min on tape that stands 10 min: $outcome", ({ minutes, outcome }) => {
    const tape = { resistances: { solvent: { word: "resists" as const, longest: 600 } } };
    const exposureTimes = minutes === null ? null : { solvent: minutes * 60 };
    expect(outcomes(onTape({ exposures: ["solvent"], exposureTimes }, tape), 16)).toEqual([outcome]);
  });

  it("stops light that lets the tape go, and asks where that is not known", () => {
    const lit = { exposures: ["ultraviolet light"] as StepInput["exposures"] };
    expect(outcomes(onTape(lit, { releasesInLight: true }), 16)).toEqual(["do not run"]);
    expect(outcomes(onTape(lit, { releasesInLight: false }), 16)).toEqual([]);
    expect(outcomes(onTape(lit), 16)).toEqual(["caution"]);
  });

  it("leaves an edge ring, the heat of a debond and its remover to others", () => {
    const ring = [frameStep({ planned: "edge ring" }), step({ planned: "edge ring", peakTemperature: celsius(200) })];
    expect(outcomes(flow(ring), 16)).toEqual([]);
    const debonded = [bondStep(), frameStep({ planned: "carrier" }), debondStep({ peakTemperature: celsius(200) })];
    expect(outcomes(flow(debonded), 16)).toEqual([]);
    const clean = step({ kind: "clean", planned: "film frame", exposures: ["solvent"] });
    expect(outcomes(flow([...debonded, clean]), 16)).toEqual([]);
  });

  it("says what would clear it", () => {
    for (const found of findings(onTape({ ...vacuum, peakTemperature: celsius(90) }), 16))
      expect(found.remedy).toBeTruthy();
  });
});
