/*
 * A step of other slots changes nothing for a wafer that skips it: whatever it is and wherever it stands, the wafer has the bows,
 * findings and uncertainties of the flow without it, at steps whose numbers alone differ.
 */
import fc from "fast-check";
import { describe, expect, it } from "vitest";
import { judgeFlow, type JudgedFlow } from "#app/engine/flow/judge.ts";
import { legFlows } from "#app/engine/flow/legs.ts";
import { STEP_KINDS, type FlowInput, type StepInput } from "#app/engine/flow/model.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { addition, bondStep, exact, step, um } from "../unit/flow-samples.ts";
import { demoFlow } from "../../fixtures/demo-flow-input.ts";

const limits = defaultLimits();

/** A step of a kind that does all that a step can do, in no time. */
const busy = (kind: StepInput["kind"]): StepInput =>
  step({
    ...bondStep(),
    kind,
    title: "Of another slot",
    peakTemperature: 600,
    holdTime: 0,
    timeSincePrevious: 0,
    exposures: ["vacuum", "solvent", "acid"],
    planned: "bare",
    siliconAfter: exact(um(30)),
    adds: [addition()],
    edgeTrim: { width: exact(1e-3), depth: exact(um(100)) },
    groundFaceForce: exact(-300, 30),
    viaProtrusion: exact(um(5)),
    thicknessVariation: exact(um(9)),
    slots: [25],
  });

const insertedAt = (flow: FlowInput, at: number, kind: StepInput["kind"]): FlowInput => ({
  ...flow,
  steps: flow.steps.toSpliced(at, 0, busy(kind)),
});

/** What a flow was found to be, step by step, with the steps counted as in the flow without the one at `at`. */
function seen({ steps, findings }: JudgedFlow, at: number) {
  const taken = steps.filter(({ state }) => state.step.skipped !== true);
  const number = (of: number) => (of > at + 1 ? of - 1 : of);
  return {
    steps: taken.map(({ state, required, outcome, uncertainty }) => ({
      bow: state.atRoom?.sagitta,
      hot: state.atPeak?.sagitta,
      released: state.released.sagitta,
      required,
      outcome,
      uncertainty,
    })),
    findings: findings.map(({ rule, step: of, outcome, figures }) => ({
      rule,
      outcome,
      step: number(of),
      figures: figures.map(({ value }) => value),
    })),
  };
}

describe.each(["Tern", "Petrel", "Fulmar B"])("%s with a step of another slot", (name) => {
  const { flow } = demoFlow(name);
  const without = judgeFlow(flow, limits);

  it("is as it was for the slots that skip it", { timeout: 120_000 }, () => {
    fc.assert(
      fc.property(fc.nat({ max: flow.steps.length }), fc.constantFrom(...STEP_KINDS), (at, kind) => {
        const [leg] = legFlows(insertedAt(flow, at, kind));
        if (!leg) throw new Error("a flow has a leg");
        expect(seen(judgeFlow(leg, limits), at)).toEqual(seen(without, flow.steps.length));
      }),
      { numRuns: 12 },
    );
  });
});
