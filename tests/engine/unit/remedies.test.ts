/*
 * The smallest changes that clear what the demo flows are barred by. What an expert expects of the flows is in the fixture.
 *
 *   margin    share of a limit that is left, 1
 */
import { describe, expect, it } from "vitest";
import { assessFlow } from "#app/engine/flow/assess.ts";
import type { FlowInput } from "#app/engine/flow/model.ts";
import { changedBy } from "#app/engine/remedy/try-change.ts";
import { findRemedies, type RemedyAnswer } from "#app/engine/remedy/find-remedies.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { applyChange, originsOf } from "#app/engine/trial/change.ts";
import { outcomeRank } from "#app/engine/vocabulary.ts";
import { demoCatalogue } from "../../fixtures/demo-catalogue.ts";
import { demoFlow } from "../../fixtures/demo-flow-input.ts";

const limits = defaultLimits();

function remediesOf(flow: FlowInput): RemedyAnswer[] {
  const search = findRemedies(flow, limits, demoCatalogue);
  for (;;) {
    const next = search.next();
    if (next.done) return next.value.answers;
    expect(next.value.done).toBeLessThan(next.value.of);
    // Who leaves it here has what was found until now.
    expect(next.value.answers).toHaveLength(next.value.done);
  }
}

const at = (answers: RemedyAnswer[], rule: number, step: number) =>
  answers.find((answer) => answer.rule === rule && answer.step === step);

/** Every remedy is what a whole assessment of the changed flow says it is. */
function expectHonest(flow: FlowInput, answers: RemedyAnswer[]) {
  for (const { rule, step, remedies } of answers)
    for (const { changes, standing, verdict } of remedies) {
      const changed = changedBy(flow, changes, demoCatalogue);
      const assessed = assessFlow(changed.flow, limits);
      const here = assessed.findings.filter(
        (finding) => finding.rule === rule && changed.origins[finding.step - 1] === step,
      );
      expect(Math.max(0, ...here.map(({ outcome }) => outcomeRank(outcome)))).toBe(outcomeRank(standing.outcome));
      expect(assessed.verdict.outcome).toBe(verdict);
    }
}

describe("Petrel on glass of 3.3 ppm", () => {
  const { flow } = demoFlow("Petrel, glass 3.3 ppm");
  const answers = remediesOf(flow);

  it("is cleared at the bond by glass of 3.0 ppm, and runs with cautions then", () => {
    expect(at(answers, 2, 10)?.remedies[0]).toMatchObject({
      changes: [{ quantity: "bond", step: 10, carrier: "Glass carrier 3.0 ppm", material: "Laser-release adhesive B" }],
      standing: { outcome: "clear" },
      verdict: "caution",
      worsens: [{ rule: 2, step: 15, outcome: "caution" }],
    });
  });

  it("says nothing of what only data can clear, but what was tried", () => {
    expect(at(answers, 8, 19)).toMatchObject({ remedies: [], pair: null });
    expect(at(answers, 8, 19)?.tried).toBeGreaterThan(0);
  });

  it("names changes that hold in a whole assessment", () => {
    expectHonest(flow, answers);
  });
});

describe("Petrel", () => {
  it("is cleared at the sputterer by less of a film or more silicon, just as much as it takes", () => {
    const { flow } = demoFlow("Petrel");
    const answer = at(remediesOf(flow), 2, 15);
    const silicon = answer?.remedies.find(({ changes: [change] }) => change?.quantity === "silicon after");
    expect(silicon?.standing.outcome).toBe("clear");
    const change = silicon?.changes[0];
    if (change?.quantity !== "silicon after") throw new Error("more silicon clears it");
    const less = applyChange(flow, { ...change, value: change.value - 1e-6 }, demoCatalogue);
    const found = assessFlow(less, limits).findings.find(({ rule, step }) => rule === 2 && step === 15);
    expect(found?.outcome).toBe("caution");
  });
});

describe("Fulmar A", () => {
  const { flow } = demoFlow("Fulmar A");
  const answers = remediesOf(flow);

  it("is rid of the slide adhesive's findings by the peel adhesive", () => {
    for (const [rule, step] of [
      [6, 13],
      [6, 18],
      [8, 21],
    ] as const)
      expect(JSON.stringify(at(answers, rule, step)?.remedies)).toContain("Peel adhesive C with release layer");
  });

  it("keeps its thickness budget with more silicon only, with a caution", () => {
    expect(at(answers, 9, 12)?.remedies).toMatchObject([
      { changes: [{ quantity: "silicon after", step: 12, value: 25e-6 }], standing: { outcome: "caution" } },
    ]);
  });

  it("is not to be cleared of an assumed stress by any quantity", () => {
    expect(at(answers, 13, 5)).toMatchObject({ remedies: [], pair: null, tried: 0 });
  });

  it("names changes that hold in a whole assessment, and none that bars another step", () => {
    expectHonest(flow, answers);
    for (const { remedies } of answers)
      for (const { worsens } of remedies) for (const { outcome } of worsens) expect(outcome).toBe("caution");
  });
});

describe("Tern, frame omitted at step 16", () => {
  const { flow } = demoFlow("Tern");
  const bare: FlowInput = {
    ...flow,
    steps: flow.steps.map((step, index) =>
      index < 15 ? step : { ...step, planned: "bare", kind: index === 15 ? "move" : step.kind },
    ),
  };

  it("gets back the frame, before the first step that needs it, and is clear", () => {
    for (const answer of remediesOf(bare))
      expect(answer.remedies[0]).toMatchObject({
        changes: [{ quantity: "frame", step: 16, tool: "frame mounter" }],
        verdict: "clear",
        worsens: [],
      });
  });
});

describe("a flow that is clear", () => {
  it("has nothing to clear", () => {
    expect(remediesOf(demoFlow("Tern").flow)).toEqual([]);
  });
});

describe("where steps were before a change", () => {
  it("is kept where nothing moves", () => {
    expect(originsOf(3, { quantity: "silicon after", step: 2, value: 1e-4 })).toEqual([1, 2, 3]);
  });

  it("follows a step that is moved", () => {
    expect(originsOf(4, { quantity: "place", step: 3, to: 1 })).toEqual([3, 1, 2, 4]);
  });

  it("leaves out a step that is put in", () => {
    expect(originsOf(3, { quantity: "frame", step: 2, tool: "any" })).toEqual([1, null, 2, 3]);
  });

  it("a change that names nothing of the flow leaves it as it is", () => {
    const { flow } = demoFlow("Tern");
    expect(applyChange(flow, { quantity: "frame", step: 2, tool: "none" }, demoCatalogue)).toBe(flow);
    expect(
      applyChange(
        flow,
        { quantity: "bond", step: 2, carrier: "none", material: "none", thickness: 1e-5 },
        demoCatalogue,
      ),
    ).toBe(flow);
  });
});
