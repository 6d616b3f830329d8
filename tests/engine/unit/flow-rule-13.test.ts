import { describe, expect, it } from "vitest";
import { assessFlow } from "#app/engine/flow/assess.ts";
import { EngineInputError } from "#app/engine/errors.ts";
import type { StressRecord } from "#app/engine/flow/handling-inputs.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { dayOf } from "#app/engine/rules/calendar.ts";
import { addition, exact, findings, flow, outcomes, step, um } from "./flow-samples.ts";

const recorded = (stressRecord: StressRecord | null, assessedOn: string | null = "2026-06-01") => ({
  ...flow([step({ adds: [addition({ stressRecord })] })]),
  assessedOn,
});

describe("rule 13, where stresses come from", () => {
  it("is clear for what was measured, and says so", () => {
    const [found] = findings(flow([step({ adds: [addition()] })]), 13);
    expect(found).toMatchObject({ outcome: "clear", remedy: null });
    expect(found?.reason).toContain("Film: measured here");
  });

  it("is a caution for an assumed stress", () => {
    const guessed = addition({ stress: { ...exact(1e8), source: "assumed" } });
    expect(findings(flow([step({ adds: [guessed] })]), 13)[0]).toMatchObject({ outcome: "caution" });
  });

  it.each([
    { on: "2025-06-02", outcome: "clear" },
    // 365 days are short of 365.25; the day before is over it.
    { on: "2025-06-01", outcome: "clear" },
    { on: "2025-05-31", outcome: "caution" },
    { on: "2020-01-01", outcome: "caution" },
  ])("a record of $on on 2026-06-01: $outcome", ({ on, outcome }) => {
    expect(outcomes(recorded({ on }), 13)).toEqual([outcome]);
    expect(outcomes(recorded({ on }, null), 13)).toEqual(["clear"]);
  });

  it("passes with caution at exactly the age that the site sets", () => {
    const year = { ...defaultLimits(), recordAge: { value: 365 * 86400, source: "site" } };
    expect(outcomes(recorded({ on: "2025-06-01" }), 13, { limits: year })).toEqual(["caution"]);
  });

  it.each([
    { filmThickness: 0.84, outcome: "clear" },
    { filmThickness: 0.8, outcome: "caution" },
    { filmThickness: 1.24, outcome: "clear" },
    { filmThickness: 1.25, outcome: "caution" },
    { filmThickness: 3, outcome: "caution" },
  ])("measured at $filmThickness µm, used at 1 µm: $outcome", ({ filmThickness, outcome }) => {
    expect(outcomes(recorded({ filmThickness: um(filmThickness) }), 13)).toEqual([outcome]);
  });

  it("is a caution for a stress after heating that is used as deposited", () => {
    expect(outcomes(recorded({ state: "after heating" }), 13)).toEqual(["caution"]);
    expect(outcomes(recorded({ state: "as deposited" }), 13)).toEqual(["clear"]);
  });

  it("has no say where nothing is put down", () => {
    expect(outcomes(flow([step()]), 13)).toEqual([]);
  });

  it("refuses what is no date, by its place", () => {
    expect(() => assessFlow(recorded({ on: "1 June" }), defaultLimits())).toThrow(EngineInputError);
    expect(() => assessFlow(recorded({ on: "2025-02-29" }), defaultLimits())).toThrow(
      "steps[0].adds[0].stressRecord.on",
    );
  });

  it("counts days through leap years and centuries", () => {
    const days = (from: string, to: string) => dayOf("", to) - dayOf("", from);
    expect(days("2024-02-28", "2024-03-01")).toBe(2);
    expect(days("2025-12-31", "2026-01-01")).toBe(1);
    expect(days("2000-01-01", "2400-01-01")).toBe(146097);
    expect(days("1900-02-28", "1900-03-01")).toBe(1);
  });
});
