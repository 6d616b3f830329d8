import { describe, expect, it } from "vitest";
import { copyStep, moveStep, putStep, removeStep } from "#app/lib/plan-edits.ts";
import type { FlowPlan, StepPlan } from "#app/schemas/flow-plan.ts";
import { plannedStep } from "./planned-step.ts";

const plan: FlowPlan = {
  name: "Plan",
  note: "",
  silicon: "si",
  waferKind: "silicon wafer",
  incomingBowAlong: null,
  incomingBowAcross: null,
  incomingFilmShare: null,
  gateBow: null,
  gateWarp: null,
  incomingThickness: { value: 725e-6, tolerance: null, source: "supplier" },
  steps: ["a", "b", "c"].map((id) => plannedStep({ id, title: `Step ${id}` })),
};
const order = (edit: { plan: FlowPlan } | null | undefined) => edit?.plan.steps.map(({ id }) => id).join("");

describe("moving", () => {
  it("puts a step where it is told, and says so from 1", () => {
    expect(order(moveStep(plan, "a", 2))).toBe("bca");
    expect(order(moveStep(plan, "c", 0))).toBe("cab");
    expect(moveStep(plan, "a", 1)?.words).toBe("Moved step 1, Step a, to 2");
  });

  it("stays within the flow, and is nothing where the step is already", () => {
    expect(order(moveStep(plan, "b", 99))).toBe("acb");
    expect(moveStep(plan, "a", -1)).toBeNull();
    expect(moveStep(plan, "c", 3)).toBeNull();
    expect(moveStep(plan, "x", 1)).toBeUndefined();
  });
});

describe("removing and copying", () => {
  it("looks at the step that takes the place, at the end at the one before", () => {
    expect(removeStep(plan, "b")).toMatchObject({ words: "Removed step 2, Step b", shown: "c" });
    expect(removeStep(plan, "c")?.shown).toBe("b");
    expect(removeStep({ ...plan, steps: plan.steps.slice(0, 1) }, "a")?.shown).toBeNull();
    expect(removeStep(plan, "x")).toBeUndefined();
  });

  it("puts the copy right behind", () => {
    const copied = copyStep(plan, "a", "new");
    expect(copied?.plan.steps.map(({ id, title }) => [id, title]).slice(0, 2)).toEqual([
      ["a", "Step a"],
      ["new", "Step a, again"],
    ]);
    expect(copyStep(plan, "x", "new")).toBeUndefined();
  });
});

describe("putting", () => {
  const { id: _id, ...values }: StepPlan = plannedStep({ title: "New" });

  it("changes a step in place, whatever the position", () => {
    const edit = putStep(plan, "b", values, 0);
    expect(order(edit)).toBe("abc");
    expect(edit).toMatchObject({ words: "Changed step 2, New", shown: "b" });
  });

  it("adds a step before a position, at most at the end", () => {
    expect(order(putStep(plan, "n", values, 1))).toBe("anbc");
    expect(order(putStep(plan, "n", values, 50))).toBe("abcn");
    expect(putStep(plan, "n", values, 50).words).toBe("Added step 4, New");
  });
});
