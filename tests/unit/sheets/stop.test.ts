/** Lengths in m. A reading that means stop is a warp as loaded. */
import { describe, expect, it } from "vitest";
import { roundedLimit, roundedRadius, roundedWarp } from "#app/lib/sheet-round.ts";
import { stopLines, stopReadings } from "#app/lib/sheet-stop.ts";
import type { ShapeResult, StepResult } from "#app/schemas/assessment-result.ts";
import { demoResult } from "#tests/fixtures/demo-assessment.ts";

const plain = (text: string) => text.replaceAll("\u00A0", " ");

describe("figures for hands", () => {
  it("are rounded to 10 µm", () => {
    expect(plain(roundedWarp(228e-6))).toBe("230 µm");
    expect(plain(roundedWarp(224e-6))).toBe("220 µm");
    expect(plain(roundedWarp(2.795e-3))).toBe("2.8 mm");
  });

  it("never round a limit up, and do not lose one to the way decimals are kept", () => {
    expect(plain(roundedLimit(399e-6))).toBe("390 µm");
    for (const limit of [200, 300, 400, 500, 800, 1000, 1500])
      expect(plain(roundedLimit(limit * 1e-6))).toBe(`${limit} µm`);
    expect(plain(roundedLimit(2000e-6))).toBe("2.0 mm");
  });

  it("give a roll radius one digit", () => {
    expect(plain(roundedRadius(0.324))).toBe("0.3 m");
    expect(plain(roundedRadius(0.0276))).toBe("30 mm");
    expect(plain(roundedRadius(0.002))).toBe("10 mm");
  });
});

const [template] = demoResult("Tern").steps;
if (!template?.atRoom) throw new Error("Tern's first step has no shape");
const shape: ShapeResult = template.atRoom;

const step = (number: number, warp: number | null, up: number | null, down: number | null = up): StepResult => ({
  ...template,
  number,
  atRoom: warp === null ? null : { ...shape, warp, edgesUp: true },
  equipment: { name: "Tool", edgesUp: up, edgesDown: down },
});

describe("the reading that means stop", () => {
  it("is the tightest limit of the group while no step is expected beyond it", () => {
    const steps = [step(1, 100e-6, 1000e-6), step(2, 230e-6, 400e-6), step(3, 230e-6, 800e-6)];
    expect(stopReadings(steps, "edgesUp", null)).toEqual([{ limit: 400e-6, steps: [1, 2, 3] }]);
    expect(stopLines(steps, null).map(plain)).toEqual(["Over 400 µm edges up or down"]);
  });

  it("stands for its own steps only where another step is expected beyond it", () => {
    const steps = [step(1, 100e-6, 300e-6), step(2, 700e-6, 1000e-6), step(3, 700e-6, 900e-6)];
    expect(stopReadings(steps, "edgesUp", null)).toEqual([
      { limit: 300e-6, steps: [1] },
      { limit: 900e-6, steps: [2, 3] },
    ]);
    expect(stopLines(steps, null).map(plain)).toEqual([
      "Over 300 µm edges up, step 1",
      "Else over 900 µm edges up",
      "Over 300 µm edges down",
    ]);
  });

  it("counts the shape that is loaded, not only the one that leaves", () => {
    const before = step(1, 500e-6, 1000e-6);
    const steps = [step(2, 100e-6, 1000e-6), step(3, 100e-6, 300e-6)];
    expect(stopReadings(steps, "edgesUp", null)).toHaveLength(1);
    expect(stopReadings(steps, "edgesUp", before)).toEqual([
      { limit: 300e-6, steps: [3] },
      { limit: 1000e-6, steps: [2] },
    ]);
  });

  it("is not loosened for a step that its own limit stops", () => {
    const steps = [step(1, 430e-6, 300e-6), step(2, 200e-6, 1000e-6)];
    expect(stopReadings(steps, "edgesUp", null)).toEqual([
      { limit: 300e-6, steps: [1] },
      { limit: 1000e-6, steps: [2] },
    ]);
    const stopped = [step(1, 2800e-6, 300e-6), step(2, 2800e-6, 1000e-6)];
    expect(stopReadings(stopped, "edgesUp", null)).toEqual([{ limit: 300e-6, steps: [1, 2] }]);
  });

  it("is none where the wafer is held flat or no limit is known", () => {
    expect(stopLines([step(1, null, 300e-6), step(2, 100e-6, null)], null)).toEqual([]);
  });

  it("tells the two directions apart where they differ", () => {
    expect(stopLines([step(1, 100e-6, 400e-6, 500e-6)], null).map(plain)).toEqual([
      "Over 400 µm edges up",
      "Over 500 µm edges down",
    ]);
  });

  it("reads what is turned over for a step the other way round", () => {
    const stops = step(1, 700e-6, 300e-6);
    const next = step(2, 1e-6, 1000e-6);
    const turned = { ...next, loadedFaceUp: stops.faceUp === "device side" ? "back side" : "device side" } as const;
    expect(stopReadings([stops, next], "edgesUp", null)).toHaveLength(2);
    expect(stopReadings([stops, turned], "edgesUp", null)).toEqual([{ limit: 300e-6, steps: [1, 2] }]);
    expect(stopReadings([stops, turned], "edgesDown", null)).toHaveLength(2);
  });
});
