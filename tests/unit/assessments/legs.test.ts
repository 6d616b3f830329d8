import { describe, expect, it } from "vitest";
import { defaultLimits } from "#app/engine/rules/limits.ts";
import { legAnswer, legNumber } from "#app/lib/assessment-leg.ts";
import { assessmentView } from "#app/lib/assessment-view.ts";
import { figureAskedFor } from "#app/lib/assessment-working.ts";
import { legQuery } from "#app/lib/leg-query.ts";
import { waferAnswer } from "#app/lib/lot-answers.ts";
import { movementSentence } from "#app/lib/out-of-date-words.ts";
import { compareResults, movementOf } from "#app/lib/result-comparison.ts";
import { sheetView } from "#app/lib/sheet-view.ts";
import { addition, exact, flow, grindStep, step, um } from "#tests/engine/unit/flow-samples.ts";
import { assessed, demoResult, HEAD } from "#tests/fixtures/demo-assessment.ts";

const range = (from: number, to: number) => Array.from({ length: to - from + 1 }, (_, index) => from + index);

/** Slots 1 to 12 are ground a little, the others far too thin to be bare. */
const parted = assessed(
  flow([
    step({ title: "Receive" }),
    grindStep(600, 1, { title: "Grind", planned: "bare", slots: range(1, 12) }),
    grindStep(100, 1, { title: "Grind on", planned: "bare", slots: range(13, 25) }),
    step({ title: "Look" }),
  ]),
);

describe("an assessment of a flow that parts by slot", () => {
  it("keeps the worst leg as its own result and every other one beside it", () => {
    expect(parted.slots).toEqual(range(13, 25));
    expect(parted.legs?.map(({ slots, result }) => [slots.length, result === null])).toEqual([
      [12, false],
      [13, true],
    ]);
    expect(parted.legs?.[0]?.result?.steps.map(({ skipped = false }) => skipped)).toEqual([false, false, true, false]);
    expect(parted.steps.map(({ skipped = false }) => skipped)).toEqual([false, true, false, false]);
  });

  it("shows the worst leg unless another is asked for", () => {
    for (const asked of [null, "2", "0", "3", "two"]) expect(legNumber(parted, asked)).toBe(2);
    expect(legNumber(parted, "1")).toBe(1);
    const [worst, other] = [assessmentView(HEAD, parted, null), assessmentView(HEAD, parted, null, "1")];
    expect(worst.legs?.chosen.slots).toBe("slots 13 to 25");
    expect(other.legs?.rows).toEqual(worst.legs?.rows);
    expect([worst.outcome, other.outcome]).toEqual([parted.verdict.outcome, "clear"]);
    expect(worst.sentences[0]).toMatch(/^Slots 13 to 25: /);
    expect(worst.sentences.at(-1)).toBe("Slots 1 to 12: clear.");
    expect(other.sentences[0]).toMatch(/^Slots 1 to 12: /);
  });

  it("says at a step which slots take it, and that these skip it", () => {
    const view = assessmentView(HEAD, parted, "2");
    expect(view.steps.map(({ title, note }) => [title, note !== null])).toEqual([
      ["Receive", expect.any(Boolean)],
      ["Grind, slots 1 to 12", true],
      ["Grind on, slots 13 to 25", true],
      ["Look", true],
    ]);
    expect(view.selected?.remarks).toContain("Only slots 1 to 12 take this step: here the wafer is left as it is.");
    expect(view.selected?.open).toEqual([]);
  });

  it("leads from its figures to workings of the same leg", () => {
    const { selected } = assessmentView(HEAD, parted, "2", "1");
    const path = selected?.lies.working ?? "";
    expect(path).toContain("&leg=1");
    const search = new URLSearchParams(path.split("?")[1]);
    expect(figureAskedFor(legAnswer(parted, search.get("leg")).result, search)).not.toBeNull();
  });

  it("has a sheet for each leg, without the steps that its slots skip", () => {
    const [worst, other] = [sheetView(HEAD, parted), sheetView(HEAD, parted, "1")];
    expect(worst.support.numbers).toEqual([1, 3, 4]);
    expect(other.support.numbers).toEqual([1, 2, 4]);
    expect([worst.blocked, other.blocked]).toEqual([true, false]);
    expect(other.titleBlock.title).toMatch(/, slots 1 to 12$/);
  });
});

describe("two assessments, of which one or both part by slot", () => {
  const whole = assessed(flow([step({ title: "Receive" }), grindStep(100, 1, { planned: "bare" }), step()]));
  const eased = assessed(
    flow([
      step({ title: "Receive" }),
      grindStep(90, 1, { title: "Grind", planned: "bare", slots: range(1, 12) }),
      grindStep(600, 1, { title: "Grind on", planned: "bare", slots: range(13, 25) }),
      step({ title: "Look" }),
    ]),
  );

  it("are compared for the same slots, where both have them", () => {
    const { slots, before, after } = compareResults(parted, eased);
    expect(slots).toBe("Compared for slots 1 to 12, the worst leg of the later one.");
    expect([before.outcome, after.outcome]).toEqual(["clear", "do not run"]);
    expect(movementSentence(movementOf(parted, eased))).toContain(slots);
  });

  it("say so where different slots are held against each other", () => {
    expect(compareResults(whole, parted).slots).toBe(
      "Different slots are compared: all slots of the earlier one with slots 13 to 25 of the later one.",
    );
    expect(compareResults(whole, whole).slots).toBeNull();
  });
});

describe("a wafer of a lot", () => {
  it("goes the way of its slot", () => {
    const input = {
      flow: flow([
        step({ kind: "receive", title: "Receive", adds: [addition({ thickness: exact(um(2)) })] }),
        grindStep(300, null, { title: "Grind", planned: "bare", slots: range(13, 25) }),
        step({ title: "Look" }),
      ]),
      limits: defaultLimits(),
    };
    const lot = { name: "L1", bow: um(-10), thickness: null, warp: null, edgeChips: null, identity: null, wafers: [] };
    const [thick, thin, none] = [3, 20, 26].map((slot) =>
      waferAnswer(input, lot, { slot, bow: um(-10), thickness: null }),
    );
    expect(thick?.at?.warp).toBeCloseTo(um(10), 7);
    expect(thin?.at?.warp).toBeGreaterThan(um(40));
    expect(none?.outcome).toBe("cannot judge");
  });
});

describe("an assessment of a flow that does not part", () => {
  it("has no legs, whatever is asked for", () => {
    const result = demoResult("Tern");
    expect(legAnswer(result, "1")).toEqual({ result, legs: null });
    expect(assessmentView(HEAD, result, null, "2").legs).toBeNull();
    expect(sheetView(HEAD, result, "1").legs).toBeNull();
  });
});

describe("the part of an address that stays with a leg", () => {
  it("is nothing where there is none", () => {
    expect([legQuery("?", null), legQuery("&", undefined), legQuery("?", "")]).toEqual(["", "", ""]);
    expect([legQuery("?", 2), legQuery("&", "1")]).toEqual(["?leg=2", "&leg=1"]);
  });
});
