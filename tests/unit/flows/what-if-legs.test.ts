import { describe, expect, it } from "vitest";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { answerOf, toldAnswer } from "#app/lib/what-if-answer.ts";
import { flow, grindStep, step } from "#tests/engine/unit/flow-samples.ts";

const limits = defaultLimits();
const range = (from: number, to: number) => Array.from({ length: to - from + 1 }, (_, index) => from + index);

/** Two grinds, each for half of the slots. */
const ground = (first: number, second: number) =>
  flow([
    step({ title: "Receive" }),
    grindStep(first, 1, { planned: "bare", slots: range(1, 12) }),
    grindStep(second, 1, { planned: "bare", slots: range(13, 25) }),
    step({ title: "Look" }),
  ]);

describe("a what-if of a flow that parts by slot", () => {
  const present = answerOf(ground(600, 100), limits);

  it("answers for the worst leg, which it names", () => {
    expect(toldAnswer(present, present)).toMatchObject({ step: 3, changed: [] });
    const told = toldAnswer(present, present);
    expect(told.computed && told.sentences[0]).toMatch(/^Slots 13 to 25: /);
  });

  it("says what changes for the slots that it answers for, not for those that were the worst before", () => {
    const told = toldAnswer(answerOf(ground(100, 600), limits), present);
    expect(told.computed && told.sentences[0]).toMatch(/^Slots 1 to 12: /);
    expect(told.computed && told.changed?.map(({ number, was }) => [number, was.outcome])).toEqual([
      [2, "clear"],
      [4, "clear"],
    ]);
  });

  it("is refused with a reason where the slots are none", () => {
    const wrong = flow([step(), step({ slots: [26] })]);
    expect(answerOf(wrong, limits)).toMatchObject({ computed: false, reason: expect.stringContaining("slot 26") });
  });
});
