import { describe, expect, it } from "vitest";
import { bondSpans } from "#app/engine/finder/bond-spans.ts";
import { answerSentences, supportSpans } from "#app/engine/flow/answer.ts";
import { assessFlow, inputsCounted } from "#app/engine/flow/assess.ts";
import { judgeFlow } from "#app/engine/flow/judge.ts";
import { hasLegs, legFlows, slotsInWords } from "#app/engine/flow/legs.ts";
import type { FlowInput, StepInput } from "#app/engine/flow/model.ts";
import { walkFlow } from "#app/engine/flow/walk.ts";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { judged, walked, walkVariant } from "#app/engine/trial/trial-walk.ts";
import {
  addition,
  bondStep,
  debondStep,
  exact,
  flow,
  frameStep,
  grindStep,
  reliefStep,
  step,
  um,
} from "./flow-samples.ts";

const limits = defaultLimits();
const range = (from: number, to: number) => Array.from({ length: to - from + 1 }, (_, index) => from + index);

const coat = (overrides: Partial<StepInput> = {}) =>
  step({ kind: "deposit", title: "Coat", adds: [addition({ thickness: exact(um(5), um(0.1)) })], ...overrides });

/** Slots 1 to 12 get a second film, which the others skip. */
const parted = () => flow([coat(), coat({ title: "Coat again", slots: range(1, 12) }), step({ title: "Look" })]);

describe("the legs of a flow", () => {
  it("are the classes of slots that take the same steps, by their first slot", () => {
    const legs = legFlows(flow([coat({ slots: range(3, 10) }), coat({ slots: range(8, 25) }), step()]));
    expect(legs.map(({ leg }) => leg?.slots)).toEqual([[1, 2], range(3, 7), range(8, 10), range(11, 25)]);
    expect(legs.map(({ steps }) => steps.map(({ skipped = false }) => skipped))).toEqual([
      [true, true, false],
      [false, true, false],
      [false, false, false],
      [true, false, false],
    ]);
  });

  it("leave a flow as it is whose steps are for all slots, by words or by silence", () => {
    const all = flow([coat(), step()]);
    expect(legFlows(all)).toEqual([all]);
    const named = flow([coat({ slots: range(1, 25) }), step()]);
    expect(legFlows(named)).toHaveLength(1);
    const { legs, slots, ...rest } = judgeFlow(named, limits);
    expect({ legs, slots }).toEqual({ legs: undefined, slots: undefined });
    expect(rest.verdict).toEqual(judgeFlow(all, limits).verdict);
  });

  it("of a leg are itself", () => {
    const [leg] = legFlows(parted());
    expect(leg && legFlows(leg)).toEqual([leg]);
  });

  it("keep the steps that a slot takes, and do nothing at the others", () => {
    const whole = parted();
    const [first, second] = legFlows(whole);
    expect(first?.steps[1]).toBe(whole.steps[1]);
    expect(second?.steps[1]).toMatchObject({ title: "Coat again", skipped: true, adds: [], equipment: null });
  });

  it.each([
    [[0, 1], "there is no slot 0"],
    [[24, 25, 26], "there is no slot 26"],
    [[1.5], "there is no slot 1.5"],
    [[3, 2], "the slots are not each once and in order"],
    [[2, 2], "the slots are not each once and in order"],
    [[], "the step is for no slot"],
  ])("refuse %j: %s", (slots, reason) => {
    expect(() => legFlows(flow([coat(), coat({ slots })]))).toThrow(reason);
  });

  it("are six at most", () => {
    const steps = (count: number) => range(1, count).map((slot) => coat({ slots: [slot] }));
    expect(legFlows(flow(steps(5)))).toHaveLength(6);
    expect(() => legFlows(flow(steps(6)))).toThrow("the slots part into 7 legs");
  });

  it("are said in words", () => {
    expect(slotsInWords(range(1, 12))).toBe("slots 1 to 12");
    expect(slotsInWords([3])).toBe("slot 3");
    expect(slotsInWords([1, 2, 5, 6, 7, 9])).toBe("slots 1, 2, 5 to 7 and 9");
  });
});

