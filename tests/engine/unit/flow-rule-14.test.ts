/*
 *   off       thin-film curvature against the laminate's, 1
 */
import { describe, expect, it } from "vitest";
import type { StepInput } from "#app/engine/flow/model.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import {
  addition,
  adhesive,
  bondStep,
  celsius,
  exact,
  findings,
  flow,
  outcomes,
  step,
  tool,
  um,
} from "./flow-samples.ts";

const covered = (micrometres: number) =>
  flow([step({ adds: [addition({ thickness: exact(um(micrometres)), stress: exact(200e6) })] })]);

describe("rule 14, validity of the model", () => {
  const off = findings(covered(60), 14)[0]?.figures[0]?.value ?? 0;

  it("says how far the thin-film formula is off, without a caution: the laminate is used", () => {
    expect(off).toBeGreaterThan(0.05);
    expect(findings(covered(60), 14)[0]).toMatchObject({ outcome: "clear" });
    expect(findings(covered(60), 14)[0]?.figures[1]?.working?.equation).toBe("stoney-curvature");
  });

  it.each([
    { times: 1, said: 1 },
    { times: 1.001, said: 0 },
  ])("says it from the site's share on, here $times of what it is", ({ times, said }) => {
    const limits = { ...defaultLimits(), stoneyWithin: { value: times * off, source: "site" } };
    expect(findings(covered(60), 14, { limits })).toHaveLength(said);
  });

  it("says nothing of thin films, and of flat wafers", () => {
    expect(outcomes(covered(1), 14)).toEqual([]);
    expect(outcomes(flow([step()]), 14)).toEqual([]);
  });

  it("is a caution where a free wafer rolls more than once round", () => {
    const rolled = flow([step({ adds: [addition({ thickness: exact(um(2)), stress: exact(1e9) })] })], {
      thickness: 20,
    });
    expect(
      findings(rolled, 14).some(({ outcome, reason }) => outcome === "caution" && reason.includes("once round")),
    ).toBe(true);
  });

  const free = (peak: number, atPeak: "free" | "held" = "free"): StepInput =>
    step({ kind: "cure", planned: "carrier", peakTemperature: celsius(peak), equipment: tool({ atPeak }) });
  const soft = adhesive({ softening: exact(celsius(120)) });

  it.each([
    { peak: 119, outcome: [] },
    { peak: 120, outcome: ["caution"] },
    { peak: 150, outcome: ["caution"] },
  ])("a pair that is free at $peak °C, softening at 120 °C: $outcome", ({ peak, outcome }) => {
    expect(outcomes(flow([bondStep({}, soft), free(peak)]), 14)).toEqual(outcome);
    expect(outcomes(flow([bondStep({}, soft), free(peak, "held")]), 14)).toEqual([]);
  });
});
