import { describe, expect, it } from "vitest";
import { waferBefore } from "#app/lib/flow-wafer-before.ts";
import { stepNumber } from "#app/services/flows/step-number.ts";
import {
  addition,
  bondStep,
  exact,
  film,
  flow,
  grindStep,
  step,
  tapeStep,
  um,
} from "../../engine/unit/flow-samples.ts";

describe("the wafer as a step finds it", () => {
  const input = flow(
    [
      step({ adds: [addition(), addition({ film: film({ id: "b", name: "Copper" }), coverage: 0.35 })] }),
      tapeStep(),
      grindStep(100, 3),
      step({ adds: [addition({ side: "back", film: film({ name: "Oxide" }), thickness: exact(um(0.5)) })] }),
      bondStep(),
    ],
    { tolerance: 15 },
  );

  it("is bare silicon before the first step", () => {
    expect(waferBefore(input, 0)).toEqual({
      slots: null,
      silicon: "725\u00a0±\u00a015\u00a0µm",
      front: [],
      back: [],
      on: null,
      faceUp: "device side",
    });
  });

  it("has its films outermost first on the device side, and what it is on", () => {
    expect(waferBefore(input, 3)).toMatchObject({
      silicon: "100\u00a0±\u00a03\u00a0µm",
      front: ["Copper, 1\u00a0µm, 35\u00a0%", "Film, 1\u00a0µm"],
      on: "grinding tape",
    });
    expect(waferBefore(input, 5)).toMatchObject({ back: ["Oxide, 0.5\u00a0µm"], on: "Silicon carrier, Adhesive" });
  });

  it("is on both carriers between them, each with its face", () => {
    const second = bondStep();
    const steps = [bondStep(), { ...second, bond: second.bond && { ...second.bond, face: "back" as const } }];
    expect(waferBefore(flow([...steps, step()]), 2)?.on).toBe(
      "device side: Silicon carrier, Adhesive; back side: Silicon carrier, Adhesive",
    );
  });

  it("is that of the first slots that take the step, where the flow parts by slot", () => {
    const some = flow([
      step({ adds: [addition()] }),
      step({ adds: [addition({ film: film({ id: "c", name: "Cover" }) })], slots: [7, 8] }),
      step({ slots: [8, 9] }),
      step(),
    ]);
    expect(waferBefore(some, 2)).toMatchObject({ slots: "slot 8", front: ["Cover, 1\u00a0µm", "Film, 1\u00a0µm"] });
    expect(waferBefore(some, 3)).toMatchObject({ slots: "slots 1 to 6 and 10 to 25", front: ["Film, 1\u00a0µm"] });
  });

  it("is not spoken of when a step before leaves no silicon", () => {
    const none = flow([step({ siliconAfter: exact(-1e-6) }), step()]);
    expect(waferBefore(none, 1)).toBeNull();
    expect(waferBefore(none, 0)).not.toBeNull();
  });
});

describe("the number that a new step gets", () => {
  it.each([
    { asked: "3", number: 3 },
    { asked: "1", number: 1 },
    { asked: "6", number: 6 },
    { asked: "7", number: 6 },
    { asked: "-7", number: 1 },
    { asked: "0", number: 1 },
    { asked: null, number: 6 },
    { asked: "here", number: 6 },
  ])("asked for $asked of 5: $number", ({ asked, number }) => {
    expect(stepNumber(asked, 5)).toBe(number);
  });
});
