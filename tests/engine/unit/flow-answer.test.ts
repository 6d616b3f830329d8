import { describe, expect, it } from "vitest";
import { answerSentences, supportSpans, tightestStep } from "#app/engine/flow/answer.ts";
import { assessFlow } from "#app/engine/flow/assess.ts";
import type { FlowInput, StepInput } from "#app/engine/flow/model.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import {
  addition,
  exact,
  film,
  flow,
  frameStep,
  grindStep,
  reliefStep,
  step,
  tapeStep,
  tool,
  trimStep,
  um,
} from "./flow-samples.ts";

const limits = defaultLimits();
const answer = (input: FlowInput) => answerSentences(input, assessFlow(input, limits));
const plain = (text: string | undefined) => text?.replaceAll("\u00a0", " ");

const pulling = (edgesUp: number): StepInput =>
  step({
    kind: "deposit",
    title: "Deposit nitride",
    adds: [addition({ stress: exact(400e6), thickness: exact(um(2)) })],
    equipment: tool({ name: "Deposition tool", warpLimitEdgesUp: exact(um(edgesUp)) }),
  });

describe("the answer in plain words", () => {
  it("says that no step needs support when none does", () => {
    expect(plain(answer(flow([step()]))[0])).toBe("Clear as planned: no step needs support.");
  });

  it("names the support, from which step to which", () => {
    const input = flow([trimStep(), tapeStep(), grindStep(100, 3), reliefStep(), frameStep()]);
    expect(answer(input)[0]).toBe("Clear as planned: tape or ring from step 3, grind, to step 5.");
    expect(supportSpans(assessFlow(input, limits).steps)).toEqual([
      { support: "bare", from: 1, to: 2 },
      { support: "tape or ring", from: 3, to: 5 },
    ]);
  });

  it("says 'at' when only one step needs it", () => {
    // 170 µm: thin enough for tape, too thick for trim and relief to be asked.
    expect(answer(flow([tapeStep(), grindStep(170, 3)]))[0]).toBe("Clear as planned: tape or ring at step 2, grind.");
  });

  it("opens with the cautions when it runs with them, and names the tightest warp", () => {
    const [support, tightest] = answer(flow([pulling(280), step()]));
    expect(support).toBe("Runs with cautions: no step needs support.");
    expect(plain(tightest)).toMatch(
      /^Tightest: step 1, edges up \d+ µm as it leaves; deposition tool takes 280 µm edges up\./,
    );
  });

  it("gives the first cause when it does not run", () => {
    const [support, cause] = answer(flow([step(), pulling(100), pulling(100)]));
    expect(support).toBe("No step needs support.");
    expect(plain(cause)).toMatch(
      /^Step 2, Deposit nitride: Edges up \d+ µm as it leaves; deposition tool takes 100 µm/,
    );
  });

  it("says what is needed when the plan is weaker", () => {
    const [support, cause] = answer(flow([tapeStep(), grindStep(170, 3), step()]));
    expect(support).toBe("Needs tape or ring from step 2, grind, to step 3.");
    expect(plain(cause)).toMatch(/^Step 3, Measure: /);
  });
});

describe("the tightest step", () => {
  it("is the one nearest its own limit, not the one that bows most", () => {
    const input = flow([pulling(280), step({ equipment: tool({ warpLimitEdgesUp: exact(um(5000)) }) })]);
    expect(tightestStep(assessFlow(input, limits))?.step).toBe(1);
  });

  it("is none where nothing lies free", () => {
    const held = flow([step({ kind: "mount on frame", planned: "film frame" })]);
    expect(tightestStep(assessFlow(held, limits))).toBeNull();
  });
});

describe("verdict and assumed inputs", () => {
  it("is the worst finding and the first step that has it", () => {
    const input = flow([pulling(280), pulling(100), pulling(100)]);
    expect(assessFlow(input, limits).verdict).toEqual({ outcome: "do not run", step: 2, rule: 2 });
    expect(assessFlow(flow([step()]), limits).verdict).toEqual({ outcome: "clear", step: null, rule: null });
  });

  it("lists what nobody measured or looked up, each once, with the first step that uses it", () => {
    const guessed = { ...exact(100e6), source: "assumed" as const };
    const seed = film({ name: "Seed", expansion: { ...exact(2e-6), source: "assumed" } });
    const input = flow([
      step(),
      step({ adds: [addition({ film: seed, stress: guessed })] }),
      step({ adds: [addition({ film: seed, stress: guessed })] }),
    ]);
    expect(assessFlow(input, limits).assumed).toEqual([
      { step: 2, what: "Seed: stress" },
      { step: 2, what: "Seed: expansion" },
    ]);
  });
});