describe("a flow that parts by slot", () => {
  it("is not walked before a leg is chosen", () => {
    expect(hasLegs(parted())).toBe(true);
    expect(() => walkFlow(parted(), limits)).toThrow("choose the slots that are looked at");
    expect(() => walked(parted(), limits)).toThrow("choose the slots that are looked at");
    for (const leg of legFlows(parted())) expect(walkFlow(leg, limits).steps).toHaveLength(3);
  });

  it("leaves the wafer of other slots as it was, for as many steps as it has", () => {
    const [, second] = legFlows(parted());
    const { steps } = walkFlow(second as FlowInput, limits);
    expect(steps[1]?.after).toBe(steps[0]?.after);
    expect(steps[1]?.atRoom?.sagitta).toBe(steps[0]?.atRoom?.sagitta);
    expect(steps[1]).toMatchObject({ number: 2, atPeak: null, remarks: [] });
  });

  const groundTo = (micrometres: number, slots: number[]) => grindStep(micrometres, 1, { slots, planned: "bare" });
  const uneven = flow([step(), groundTo(600, range(1, 12)), groundTo(100, range(13, 25)), step({ title: "Look" })]);

  it("is answered by its worst leg, and says the others'", () => {
    const assessed = assessFlow(uneven, limits);
    expect(assessed.slots).toEqual(range(13, 25));
    expect(assessed.legs?.map(({ slots, verdict }) => [slots.length, verdict.outcome])).toEqual([
      [12, "clear"],
      [13, assessed.verdict.outcome],
    ]);
    expect(assessed.findings.every(({ step: number }) => number !== 2)).toBe(true);
    expect(assessed.findings).toEqual(assessed.legs?.[1]?.findings);
    const sentences = answerSentences(uneven, assessed);
    expect(sentences[0]).toMatch(/^Slots 13 to 25: /);
    expect(sentences.at(-1)).toBe("Slots 1 to 12: clear.");
  });

  it("counts the inputs of all legs together, and of each its own", () => {
    const whole = assessFlow(uneven, limits);
    expect(whole.inputs).toBe(3);
    expect(whole.legs?.map((leg) => inputsCounted(leg.flow).inputs)).toEqual([2, 2]);
  });

  it("does not count a skipped step among the support needed", () => {
    const [first] = legFlows(flow([grindStep(250, 1), coat({ slots: [25] }), step({ planned: "grinding tape" })]));
    const [span, ...more] = supportSpans(judgeFlow(first as FlowInput, limits).steps);
    expect(more).toEqual([]);
    expect(span).toMatchObject({ from: 1, to: 3 });
  });

  it("leaves a debond of slots that were not bonded to the order rule of their leg", () => {
    const whole = flow([step(), bondStep({ slots: range(1, 12) }), frameStep(), debondStep(), step()]);
    const { legs = [] } = judgeFlow(whole, limits);
    const orders = legs.map(({ findings }) =>
      findings.some(({ rule, step: at, outcome }) => rule === 12 && at === 4 && outcome === "do not run"),
    );
    expect(orders).toEqual([false, true]);
    expect(legFlows(whole).map((leg) => bondSpans(leg))).toEqual([[{ from: 2, to: 4, face: "front" }], []]);
  });

  it("lets wafers wait while the other slots are worked on", () => {
    const hour = 3600;
    const waiting = (hours: number, overrides: Partial<StepInput> = {}) => ({
      timeSincePrevious: hours * hour,
      ...overrides,
    });
    const whole = flow([
      grindStep(90, 1),
      step({ kind: "hold", title: "Wait", holdTime: 20 * hour, slots: [1], ...waiting(3) }),
      reliefStep(waiting(2)),
    ]);
    const times = judgeFlow(whole, limits).legs?.map(
      ({ findings }) => findings.find(({ rule, step: at }) => rule === 17 && at === 3)?.figures[0]?.value,
    );
    expect(times).toEqual([25 * hour, 25 * hour]);
  });

  it("is tried from its leg as it is judged", () => {
    for (const leg of legFlows(uneven)) {
      const base = walked(leg, limits);
      const outcomes = (found: { rule: number; step: number; outcome: string }[]) =>
        found.map(({ rule, step: at, outcome }) => [rule, at, outcome]);
      const expected = outcomes(judgeFlow(leg, limits).findings);
      expect(outcomes(judged(base, limits))).toEqual(expected);
      const copy = { ...leg, steps: leg.steps.map((each) => ({ ...each })) };
      expect(outcomes(judged(walkVariant(base, copy, limits), limits))).toEqual(expected);
    }
  });
});
