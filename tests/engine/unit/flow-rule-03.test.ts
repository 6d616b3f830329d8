/*
 *   load      film force over the force at which a free wafer rolls about one axis, 1
 */
import { describe, expect, it } from "vitest";
import type { StepInput } from "#app/engine/flow/model.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { addition, celsius, exact, findings, flow, outcomes, step, tapeStep, tool, um } from "./flow-samples.ts";

const limits = defaultLimits();
const pulling = (megapascals: number, overrides: Partial<StepInput> = {}): StepInput =>
  step({
    kind: "deposit",
    adds: [addition({ stress: exact(megapascals * 1e6), thickness: exact(um(1)) })],
    ...overrides,
  });
const thin = (megapascals: number, overrides: Partial<StepInput> = {}) =>
  flow([pulling(megapascals, overrides)], { thickness: 100 });
const loadOf = (megapascals: number) => walkFlow(thin(megapascals), limits).steps[0]?.released.stabilityRatio ?? 0;

/** Film stress, MPa, that loads the free wafer just so: the load is proportional to it. */
const stressFor = (load: number) => (100 * load) / loadOf(100);

describe("rule 3, curling", () => {
  it.each([
    { load: 0.69, outcome: [] },
    { load: 0.71, outcome: ["caution"] },
    { load: 0.99, outcome: ["caution"] },
    { load: 1.01, outcome: ["do not run"] },
    { load: 5, outcome: ["do not run"] },
  ])("free at $load of the critical load: $outcome", ({ load, outcome }) => {
    expect(loadOf(stressFor(load))).toBeCloseTo(load, 2);
    expect(outcomes(thin(stressFor(load)), 3)).toEqual(outcome);
  });

  it("passes with caution at exactly the site's share and at the critical load", () => {
    const load = loadOf(100);
    const at = { ...limits, curlMargin: { value: load, source: "site" } };
    expect(outcomes(thin(100), 3, { limits: at })).toEqual([load > 1 ? "do not run" : "caution"]);
  });

  it("says radius, edge lift and what would clear it", () => {
    const [found] = findings(thin(stressFor(5)), 3);
    expect(found?.reason).toMatch(/rolls to a radius of about .* edges lifting/);
    expect(found?.remedy).toContain("Plan tape, ring or carrier");
    expect(found?.figures[1]?.working).toBeTruthy();
  });

  it("does not judge a held wafer, and says what it would do if released", () => {
    const held = flow([tapeStep(), pulling(stressFor(5), { planned: "grinding tape" })], { thickness: 100 });
    const [found] = findings(held, 3);
    expect(found).toMatchObject({ outcome: "clear", remedy: null });
    expect(found?.reason).toContain("Do not release: it would roll");
  });

  it("judges a gripper as free, and the peak only where the tool leaves it free", () => {
    expect(outcomes(thin(stressFor(5), { planned: "thin-wafer gripper" }), 3)).toEqual(["do not run"]);
    const cold = thin(stressFor(0.5));
    expect(outcomes(cold, 3)).toEqual([]);
    // The film pulls harder at 400 °C: silicon grows more than it does.
    const hot = (atPeak: "free" | "held") => ({ peakTemperature: celsius(400), equipment: tool({ atPeak }) });
    expect(outcomes(thin(stressFor(0.5), hot("free")), 3)).not.toEqual([]);
    expect(outcomes(thin(stressFor(0.5), hot("held")), 3)).toEqual([]);
  });
});
