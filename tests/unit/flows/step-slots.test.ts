/** Slots of a cassette as they are typed for a step, and what a plan carries on where its slots part. */
import { describe, expect, it } from "vitest";
import { flowFigures } from "#app/lib/flow-figures.ts";
import { planColumns } from "#app/lib/flow-plan.ts";
import { stepRows, type ShownStep } from "#app/lib/flow-rows.ts";
import { readSlots, slotsText } from "#app/lib/step-slots.ts";
import { stepHandlingWords } from "#app/lib/step-handling-words.ts";
import { BLANK_HANDLING } from "#app/lib/blank-step.ts";
import { stepSchema } from "#app/schemas/flow.ts";
import { stepRunOf } from "#app/lib/flow-handling.ts";

const run = (from: number, to: number) => Array.from({ length: to - from + 1 }, (_, index) => from + index);

describe("slots that are typed", () => {
  it.each([
    ["1-12", run(1, 12)],
    ["14, 1–3", [1, 2, 3, 14]],
    ["1 to 3 and 7", [1, 2, 3, 7]],
    ["5 - 6; 9 25", [5, 6, 9, 25]],
    ["7", [7]],
  ])("%j are read", (typed, slots) => {
    expect(readSlots(typed)).toEqual({ ok: true, slots });
    expect(readSlots(slotsText(slots))).toEqual({ ok: true, slots });
  });

  it.each(["", "  ", null, undefined, "1-25", "1-12, 13-25"])("%j are every wafer of the lot", (typed) => {
    expect(readSlots(typed)).toEqual({ ok: true, slots: null });
  });

  it.each([
    ["12-1", "12-1 runs backwards: type 1-12."],
    ["0-3", "There is no slot 0: a cassette has slots 1 to 25."],
    ["20-26", "There is no slot 26: a cassette has slots 1 to 25."],
    ["1-5, 5", "Slot 5 is named twice."],
    ["odd", "“odd” is no slot. Type for example 1-12, 14."],
    ["1.5", "“1.5” is no slot. Type for example 1-12, 14."],
    ["-3", "“-3” is no slot. Type for example 1-12, 14."],
    ["9999", "There is no slot 9999: a cassette has slots 1 to 25."],
  ])("%j are refused by name", (typed, message) => {
    expect(readSlots(typed)).toEqual({ ok: false, message });
  });

  it("are a field of every step, kept, said in words and given to the engine", () => {
    const typed = {
      title: "Measure",
      kind: "measure",
      peakTemperature: "25 °C",
      planned: "bare",
    };
    const read = stepSchema.parse({ ...typed, handling: { slots: "1-12" } });
    expect(read.handling.slots).toEqual(run(1, 12));
    expect(stepRunOf(read.handling)).toEqual({ slots: run(1, 12) });
    expect(stepRunOf(BLANK_HANDLING)).toEqual({});
    expect(new Map(stepHandlingWords(read.handling)).get("Slots")).toBe("1 to 12");
    const refused = stepSchema.safeParse({
      ...typed,
      handling: { slots: "12-1" },
    });
    expect(refused.error?.issues.map(({ path, message }) => [path.join("."), message])).toEqual([
      ["handling.slots", "12-1 runs backwards: type 1-12."],
    ]);
  });
});

const um = (value: number) => ({
  value: value / 1e6,
  tolerance: null,
  source: "assumed" as const,
});
const step = (overrides: Partial<ShownStep>): ShownStep => ({
  ...{
    id: "id",
    kind: "measure",
    title: "Measure",
    peakTemperature: 298.15,
    holdTime: null,
    equipment: null,
  },
  ...{
    exposures: [],
    planned: "bare",
    siliconAfter: null,
    trimWidth: null,
    trimDepth: null,
    carrier: null,
  },
  ...{ bondingMaterial: null, bondThickness: null, films: [] },
  ...overrides,
});
const [low, high] = [{ slots: run(1, 12) }, { slots: run(13, 25) }];
const plan = [
  step({
    kind: "bond",
    planned: "carrier",
    carrier: { name: "Glass" },
    handling: low,
  }),
  step({
    kind: "bond",
    planned: "carrier",
    carrier: { name: "Silicon" },
    handling: high,
  }),
  step({
    kind: "grind",
    planned: "carrier",
    siliconAfter: um(100),
    handling: low,
  }),
  step({
    kind: "grind",
    planned: "carrier",
    siliconAfter: um(50),
    handling: high,
  }),
  step({ kind: "deposit", planned: "carrier" }),
  step({ kind: "debond", handling: { ...low, debondFace: "front" } }),
  step({ kind: "debond", handling: { ...high, debondFace: "front" } }),
  step({}),
];

describe("a plan whose slots part", () => {
  const rows = stepRows(plan, um(775));

  it("carries silicon and carriers on for the wafers that take each step", () => {
    expect(rows.map(({ slots, silicon, bond }) => [slots, silicon.text, bond])).toEqual([
      ["slots 1 to 12", "775", "Glass"],
      ["slots 13 to 25", "775", "Silicon"],
      ["slots 1 to 12", "100", "Glass"],
      ["slots 13 to 25", "50", "Silicon"],
      [null, "100 or 50", "Glass or Silicon"],
      ["slots 1 to 12", "100", null],
      ["slots 13 to 25", "50", null],
      [null, "100 or 50", null],
    ]);
    expect(rows.slice(5, 7).map(({ changes }) => changes.map(({ what }) => what))).toEqual([["Glass"], ["Silicon"]]);
  });

  it("is drawn with the thinnest wafer, and names no carrier where there are two kinds", () => {
    const columns = planColumns(plan, um(775));
    expect(columns.map(({ silicon }) => silicon.text)).toEqual(["775", "775", "100", "50", "50", "100", "50", "50"]);
    expect(columns.map(({ planned }) => planned).slice(0, 5)).toEqual([
      "Glass",
      "Silicon",
      "Glass",
      "Silicon",
      "carrier",
    ]);
  });

  it("says its legs among its figures", () => {
    const figures = flowFigures({
      ...{
        silicon: { name: "Silicon", diameter: 0.3 },
        incoming: um(775),
        incomingBow: null,
        thinnest: null,
      },
      ...{ hottest: null, rows, legs: ["slots 1 to 12", "slots 13 to 25"] },
    });
    expect(figures.at(-1)).toEqual({
      label: "Parts by slot into",
      value: "slots 1 to 12; slots 13 to 25",
    });
  });
});
