import { describe, expect, it } from "vitest";
import { EngineInputError } from "#app/engine/errors.ts";
import { assessFlow } from "#app/engine/flow/assess.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { waferAnswer } from "#app/lib/lot-answers.ts";
import { expectedShare } from "#app/lib/lot-expected.ts";
import { bowOnReceipt, withLot } from "#app/lib/lot-input.ts";
import type { AssessmentInput } from "#app/schemas/assessment-changes.ts";
import type { LotInput } from "#app/schemas/lot.ts";
import { demoResult } from "#tests/fixtures/demo-assessment.ts";
import { demoFlow } from "#tests/fixtures/demo-flow-input.ts";

const um = (micrometres: number) => micrometres / 1e6;
const inputOf = (name: string): AssessmentInput => ({ flow: demoFlow(name).flow, limits: defaultLimits() });

const lotOf = (bow: number, more: Partial<LotInput> = {}): LotInput => ({
  name: "K-17",
  bow,
  thickness: null,
  warp: null,
  edgeChips: "none",
  identity: "matches",
  wafers: [],
  ...more,
});

const DEMO = ["Tern", "Petrel", "Fulmar B"];

describe("a lot in place of what a flow was assessed for", () => {
  it.each(DEMO)("comes to the same assessment when it came in as %s was assessed for", (name) => {
    const input = inputOf(name);
    const before = assessFlow(input.flow, input.limits);
    const own = withLot(input, lotOf(bowOnReceipt(input), { thickness: input.flow.wafer.thickness.value }));
    const after = assessFlow(own.flow, own.limits);
    expect(after.verdict).toEqual(before.verdict);
    after.steps.forEach(({ state, outcome }, index) => {
      const was = before.steps[index];
      // The bow is met within 1 nm at full thickness, which thinning to 20 µm makes some 2 µm of.
      expect(Math.abs((state.atRoom?.warp ?? 0) - (was?.state.atRoom?.warp ?? 0))).toBeLessThan(um(2));
      expect(outcome).toBe(was?.outcome);
    });
  });

  it.each(DEMO)("brings the wafer of %s to the bow that was measured, with the thickness that was measured", (name) => {
    const own = withLot(inputOf(name), lotOf(um(-180), { thickness: um(720) }));
    expect(bowOnReceipt(own)).toBeCloseTo(um(-180), 8);
    expect(own.flow.wafer.thickness.value).toBe(um(720));
    expect(own.flow.steps[0]?.adds[0]?.stress).toMatchObject({ source: "measured here", note: "lot K-17" });
  });

  it("grows as the wafer is thinned, as a film's bow does", () => {
    const bare = (bow: number): AssessmentInput => {
      const { flow, limits } = inputOf("Tern");
      const [receive] = flow.steps;
      if (!receive) throw new Error("the flow receives its wafers");
      const thin = {
        ...receive,
        kind: "grind" as const,
        adds: [],
        siliconAfter: { value: um(362.5), tolerance: null, source: "assumed" as const },
      };
      return withLot({ limits, flow: { ...flow, steps: [{ ...receive, adds: [] }, thin] } }, lotOf(bow));
    };
    const { flow, limits } = bare(um(-2));
    const { steps } = assessFlow(flow, limits);
    const [received, ground] = steps.map(({ state }) => state.atRoom?.warp ?? 0);
    expect(received).toBeCloseTo(um(2), 8);
    // Half the silicon: four times the bow.
    expect((ground ?? 0) / (received ?? 1)).toBeCloseTo(4, 1);
    expect(flow.wafer.incoming?.filmShare?.value).toBe(1);
  });

  it("refuses a bow that no film of the receipt gives", () => {
    const refused = () => withLot(inputOf("Tern"), lotOf(0.02));
    expect(refused).toThrow(EngineInputError);
    expect(refused).toThrow(/^lot\.bow/);
  });

  it("judges the gate by what the lot is assessed for now, and by what was not inspected", () => {
    const input = inputOf("Tern");
    const gated = {
      ...input,
      flow: { ...input.flow, gate: { bow: { value: um(-90), tolerance: um(40), source: "assumed" as const } } },
    };
    const outcomes = (lot: LotInput) => {
      const own = withLot(gated, lot);
      return assessFlow(own.flow, own.limits)
        .findings.filter(({ rule }) => rule === 15)
        .map(({ outcome }) => outcome);
    };
    expect(new Set(outcomes(lotOf(um(-180))))).toEqual(new Set(["clear"]));
    expect(outcomes(lotOf(um(-180), { edgeChips: null }))).toContain("cannot judge");
    expect(outcomes(lotOf(um(-180), { edgeChips: "found" }))).toContain("do not run");
  });
});

describe("the wafers of a lot", () => {
  const input = inputOf("Tern");
  const lot = lotOf(um(-20));
  const at = (bow: number, thickness: number | null = null) => waferAnswer(input, lot, { slot: 3, bow, thickness });

  it("are judged by the warp where each comes nearest to a limit", () => {
    const assessed = at(bowOnReceipt(input));
    const worst = demoResult("Tern").findings.filter(({ rule }) => rule === 2);
    expect(
      worst.some(
        ({ step, figures }) =>
          step === assessed.at?.step && Math.abs((figures[0]?.value ?? 0) - (assessed.at?.warp ?? 1)) < um(0.1),
      ),
    ).toBe(true);
    expect(assessed).toMatchObject({ slot: 3, outcome: "clear", reason: null });
    expect(at(um(-900))).toMatchObject({ outcome: "do not run" });
  });

  it("cannot be judged where nothing can be computed, and say why", () => {
    const impossible = at(0.02);
    expect(impossible).toMatchObject({ outcome: "cannot judge", at: null });
    expect(impossible.reason).toMatch(/^This bow .*\.$/);
  });
});

describe("what is expected of any lot", () => {
  it("is a share with the range of single lots about it, and names what it rests on", () => {
    const { flow } = inputOf("Petrel");
    const result = demoResult("Petrel");
    const expected = expectedShare(flow, result);
    if (!expected) throw new Error("the flow has a limit and tolerances");
    const [least, most] = expected.lots;
    expect(least).toBeLessThanOrEqual(expected.share);
    expect(most).toBeGreaterThanOrEqual(expected.share);
    expect(most).toBeLessThanOrEqual(1);
    expect(expected.by).not.toBe("");
  });

  it("is nothing without a tolerance", () => {
    const result = demoResult("Tern");
    const exact = {
      ...result,
      findings: result.findings.map((finding) => ({
        ...finding,
        figures: finding.figures.map((figure) => ({ ...figure, standardUncertainty: null })),
      })),
    };
    expect(expectedShare(inputOf("Tern").flow, exact)).toBeNull();
  });
});
